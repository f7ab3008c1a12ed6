/**
 * The plan of one child: every milestone with its window, state, waits and the reasons of its dates.
 * Pure: today comes in, nothing is stored, equal inputs give equal answers.
 */
import { fromEpochDay, type PlainDate } from '@weftway/calendar/plain-date';
import { alarmsOf } from './alarms.ts';
import { never } from './child-record.ts';
import { waitsOf } from './gates.ts';
import type { PathwayFacts } from './pathway-facts.ts';
import type { ClinicalStatus, OffPathMilestone, PathwayPlan, PlannedMilestone, PlannedWindow } from './pathway-plan.ts';
import type { PlanOptions, Row } from './planning.ts';
import { planRow } from './plan-row.ts';
import { planRows, stableKeyOf, type PlannedRows } from './plan-rows.ts';
import { projectedRhythm } from './projected-rhythm.ts';
import type { Protocol } from './protocol.ts';
import { reasonsOf } from './reasons.ts';
import { boardState, clinicalStatus, daysLate, isLapsed, nextChangeDay } from './state-of-milestone.ts';
import type { WindowDraft } from './window-draft.ts';

const noReasons = { earliest: [], target: [], latest: [] } as const;
const nothing: readonly never[] = [];

/**
 * Plans a child's whole path for one day, from the facts that are not dated after it.
 * Throws a RangeError when neither the date of birth nor the expected date is known.
 */
export function planPathway(
  protocol: Protocol,
  facts: PathwayFacts,
  today: PlainDate,
  options: PlanOptions = {},
): PathwayPlan {
  const planned = planRows(protocol, facts, today, options);
  const { child } = planned.planning;
  const milestones: PlannedMilestone[] = [];
  const offPath: OffPathMilestone[] = [];
  for (const row of planned.rows) {
    const status = clinicalStatus(planned.planning, row, child.today);
    const id = row.milestone.rule.id;
    const isUnbooked = row.fixed === 'not_started' && row.milestone.clockFrom === 'operation-booked';
    if (status === 'not_applicable' || isUnbooked) {
      offPath.push({
        key: stableKeyOf(row),
        id,
        clinical: isUnbooked ? 'not_started' : 'not_applicable',
        reason: row.offPath ?? 'not-booked',
      });
    } else milestones.push(dress(planned, row, status));
  }
  return {
    today,
    milestones,
    offPath,
    base: { birth: fromEpochDay(child.birth), corrected: fromEpochDay(child.corrected), isExpected: !child.isBorn },
    alarms: alarmsOf(planned),
  };
}

function dress(planned: PlannedRows, row: Row, clinical: ClinicalStatus): PlannedMilestone {
  const { planning } = planned;
  const { child } = planning;
  const { draft, milestone } = row;
  const withReasons = planning.options.reasons !== false;
  const changes = nextChangeDay(planning, row, child.today);
  return {
    key: stableKeyOf(row),
    id: milestone.rule.id,
    side: row.side,
    forOperation: row.operation === '' ? null : row.operation,
    occurrence: row.occurrence,
    state: boardState(clinical, draft.hasWindow),
    clinical,
    isDue: clinical === 'due',
    squeezedByDays: draft.hasWindow && draft.earliest > draft.latest ? draft.earliest - draft.latest : null,
    isLapsed: isLapsed(row, child.today),
    isRenewable: clinical === 'signed_off' && planned.planning.compiled.renewable.has(milestone.rule.id),
    window: plannedWindow(draft, milestone.rule.closingDays),
    daysLate: daysLate(planning, row, child.today),
    waitsFor: row.operation === null && !isSettled(row) ? waitsOf(planning, row, child.today, planRow) : nothing,
    moves: milestone.moves,
    reasons: withReasons ? reasonsOf(planning, row) : noReasons,
    remark: row.remark,
    past: withReasons
      ? row.past.map((one) => ({
          occurrence: one.occurrence,
          on: fromEpochDay(one.on),
          kind: one.kind,
          window: one.draft === null ? null : plannedWindow(one.draft, milestone.rule.closingDays),
        }))
      : nothing,
    rhythm: withReasons ? projectedRhythm(planning, row) : nothing,
    changesOn: changes === never ? null : fromEpochDay(changes),
  };
}

/** Signed and waived milestones wait for nothing. */
function isSettled(row: Row): boolean {
  return row.fixed === 'signed_off' || row.fixed === 'waived';
}

function plannedWindow(draft: WindowDraft, closingDays: number): PlannedWindow | null {
  if (!draft.hasWindow) return null;
  return {
    earliest: fromEpochDay(draft.earliest),
    target: fromEpochDay(draft.target),
    latest: fromEpochDay(draft.latest),
    closing: fromEpochDay(draft.latest - closingDays),
  };
}

/** The next day on which any state of the plan changes by itself, or null. */
export function nextChange(plan: PathwayPlan): PlainDate | null {
  let next: PlainDate | null = null;
  for (const { changesOn } of plan.milestones) {
    if (changesOn !== null && (next === null || changesOn < next)) next = changesOn;
  }
  return next;
}
