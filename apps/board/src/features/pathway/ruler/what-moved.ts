/** What the last act moved: of this screen, else of whoever signed last. */
import { formatDate } from '@weftway/calendar/format-date';
import type { Pathway } from '@weftway/contract/pathway';
import { milestoneStateNames } from '@weftway/pathway/milestone-state';
import { planPathway } from '@weftway/pathway/plan-pathway';
import type { PathwayFacts } from '@weftway/pathway/pathway-facts';
import type { LastAct } from '../../../queries/pathway-queries.ts';
import { pathwayWords } from '../../../words/pathway.ts';
import { reasonText, type Naming } from '../../../words/reasons.ts';
import type { ChildPlan } from '../model/child-plan.ts';
import { movedBetween, type Move } from '../model/moved.ts';

export interface WhatMoved {
  /** What was done, or null where it was not one milestone. */
  readonly by: string | null;
  readonly moves: readonly Move[];
}

/** The facts as they were before the last signature. */
const beforeLastSignature = (of: ChildPlan): { readonly facts: PathwayFacts; readonly milestone: string } | null => {
  const last = of.pathway.signatures.toSorted((a, b) => a.signedAt.localeCompare(b.signedAt)).at(-1);
  if (last === undefined) return null;
  const { facts } = of.pathway;
  const rule = of.ruleOf(last.milestone);
  const isOf = (one: { readonly milestone: string; readonly on: string }): boolean =>
    one.milestone === last.milestone && one.on === last.performedOn;
  const raised = new Set(
    (rule?.raises ?? [])
      .filter((raise) => raise.oneOf.includes(last.values[raise.field]?.value ?? ''))
      .map((raise) => raise.finding),
  );
  const hasRoots = (rule?.evidence ?? []).some((field) => field.kind === 'root-stage');
  return {
    milestone: last.milestone,
    facts: {
      ...facts,
      completions: facts.completions.filter((one) => !isOf(one)),
      parts: facts.parts.filter((one) => !isOf(one)),
      findings: facts.findings.filter((one) => !(raised.has(one.name) && one.on === last.performedOn)),
      roots: hasRoots ? facts.roots.filter((one) => one.on !== last.performedOn) : facts.roots,
    },
  };
};

const actedOn = (act: LastAct): string | null => {
  const known = new Set(act.before.history.map((entry) => entry.seq));
  return act.after.history.find((entry) => !known.has(entry.seq) && entry.milestone !== null)?.milestone ?? null;
};

const isWorthSaying = (move: Move): boolean =>
  move.kind !== 'state' ||
  move.after?.state === 'open' ||
  move.after?.state === 'closing' ||
  move.after?.state === 'waiting';

export const whatMoved = (
  of: ChildPlan,
  act: LastAct | null,
  planOf: (pathway: Pathway) => ChildPlan,
): WhatMoved | null => {
  if (act !== null) {
    const milestone = actedOn(act);
    const moves = movedBetween(planOf(act.before).plan, of.plan, milestone).filter(isWorthSaying);
    return moves.length === 0 ? null : { by: milestone, moves };
  }
  const earlier = beforeLastSignature(of);
  if (earlier === null) return null;
  const moves = movedBetween(planPathway(of.protocol, earlier.facts, of.today), of.plan, earlier.milestone).filter(
    isWorthSaying,
  );
  return moves.length === 0 ? null : { by: earlier.milestone, moves };
};

/** "opens 28 days later, because Lip repair on 20 Aug 2026, then 12 weeks …" */
export const moveText = (move: Move, naming: Naming): string => {
  const words = pathwayWords.moved;
  const { before, after } = move;
  if (move.kind === 'left') return words.left;
  if (move.kind === 'came') {
    const window = after?.window ?? null;
    if (window === null) return words.came;
    const dates = [formatDate(window.earliest), formatDate(window.latest)] as const;
    return before === null ? words.cameWith(...dates) : words.cameDated(...dates);
  }
  if (move.kind === 'state')
    return before === null || after === null
      ? ''
      : words.state(milestoneStateNames[before.state], milestoneStateNames[after.state]);
  const dates = move.dates.map(({ which, days }) => words.date(which, days)).join(', ');
  const why = move.dates.find((date) => date.because !== null);
  if (why === undefined || why.because === null) return dates;
  const reason = reasonText(why.because, naming, why.which);
  return `${dates}: ${reason.charAt(0).toLowerCase()}${reason.slice(1)}`;
};
