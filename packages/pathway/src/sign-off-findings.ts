/** The findings that a record raises, so that what they start can appear on the path. */
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { Finding } from './pathway-facts.ts';
import type { MilestoneRule } from './protocol.ts';
import type { EvidenceValues } from './sign-off-evidence.ts';

/**
 * Findings of one record, each once, dated with the day on which it was performed; nothing is dated back. Holds for a
 * saved draft as well where a start counts before the signature (arch widening).
 */
export function raisedFindings(rule: MilestoneRule, values: EvidenceValues, on: PlainDate): Finding[] {
  const names = rule.raises
    .filter(({ field, oneOf }) => {
      const value = values[field]?.value;
      return value !== null && value !== undefined && oneOf.includes(value);
    })
    .map((raise) => raise.finding);
  return [...new Set(names)].map((name) => ({ name, on }));
}
