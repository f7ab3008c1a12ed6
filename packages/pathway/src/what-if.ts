/**
 * What would move if one thing were different: nothing is written, the plan is made twice and compared.
 */
import { addWeeks, daysBetween, type PlainDate } from '@weftway/calendar/plain-date';
import { planPathway } from './plan-pathway.ts';
import type { MilestoneKey, PathwayFacts } from './pathway-facts.ts';
import type { ClinicalStatus, PathwayPlan, PlannedWindow } from './pathway-plan.ts';
import type { MilestoneState } from './milestone-state.ts';
import type { PlanOptions } from './planning.ts';
import type { Protocol } from './protocol.ts';

export type PathwayChange =
  /** It is done `weeks` later than it was done, booked or, failing both, than its target. */
  | { readonly kind: 'slip'; readonly milestone: MilestoneKey; readonly weeks: number }
  | { readonly kind: 'waive'; readonly milestone: MilestoneKey }
  | { readonly kind: 'book'; readonly milestone: MilestoneKey; readonly on: PlainDate };

export interface Foreseen {
  readonly window: PlannedWindow | null;
  readonly state: MilestoneState | null;
  readonly clinical: ClinicalStatus;
  readonly squeezedByDays: number | null;
}

export interface WhatIfDifference {
  readonly key: MilestoneKey;
  readonly before: Foreseen;
  readonly after: Foreseen;
  /** Days by which the opening, the target and the latest date move; later is positive, null without both windows. */
  readonly daysMoved: { readonly earliest: number; readonly target: number; readonly latest: number } | null;
}

/**
 * The milestones that a change would touch, in the order of the protocol. A slip is looked at from the later of today
 * and the day it would be done, before and after, so that only the change tells the two plans apart.
 */
export function whatIf(
  protocol: Protocol,
  facts: PathwayFacts,
  today: PlainDate,
  change: PathwayChange,
  options: PlanOptions = {},
): WhatIfDifference[] {
  const bare = { ...options, reasons: false };
  const plan = planPathway(protocol, facts, today, bare);
  const changed = changedFacts(plan, facts, today, change);
  if (changed === null) return [];
  const before = planPathway(protocol, changed.without, changed.day, bare);
  const after = planPathway(protocol, changed.with, changed.day, bare);
  return differences(before, after);
}

interface TwoPaths {
  readonly day: PlainDate;
  readonly without: PathwayFacts;
  readonly with: PathwayFacts;
}

function changedFacts(
  plan: PathwayPlan,
  facts: PathwayFacts,
  today: PlainDate,
  change: PathwayChange,
): TwoPaths | null {
  const { milestone } = change;
  if (change.kind === 'waive') {
    const waiver = { milestone, on: today, reason: 'what if', kind: 'waived' } as const;
    return { day: today, without: facts, with: { ...facts, waivers: [...facts.waivers, waiver] } };
  }
  if (change.kind === 'book') {
    return { day: today, without: facts, with: withBooking(facts, milestone, change.on) };
  }
  const done = facts.completions.filter((one) => one.milestone === milestone && one.on <= today);
  const booked = facts.bookings.filter((one) => one.milestone === milestone);
  const planned = plan.milestones.find((one) => one.key === milestone)?.window?.target;
  const from = done[done.length - 1]?.on ?? booked[booked.length - 1]?.on ?? planned;
  if (from === undefined) return null;
  const to = addWeeks(from, change.weeks);
  const day = [today, from, to].reduce((latest, one) => (one > latest ? one : latest));
  return { day, without: doneOn(facts, milestone, from), with: doneOn(facts, milestone, to) };
}

function withBooking(facts: PathwayFacts, milestone: MilestoneKey, on: PlainDate): PathwayFacts {
  const others = facts.bookings.filter((one) => one.milestone !== milestone);
  return { ...facts, bookings: [...others, { milestone, on }] };
}

/** The facts with the last occurrence of a milestone done on a day; its booking goes with it. */
function doneOn(facts: PathwayFacts, milestone: MilestoneKey, on: PlainDate): PathwayFacts {
  const own = facts.completions.filter((one) => one.milestone === milestone);
  const last = own.reduce<(typeof own)[number] | null>(
    (latest, one) => (latest && latest.on > one.on ? latest : one),
    null,
  );
  const others = facts.completions.filter((one) => one !== last);
  const booked = facts.bookings.some((one) => one.milestone === milestone) ? withBooking(facts, milestone, on) : facts;
  return { ...booked, completions: [...others, { ...last, milestone, on }] };
}

function differences(before: PathwayPlan, after: PathwayPlan): WhatIfDifference[] {
  const earlier = foreseen(before);
  const later = foreseen(after);
  const off: Foreseen = { window: null, state: null, clinical: 'not_applicable', squeezedByDays: null };
  const found: WhatIfDifference[] = [];
  for (const key of new Set([...earlier.keys(), ...later.keys()])) {
    const [one, other] = [earlier.get(key) ?? off, later.get(key) ?? off];
    if (isSame(one, other)) continue;
    found.push({ key, before: one, after: other, daysMoved: daysMoved(one.window, other.window) });
  }
  return found;
}

function foreseen(plan: PathwayPlan): Map<MilestoneKey, Foreseen> {
  const found = new Map<MilestoneKey, Foreseen>();
  for (const { key, window, state, clinical, squeezedByDays } of plan.milestones) {
    found.set(key, { window, state, clinical, squeezedByDays });
  }
  for (const { key, clinical } of plan.offPath)
    found.set(key, { window: null, state: null, clinical, squeezedByDays: null });
  return found;
}

function isSame(one: Foreseen, other: Foreseen): boolean {
  const moved = daysMoved(one.window, other.window);
  const isMoved =
    moved === null ? one.window !== other.window : moved.earliest !== 0 || moved.target !== 0 || moved.latest !== 0;
  return !isMoved && one.clinical === other.clinical;
}

function daysMoved(before: PlannedWindow | null, after: PlannedWindow | null): WhatIfDifference['daysMoved'] {
  if (before === null || after === null) return null;
  return {
    earliest: daysBetween(before.earliest, after.earliest),
    target: daysBetween(before.target, after.target),
    latest: daysBetween(before.latest, after.latest),
  };
}
