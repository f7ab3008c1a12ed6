/**
 * The ordered steps behind each date. They add up: every step's date is the date before plus its days, the first names
 * the base, and the last is the date itself.
 */
import { fromEpochDay } from '@weftway/calendar/plain-date';
import type { PlannedMilestone, ReasonStep } from './pathway-plan.ts';
import type { Planning, Row } from './planning.ts';
import type { DraftStep } from './window-draft.ts';

/** The reasons of the three dates of a row; empty where it has no window. */
export function reasonsOf(planning: Planning, row: Row): PlannedMilestone['reasons'] {
  const { trace } = row.draft;
  if (trace === null || !row.draft.hasWindow) return { earliest: [], target: [], latest: [] };
  const { source } = row.milestone;
  return {
    earliest: dressSteps(planning, trace.earliest, source),
    target: dressSteps(planning, trace.target, source),
    latest: dressSteps(planning, trace.latest, source),
  };
}

function dressSteps(planning: Planning, steps: readonly DraftStep[], source: string): ReasonStep[] {
  const dressed: ReasonStep[] = [];
  let before: number | null = null;
  for (const step of steps) {
    dressed.push({
      rule: step.rule,
      days: before === null ? 0 : step.day - before,
      date: fromEpochDay(step.day),
      ...(step.span === undefined ? {} : { span: step.span }),
      ...(step.event === undefined ? {} : { event: { name: step.event.name, on: fromEpochDay(step.event.on) } }),
      ...(step.note === undefined ? {} : { note: step.note }),
      source,
    });
    if (before === null) dressed.push(...baseRemarks(planning, step, source));
    before = step.day;
  }
  return dressed;
}

/** What must be said about a base: an estimated birth is six months uncertain either way; gestation may be unknown. */
function baseRemarks(planning: Planning, step: DraftStep, source: string): ReasonStep[] {
  const { facts, isBorn } = planning.child;
  const remark = (note: string): ReasonStep => ({
    rule: 'estimated-birth',
    days: 0,
    date: fromEpochDay(step.day),
    note,
    source,
  });
  if (step.rule === 'base-corrected' && facts.gestation === null) return [remark('gestation-unknown')];
  const isAge = step.rule === 'base-birth' || step.rule === 'base-corrected';
  return isAge && isBorn && facts.isBirthEstimated ? [remark('six-months-either-way')] : [];
}
