/** The protocol that a child follows: the team's, and the milestones that were added for this child alone. */
import type { MilestoneRule, Protocol } from '@weftway/pathway/protocol';
import type { OwnRow } from './pathway-store.ts';

const rulesByProtocol = new WeakMap<Protocol, ReadonlyMap<string, MilestoneRule>>();
const wholeByOwn = new WeakMap<Protocol, Map<string, Protocol>>();
/** Own milestones are rare; beyond this many different sets the memory is given back. */
const rememberedSets = 500;

/** The rules of a protocol by their id, made once. */
export const rulesOf = (protocol: Protocol): ReadonlyMap<string, MilestoneRule> => {
  const known = rulesByProtocol.get(protocol);
  if (known !== undefined) return known;
  const rules = new Map(protocol.milestones.map((rule) => [rule.id, rule]));
  rulesByProtocol.set(protocol, rules);
  return rules;
};

export const ownRulesOf = (own: readonly OwnRow[]): MilestoneRule[] =>
  own.map((row) => JSON.parse(row.rule) as MilestoneRule); // validated when it was added

/** The same object for the same additions, so that the planner compiles it once. */
export const protocolOf = (protocol: Protocol, own: readonly OwnRow[]): Protocol => {
  if (own.length === 0) return protocol;
  const key = own.map((row) => row.rule).join('\n');
  const sets = wholeByOwn.get(protocol) ?? new Map<string, Protocol>();
  wholeByOwn.set(protocol, sets);
  const known = sets.get(key);
  if (known !== undefined) return known;
  if (sets.size >= rememberedSets) sets.clear();
  const whole = { ...protocol, milestones: [...protocol.milestones, ...ownRulesOf(own)] };
  sets.set(key, whole);
  return whole;
};

/** `SURG-03` of `SURG-03`, `ORTH-05:R`, `CARE-04:SURG-01`. */
export const ruleIdOf = (key: string): string => key.split(':', 1)[0] ?? key;
