/**
 * Works out one row of the plan: whether the milestone is on the path, what has been recorded for it, its window, and
 * whether its gates are open. The word for its state is found afterwards from the row and the day.
 */
import { toEpochDay } from '@weftway/calendar/plain-date';
import { addSpanToDay, span } from '@weftway/calendar/span';
import { never, type Dated } from './child-record.ts';
import { eventIndex, isRedating } from './clock-base.ts';
import type { FactTest } from './compile-condition.ts';
import { applyGates, sideOfNeed } from './gates.ts';
import { awaitedOccurrence, completionsOfRow, isEnded } from './occurrences.ts';
import type { Completion, Side } from './pathway-facts.ts';
import { completionsOf, farFuture, ofSide, type Planning, type Row } from './planning.ts';
import { layFirstWindow, type FirstWindow, type WindowSource } from './window.ts';
import { newDraft } from './window-draft.ts';

const none: readonly never[] = [];
const source: WindowSource = {
  rowOf: (planning, index, side) => planRow(planning, index, side),
  awaitedOn: (planning, index, day) => {
    const milestone = planning.compiled.milestones[index];
    if (milestone === undefined) return null;
    const row = emptyRow(planning, milestone, null, null);
    if (!isOnPath(planning, row)) return null;
    const { first, draft } = awaitedOccurrence(planning, row, completionsOfRow(planning, row), day, source);
    return first.offPath === null ? draft : null;
  },
  rowOfId: (planning, id) => {
    const index = planning.compiled.indexOf.get(id);
    return index === undefined ? null : planRow(planning, index, null);
  },
};

/** The row of a milestone, or of one side of it; worked out once in an act of planning. */
export function planRow(planning: Planning, index: number, side: Side | null): Row {
  const place = index * 3 + (side === null ? 0 : side === 'R' ? 1 : 2);
  const known = planning.rows[place];
  if (known) return known;
  const milestone = planning.compiled.milestones[index];
  if (!milestone) throw new RangeError(`The protocol has no milestone with number ${String(index)}.`);
  const row = emptyRow(planning, milestone, side, null);
  // Kept before it is filled: the graft and its readiness ask each other for their windows.
  planning.rows[place] = row;
  fillRow(planning, row);
  return row;
}

/** A row about which nothing is known yet. */
export function emptyRow(
  planning: Planning,
  milestone: Row['milestone'],
  side: Side | null,
  operation: string | null,
): Row {
  return {
    milestone,
    side,
    operation,
    offPath: null,
    fixed: null,
    remark: null,
    occurrence: 1,
    draft: newDraft(planning.options.reasons !== false),
    isGateShut: false,
    freshUntil: farFuture,
    heldUntil: never,
    lapseDay: never,
    isStarted: false,
    isUnverified: false,
    isCaughtUp: false,
    past: none,
    isRepeating: false,
  };
}

function fillRow(planning: Planning, row: Row): void {
  const { milestone } = row;
  if (!isOnPath(planning, row)) {
    row.offPath = 'phenotype';
    return;
  }
  const done = completionsOfRow(planning, row);
  const waivedBy = done.length === 0 ? waivedCause(planning, row) : null;
  if (waivedBy !== null) {
    row.offPath = `follows-waived:${waivedBy}`;
    return;
  }
  if (milestone.repeats.length === 0) fillSingle(planning, row, done);
  else fillRepeating(planning, row, done);
  if (row.offPath !== null) return;
  applyRecords(planning, row, done);
  if (row.fixed === null) applyGates(planning, row, source.rowOf);
  row.lapseDay = lapseDay(planning, row);
  // A notched gum leaves one question open, answered with the first orthodontic records.
  if (milestone.rule.id === 'ORTH-01' && planning.child.hasGumQuestion) row.remark ??= 'gum-question';
  row.isStarted = milestone.rule.id === 'ORTH-03' && hasFact(planning, 'expansion_started');
}

function hasFact(planning: Planning, name: string): boolean {
  return planning.child.findings.has(name) || planning.child.facts.flags.includes(name);
}

function isOnPath(planning: Planning, row: Row): boolean {
  const { milestone } = row;
  const { child, options } = planning;
  if (milestone.applies === null || holdsForSide(planning, row, milestone.applies)) return true;
  if (milestone.rule.id === 'ORTH-01' && child.hasGumQuestion) return true;
  if (milestone.appliesGiven === null || !milestone.appliesGiven(child.truth)) return false;
  // What was done, half signed, waived or held was on the path, whatever else was written down.
  const { index } = milestone;
  const records = [child.done[index], child.parts[index], child.waived[index], child.held[index]];
  return (
    options.given?.has(milestone.rule.id) === true || records.some((all) => ofSide(all ?? none, row.side).length > 0)
  );
}

/** Facts that a completed graft stands for hold for its own side only. */
function holdsForSide(planning: Planning, row: Row, test: FactTest): boolean {
  const { truth } = planning.child;
  const graft = planning.compiled.rootMilestones.graft;
  if (row.side === null || graft < 0 || planning.child.gumSides.length < 2) return test(truth);
  const facts = planning.compiled.factsOfDone[graft] ?? none;
  const before = facts.map((fact) => truth[fact] ?? 0);
  const isDone = completionsOf(planning, graft, row.side).length > 0;
  for (const fact of facts) truth[fact] = isDone ? 1 : 0;
  const holds = test(truth);
  facts.forEach((fact, at) => {
    truth[fact] = before[at] ?? 0;
  });
  return holds;
}

