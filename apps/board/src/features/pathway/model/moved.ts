/** What moved between two plans of the same child: dates, states, and what came onto the path or left it. */
import { daysBetween } from '@weftway/calendar/plain-date';
import type { PathwayPlan, PlannedMilestone, PlannedWindow, ReasonStep } from '@weftway/pathway/pathway-plan';
import type { Which } from '../../../words/reasons.ts';

export interface DateMove {
  readonly which: Which;
  readonly days: number;
  /** The step of the reckoning that is new. */
  readonly because: ReasonStep | null;
}

export interface Move {
  readonly key: string;
  readonly kind: 'moved' | 'came' | 'left' | 'state';
  readonly before: PlannedMilestone | null;
  readonly after: PlannedMilestone | null;
  readonly dates: readonly DateMove[];
}

const whiches: readonly Which[] = ['earliest', 'target', 'latest'];

const stepName = (step: ReasonStep): string =>
  JSON.stringify([step.rule, step.event ?? null, step.span ?? null, step.note ?? null]);

const newStep = (before: readonly ReasonStep[], after: readonly ReasonStep[]): ReasonStep | null => {
  const known = new Set(before.map(stepName));
  return after.toReversed().find((step) => !known.has(stepName(step))) ?? null;
};

const dateMoves = (before: PlannedMilestone, after: PlannedMilestone): DateMove[] => {
  const from: PlannedWindow | null = before.window;
  const to: PlannedWindow | null = after.window;
  if (from === null || to === null) return [];
  return whiches.flatMap((which) => {
    const days = daysBetween(from[which], to[which]);
    return days === 0 ? [] : [{ which, days, because: newStep(before.reasons[which], after.reasons[which]) }];
  });
};

const moveOf = (before: PlannedMilestone, after: PlannedMilestone): Move | null => {
  const isDone = after.state === 'signed' || after.state === 'waived';
  // An occurrence that was done makes place for the next one; that is no move of a date.
  const dates = isDone || before.occurrence !== after.occurrence ? [] : dateMoves(before, after);
  const hasNewWindow = before.window === null && after.window !== null;
  if (dates.length > 0) return { key: after.key, kind: 'moved', before, after, dates };
  if (hasNewWindow && !isDone) return { key: after.key, kind: 'came', before, after, dates };
  return before.state !== after.state && !isDone ? { key: after.key, kind: 'state', before, after, dates } : null;
};

/** Everything that moved, in the order of the protocol; the milestone that was acted on is left out by `except`. */
export const movedBetween = (before: PathwayPlan, after: PathwayPlan, except: string | null = null): Move[] => {
  const known = new Map(before.milestones.map((one) => [one.key, one]));
  const still = new Set(after.milestones.map((one) => one.key));
  const moves = after.milestones.flatMap((one): Move[] => {
    if (one.key === except) return [];
    const was = known.get(one.key);
    if (was === undefined) return [{ key: one.key, kind: 'came', before: null, after: one, dates: [] }];
    const move = moveOf(was, one);
    return move === null ? [] : [move];
  });
  const left = before.milestones
    .filter((one) => !still.has(one.key) && one.key !== except)
    .map((one): Move => ({ key: one.key, kind: 'left', before: one, after: null, dates: [] }));
  return [...moves, ...left];
};
