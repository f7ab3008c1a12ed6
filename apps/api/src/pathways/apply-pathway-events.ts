/** Facts about one child's milestones. */
import type { Knex } from 'knex';
import type { Appliers, EventPayloads } from '../trail/trail-event.ts';

type PathwayEvents =
  | 'milestone-claimed'
  | 'milestone-released'
  | 'milestone-handed-over'
  | 'draft-saved'
  | 'milestone-signed'
  | 'signature-amended'
  | 'milestone-held'
  | 'hold-lifted'
  | 'milestone-waived'
  | 'booking-set'
  | 'booking-removed'
  | 'finding-recorded'
  | 'finding-withdrawn'
  | 'own-milestone-added'
  | 'history-imported'
  | 'import-confirmed';

interface Place {
  readonly childId: string;
  readonly milestone: string;
}

const placeOf = (event: { readonly childId?: string; readonly milestone?: string }): Place => {
  if (event.childId === undefined || event.milestone === undefined) throw new Error('A pathway event without a place');
  return { childId: event.childId, milestone: event.milestone };
};

const childOf = (event: { readonly childId?: string }): string => {
  if (event.childId === undefined) throw new Error('A pathway event without a child');
  return event.childId;
};

const rowOf = ({ childId, milestone }: Place) => ({ child_id: childId, milestone });

const touch = async (trx: Knex, childId: string, seq: number): Promise<void> => {
  await trx('children').where({ id: childId }).update({ pathway_version: seq });
};

const insertSignature = async (
  trx: Knex,
  place: Place,
  signed: EventPayloads['signature-amended'],
  draftedById: string | null,
): Promise<void> => {
  const { signature } = signed;
  await trx('signatures').insert({
    id: signature.id,
    ...rowOf(place),
    part: signature.part,
    occurrence: signature.occurrence,
    performed_on: signature.performedOn,
    signed_at: signature.signedAt,
    signed_on: signed.signedOn ?? signature.signedAt.slice(0, 10),
    signer_id: signature.signerId,
    signer_name: signature.signerName,
    signer_role: signature.signerRole,
    meaning: signature.meaning,
    evidence: JSON.stringify(signature.values),
    drafted_by_id: draftedById,
    drafted_by_name: signature.draftedByName,
    overrides: JSON.stringify(signature.overrides),
    protocol_version: signature.protocolVersion,
    digest: signature.digest,
    signed_text: signed.signedText ?? null,
    previous_digest: signed.previousDigest,
    amends: signature.amends,
    amend_reason: signature.amendReason,
  });
};

const own = async (trx: Knex, place: Place, part: string, memberId: string, at: string): Promise<void> => {
  await trx('claims')
    .insert({ ...rowOf(place), part, member_id: memberId, since: at })
    .onConflict(['child_id', 'milestone', 'part'])
    .merge();
};