/** The waived milestone whose event this one counts from, directly or further up. */
function waivedCause(planning: Planning, row: Row): string | null {
  const { milestone } = row;
  const byMolding = milestone.rule.lane === 'molding' && milestone.clockFrom === 'finding';
  const index = byMolding
    ? (milestone.gates[0]?.index ?? -1)
    : milestone.clockFrom === 'event'
      ? eventIndex(planning, row)
      : -1;
  const parent = planning.compiled.milestones[index];
  if (parent === undefined) return null;
  const side = sideOfNeed(planning, index, row.side);
  if (completionsOf(planning, index, side).length > 0) return null;
  const waivers = ofSide(planning.child.waived[index] ?? none, side);
  if (waivers.some((waiver) => !isRedating(waiver))) return parent.rule.id;
  const cause = planRow(planning, index, side).offPath;
  if (cause?.startsWith('follows-waived:') === true) return cause.slice('follows-waived:'.length);
  // A step whose own condition nobody stated still hands on what was waived before it.
  return cause === 'phenotype' ? waivedCause(planning, emptyRow(planning, parent, side, null)) : null;
}

function fillSingle(planning: Planning, row: Row, done: readonly Dated<Completion>[]): void {
  const last = done[done.length - 1];
  if (last === undefined && isEnded(planning, row)) {
    row.offPath = 'ended';
    return;
  }
  const asOf = last?.on ?? planning.child.today;
  // What was first done before the arrival keeps the window that it had then.
  const arrivedBy = done[0]?.on ?? asOf;
  const first = layFirstWindow(planning, row, row.draft, { asOf, arrivedBy, rhythm: null, source });
  takeFirst(planning, row, first, last === undefined);
  row.occurrence = Math.max(1, done.length);
  if (last === undefined) return;
  row.offPath = null;
  row.isUnverified = last.fact.isUnverified === true;
  row.fixed = row.isUnverified ? 'awaiting_sign_off' : 'signed_off';
}

function fillRepeating(planning: Planning, row: Row, done: readonly Dated<Completion>[]): void {
  row.isRepeating = true;
  const { today } = planning.child;
  const last = done[done.length - 1];
  if (isEnded(planning, row)) {
    if (last === undefined) {
      row.offPath = 'ended';
      return;
    }
    const before = awaitedOccurrence(planning, row, done.slice(0, -1), last.on, source);
    row.draft = before.draft;
    row.occurrence = done.length;
    row.fixed = 'signed_off';
    return;
  }
  const awaited = awaitedOccurrence(planning, row, done, today, source);
  row.draft = awaited.draft;
  row.past = awaited.past;
  row.occurrence = awaited.occurrence;
  if (awaited.isFinished) row.fixed = awaited.lastKind === 'waived' ? 'waived' : 'signed_off';
  else takeFirst(planning, row, awaited.first, true);
}

function takeFirst(planning: Planning, row: Row, first: FirstWindow, isOpen: boolean): void {
  row.offPath = first.offPath;
  // Unconfirmed events already give the dates; what counts from them waits.
  if (first.isUnverified && isOpen) row.isGateShut = true;
  if (first.missing === null) return;
  row.remark = `after:${first.missing.name}`;
  if (first.missing.what === 'booking') row.fixed = 'not_started';
}

/** Waivers, half signatures and holds of the awaited occurrence. */
function applyRecords(planning: Planning, row: Row, done: readonly Dated<Completion>[]): void {
  const { child } = planning;
  const { index } = row.milestone;
  const lastDone = done[done.length - 1]?.on ?? never;
  applyWaiver(planning, row, lastDone);
  if (row.fixed === 'signed_off' || row.fixed === 'waived') return;
  for (const part of ofSide(child.parts[index] ?? none, row.side))
    if (part.on > lastDone) row.fixed = 'awaiting_sign_off';
  for (const hold of ofSide(child.held[index] ?? none, row.side)) {
    row.heldUntil = Math.max(row.heldUntil, toEpochDay(hold.fact.reviewOn));
  }
}

/** A waiver ends a milestone; of a repeating one it covered one occurrence and has been reckoned with already. */
function applyWaiver(planning: Planning, row: Row, lastDone: number): void {
  const waivers = ofSide(planning.child.waived[row.milestone.index] ?? none, row.side);
  if (waivers.length === 0 || (row.isRepeating && row.draft.hasWindow)) return;
  const waiver = waivers.filter((one) => !isRedating(one)).pop();
  if (waiver === undefined || (row.fixed === 'signed_off' && waiver.on <= lastDone)) return;
  row.fixed = 'waived';
  row.remark = waiver.fact.reason;
}

/** Lapse is counted in days from birth, also for children born early. */
function lapseDay(planning: Planning, row: Row): number {
  const { lapse } = row.milestone.rule;
  if (lapse === undefined || !planning.child.isBorn) return never;
  return lapse.after === 'birth' ? planning.child.birth : addSpanToDay(planning.child.birth, span(lapse.after));
}
