/**
 * The first window of a milestone: base, spans or variant, root rule, arrival on the team, gates.
 * The opening follows what happened; the latest date never moves because something else was late
 * (published date rules, 4).
 */
import { addSpanToDay } from '@weftway/calendar/span';
import { birthBase, clockBase } from './clock-base.ts';
import { never } from './child-record.ts';
import type { CompiledRepeat, CompiledWindow } from './compiled-protocol.ts';
import { firstOfGoodRun } from './gates.ts';
import { applyArrival, arrivalDay, heldOn, type RowOfId } from './late-arrival.ts';
import type { Side } from './pathway-facts.ts';
import { completionsOf, ofSide, type Planning, type Row } from './planning.ts';
import {
  capGraftTarget,
  incisorTrackDay,
  isOnIncisorTrack,
  layGraftWindow,
  layReadinessWindow,
  rootDates,
} from './root-rule.ts';
import { layWindow, moveDate, newDraft, settleTarget, type WindowBase, type WindowDraft } from './window-draft.ts';

export interface WindowSource {
  readonly rowOf: (planning: Planning, index: number, side: Side | null) => Row;
  /** The window of a repeating milestone that was awaited on a day, ended since or not; null when it was off the path. */
  readonly awaitedOn: (planning: Planning, index: number, day: number) => WindowDraft | null;
  readonly rowOfId: RowOfId;
}

export interface FirstWindow {
  /** Why the milestone is off the path, or null. */
  readonly offPath: string | null;
  /** What has not come yet, when there is no window for want of it. */
  readonly missing: { readonly what: 'event' | 'booking'; readonly name: string } | null;
  readonly isUnverified: boolean;
}

const laid: FirstWindow = { offPath: null, missing: null, isUnverified: false };
const laidUnverified: FirstWindow = { ...laid, isUnverified: true };

/** The variant of the window that held for this child on a day, else the plain window. */
function windowFor(planning: Planning, row: Row, asOf: number): CompiledWindow {
  for (const variant of row.milestone.variants) if (heldOn(planning, variant.when, asOf)) return variant;
  return row.milestone.plain;
}

export interface FirstWindowQuestion {
  /** Facts after this day are not looked at. */
  readonly asOf: number;
  /** Arrivals on the team and late findings after this day do not move the window. */
  readonly arrivedBy: number;
  /** The rhythm that a repeating milestone joins on arrival. */
  readonly rhythm: CompiledRepeat | null;
  readonly source: WindowSource;
}

/** Fills a draft with the first window of a row. */
export function layFirstWindow(
  planning: Planning,
  row: Row,
  draft: WindowDraft,
  question: FirstWindowQuestion,
): FirstWindow {
  const { asOf, source } = question;
  if (row.milestone.rule.followsRoot === 'readiness') return layReadiness(planning, row, draft, question);
  const chosen = windowFor(planning, row, question.arrivedBy);
  if (borrowedWindow(planning, row, draft, source)) return laid;
  const reading = clockBase(planning, row, chosen.window, asOf);
  if (reading.kind === 'missing') return { offPath: null, missing: reading, isUnverified: false };
  const isGraft = row.milestone.rule.followsRoot === 'graft' && !isOnIncisorTrack(planning);
  if (isGraft) layGraft(planning, row, draft, reading.base, question);
  else {
    layWindow(draft, reading.base, chosen, chosen.note === undefined ? 'span' : 'variant-span');
    if (planning.child.facts.sex === 'unknown') widenForSex(row, draft, reading.base);
  }
  const offPath = applyArrival(planning, row, draft, {
    rhythm: question.rhythm,
    rowOf: source.rowOfId,
    asOf: question.arrivedBy,
  });
  if (offPath !== null) return { offPath, missing: null, isUnverified: reading.isUnverified };
  applyGateDates(planning, row, draft, asOf);
  if (isGraft && rootDates(planning, row.side, asOf).low !== never) capGraftTarget(draft);
  else settleTarget(draft);
  return reading.isUnverified ? laidUnverified : laid;
}

function layGraft(
  planning: Planning,
  row: Row,
  draft: WindowDraft,
  base: WindowBase,
  { asOf, source }: FirstWindowQuestion,
): void {
  const xray = milestoneOfKind(planning, 'tracking');
  const nextXray = xray < 0 ? null : nextXrayOf(planning, row, xray, asOf, source);
  layGraftWindow(planning, draft, { side: row.side, asOf, base, nextXray, byAge: row.milestone.plain });
}

