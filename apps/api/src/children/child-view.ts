/** The record of one child as the contract shows it. Other nouns may use this view. */
import type { Knex } from 'knex';
import type { Child, ChildFields } from '@weftway/contract/child';
import { parseCleftCode } from '@weftway/pathway/cleft-code';
import { icd10Of } from '@weftway/pathway/cleft-icd10';

export interface ChildRowRecord {
  readonly id: string;
  readonly version: number;
  readonly first_name: string;
  readonly family_name: string;
  readonly record_number: string;
  readonly born_on: string | null;
  readonly due_on: string | null;
  readonly is_birth_estimated: 0 | 1;
  readonly gestation_days: number | null;
  readonly sex: ChildFields['sex'];
  readonly cleft: string;
  readonly is_cleft_provisional: 0 | 1;
  readonly flags: string;
  readonly syndromes: string;
  readonly referred_on: string | null;
  readonly prenatal_referral_on: string | null;
  readonly team_start_on: string | null;
  readonly site: string;
  readonly lead_clinician_id: string | null;
  readonly contacts: string;
  readonly alerts: string;
  readonly notes: string;
  readonly protocol_version: number;
  readonly transferred_on: string | null;
  readonly transferred_to: string | null;
  readonly care_ended_on: string | null;
  readonly care_ended_reason: string | null;
  readonly registered_at: string;
}

type DateText = ChildFields['bornOn'];
const dateOf = (text: string | null): DateText => text as DateText; // stored as a checked date

export const fieldsOf = (row: ChildRowRecord): ChildFields => ({
  firstName: row.first_name,
  familyName: row.family_name,
  recordNumber: row.record_number,
  bornOn: dateOf(row.born_on),
  dueOn: dateOf(row.due_on),
  isBirthEstimated: row.is_birth_estimated === 1,
  gestation:
    row.gestation_days === null ? null : { weeks: Math.floor(row.gestation_days / 7), days: row.gestation_days % 7 },
  sex: row.sex,
  cleft: row.cleft,
  isCleftProvisional: row.is_cleft_provisional === 1,
  // Lists are written from the contract's schema.
  flags: JSON.parse(row.flags) as ChildFields['flags'],
  syndromes: JSON.parse(row.syndromes) as ChildFields['syndromes'],
  referredOn: dateOf(row.referred_on),
  prenatalReferralOn: dateOf(row.prenatal_referral_on),
  teamStartOn: dateOf(row.team_start_on),
  site: row.site,
  leadClinicianId: row.lead_clinician_id,
  contacts: JSON.parse(row.contacts) as ChildFields['contacts'],
  alerts: JSON.parse(row.alerts) as ChildFields['alerts'],
  notes: row.notes,
});

const classified = (fields: ChildFields): Child['icd10'] => {
  const reading = parseCleftCode(fields.cleft);
  if (!reading.ok) return null;
  return icd10Of(reading.code, {
    isUvulaOnly: fields.flags.includes('uvula_only'),
    isMidlineLip: fields.flags.includes('midline_lip'),
    isSubmucous: fields.flags.includes('smcp'),
  });
};

export const childOf = (row: ChildRowRecord, traineeIds: readonly string[]): Child => {
  const fields = fieldsOf(row);
  return {
    id: row.id,
    version: row.version,
    fields,
    icd10: classified(fields),
    protocolVersion: row.protocol_version,
    transferredOn: dateOf(row.transferred_on),
    transferredTo: row.transferred_to ?? '',
    traineeIds: [...traineeIds],
    careEnded:
      row.care_ended_on === null
        ? null
        : { on: row.care_ended_on as NonNullable<DateText>, reason: row.care_ended_reason ?? '' }, // stored as a checked date
    registeredAt: row.registered_at,
  };
};

export const findChildRow = async (db: Knex, childId: string): Promise<ChildRowRecord | null> => {
  const row: ChildRowRecord | undefined = await db('children').where({ id: childId }).first('*');
  return row ?? null;
};

/** Rows by record number in small letters, for many numbers at once. */
export const childRowsByRecordNumber = async (
  db: Knex,
  recordNumbers: readonly string[],
): Promise<ReadonlyMap<string, ChildRowRecord>> => {
  const wanted = JSON.stringify(recordNumbers.map((number) => number.toLowerCase()));
  const rows: ChildRowRecord[] = await db('children')
    .select('*')
    .whereRaw('lower(record_number) in (select value from json_each(?))', [wanted]);
  return new Map(rows.map((row) => [row.record_number.toLowerCase(), row]));
};

export const traineeIdsOf = async (db: Knex, childId: string): Promise<string[]> => {
  const rows: { member_id: string }[] = await db('assignments')
    .where({ child_id: childId })
    .orderBy('member_id')
    .select('member_id');
  return rows.map((row) => row.member_id);
};

/** The child as it stands. Throws when it does not exist: callers have found it before. */
export const viewChild = async (db: Knex, childId: string): Promise<Child> => {
  const row = await findChildRow(db, childId);
  if (row === null) throw new Error('The child was not found');
  return childOf(row, await traineeIdsOf(db, childId));
};
