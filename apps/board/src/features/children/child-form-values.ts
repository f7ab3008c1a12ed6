/** What the form holds while it is typed, and the record it stands for. The pair is held together by a test. */
import type { PlainDate } from '@weftway/calendar/plain-date';
import { childFieldsSchema, type ChildFields, type Contact } from '@weftway/contract/child';
import { childDateFaults } from '@weftway/contract/child-date-rules';
import { parseCleftCode } from '@weftway/pathway/cleft-code';

type DateName = 'bornOn' | 'dueOn' | 'referredOn' | 'prenatalReferralOn' | 'teamStartOn';

/** Dates are text ('' when empty), gestation is two numbers, syndromes are lines. */
export interface ChildFormValues
  extends
    Omit<ChildFields, DateName | 'gestation' | 'syndromes' | 'leadClinicianId' | 'contacts' | 'alerts'>,
    Record<DateName, string> {
  readonly gestationWeeks: number | null;
  readonly gestationDays: number | null;
  readonly syndromes: string;
  readonly leadClinicianId: string;
  readonly contacts: Contact[];
  readonly alerts: ChildFields['alerts'];
}

export const emptyContact: Contact = {
  name: '',
  relation: 'mother',
  phone: '',
  email: '',
  language: '',
  needsInterpreter: false,
  mayConsent: true,
};

export const blankChildForm = (site: string): ChildFormValues => ({
  firstName: '',
  familyName: '',
  recordNumber: '',
  bornOn: '',
  dueOn: '',
  isBirthEstimated: false,
  gestationWeeks: null,
  gestationDays: null,
  sex: 'unknown',
  cleft: '•••••••',
  isCleftProvisional: true,
  flags: [],
  syndromes: '',
  referredOn: '',
  prenatalReferralOn: '',
  teamStartOn: '',
  site,
  leadClinicianId: '',
  contacts: [],
  alerts: [],
  notes: '',
});

export const formOf = (fields: ChildFields): ChildFormValues => {
  const { gestation, bornOn, dueOn, referredOn, prenatalReferralOn, teamStartOn, ...rest } = fields;
  return {
    ...rest,
    bornOn: bornOn ?? '',
    dueOn: dueOn ?? '',
    referredOn: referredOn ?? '',
    prenatalReferralOn: prenatalReferralOn ?? '',
    teamStartOn: teamStartOn ?? '',
    gestationWeeks: gestation?.weeks ?? null,
    gestationDays: gestation?.days ?? null,
    syndromes: fields.syndromes.join('\n'),
    leadClinicianId: fields.leadClinicianId ?? '',
  };
};

/** The record as typed; text that is no date is kept, for the schema to refuse. */
const draftOf = (values: ChildFormValues) => {
  const { gestationWeeks, gestationDays, ...rest } = values;
  const dateOr = (text: string): string | null => (text === '' ? null : text);
  const reading = parseCleftCode(values.cleft);
  return {
    ...rest,
    bornOn: dateOr(values.bornOn),
    dueOn: dateOr(values.dueOn),
    referredOn: dateOr(values.referredOn),
    prenatalReferralOn: dateOr(values.prenatalReferralOn),
    teamStartOn: dateOr(values.teamStartOn),
    gestation: gestationWeeks === null ? null : { weeks: gestationWeeks, days: gestationDays ?? 0 },
    cleft: reading.ok ? reading.code : values.cleft,
    syndromes: values.syndromes
      .split('\n')
      .map((line) => line.trim())
      .filter((line) => line !== ''),
    leadClinicianId: values.leadClinicianId === '' ? null : values.leadClinicianId,
  };
};

export interface FormFault {
  /** Name of the field: `contacts.0.phone`. */
  readonly name: string;
  readonly message: string;
}

/** `/contacts/0/phone` or `/fields/contacts/0/phone`, as the form calls it. */
export const fieldNameOf = (pointer: string): string => {
  const name = pointer.replace(/^\/(fields\/)?/, '').replaceAll('/', '.');
  if (name === 'gestation' || name === 'gestation.weeks') return 'gestationWeeks';
  if (name === 'gestation.days') return 'gestationDays';
  return name.startsWith('syndromes') ? 'syndromes' : name;
};

const uniqueByName = (faults: readonly FormFault[]): FormFault[] =>
  faults.filter((fault, index) => faults.findIndex(({ name }) => name === fault.name) === index);

export type FormReading =
  { readonly kind: 'fields'; readonly fields: ChildFields } | { readonly kind: 'faults'; readonly faults: FormFault[] };

/** `expected`: only the expected date is asked for; `any`: a record that is edited. */
export type ChildKind = 'born' | 'expected' | 'any';

/** What was typed for a born child does not count once the child is said to be expected. */
const ofKind = (values: ChildFormValues, kind: ChildKind): ChildFormValues =>
  kind === 'expected'
    ? { ...values, bornOn: '', isBirthEstimated: false, gestationWeeks: null, gestationDays: null, referredOn: '' }
    : values;

/** Reads the form as the API would: shape, cleft code, and dates that can be on `today`. */
export const readChildForm = (typed: ChildFormValues, today: PlainDate, kind: ChildKind): FormReading => {
  const values = ofKind(typed, kind);
  const parsed = childFieldsSchema.safeParse(draftOf(values));
  const faults: FormFault[] = parsed.success
    ? []
    : parsed.error.issues.map((issue) => ({
        name: fieldNameOf(`/${issue.path.map(String).join('/')}`),
        message: issue.message,
      }));
  const reading = parseCleftCode(values.cleft);
  if (!reading.ok) faults.push({ name: 'cleft', message: reading.message });
  if (kind === 'expected' && values.dueOn === '') faults.push({ name: 'dueOn', message: 'Write the expected date.' });
  if (kind === 'born' && values.bornOn === '')
    faults.push({ name: 'bornOn', message: 'Write the birth date. A child not yet born is added as expected.' });
  if (parsed.success)
    faults.push(
      ...childDateFaults(parsed.data, today).map(({ field, detail }) => ({
        name: fieldNameOf(`/${field}`),
        message: detail,
      })),
    );
  if (parsed.success && faults.length === 0) return { kind: 'fields', fields: parsed.data };
  // The schema points at the birth date when there is no date at all; an expected child has no such field.
  const shown = kind === 'expected' ? faults.filter(({ name }) => name !== 'bornOn') : faults;
  return { kind: 'faults', faults: uniqueByName(shown) };
};
