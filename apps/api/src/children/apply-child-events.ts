/** Facts about children. */
import type { Knex } from 'knex';
import type { ChildFields } from '@weftway/contract/child';
import type { Appliers } from '../trail/trail-event.ts';
import { searchTextOf } from './search-text.ts';

type ChildEvents =
  | 'child-registered'
  | 'child-edited'
  | 'child-transferred'
  | 'child-returned'
  | 'care-ended'
  | 'lead-handed-on'
  | 'trainees-assigned'
  | 'child-moved-to-protocol'
  | 'import-accepted';

const idOf = (event: { readonly childId?: string }): string => {
  if (event.childId === undefined) throw new Error('A child event without a child');
  return event.childId;
};

const columnsOf = (fields: ChildFields) => ({
  first_name: fields.firstName,
  family_name: fields.familyName,
  record_number: fields.recordNumber,
  search_text: searchTextOf(fields),
  born_on: fields.bornOn,
  due_on: fields.dueOn,
  is_birth_estimated: fields.isBirthEstimated ? 1 : 0,
  gestation_days: fields.gestation === null ? null : fields.gestation.weeks * 7 + fields.gestation.days,
  sex: fields.sex,
  cleft: fields.cleft,
  is_cleft_provisional: fields.isCleftProvisional ? 1 : 0,
  flags: JSON.stringify(fields.flags),
  syndromes: JSON.stringify(fields.syndromes),
  referred_on: fields.referredOn,
  prenatal_referral_on: fields.prenatalReferralOn,
  team_start_on: fields.teamStartOn,
  site: fields.site,
  lead_clinician_id: fields.leadClinicianId,
  contacts: JSON.stringify(fields.contacts),
  alerts: JSON.stringify(fields.alerts),
  notes: fields.notes,
});

const change = async (trx: Knex, childId: string, seq: number, columns: Record<string, unknown>): Promise<void> => {
  await trx('children')
    .where({ id: childId })
    .update({ ...columns, version: trx.raw('version + 1'), pathway_version: seq });
};

export const childAppliers: Appliers<ChildEvents> = {
  'child-registered': async (trx, event, stamp) => {
    await trx('children').insert({
      id: idOf(event),
      version: 1,
      pathway_version: stamp.seq,
      ...columnsOf(event.after.fields),
      protocol_version: event.after.protocolVersion,
      registered_at: stamp.at,
    });
  },
  'child-edited': (trx, event, { seq }) => change(trx, idOf(event), seq, columnsOf(event.after.fields)),
  'child-transferred': (trx, event, { seq }) =>
    change(trx, idOf(event), seq, { transferred_on: event.after.on, transferred_to: event.after.to }),
  'child-returned': (trx, event, { seq }) =>
    change(trx, idOf(event), seq, { transferred_on: null, transferred_to: null }),
  'care-ended': (trx, event, { seq }) =>
    change(trx, idOf(event), seq, { care_ended_on: event.after.on, care_ended_reason: event.after.reason }),
  'lead-handed-on': (trx, event, { seq }) =>
    change(trx, idOf(event), seq, { lead_clinician_id: event.after.leadClinicianId }),
  'child-moved-to-protocol': (trx, event, { seq }) =>
    change(trx, idOf(event), seq, { protocol_version: event.after.version }),
  'trainees-assigned': async (trx, event, { seq }) => {
    const childId = idOf(event);
    await trx('assignments').where({ child_id: childId }).delete();
    for (const memberId of event.after.memberIds)
      await trx('assignments').insert({ child_id: childId, member_id: memberId });
    await trx('children').where({ id: childId }).update({ pathway_version: seq });
  },
  'import-accepted': async () => undefined,
};
