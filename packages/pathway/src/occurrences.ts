/**
 * Repeating milestones: which occurrence is awaited, and its window.
 * Intervals count from the last signed occurrence, or from the target of a waived one; a missed visit is one late item.
 * Age bands count by window: a visit counts for the latest band whose opening it has reached, earlier ones are missed
 * (published date rules, 10; rulings on age borders, bands and the end of a repeat).
 */
import { fromEpochDay } from '@weftway/calendar/plain-date';
import { addSpanToDay } from '@weftway/calendar/span';
import { never, type Dated } from './child-record.ts';
import { isRedating } from './clock-base.ts';
import type { CompiledRepeat, Ending } from './compiled-protocol.ts';
import { awaitedAroundEvent, awaitedBand } from './age-bands.ts';
import { laidOccurrence, type Awaited, type Happening } from './awaited.ts';
import { applyArrival, arrivalDay } from './late-arrival.ts';
import type { Completion } from './pathway-facts.ts';
import {
  completionsOf,
  isDoneOrWaived,
  ofSide,
  until,
  type PastOccurrence,
  type Planning,
  type Row,
} from './planning.ts';
import { isRootAtQuarter } from './root-rule.ts';
import { applyGateDates, layAgeWindow, layFirstWindow, type FirstWindow, type WindowSource } from './window.ts';
import { layWindow, newDraft, settleTarget, type WindowDraft } from './window-draft.ts';

const none: readonly never[] = [];

/** Completions of a row; readings of the canine root count as x-rays of it, the one of the first records included. */
export function completionsOfRow(planning: Planning, row: Row): readonly Dated<Completion>[] {
  const own = completionsOf(planning, row.milestone.index, row.side);
  const { roots } = planning.child;
  if (row.milestone.rule.followsRoot !== 'tracking' || roots.length === 0) return own;
  const days = new Set(own.map((entry) => entry.on));
  const { id } = row.milestone.rule;
  const extra: Dated<Completion>[] = [];
  for (const reading of roots) {
    if (days.has(reading.on)) continue;
    days.add(reading.on);
    extra.push({ on: reading.on, suffix: '', fact: { milestone: id, on: fromEpochDay(reading.on) } });
  }
  return extra.length === 0 ? own : [...own, ...extra].sort((left, right) => left.on - right.on);
}

/** Whether something has happened that ends a repeating milestone: a milestone signed or waived, or a fact. */
export function isEnded(planning: Planning, row: Row): boolean {
  const { truth } = planning.child;
  for (const one of row.milestone.endings) if (hasHappened(planning, row, one, true)) return true;
  for (const repeat of row.milestone.repeats) {
    if (repeat.when !== null && !isRootRule(row) && !repeat.when(truth)) continue;
    for (const one of repeat.until) if (hasHappened(planning, row, one, false)) return true;
  }
  return false;
}

function isRootRule(row: Row): boolean {
  return row.milestone.rule.followsRoot === 'tracking';
}

function hasHappened(planning: Planning, row: Row, one: Ending, onlySigned: boolean): boolean {
  if (one.index < 0) return planning.child.truth[one.fact] === 1;
  const side = planning.compiled.milestones[one.index]?.rule.perSide === true ? row.side : null;
  if (onlySigned) return completionsOf(planning, one.index, side).length > 0;
  return isDoneOrWaived(planning, one.index, side);
}

/** Works out the awaited occurrence from what happened up to `asOf`. */
export function awaitedOccurrence(
  planning: Planning,
  row: Row,
  done: readonly Dated<Completion>[],
  asOf: number,
  source: WindowSource,
): Awaited {
  const waivers = ofSide(planning.child.waived[row.milestone.index] ?? none, row.side);
  const { repeatKind } = row.milestone;
  if (repeatKind === 'intervals' && waivers.length === 0 && planning.options.reasons === false) {
    const quick = awaitedAfterLast(planning, row, done, asOf, source);
    if (quick) return quick;
  }
  const happened: Happening[] = until(done, asOf).map((entry) => ({ on: entry.on, kind: 'signed' }));
  for (const waiver of until(waivers, asOf)) if (!isRedating(waiver)) happened.push({ on: waiver.on, kind: 'waived' });
  happened.sort((left, right) => left.on - right.on || (left.kind === 'signed' ? -1 : 1));
  if (repeatKind === 'bands') return awaitedBand(planning, row, happened, asOf, source);
  if (repeatKind === 'around-event') return awaitedAroundEvent(planning, row, happened, asOf, source);
  return awaitedInterval(planning, row, happened, asOf, source);
}

/** The same without looking at earlier occurrences, when nobody asks for them; null when the repeat is used up. */
function awaitedAfterLast(
  planning: Planning,
  row: Row,
  done: readonly Dated<Completion>[],
  asOf: number,
  source: WindowSource,
): Awaited | null {
  const entries = until(done, asOf);
  const last = entries[entries.length - 1]?.on ?? never;
  const next = intervalWindow(planning, row, last, asOf, source);
  if (next === null) return null;
  const lastKind = last === never ? null : 'signed';
  const { first, draft } = next;
  return { first, draft, occurrence: entries.length + 1, isFinished: false, lastKind, past: none };
}

