/**
 * The bone graft rule: the window of the graft and of its readiness follow the root of the canine beside the cleft,
 * one side at a time (published date rules, 14; rulings on sides, early roots, the early-incisor track and arrivals).
 * The months are common practice; the bounds are a setting of the team.
 */
import { addMonthsToDay } from '@weftway/calendar/plain-date';
import { never } from './child-record.ts';
import type { CompiledWindow } from './compiled-protocol.ts';
import { isAtLeast, type Fraction } from './fraction.ts';
import type { Side } from './pathway-facts.ts';
import type { Planning } from './planning.ts';
import { layWindow, moveDate, type StepDetails, type WindowBase, type WindowDraft } from './window-draft.ts';

const readinessBeforeGraftDays = 14;
const years = (count: number): number => count * 12;
const quarter: Fraction = { over: 1, under: 4 };

export interface RootDates {
  readonly hasReading: boolean;
  readonly low: number;
  readonly high: number;
}

/** First readings of a side at or above the lower and the upper bound, not later than a day; -1e9 when there is none. */
export function rootDates(planning: Planning, side: Side | null, asOf: number): RootDates {
  let [hasReading, low, high] = [false, never, never];
  for (const reading of planning.child.roots) {
    if (reading.on > asOf || (side !== null && reading.side !== side)) continue;
    hasReading = true;
    if (low === never && isAtLeast(reading.stage, planning.compiled.rootLower)) low = reading.on;
    if (high === never && isAtLeast(reading.stage, planning.compiled.rootUpper)) high = reading.on;
  }
  const recorded = planning.child.findings.get('root_low');
  if (low === never && recorded !== undefined && recorded <= asOf) return { hasReading: true, low: recorded, high };
  return { hasReading, low, high };
}

/** Whether the latest reading of the more mature side that still waits for its graft is at one quarter or more. */
export function isRootAtQuarter(planning: Planning, openSides: readonly Side[], asOf: number): boolean {
  return openSides.some((side) => {
    const readings = planning.child.roots.filter((reading) => reading.side === side && reading.on <= asOf);
    const last = readings[readings.length - 1];
    return last !== undefined && isAtLeast(last.stage, quarter);
  });
}

/** The day on which the early-incisor track was chosen; -1e9 when it was not, or nobody wrote the day down. */
export function incisorTrackDay(planning: Planning): number {
  return planning.child.findings.get('early_incisor_track') ?? never;
}

/** Whether the early-incisor track was chosen. */
export function isOnIncisorTrack(planning: Planning): boolean {
  return incisorTrackDay(planning) !== never || planning.child.facts.flags.includes('early_incisor_track');
}

export interface GraftQuestion {
  readonly side: Side | null;
  /** Readings after this day are not looked at. */
  readonly asOf: number;
  readonly base: WindowBase;
  /** The x-ray now awaited, if any. */
  readonly nextXray: WindowDraft | null;
  /** The window by age alone. */
  readonly byAge: CompiledWindow;
}

/** Lays the window of the graft of a side, before gates and late arrival. */
export function layGraftWindow(planning: Planning, draft: WindowDraft, question: GraftQuestion): void {
  const { nextXray, base } = question;
  const root = rootDates(planning, question.side, question.asOf);
  layWindow(draft, base, question.byAge, 'span');
  if (!root.hasReading) return;
  if (root.low !== never) {
    layRootWindow(draft, root, base);
    return;
  }
  if (nextXray === null || !nextXray.hasWindow) return;
  if (nextXray.target > draft.target) moveDate(draft, 'target', nextXray.target, 'root-rule', { note: 'next-xray' });
  if (nextXray.latest > draft.latest) moveDate(draft, 'latest', nextXray.latest, 'root-rule', { note: 'next-xray' });
}

function layRootWindow(draft: WindowDraft, root: RootDates, base: WindowBase): void {
  const sevenYears = addMonthsToDay(base.day, years(7));
  const lowEnd = addMonthsToDay(root.low, 9);
  const highEnd = root.high === never ? lowEnd : addMonthsToDay(root.high, 3);
  draft.earliest = root.low;
  draft.target = addMonthsToDay(root.low, 3);
  draft.latest = Math.min(lowEnd, highEnd);
  if (draft.trace !== null) {
    const low: StepDetails = { event: { name: 'root-lower-bound', on: root.low } };
    const start = { rule: 'base-root', day: root.low, ...low } as const;
    draft.trace.earliest = [start];
    draft.trace.target = [start, { rule: 'root-rule', day: draft.target, span: '3m' }];
    draft.trace.latest =
      draft.latest === lowEnd
        ? [start, { rule: 'root-rule', day: lowEnd, span: '9m' }]
        : [
            { rule: 'base-root', day: root.high, event: { name: 'root-upper-bound', on: root.high } },
            { rule: 'root-rule', day: highEnd, span: '3m' },
          ];
  }
  if (draft.earliest < sevenYears) moveDate(draft, 'earliest', sevenYears, 'not-before-age', { span: '7y' });
}

/** The target of a graft that follows its root: not before the opening, but never after the latest date. */
export function capGraftTarget(draft: WindowDraft): void {
  if (draft.target < draft.earliest) moveDate(draft, 'target', draft.earliest, 'target-not-before-earliest');
  if (draft.target > draft.latest) moveDate(draft, 'target', draft.latest, 'not-after-latest');
}

/** Lays the readiness window on the day of its trigger, capped by the graft of that side. */
export function layReadinessWindow(
  draft: WindowDraft,
  trigger: WindowBase,
  graft: WindowDraft,
  spans: CompiledWindow,
): void {
  layWindow(draft, trigger, spans, 'span');
  const cap = graft.latest - readinessBeforeGraftDays;
  if (graft.hasWindow && draft.latest > cap) {
    moveDate(draft, 'latest', cap, 'root-rule', { note: 'before-graft', span: '-14d' });
  }
}
