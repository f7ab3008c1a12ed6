/**
 * Values of a record before it is signed: what a field can never hold is refused, what it hardly ever holds must be
 * confirmed by the person who typed it, and an empty field needs a reason.
 */
import { readPlainDate } from '@weftway/calendar/plain-date';
import type { EvidenceField, MilestoneRule } from './protocol.ts';

/** A value as typed, or left empty for a stated reason. */
export interface EvidenceValue {
  readonly value: string | null;
  readonly emptyBecause?: string | undefined;
  /** An unlikely value that the person confirmed. */
  readonly isConfirmed?: boolean | undefined;
}
export type EvidenceValues = Readonly<Record<string, EvidenceValue>>;

export interface EvidenceFault {
  /** `unlikely` may be confirmed, `impossible` may not. */
  readonly kind: 'impossible' | 'unlikely';
  readonly message: string;
}

const longest = { text: 300, 'long-text': 4000 } as const;

/** What is wrong with a value that is not empty; null when nothing is. Numbers are in the unit of the field. */
export function evidenceFault(field: EvidenceField, value: string): EvidenceFault | null {
  switch (field.kind) {
    case 'number':
    case 'grade':
      return numberFault(field, value);
    case 'yes-no':
      return oneOfFault(field, value, ['yes', 'no']);
    case 'choice':
      return oneOfFault(field, value, field.choices ?? []);
    case 'date':
      return dateFault(field, value);
    case 'root-stage':
      return rootFault(field, value);
    case 'text':
    case 'long-text':
      return value.length > longest[field.kind]
        ? impossible(`${field.label} is longer than ${String(longest[field.kind])} characters.`)
        : null;
  }
}

const impossible = (message: string): EvidenceFault => ({ kind: 'impossible', message });

function numberFault(field: EvidenceField, text: string): EvidenceFault | null {
  const pattern = field.kind === 'grade' ? /^-?\d+$/ : /^-?\d+(\.\d+)?$/;
  if (!pattern.test(text))
    return impossible(`${field.label} must be a ${field.kind === 'grade' ? 'whole ' : ''}number.`);
  const value = Number(text);
  const { min = Number.NEGATIVE_INFINITY, max = Number.POSITIVE_INFINITY, likely } = field;
  const unit = field.unit === undefined ? '' : ` ${field.unit}`;
  if (value < min || value > max) return impossible(`${field.label} cannot be ${text}${unit}.`);
  if (!likely || (value >= likely[0] && value <= likely[1])) return null;
  const range = `${String(likely[0])} to ${String(likely[1])}${unit}`;
  return { kind: 'unlikely', message: `${field.label} of ${text}${unit} is unusual (mostly ${range}). Is it right?` };
}

function oneOfFault(field: EvidenceField, value: string, choices: readonly string[]): EvidenceFault | null {
  return choices.includes(value) ? null : impossible(`${field.label} must be one of: ${choices.join(', ')}.`);
}

function dateFault(field: EvidenceField, value: string): EvidenceFault | null {
  const reading = readPlainDate(value);
  // No living patient and no planned visit lies outside these years.
  if (reading.kind === 'date' && value >= '1900-01-01' && value < '2200-01-01') return null;
  return impossible(`${field.label} is not a day of the calendar.`);
}

/** A root stage is an exact fraction of the final length, from 0 to 1. */
function rootFault(field: EvidenceField, value: string): EvidenceFault | null {
  const match = /^(\d{1,3})(?:\/(\d{1,3}))?$/.exec(value);
  const [over, under] = [Number(match?.[1]), Number(match?.[2] ?? 1)];
  return match && under > 0 && over <= under
    ? null
    : impossible(`${field.label} must be a part of the root, such as 1/2.`);
}

/** The fields that one signature answers for; a field without a part belongs to the first. */
export function fieldsOfPart(rule: MilestoneRule, part: string): EvidenceField[] {
  const first = rule.signatures[0]?.part;
  return rule.evidence.filter((field) => (field.part ?? first) === part);
}

/** Empty fields without a reason, in the order of the record. */
export function missingFields(fields: readonly EvidenceField[], values: EvidenceValues): EvidenceField[] {
  return fields.filter((field) => {
    const entry = values[field.name];
    return isBlank(entry?.value) && isBlank(entry?.emptyBecause);
  });
}

/** Faulty values of the given fields; unlikely ones that were confirmed are left out. */
export function valueFaults(
  fields: readonly EvidenceField[],
  values: EvidenceValues,
): { readonly field: EvidenceField; readonly fault: EvidenceFault }[] {
  return fields.flatMap((field) => {
    const entry = values[field.name];
    if (!entry || entry.value === null || isBlank(entry.value)) return [];
    const fault = evidenceFault(field, entry.value);
    if (!fault || (fault.kind === 'unlikely' && entry.isConfirmed === true)) return [];
    return [{ field, fault }];
  });
}

export const isBlank = (text: string | null | undefined): boolean =>
  text === null || text === undefined || text.trim() === '';
