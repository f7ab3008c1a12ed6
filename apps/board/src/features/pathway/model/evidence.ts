/** Evidence while it is being typed: what is here, what is missing, and how two people's drafts are put together. */
import { ageInMonths } from '@weftway/calendar/age';
import { daysBetween, readPlainDate, type PlainDate } from '@weftway/calendar/plain-date';
import type { Evidence, EvidenceValue } from '@weftway/contract/pathway';
import type { EvidenceField } from '@weftway/pathway/protocol';
import { evidenceFault, isBlank } from '@weftway/pathway/sign-off-evidence';

export const blank: EvidenceValue = { value: null };

export const valueOf = (values: Evidence, name: string): EvidenceValue => values[name] ?? blank;

/** Filled in, or left empty with a reason. */
export const isHere = (values: Evidence, field: EvidenceField): boolean => {
  const { value, emptyBecause } = valueOf(values, field.name);
  return !isBlank(value) || !isBlank(emptyBecause);
};

export const countHere = (values: Evidence, fields: readonly EvidenceField[]): number =>
  fields.filter((field) => isHere(values, field)).length;

export interface FieldFault {
  readonly kind: 'missing' | 'impossible' | 'unlikely';
  readonly message: string;
}

/** What is wrong with a typed value; an empty field is only wrong when it is to be signed. */
export const faultOf = (values: Evidence, field: EvidenceField): FieldFault | null => {
  const { value, isConfirmed } = valueOf(values, field.name);
  if (value === null || isBlank(value)) return null;
  const fault = evidenceFault(field, value);
  return fault === null || (fault.kind === 'unlikely' && isConfirmed === true) ? null : fault;
};

const same = (a: EvidenceValue, b: EvidenceValue): boolean =>
  (a.value ?? '') === (b.value ?? '') &&
  (a.emptyBecause ?? '') === (b.emptyBecause ?? '') &&
  (a.isConfirmed ?? false) === (b.isConfirmed ?? false);

export const sameEvidence = (a: Evidence, b: Evidence): boolean =>
  [...new Set([...Object.keys(a), ...Object.keys(b)])].every((name) => same(valueOf(a, name), valueOf(b, name)));

export interface Merge {
  readonly values: Evidence;
  /** Fields that both changed, differently. */
  readonly both: readonly { readonly name: string; readonly mine: EvidenceValue; readonly theirs: EvidenceValue }[];
}

/** Puts two drafts together field by field; where both changed, mine stands until somebody chooses. */
export const mergeDrafts = (base: Evidence, mine: Evidence, theirs: Evidence): Merge => {
  const names = [...new Set([...Object.keys(base), ...Object.keys(mine), ...Object.keys(theirs)])];
  const values: Record<string, EvidenceValue> = {};
  const both: { name: string; mine: EvidenceValue; theirs: EvidenceValue }[] = [];
  for (const name of names) {
    const [was, own, other] = [valueOf(base, name), valueOf(mine, name), valueOf(theirs, name)];
    const iChanged = !same(was, own);
    const theyChanged = !same(was, other);
    values[name] = iChanged ? own : other;
    if (iChanged && theyChanged && !same(own, other)) both.push({ name, mine: own, theirs: other });
  }
  return { values, both };
};

const isDay = (text: string | null): text is PlainDate => text !== null && readPlainDate(text).kind === 'date';

/** What follows from the day on which it was done, where nobody wrote anything else: the day itself, and the age. */
export const fromDay = (
  fields: readonly EvidenceField[],
  values: Evidence,
  day: string | null,
  before: string | null,
  birth: PlainDate | null,
): Evidence => {
  const follows = (name: string, on: string | null): string | null => {
    if (!isDay(on)) return null;
    if (name === 'operation_date') return on;
    if (birth === null || on < birth) return null;
    if (name === 'age_days') return String(daysBetween(birth, on));
    return name === 'age_months' ? String(ageInMonths(birth, on)) : null;
  };
  const next: Record<string, EvidenceValue> = { ...values };
  for (const { name } of fields) {
    const made = follows(name, day);
    const now = valueOf(values, name);
    const isUntouched = isBlank(now.value) ? isBlank(now.emptyBecause) : now.value === follows(name, before);
    if (made !== null && isUntouched) next[name] = { value: made };
  }
  return next;
};
