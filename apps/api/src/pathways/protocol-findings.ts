/** The findings that a protocol knows: names that its conditions and clocks read, without those that are worked out. */
import type { Condition } from '@weftway/pathway/condition';
import type { MilestoneRule } from '@weftway/pathway/protocol';

/** Read off the cleft code, the settings, the child's record, or what was signed; nobody records them by hand. */
const workedOut: readonly string[] = [
  'lip',
  'lip_complete',
  'gum',
  'gum_notched',
  'palate',
  'molding_team',
  'sex_male',
  'sex_unknown',
  'root_low',
  'root_at_quarter',
  'molding_started',
  'speech_surgery_done',
  'graft_done',
];

const namesIn = (condition: Condition | undefined): string[] => {
  if (condition === undefined) return [];
  if (typeof condition === 'string') return [condition];
  if ('not' in condition) return namesIn(condition.not);
  return ('all' in condition ? condition.all : condition.any).flatMap(namesIn);
};

const namesOf = (rule: MilestoneRule): string[] => [
  ...(rule.clock.from === 'finding' ? [rule.clock.finding] : []),
  ...namesIn(rule.applies),
  ...rule.variants.flatMap((variant) => namesIn(variant.when)),
  ...rule.prerequisites.flatMap((need) => namesIn(need.when)),
  ...rule.repeats.flatMap((repeat) => [...namesIn(repeat.when), ...(repeat.until ?? [])]),
  ...rule.raises.map((raise) => raise.finding),
];

const known = new WeakMap<ReadonlyMap<string, MilestoneRule>, ReadonlySet<string>>();

export const findingsOfProtocol = (rules: ReadonlyMap<string, MilestoneRule>): ReadonlySet<string> => {
  const cached = known.get(rules);
  if (cached !== undefined) return cached;
  const names = new Set(
    [...rules.values()]
      .flatMap(namesOf)
      .filter((name) => /^[a-z]/.test(name) && !workedOut.includes(name) && !name.startsWith('added_')),
  );
  known.set(rules, names);
  return names;
};
