/** Which findings a signed milestone raises: evidence that starts a clock or puts another milestone on the path. */
import type { Completion, Finding } from './pathway-facts.ts';
import type { MilestoneRule } from './protocol.ts';

/** Findings of the day of signing, each name once, in the order of the rule. */
export function findingsFromCompletion(rule: MilestoneRule, completion: Completion): Finding[] {
  const found = new Map<string, Finding>();
  for (const { field, oneOf, finding } of rule.raises) {
    const value = completion.results?.[field];
    if (value !== undefined && oneOf.includes(value)) found.set(finding, { name: finding, on: completion.on });
  }
  return [...found.values()];
}
