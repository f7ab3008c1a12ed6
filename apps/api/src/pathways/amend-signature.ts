import { canMilestone } from '@weftway/abilities/ability-for';
import { amendSignature } from '@weftway/contract/pathway';
import type { Signature } from '@weftway/contract/pathway';
import { signingFaults, signsAs } from '@weftway/pathway/sign-off';
import type { Signing } from '@weftway/pathway/sign-off';
import { endpoint } from '../http/endpoint.ts';
import type { AskOfActor } from '../http/endpoint.ts';
import { done, fieldRefused, refused } from '../http/outcome.ts';
import { digestOf, firstHash } from '../trail/trail-chain.ts';
import { unknownFieldFaults } from './evidence-checks.ts';
import { openMilestone, personOf, subjectOfPart } from './open-pathway.ts';
import type { OpenedMilestone } from './open-pathway.ts';
import type { SignatureRow } from './pathway-store.ts';
import { viewPathway } from './pathway-view.ts';
import type { SignedOccurrence } from './signed-entries.ts';
import { signingRefusal } from './signing-refusal.ts';
import { givenOf, roleOfSigner, signedTextOf } from './signing.ts';

type Ask = AskOfActor<typeof amendSignature>;

/** An amendment is judged as a signature of the same part, beside the other part; gates and checks were judged before. */
const signingFor = (ask: Ask, opened: OpenedMilestone, old: SignatureRow, group: SignedOccurrence): Signing => ({
  rule: opened.rule,
  part: old.part,
  signer: personOf(opened.record, ask.actor),
  values: ask.body.values,
  performedOn: ask.body.performedOn,
  today: ask.today,
  birth: opened.facts.birth,
  planned: { key: opened.key, state: 'open', waitsFor: [], isLapsed: false },
  given: givenOf(
    opened,
    group.standing.filter((row) => row.part !== old.part),
  ),
  overrides: JSON.parse(old.overrides) as Signature['overrides'], // written from the contract's schema
});

const amendedOf = (
  ask: Ask,
  opened: OpenedMilestone,
  old: SignatureRow,
  role: string,
): { readonly signature: Signature; readonly text: string } => {
  const { performedOn, values, reason } = ask.body;
  const text = signedTextOf(opened, {
    part: old.part,
    occurrence: old.occurrence,
    meaning: old.meaning,
    performedOn,
    values,
    amends: old.id,
    amendReason: reason,
  });
  const signature: Signature = {
    id: ask.services.newId(),
    milestone: old.milestone,
    part: old.part,
    occurrence: old.occurrence,
    performedOn,
    signedAt: ask.now,
    signerId: ask.actor.id,
    signerName: ask.actor.name,
    signerRole: role,
    meaning: old.meaning,
    values,
    draftedByName: null,
    overrides: JSON.parse(old.overrides) as Signature['overrides'], // written from the contract's schema
    protocolVersion: opened.record.child.protocol_version,
    digest: digestOf(text),
    amends: old.id,
    amendReason: reason,
  };
  return { signature, text };
};

export const amendSignatureEndpoint = endpoint<typeof amendSignature>({
  operation: amendSignature,
  can: { action: 'amend', subject: 'Milestone' },
  confirmsPassword: true,
  handle: async (ask) => {
    const { trx, actor, ability, body, params, today } = ask;
    const opened = await openMilestone(ask, params);
    if (opened.kind === 'refused') return opened;
    const group = opened.occurrences.find(
      (one) => one.milestone === opened.key && one.entries.some((row) => row.id === body.signatureId),
    );
    const old = group?.entries.find((row) => row.id === body.signatureId);
    if (group === undefined || old === undefined)
      return fieldRefused('/signatureId', 'There is no such signature of this milestone.');
    if (!canMilestone(ability, 'amend', subjectOfPart(opened, old.part)))
      return refused('not-allowed', { detail: 'This is for somebody who could have signed it to amend.' });
    if (!group.standing.includes(old))
      return refused('milestone-state-refuses', {
        detail: 'This entry was amended already; amend the newer one.',
        extra: { reason: 'amended' },
      });
    const errors = unknownFieldFaults(opened.rule, old.part, body.values);
    if (errors.length > 0) return refused('bad-input', { errors });
    const signing = signingFor(ask, opened, old, group);
    const refusal = signingRefusal(signingFaults(signing));
    if (refusal !== null) return refusal;
    const signedAs = signsAs(signing);
    if (signedAs === null) return refused('not-allowed');
    const { signature, text } = amendedOf(ask, opened, old, roleOfSigner(signedAs, actor));
    return done(
      [
        {
          kind: 'signature-amended',
          childId: params.childId,
          milestone: opened.key,
          before: { signatureId: old.id, performedOn: old.performed_on, digest: old.digest },
          after: {
            signature,
            previousDigest: opened.record.signatures.at(-1)?.digest ?? firstHash,
            signedText: text,
            signedOn: today,
          },
        },
      ],
      () => viewPathway(trx, params.childId, actor),
    );
  },
});
