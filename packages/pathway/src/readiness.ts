/**
 * The readiness card of an operation: every gate and check judged on the day for which it is booked, not on today
 * (published date rules, 5).
 */
import { toEpochDay, type PlainDate } from '@weftway/calendar/plain-date';
import { waitsOf } from './gates.ts';
import type { MilestoneKey, PathwayFacts } from './pathway-facts.ts';
import type { Wait } from './pathway-plan.ts';
import type { PlanOptions } from './planning.ts';
import { planRow } from './plan-row.ts';
import { planRows, stableKeyOf } from './plan-rows.ts';
import type { Protocol } from './protocol.ts';

/** A milestone and the day on which it is to be done. */
export interface BookedDay {
  readonly milestone: MilestoneKey;
  readonly on: PlainDate;
}

/** Gates, checks and soft links of a milestone as they would stand on a day; empty when it is not on the path. */
export function readinessOn(
  protocol: Protocol,
  facts: PathwayFacts,
  today: PlainDate,
  booked: BookedDay,
  options: PlanOptions = {},
): Wait[] {
  const { planning, rows } = planRows(protocol, facts, today, { ...options, reasons: false });
  const row = rows.find((one) => stableKeyOf(one) === booked.milestone || one.milestone.rule.id === booked.milestone);
  if (row === undefined || row.offPath !== null) return [];
  return waitsOf(planning, row, toEpochDay(booked.on), planRow);
}
