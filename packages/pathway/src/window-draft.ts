/**
 * The three dates of a window while they are being reckoned, in days since 1970-01-01, each with the steps that led to it.
 * Steps are kept only when somebody will read them; the reckoning itself is the same either way.
 */
import { addSpanToDay } from '@weftway/calendar/span';
import type { CompiledWindow } from './compiled-protocol.ts';
import type { ReasonRule } from './pathway-plan.ts';

export interface DraftStep {
  readonly rule: ReasonRule;
  readonly day: number;
  readonly span?: string | undefined;
  readonly event?: { readonly name: string; readonly on: number } | undefined;
  readonly note?: string | undefined;
}

export type StepDetails = Omit<DraftStep, 'rule' | 'day'>;

export interface DraftTrace {
  earliest: DraftStep[];
  target: DraftStep[];
  latest: DraftStep[];
}

/** Mutable on purpose: one draft is filled for each milestone, millions of times in a roll of a whole registry. */
export interface WindowDraft {
  hasWindow: boolean;
  earliest: number;
  target: number;
  latest: number;
  trace: DraftTrace | null;
}

export interface WindowBase {
  readonly day: number;
  readonly rule: ReasonRule;
  readonly details?: StepDetails;
}

/** An empty draft; with `traced` it keeps its steps. */
export function newDraft(traced: boolean): WindowDraft {
  const trace = traced ? { earliest: [], target: [], latest: [] } : null;
  return { hasWindow: false, earliest: 0, target: 0, latest: 0, trace };
}

/** Starts the window at a base day and adds the three spans. */
export function layWindow(draft: WindowDraft, base: WindowBase, spans: CompiledWindow, rule: ReasonRule): void {
  const { window, texts, note } = spans;
  draft.hasWindow = true;
  draft.earliest = addSpanToDay(base.day, window.earliest);
  draft.target = addSpanToDay(base.day, window.target);
  draft.latest = addSpanToDay(base.day, window.latest);
  if (draft.trace === null) return;
  const start: DraftStep = { rule: base.rule, day: base.day, ...base.details };
  draft.trace.earliest = [start, { rule, day: draft.earliest, span: texts.earliest, note }];
  draft.trace.target = [start, { rule, day: draft.target, span: texts.target, note }];
  draft.trace.latest = [start, { rule, day: draft.latest, span: texts.latest, note }];
}

/** Moves one of the dates and writes down why. */
export function moveDate(
  draft: WindowDraft,
  which: 'earliest' | 'target' | 'latest',
  day: number,
  rule: ReasonRule,
  details?: StepDetails,
): void {
  draft[which] = day;
  draft.trace?.[which].push({ rule, day, ...details });
}

/** The target is never before the opening (published date rules, 4). */
export function settleTarget(draft: WindowDraft): void {
  if (draft.target < draft.earliest) moveDate(draft, 'target', draft.earliest, 'target-not-before-earliest');
}
