/** The findings that a protocol asks about and a person can record: what starts clocks, ends rhythms, or switches on milestones. */
import type { Condition } from '@weftway/pathway/condition';
import type { Protocol } from '@weftway/pathway/protocol';
import { findingWords } from '../../../words/findings.ts';

/** Facts that follow from the record itself and are not for a person to state here. */
const derived = new Set([
  'lip',
  'gum',
  'palate',
  'lip_complete',
  'gum_notched',
  'molding_team',
  'sex_male',
  'sex_unknown',
  'operation_is_palate',
  'root_at_quarter',
  'root_low',
  'graft_done',
  'speech_surgery_done',
  'molding_started',
  'prenatal_referral',
  'birth_referral',
]);

const namesIn = (condition: Condition | undefined): readonly string[] => {
  if (condition === undefined) return [];
  if (typeof condition === 'string') return [condition];
  if ('not' in condition) return namesIn(condition.not);
  return ('all' in condition ? condition.all : condition.any).flatMap(namesIn);
};

export const findingNames = (protocol: Protocol): readonly string[] => {
  const ids = new Set(protocol.milestones.map((rule) => rule.id));
  const names = protocol.milestones.flatMap((rule) => [
    ...namesIn(rule.applies),
    ...rule.variants.flatMap((variant) => namesIn(variant.when)),
    ...rule.prerequisites.flatMap((need) => namesIn(need.when)),
    ...rule.repeats.flatMap((repeat) => [...namesIn(repeat.when), ...(repeat.until ?? [])]),
    ...(rule.clock.from === 'finding' ? [rule.clock.finding] : []),
    ...rule.raises.map((raise) => raise.finding),
  ]);
  return [...new Set(names)]
    .filter((name) => !derived.has(name) && !name.startsWith('signed:') && !name.startsWith('own_') && !ids.has(name))
    .toSorted((a, b) => findingWords(a).localeCompare(findingWords(b)));
};