export const pathwayAppliers: Appliers<PathwayEvents> = {
  'milestone-claimed': async (trx, event, stamp) => {
    const place = placeOf(event);
    // Plain insert: a second claim meets the primary key and fails.
    await trx('claims').insert({
      ...rowOf(place),
      part: event.after.part,
      member_id: event.after.memberId,
      since: stamp.at,
    });
    await touch(trx, place.childId, stamp.seq);
  },
  'milestone-released': async (trx, event, stamp) => {
    const place = placeOf(event);
    await trx('claims')
      .where({ ...rowOf(place), part: event.after.part })
      .delete();
    await touch(trx, place.childId, stamp.seq);
  },
  'milestone-handed-over': async (trx, event, stamp) => {
    const place = placeOf(event);
    await own(trx, place, event.after.part, event.after.to, stamp.at);
    await touch(trx, place.childId, stamp.seq);
  },
  'draft-saved': async (trx, event, stamp) => {
    const place = placeOf(event);
    const { part, occurrence, values, performedOn, isReady } = event.after;
    const row = {
      occurrence,
      evidence: JSON.stringify(values),
      performed_on: performedOn,
      by_id: stamp.actorId,
      at: stamp.at,
      is_ready: isReady ? 1 : 0,
      version: stamp.seq,
    };
    await trx('drafts')
      .insert({ ...rowOf(place), part, ...row })
      .onConflict(['child_id', 'milestone', 'part'])
      .merge();
    await touch(trx, place.childId, stamp.seq);
  },
  'milestone-signed': async (trx, event, stamp) => {
    const place = placeOf(event);
    await insertSignature(trx, place, event.after, event.after.draftedById);
    await trx('drafts')
      .where({ ...rowOf(place), part: event.after.signature.part })
      .delete();
    await trx('holds').where(rowOf(place)).delete();
    await touch(trx, place.childId, stamp.seq);
  },
  'signature-amended': async (trx, event, stamp) => {
    const place = placeOf(event);
    await insertSignature(trx, place, event.after, null);
    await touch(trx, place.childId, stamp.seq);
  },
  'milestone-held': async (trx, event, stamp) => {
    const place = placeOf(event);
    const { reason, heldOn, reviewOn } = event.after;
    await trx('holds')
      .insert({ ...rowOf(place), reason, held_on: heldOn, review_on: reviewOn, by_id: stamp.actorId })
      .onConflict(['child_id', 'milestone'])
      .merge();
    await touch(trx, place.childId, stamp.seq);
  },
  'hold-lifted': async (trx, event, stamp) => {
    const place = placeOf(event);
    await trx('holds').where(rowOf(place)).delete();
    await touch(trx, place.childId, stamp.seq);
  },
  'milestone-waived': async (trx, event, stamp) => {
    const place = placeOf(event);
    const { after } = event;
    await trx('waivers').insert({
      id: after.id,
      ...rowOf(place),
      occurrence: after.occurrence,
      kind: after.kind,
      reason: after.reason,
      note: after.note,
      second_name: after.secondName,
      offer_again_on: after.offerAgainOn,
      waived_on: after.waivedOn,
      by_id: stamp.actorId,
    });
    // What was prepared or paused belonged to the occurrence that is waived.
    await trx('drafts').where(rowOf(place)).delete();
    await trx('holds').where(rowOf(place)).delete();
    await touch(trx, place.childId, stamp.seq);
  },
  'booking-set': async (trx, event, stamp) => {
    const place = placeOf(event);
    await trx('bookings')
      .insert({ ...rowOf(place), booked_on: event.after.on })
      .onConflict(['child_id', 'milestone'])
      .merge();
    await touch(trx, place.childId, stamp.seq);
  },
  'booking-removed': async (trx, event, stamp) => {
    const place = placeOf(event);
    await trx('bookings').where(rowOf(place)).delete();
    await touch(trx, place.childId, stamp.seq);
  },
  'finding-recorded': async (trx, event, stamp) => {
    const childId = childOf(event);
    const { name, on, note } = event.after;
    await trx('findings')
      .insert({ child_id: childId, name, found_on: on, note })
      .onConflict(['child_id', 'name'])
      .merge();
    await touch(trx, childId, stamp.seq);
  },
  'finding-withdrawn': async (trx, event, stamp) => {
    const childId = childOf(event);
    await trx('findings').where({ child_id: childId, name: event.after.name }).delete();
    await touch(trx, childId, stamp.seq);
  },
  'own-milestone-added': async (trx, event, stamp) => {
    const childId = childOf(event);
    await trx('own_milestones').insert({
      child_id: childId,
      id: event.after.rule.id,
      rule: JSON.stringify(event.after.rule),
      added_on: event.after.addedOn,
    });
    await touch(trx, childId, stamp.seq);
  },
  'history-imported': async (trx, event, stamp) => {
    const place = placeOf(event);
    const { performedOn, precision, isUnverified, results, source } = event.after;
    await trx('imported_completions')
      .insert({
        ...rowOf(place),
        performed_on: performedOn,
        date_precision: precision,
        is_unverified: isUnverified ? 1 : 0,
        results: JSON.stringify(results),
        source,
      })
      .onConflict(['child_id', 'milestone', 'performed_on'])
      .merge();
    await touch(trx, place.childId, stamp.seq);
  },
  'import-confirmed': async (trx, event, stamp) => {
    const place = placeOf(event);
    await trx('imported_completions').where(rowOf(place)).update({ is_unverified: 0 });
    await touch(trx, place.childId, stamp.seq);
  },
};
