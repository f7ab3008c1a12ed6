/**
 * Alarms that stand beside the states: a graft that nobody can see, a review long past, a family lost to follow-up,
 * and a window that opens after its own latest date (published date rules 4, 14, 15).
 */
import { addMonthsToDay, fromEpochDay } from '@weftway/calendar/plain-date';
import { isAtLeast, type Fraction } from './fraction.ts';
import type { PathwayPlan } from './pathway-plan.ts';
import { completionsOf, isDoneOrWaived, type Row } from './planning.ts';
import { stableKeyOf, type PlannedRows } from './plan-rows.ts';
import { clinicalStatus } from './state-of-milestone.ts';

type Alarm = PathwayPlan['alarms'][number];

const blindAfterMonths = 8;
const lostAfterMonths = 24;
const quarter: Fraction = { over: 1, under: 4 };
const reviewId = 'TEAM-05';

/** The alarms of a plan on its day; none while the child is with another team. */
export function alarmsOf(planned: PlannedRows): Alarm[] {
  if (planned.planning.child.isTransferred || !planned.planning.child.isBorn) return [];
  return [...squeezed(planned), ...reviewAlarms(planned), ...blindGrafts(planned)];
}

function isOpen(row: Row): boolean {
  return row.offPath === null && row.fixed === null;
}

function squeezed(planned: PlannedRows): Alarm[] {
  return planned.rows
    .filter((row) => isOpen(row) && row.draft.hasWindow && row.draft.earliest > row.draft.latest)
    .map((row) => ({
      name: 'squeezed',
      since: fromEpochDay(planned.planning.child.today),
      milestone: stableKeyOf(row),
    }));
}

function reviewAlarms(planned: PlannedRows): Alarm[] {
  const { planning } = planned;
  const row = planned.rows.find((one) => one.milestone.rule.id === reviewId);
  if (!row || row.fixed !== null || row.offPath !== null) return [];
  const alarms: Alarm[] = [];
  const { today, birth, teamStart } = planning.child;
  if (clinicalStatus(planning, row, today) === 'overdue') {
    alarms.push({ name: 'review-overdue', since: fromEpochDay(row.draft.latest + 1), milestone: reviewId });
  }
  const done = completionsOf(planning, row.milestone.index, null);
  const lastSeen = done[done.length - 1]?.on ?? Math.max(birth, teamStart);
  const lostOn = addMonthsToDay(lastSeen, lostAfterMonths);
  if (today >= lostOn) alarms.push({ name: 'lost-to-follow-up', since: fromEpochDay(lostOn), milestone: reviewId });
  return alarms;
}

/** A root that had reached one quarter and has not been seen for more than eight months, on a side still to be grafted. */
function blindGrafts(planned: PlannedRows): Alarm[] {
  const { planning } = planned;
  const graft = planning.compiled.rootMilestones.graft;
  return planned.rows.flatMap((row): Alarm[] => {
    if (row.milestone.index !== graft || row.offPath !== null || isDoneOrWaived(planning, graft, row.side)) return [];
    const readings = planning.child.roots.filter((reading) => row.side === null || reading.side === row.side);
    const last = readings[readings.length - 1];
    if (last === undefined || !isAtLeast(last.stage, quarter)) return [];
    const blindOn = addMonthsToDay(last.on, blindAfterMonths) + 1;
    if (planning.child.today < blindOn) return [];
    return [{ name: 'graft-blind', since: fromEpochDay(blindOn), milestone: stableKeyOf(row) }];
  });
}
