/**
 * Evidence that only the disciplines who sign a milestone may see: what parents said about themselves, a raw genetic
 * result. For everybody else such a field is blank, everywhere that it could be read.
 */
import type { Evidence } from '@weftway/contract/pathway';
import type { PathwayFacts } from '@weftway/pathway/pathway-facts';
import type { MilestoneRule } from '@weftway/pathway/protocol';
import type { Discipline } from '@weftway/team/disciplines';
import type { Standing } from '@weftway/team/standings';
import { ruleIdOf } from './whole-protocol.ts';

export const keptPrivate = 'Kept private';

export interface Reader {
  readonly id: string;
  readonly standing: Standing;
  readonly disciplines: readonly Discipline[];
}

/** May this person read the private fields? A trainee may, in their own discipline: they were assigned to the child. */
const maySee = (rule: MilestoneRule, reader: Reader, leadClinicianId: string | null): boolean =>
  rule.signatures
    .flatMap((signature) => signature.disciplines)
    .some((signer) =>
      signer === 'lead-clinician' ? leadClinicianId === reader.id : reader.disciplines.includes(signer),
    );

/** Names of the fields of a milestone that this person may not read. */
export const hiddenFields = (
  rule: MilestoneRule | undefined,
  reader: Reader,
  leadClinicianId: string | null,
): readonly string[] => {
  const names = (rule?.evidence ?? []).filter((field) => field.isPrivate === true).map((field) => field.name);
  return rule === undefined || names.length === 0 || maySee(rule, reader, leadClinicianId) ? [] : names;
};

export const withoutHidden = (values: Evidence, hidden: readonly string[]): Evidence =>
  hidden.length === 0
    ? values
    : Object.fromEntries(
        Object.entries(values).map(([name, value]) => [
          name,
          hidden.includes(name) ? { value: null, emptyBecause: keptPrivate } : value,
        ]),
      );

/** Facts without the private results; findings that they raised stay, since the whole team acts on them. */
export const factsFor = (facts: PathwayFacts, hiddenOf: (milestone: string) => readonly string[]): PathwayFacts => ({
  ...facts,
  completions: facts.completions.map((completion) => {
    const hidden = hiddenOf(ruleIdOf(completion.milestone));
    if (hidden.length === 0 || completion.results === undefined) return completion;
    return {
      ...completion,
      results: Object.fromEntries(Object.entries(completion.results).filter(([name]) => !hidden.includes(name))),
    };
  }),
});

/** What somebody saves who may not read every field: the values that are hidden from them stay as they were. */
export const keepHidden = (saved: Evidence, before: Evidence | null, hidden: readonly string[]): Evidence => {
  if (before === null || hidden.length === 0) return saved;
  const kept = hidden.flatMap((name) => {
    const old = before[name];
    const isTyped = saved[name] !== undefined && saved[name].emptyBecause !== keptPrivate;
    return old === undefined || isTyped ? [] : [[name, old] as const];
  });
  return { ...saved, ...Object.fromEntries(kept) };
};
