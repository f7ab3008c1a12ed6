/** What a child's record must hold besides its shape: dates that can be, a cleft code that can be read, a known site. */
import { isDeepStrictEqual } from 'node:util';
import type { Knex } from 'knex';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { ChildFields } from '@weftway/contract/child';
import { childDateFaults } from '@weftway/contract/child-date-rules';
import type { FieldFault } from '@weftway/contract/problems';
import { parseCleftCode } from '@weftway/pathway/cleft-code';
import { mayLead, sitesOf } from './team-choices-view.ts';

interface Checked {
  readonly faults: readonly FieldFault[];
  /** With the cleft code in its stored form. */
  readonly fields: ChildFields;
}

const isSameDate = (fields: ChildFields, before: ChildFields | null): boolean =>
  before !== null &&
  (['bornOn', 'dueOn', 'referredOn', 'prenatalReferralOn', 'teamStartOn'] as const).every(
    (name) => fields[name] === before[name],
  ) &&
  isDeepStrictEqual(fields.gestation, before.gestation);

const lateExpectedFaults = (fields: ChildFields, before: ChildFields | null, today: PlainDate): FieldFault[] => {
  const isPast = fields.bornOn === null && fields.dueOn !== null && fields.dueOn < today;
  const daysPast = isPast ? (Date.parse(today) - Date.parse(fields.dueOn ?? today)) / 86_400_000 : 0;
  // An expected child already on the list stays editable; a new one this long past its date was born.
  return daysPast > 35 && fields.dueOn !== before?.dueOn
    ? [{ pointer: 'dueOn', detail: 'This date is more than five weeks past. Write the birth date.' }]
    : [];
};

/** `before`: the record as it stands, null when it is new. Pointers begin with `prefix`. */
export const checkChild = async (
  trx: Knex,
  fields: ChildFields,
  before: ChildFields | null,
  ask: { readonly today: PlainDate; readonly prefix: string },
): Promise<Checked> => {
  const faults: FieldFault[] = isSameDate(fields, before)
    ? []
    : [
        ...childDateFaults(fields, ask.today).map(({ field, detail }) => ({ pointer: field, detail })),
        ...lateExpectedFaults(fields, before, ask.today),
      ];
  const reading = parseCleftCode(fields.cleft);
  if (!reading.ok) faults.push({ pointer: 'cleft', detail: reading.message });
  const sites = await sitesOf(trx);
  if (fields.site !== before?.site && !sites.includes(fields.site))
    faults.push({ pointer: 'site', detail: `Choose one of the team's sites: ${sites.join(', ')}.` });
  const { leadClinicianId } = fields;
  if (
    leadClinicianId !== null &&
    leadClinicianId !== before?.leadClinicianId &&
    !(await mayLead(trx, leadClinicianId))
  ) {
    faults.push({ pointer: 'leadClinicianId', detail: 'Choose a clinician who is on the team today.' });
  }
  return {
    faults: faults.map(({ pointer, detail }) => ({ pointer: `${ask.prefix}/${pointer}`, detail })),
    fields: reading.ok ? { ...fields, cleft: reading.code } : fields,
  };
};

/** What the clinicians alone change. */
export const cleftFieldNames = [
  'cleft',
  'isCleftProvisional',
  'flags',
  'syndromes',
] as const satisfies readonly (keyof ChildFields)[];

/** Names of the fields that differ. */
export const changedFields = (before: ChildFields, after: ChildFields): (keyof ChildFields)[] =>
  (Object.keys(after) as (keyof ChildFields)[]).filter((name) => !isDeepStrictEqual(before[name], after[name])); // keys of the schema
