import { canMilestone } from '@weftway/abilities/ability-for';
import { signMilestone } from '@weftway/contract/pathway';
import type { BodyOf } from '@weftway/contract/operation';
import type { Signature } from '@weftway/contract/pathway';
import type { Signer } from '@weftway/pathway/protocol';
import { endpoint } from '../http/endpoint.ts';
import type { AskOfActor } from '../http/endpoint.ts';
import { done, fieldRefused, refused } from '../http/outcome.ts';
import type { Refused } from '../http/outcome.ts';
import { digestOf, firstHash } from '../trail/trail-chain.ts';
import type { TrailEvent } from '../trail/trail-event.ts';
import { unknownFieldFaults } from './evidence-checks.ts';
import { findPerson } from './members-store.ts';
import { openMilestone, partRefusal, subjectOfPart } from './open-pathway.ts';
import type { OpenedMilestone } from './open-pathway.ts';
import { viewPathway } from './pathway-view.ts';
import { halfSigned } from './signed-entries.ts';
import { signingRefusal } from './signing-refusal.ts';
import { prepareSigning, roleOfSigner, signedTextOf } from './signing.ts';
import type { PreparedSigning } from './signing.ts';

type Ask = AskOfActor<typeof signMilestone>;
type Body = BodyOf<typeof signMilestone>;

const signedAlready = (opened: OpenedMilestone, part: string): Refused => {
  const last = opened.occurrences
    .filter((one) => one.milestone === opened.key)
    .at(-1)
    ?.standing.find((row) => row.part === part);
  return refused('milestone-already-signed', {
    detail: last === undefined ? 'This is signed already.' : `${last.signer_name} has signed this already.`,
    ...(last === undefined
      ? {}
      : { extra: { current: { id: last.id, signerName: last.signer_name, signedAt: last.signed_at } } }),
  });
};

/** True when the very thing that is about to be signed was signed a moment ago, by somebody who was faster. */
const isSignedMeanwhile = (opened: OpenedMilestone, body: Body, meaning: string): boolean =>
  opened.occurrences
    .filter((one) => one.milestone === opened.key && one.standing.some((row) => row.part === body.part))
    .some((one) => digestOf(signedTextOf(opened, { ...body, occurrence: one.occurrence, meaning })) === body.digest);

/** An operation done elsewhere is confirmed, not signed. */
const importedRefusal = ({ record, key, rule, planned }: OpenedMilestone): Refused | null =>
  planned?.state === 'partly-signed' &&
  rule.repeats.length === 0 &&
  record.imported.some((row) => row.is_unverified === 1 && (row.milestone === key || row.milestone === rule.id))
    ? refused('milestone-state-refuses', {
        detail: 'This was done elsewhere; a surgeon confirms it.',
        extra: { reason: 'imported' },
      })
    : null;

const refusalOf = (opened: OpenedMilestone, body: Body, prepared: PreparedSigning): Refused | null => {
  const stray = body.overrides.findIndex(
    ({ check }) =>
      !opened.rule.evidence.some((field) => field.name === check) &&
      !opened.rule.prerequisites.some((need) => need.milestone === check.split(':')[0]),
  );
  if (stray >= 0) return fieldRefused(`/overrides/${stray}/check`, 'This is not a check of this milestone.');
  const refusal = signingRefusal(prepared.faults);
  if (refusal?.problem === 'milestone-already-signed') return signedAlready(opened, body.part);
  if (refusal !== null && refusal.problem !== 'milestone-not-ready') return refusal;
  // Said first: whoever was faster, not what the next occurrence would still lack.
  if (body.digest !== prepared.digest && isSignedMeanwhile(opened, body, prepared.meaning))
    return signedAlready(opened, body.part);
  if (refusal !== null) return refusal;
  return body.digest === prepared.digest
    ? null
    : refused('signed-content-changed', {
        detail: 'Read it again before you sign.',
        extra: { current: { digest: prepared.digest } },
      });
};