/** The x-ray awaited by an open graft; a graft done or waived keeps the one awaited on its day. */
function nextXrayOf(
  planning: Planning,
  row: Row,
  xray: number,
  asOf: number,
  source: WindowSource,
): WindowDraft | null {
  const waivers = ofSide(planning.child.waived[row.milestone.index] ?? [], row.side);
  const isOpen = waivers.length === 0 && completionsOf(planning, row.milestone.index, row.side).length === 0;
  if (!isOpen) return source.awaitedOn(planning, xray, Math.min(asOf, waivers[waivers.length - 1]?.on ?? asOf));
  const next = source.rowOf(planning, xray, null);
  return next.offPath !== null || next.fixed === 'signed_off' || next.fixed === 'waived' ? null : next.draft;
}

/** While the sex is unknown, the window opens at the earlier and closes at the later of the two. */
function widenForSex(row: Row, draft: WindowDraft, base: WindowBase): void {
  row.milestone.variants.forEach((variant, at) => {
    const rule = row.milestone.rule.variants[at];
    if (rule?.when !== 'sex_male') return;
    const note = 'sex-unknown';
    const earliest = addSpanToDay(base.day, variant.window.earliest);
    const latest = addSpanToDay(base.day, variant.window.latest);
    if (earliest < draft.earliest)
      moveDate(draft, 'earliest', earliest, 'variant-span', { span: rule.window.earliest, note });
    if (latest > draft.latest) moveDate(draft, 'latest', latest, 'variant-span', { span: rule.window.latest, note });
  });
}

/** The opening is not before any dated gate plus its gap. */
export function applyGateDates(planning: Planning, row: Row, draft: WindowDraft, asOf: number): void {
  for (const need of row.milestone.gates) {
    if (!need.movesDates || need.index < 0) continue;
    if (need.when !== null && !heldOn(planning, need.when, asOf)) continue;
    const first = firstOfGoodRun(planning, need, row.side, asOf);
    if (first === never) continue;
    const opens = need.gap === null ? first : addSpanToDay(first, need.gap);
    if (opens <= draft.earliest) continue;
    moveDate(draft, 'earliest', opens, 'gate-moved', {
      span: need.rule.gap,
      event: { name: need.rule.milestone, on: first },
    });
  }
}

/** Ear tubes that were chosen to go with the palate repair take its window while that choice stands. */
function borrowedWindow(planning: Planning, row: Row, draft: WindowDraft, source: WindowSource): boolean {
  if (row.milestone.rule.id !== 'EAR-07') return false;
  const { child } = planning;
  const names = ['tubes_with_palate', 'tubes_with_palate_repair'];
  if (!names.some((name) => child.findings.has(name) || child.facts.flags.includes(name))) return false;
  const repair = source.rowOfId(planning, 'SURG-03');
  if (repair === null || repair.offPath !== null || !repair.draft.hasWindow) return false;
  const { hasWindow, earliest, target, latest, trace } = repair.draft;
  Object.assign(draft, { hasWindow, earliest, target, latest });
  if (draft.trace !== null && trace !== null) draft.trace = trace;
  return true;
}

function layReadiness(
  planning: Planning,
  row: Row,
  draft: WindowDraft,
  { asOf, arrivedBy, source }: FirstWindowQuestion,
): FirstWindow {
  const isTrack = isOnIncisorTrack(planning);
  const day = isTrack ? incisorTrackDay(planning) : rootDates(planning, row.side, asOf).low;
  const name = isTrack ? 'early_incisor_track' : 'root_low';
  if (day === never) return { offPath: null, missing: { what: 'event', name }, isUnverified: false };
  const graftIndex = milestoneOfKind(planning, 'graft');
  const graft = graftIndex < 0 ? newDraft(false) : source.rowOf(planning, graftIndex, row.side).draft;
  const lay = (base: WindowBase): void => {
    layReadinessWindow(draft, base, graft, row.milestone.plain);
  };
  lay({ day, rule: isTrack ? 'base-finding' : 'base-root', details: { event: { name, on: day } } });
  const start = arrivalDay(planning, row, arrivedBy);
  if (start !== never && draft.latest < start) lay({ day: start, rule: 'base-team-start' });
  else if (start !== never && draft.earliest < start) moveDate(draft, 'earliest', start, 'team-start-moved');
  applyGateDates(planning, row, draft, asOf);
  settleTarget(draft);
  return laid;
}

/** The number of the milestone that follows the root in a way; -1 when the protocol has none. */
export function milestoneOfKind(planning: Planning, kind: 'tracking' | 'readiness' | 'graft'): number {
  return planning.compiled.rootMilestones[kind];
}

/** The window of an age band, counted from birth. */
export function layAgeWindow(planning: Planning, draft: WindowDraft, band: CompiledRepeat): void {
  layWindow(draft, birthBase(planning), band, 'age-span');
}
