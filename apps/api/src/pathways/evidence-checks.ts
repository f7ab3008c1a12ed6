/** Evidence as it was sent: which fields are known, which values cannot be, which are unlikely. */
import type { Evidence } from '@weftway/contract/pathway';
import type { FieldFault } from '@weftway/contract/problems';
import type { MilestoneRule } from '@weftway/pathway/protocol';
import { fieldsOfPart, valueFaults } from '@weftway/pathway/sign-off-evidence';
import type { PathwayFacts } from '@weftway/pathway/pathway-facts';

export const unknownFieldFaults = (rule: MilestoneRule, part: string, values: Evidence): FieldFault[] => {
  const known = new Set(fieldsOfPart(rule, part).map((field) => field.name));
  return Object.keys(values)
    .filter((name) => !known.has(name))
    .map((name) => ({ pointer: `/values/${name}`, detail: 'This field is not known here.' }));
};

/** Values that a field cannot hold, and unlikely ones that nobody confirmed (`/values/<name>/isConfirmed`). */
export const valueFieldFaults = (rule: MilestoneRule, part: string, values: Evidence): FieldFault[] =>
  valueFaults(fieldsOfPart(rule, part), values).map(({ field, fault }) => ({
    pointer: fault.kind === 'impossible' ? `/values/${field.name}/value` : `/values/${field.name}/isConfirmed`,
    detail: fault.message,
  }));

/** Something can be done neither in the future nor before birth, except for what is done before birth. */
export const dayFaults = (
  rule: MilestoneRule,
  on: string | null,
  facts: PathwayFacts,
  today: string,
  pointer: string,
): FieldFault[] => {
  if (on === null) return [];
  if (on > today) return [{ pointer, detail: 'The day lies in the future.' }];
  const isBeforeBirth = facts.birth === null || on < facts.birth;
  return isBeforeBirth && rule.clock.from !== 'prenatal-referral'
    ? [{ pointer, detail: 'The day lies before the birth of the child.' }]
    : [];
};