function awaitedInterval(
  planning: Planning,
  row: Row,
  happened: readonly Happening[],
  asOf: number,
  source: WindowSource,
): Awaited {
  const past: PastOccurrence[] = [];
  const traced = planning.options.reasons !== false;
  let last = never;
  let lastKind: Happening['kind'] | null = null;
  let current: IntervalWindow | null = null;
  for (const [at, one] of happened.entries()) {
    const needsWindow = traced || one.kind === 'waived' || at >= happened.length - 2;
    const window = needsWindow ? intervalWindow(planning, row, last, one.on, source) : null;
    // A waiver while the event has not come covers no occurrence from which a next one could count.
    if (one.kind === 'waived' && window?.draft.hasWindow !== true) continue;
    current = window ?? current;
    past.push({ occurrence: past.length + 1, on: one.on, kind: one.kind, draft: window?.draft ?? null });
    last = one.kind === 'waived' && window !== null ? window.draft.target : one.on;
    lastKind = one.kind;
  }
  const next = intervalWindow(planning, row, last, asOf, source);
  const occurrence = past.length + 1;
  if (next) return { first: next.first, draft: next.draft, occurrence, isFinished: false, lastKind, past };
  const draft = current?.draft ?? newDraft(false);
  return { first: laidOccurrence, draft, occurrence: past.length, isFinished: true, lastKind, past };
}

interface IntervalWindow {
  readonly draft: WindowDraft;
  readonly first: FirstWindow;
}

/** The window of the occurrence after `last` (the first one when it is -1e9); null when none follows. */
function intervalWindow(
  planning: Planning,
  row: Row,
  last: number,
  asOf: number,
  source: WindowSource,
): IntervalWindow | null {
  const draft = newDraft(planning.options.reasons !== false);
  if (last === never) {
    const rhythm = repeatAt(planning, row, arrivalDay(planning, row, asOf), asOf);
    const isRhythm = rhythm !== null && !rhythm.byAge;
    const first = layFirstWindow(planning, row, draft, {
      asOf,
      arrivedBy: asOf,
      rhythm: isRhythm ? rhythm : null,
      source,
    });
    return { draft, first };
  }
  const repeat = repeatAt(planning, row, last, asOf);
  if (repeat === null) return null;
  if (repeat.byAge) layAgeWindow(planning, draft, repeat);
  else {
    const details = draft.trace === null ? undefined : { event: { name: row.milestone.rule.id, on: last } };
    const base = { day: last, rule: 'base-last-occurrence', ...(details && { details }) } as const;
    layWindow(draft, base, repeat, 'repeat-span');
  }
  const offPath = applyArrival(planning, row, draft, {
    rhythm: repeat.byAge ? null : repeat,
    rowOf: source.rowOfId,
    asOf,
  });
  applyGateDates(planning, row, draft, asOf);
  settleTarget(draft);
  return { draft, first: offPath === null ? laidOccurrence : { ...laidOccurrence, offPath } };
}

/** The interval in force at the age of the last occurrence, or the next age point that opens after it. */
export function repeatAt(planning: Planning, row: Row, last: number, asOf: number): CompiledRepeat | null {
  const { birth } = planning.child;
  // The interval after an x-ray follows what it showed, not what the next one will show.
  const seenBy = Math.min(asOf, last);
  if (last === never) return row.milestone.repeats.find((repeat) => !repeat.byAge) ?? null;
  for (const repeat of row.milestone.repeats) {
    if (repeat.byAge || !isAtAge(repeat, birth, last) || !holds(planning, row, repeat, seenBy)) continue;
    return repeat;
  }
  for (const repeat of row.milestone.repeats) {
    if (!repeat.byAge || (repeat.ageFrom !== null && last < addSpanToDay(birth, repeat.ageFrom))) continue;
    if (addSpanToDay(birth, repeat.window.earliest) > last && holds(planning, row, repeat, seenBy)) return repeat;
  }
  return null;
}

function holds(planning: Planning, row: Row, repeat: CompiledRepeat, asOf: number): boolean {
  if (repeat.when === null) return true;
  return repeat.when(isRootRule(row) ? withRoot(planning, asOf) : planning.child.truth);
}

function isAtAge(repeat: CompiledRepeat, birth: number, last: number): boolean {
  if (repeat.ageFrom !== null && last < addSpanToDay(birth, repeat.ageFrom)) return false;
  if (repeat.ageTo === null) return true;
  const end = addSpanToDay(birth, repeat.ageTo);
  return repeat.isAgeToIncluded ? last <= end : last < end;
}

/** The facts with the one about the root added: the more mature side that is neither grafted nor waived decides. */
function withRoot(planning: Planning, asOf: number): Uint8Array {
  const { truth, gumSides } = planning.child;
  const number = planning.compiled.names.get('root_at_quarter');
  if (number === undefined) return truth;
  const graft = planning.compiled.rootMilestones.graft;
  const open = gumSides.filter((side) => graft < 0 || !isDoneOrWaived(planning, graft, side));
  truth[number] = isRootAtQuarter(planning, open.length > 0 ? open : gumSides, asOf) ? 1 : 0;
  return truth;
}
