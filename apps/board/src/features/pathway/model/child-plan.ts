/** The plan of the child on screen, reckoned in the browser by the same pure code as on the server. */
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { Pathway } from '@weftway/contract/pathway';
import { planPathway } from '@weftway/pathway/plan-pathway';
import type { PathwayPlan } from '@weftway/pathway/pathway-plan';
import type { MilestoneRule, Protocol } from '@weftway/pathway/protocol';
import { useMemo } from 'react';
import type { Naming } from '../../../words/reasons.ts';

export interface ChildPlan {
  readonly pathway: Pathway;
  /** The team's protocol with the milestones that were added for this child alone. */
  readonly protocol: Protocol;
  readonly plan: PathwayPlan;
  readonly today: PlainDate;
  readonly ruleOf: (key: string) => MilestoneRule | undefined;
  /** Title with its side or operation: "Bone graft to the gum, right". */
  readonly titleOf: (key: string) => string;
}

/** One object for the same parts, because the planner remembers what it made of a protocol by identity. */
const joined = new WeakMap<Protocol, Map<string, Protocol>>();

const protocolOfChild = (protocol: Protocol, own: readonly MilestoneRule[]): Protocol => {
  if (own.length === 0) return protocol;
  const known = joined.get(protocol) ?? new Map<string, Protocol>();
  joined.set(protocol, known);
  const name = JSON.stringify(own);
  const made = known.get(name) ?? { ...protocol, milestones: [...protocol.milestones, ...own] };
  known.set(name, made);
  return made;
};

const sideNames: Readonly<Record<string, string>> = { R: 'right', L: 'left' };

export const childPlan = (pathway: Pathway, teamProtocol: Protocol, today: PlainDate): ChildPlan => {
  const protocol = protocolOfChild(teamProtocol, pathway.ownMilestones);
  const rules = new Map(protocol.milestones.map((rule) => [rule.id, rule]));
  const ruleOf = (key: string): MilestoneRule | undefined => rules.get(key.split(':')[0] ?? key);
  const titleOf = (key: string): string => {
    const rest = key.split(':').slice(1).join(':');
    const title = ruleOf(key)?.title ?? key;
    if (rest === '') return title;
    return `${title}, ${sideNames[rest] ?? `for ${titleOf(rest).toLowerCase()}`}`;
  };
  return { pathway, protocol, plan: planPathway(protocol, pathway.facts, today), today, ruleOf, titleOf };
};

export const usePlan = (pathway: Pathway, teamProtocol: Protocol, today: PlainDate): ChildPlan =>
  useMemo(() => childPlan(pathway, teamProtocol, today), [pathway, teamProtocol, today]);

/** What the words of reasons need to know of this child. */
export const namingOf = (of: ChildPlan): Naming => ({ titleOf: of.titleOf, birth: of.pathway.facts.birth });