const signatureOf = (
  ask: Ask,
  opened: OpenedMilestone,
  prepared: PreparedSigning,
  role: string,
  draftedByName: string | null,
): Signature => ({
  id: ask.services.newId(),
  milestone: opened.key,
  part: ask.body.part,
  occurrence: prepared.occurrence,
  performedOn: ask.body.performedOn,
  signedAt: ask.now,
  signerId: ask.actor.id,
  signerName: ask.actor.name,
  signerRole: role,
  meaning: prepared.meaning,
  values: ask.body.values,
  draftedByName,
  overrides: ask.body.overrides,
  protocolVersion: opened.record.child.protocol_version,
  digest: prepared.digest,
  amends: null,
  amendReason: null,
});

/** The act of signing; a draft by somebody else leaves its author's name beside the signer's. */
const signedEvent = async (
  ask: Ask,
  opened: OpenedMilestone,
  prepared: PreparedSigning,
  signedAs: Signer,
): Promise<TrailEvent> => {
  const draft = opened.record.drafts.find(
    (one) => one.milestone === opened.key && one.part === ask.body.part && one.by_id !== ask.actor.id,
  );
  const draftedBy = draft === undefined ? null : await findPerson(ask.trx, draft.by_id);
  const signature = signatureOf(ask, opened, prepared, roleOfSigner(signedAs, ask.actor), draftedBy?.name ?? null);
  return {
    kind: 'milestone-signed',
    childId: ask.params.childId,
    milestone: opened.key,
    before: { state: opened.planned?.state ?? null },
    after: {
      signature,
      draftedById: draft?.by_id ?? null,
      previousDigest: opened.record.signatures.at(-1)?.digest ?? firstHash,
      signedText: prepared.text,
      signedOn: ask.today,
    },
  };
};

/** An operation that came before its booked day needs that day no longer; a booking left ahead would ask for it again. */
const bookingOvertaken = (ask: Ask, { record, rule, key, occurrences }: OpenedMilestone): TrailEvent[] => {
  const booking = record.bookings.find((row) => row.milestone === key);
  if (!rule.isOperation || booking === undefined || booking.booked_on <= ask.body.performedOn) return [];
  const signed = halfSigned(occurrences, key)?.standing.map((row) => row.part) ?? [];
  if (!rule.signatures.every(({ part }) => part === ask.body.part || signed.includes(part))) return [];
  return [
    {
      kind: 'booking-removed',
      childId: ask.params.childId,
      milestone: key,
      before: { on: booking.booked_on },
      after: { reason: 'Done before the booked day' },
    },
  ];
};

export const signMilestoneEndpoint = endpoint<typeof signMilestone>({
  operation: signMilestone,
  can: { action: 'sign', subject: 'Milestone' },
  confirmsPassword: true,
  handle: async (ask) => {
    const { trx, actor, ability, body, params, today } = ask;
    const opened = await openMilestone(ask, params);
    if (opened.kind === 'refused') return opened;
    const unknown = partRefusal(opened.rule, body.part);
    if (unknown !== null) return unknown;
    if (!canMilestone(ability, 'sign', subjectOfPart(opened, body.part)))
      return refused('not-allowed', { detail: 'This is for somebody of another discipline to sign.' });
    const errors = unknownFieldFaults(opened.rule, body.part, body.values);
    if (errors.length > 0) return refused('bad-input', { errors });
    const prepared = prepareSigning(opened, actor, body, today);
    const refusal = importedRefusal(opened) ?? refusalOf(opened, body, prepared);
    if (refusal !== null) return refusal;
    if (prepared.signedAs === null) return refused('not-allowed');
    const event = await signedEvent(ask, opened, prepared, prepared.signedAs);
    return done([event, ...bookingOvertaken(ask, opened)], () => viewPathway(trx, params.childId, actor));
  },
});
