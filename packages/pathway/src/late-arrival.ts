/**
 * Children who join the team late, and findings made late: what can still be made up counts from the arrival, what
 * cannot is off the path (published rules on what shifts the path; rulings on catch-up, rhythm and found late).
 */
import { addMonthsToDay } from '@weftway/calendar/plain-date';
import { addSpanToDay } from '@weftway/calendar/span';
import { never } from './child-record.ts';
import type { FactTest } from './compile-condition.ts';
import type { CompiledRepeat } from './compiled-protocol.ts';
import { isDoneOrWaived, type Planning, type Row } from './planning.ts';
import { moveDate, settleTarget, type WindowDraft } from './window-draft.ts';

export type RowOfId = (planning: Planning, id: string) => Row | null;

export interface ArrivalQuestion {
  /** The rhythm that a repeating milestone joins. */
  readonly rhythm: CompiledRepeat | null;
  readonly rowOf: RowOfId;
  /** Arrivals after this day move nothing. */
  readonly asOf: number;
}

/** Days between lip and palate repair when both are made up. */
const lipToPalateDays = 84;
const monthsToThirdBirthday = 36;

/** The operation for which an item prepares; once it is done, making the item up has lost its sense. */
const preparesFor: Readonly<Record<string, string>> = {
  'EAR-03': 'SURG-03',
  'ORTH-02': 'ORTH-05',
  'ORTH-03': 'ORTH-05',
};
/** Items of infancy that are not made up later unless a concern is recorded. */
const infancyOnly: readonly string[] = ['CARE-01', 'PSY-01'];
/** The next item of the same series: once its own latest date lies before the arrival, the earlier one is left out. */
const nextInSeries: Readonly<Record<string, string>> = { 'SPCH-02': 'SPCH-03' };

/**
 * The day from which a child's milestone counts as joined: arrival on the team or a late finding, the later; else -1e9.
 * What came after `asOf` has not moved anything yet: what is signed keeps the window shown on the day of signing.
 */
export function arrivalDay(planning: Planning, row: Row, asOf: number): number {
  const { child } = planning;
  const start = child.teamStart <= asOf ? child.teamStart : never;
  const { applies } = row.milestone;
  if (child.foundLate.length === 0 || applies === null) return start;
  const found = switchedOnDay(planning, applies);
  return found <= asOf ? Math.max(start, found) : start;
}

/** The day of the late finding through which a condition became true; -1e9 when it held without, or does not hold. */
function switchedOnDay(planning: Planning, applies: FactTest): number {
  const { foundLate, truth } = planning.child;
  for (const { fact } of foundLate) truth[fact] = 0;
  let day = never;
  let holds = applies(truth);
  const heldBefore = holds;
  for (const { fact, on } of foundLate) {
    truth[fact] = 1;
    if (holds) continue;
    holds = applies(truth);
    day = on;
  }
  return holds && !heldBefore ? day : never;
}

/** Whether a condition held on a day: what was found only later did not hold yet. */
export function heldOn(planning: Planning, test: FactTest, asOf: number): boolean {
  const { foundLate, truth } = planning.child;
  if (foundLate.length === 0) return test(truth);
  for (const { fact, on } of foundLate) truth[fact] = on <= asOf ? 1 : 0;
  const held = test(truth);
  for (const { fact } of foundLate) truth[fact] = 1;
  return held;
}

/**
 * Moves a window that the arrival, if it came by `asOf`, overtook. Answers why the milestone is off the path, or null while it stays on.
 * A latest date on the day of arrival itself is not moved.
 */
export function applyArrival(
  planning: Planning,
  row: Row,
  draft: WindowDraft,
  { rhythm, rowOf, asOf }: ArrivalQuestion,
): string | null {
  const start = arrivalDay(planning, row, asOf);
  if (start === never || !draft.hasWindow) return null;
  if (draft.latest >= start) {
    if (draft.earliest < start) {
      moveDate(draft, 'earliest', start, 'team-start-moved');
      settleTarget(draft);
    }
    return null;
  }
  const days = catchUpDays(planning, row, rowOf);
  if (days !== null) {
    if (hasLostSense(planning, row, start, rowOf)) return 'lost-sense';
    catchUp(draft, start, days);
    row.isCaughtUp = true;
    return null;
  }
  if (rhythm === null) return 'before-team-start';
  moveDate(draft, 'earliest', start, 'team-start-moved');
  moveDate(draft, 'target', start, 'team-start-moved');
  moveDate(draft, 'target', addSpanToDay(start, rhythm.window.target), 'repeat-span', {
    span: rhythm.rule.window.target,
  });
  moveDate(draft, 'latest', start, 'team-start-moved');
  moveDate(draft, 'latest', addSpanToDay(start, rhythm.window.latest), 'repeat-span', {
    span: rhythm.rule.window.latest,
  });
  row.isCaughtUp = true;
  return null;
}

function catchUp(draft: WindowDraft, start: number, days: readonly [number, number]): void {
  moveDate(draft, 'earliest', start, 'team-start-moved');
  moveDate(draft, 'target', start, 'team-start-moved');
  moveDate(draft, 'target', start + days[0], 'catch-up-span', { span: `${String(days[0])}d` });
  moveDate(draft, 'latest', start, 'team-start-moved');
  moveDate(draft, 'latest', start + days[1], 'catch-up-span', { span: `${String(days[1])}d` });
}

function catchUpDays(planning: Planning, row: Row, rowOf: RowOfId): readonly [number, number] | null {
  const own = row.milestone.rule.catchUp;
  if (own === undefined) return null;
  if (row.milestone.rule.id !== 'SURG-03') return own;
  const lip = rowOf(planning, 'SURG-01');
  const lipDays = lip?.milestone.rule.catchUp;
  if (lip === null || lipDays === undefined || lip.offPath !== null || !lip.isCaughtUp) return own;
  return [lipDays[0] + lipToPalateDays, lipDays[1] + lipToPalateDays];
}

function hasLostSense(planning: Planning, row: Row, start: number, rowOf: RowOfId): boolean {
  const { id } = row.milestone.rule;
  const operation = planning.compiled.indexOf.get(preparesFor[id] ?? '');
  if (operation !== undefined && isDoneOrWaived(planning, operation, null)) return true;
  if (infancyOnly.includes(id) && start >= addMonthsToDay(planning.child.birth, monthsToThirdBirthday)) {
    return !hasConcern(planning, id);
  }
  const next = nextInSeries[id];
  const nextIndex = next === undefined ? undefined : planning.compiled.indexOf.get(next);
  const nextMilestone = nextIndex === undefined ? undefined : planning.compiled.milestones[nextIndex];
  if (nextMilestone === undefined || rowOf(planning, nextMilestone.rule.id) === null) return false;
  return addSpanToDay(planning.child.birth, nextMilestone.window.latest) < start;
}

function hasConcern(planning: Planning, id: string): boolean {
  const names = id === 'CARE-01' ? ['concern', 'feeding_concern'] : ['concern', 'mood_concern'];
  return names.some((name) => planning.child.findings.has(name) || planning.child.facts.flags.includes(name));
}
