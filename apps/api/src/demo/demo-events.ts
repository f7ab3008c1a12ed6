/** The acts of the sample children as events of the trail. */
import { signedContentOf } from './demo-digest.ts';
import type { SampleAct } from '@weftway/sample-team/sample-acts';
import type { MilestoneRule } from '@weftway/pathway/protocol';
import type { Signature } from '@weftway/contract/pathway';
import type { TrailEvent } from '../trail/trail-event.ts';

export interface DemoActor {
  readonly name: string;
  readonly role: string;
}

export interface DemoSetting {
  readonly rules: ReadonlyMap<string, MilestoneRule>;
  readonly actors: ReadonlyMap<string, DemoActor>;
  readonly protocolVersion: number;
  /** Digest of the last signature of each child. */
  readonly lastDigests: Map<string, string>;
  readonly newId: () => string;
}

const nothingBefore = '0'.repeat(64);

const signedEvent = (childId: string, act: Extract<SampleAct, { kind: 'sign' }>, setting: DemoSetting): TrailEvent => {
  const rule = setting.rules.get(act.milestone.split(':')[0] ?? '');
  const part = rule?.signatures.find((one) => one.part === act.part);
  const signer = setting.actors.get(act.signerId);
  const bare: Omit<Signature, 'digest'> = {
    id: setting.newId(),
    milestone: act.milestone,
    part: act.part,
    occurrence: act.occurrence,
    performedOn: act.performedOn as Signature['performedOn'], // a date of the planner
    signedAt: act.at,
    signerId: act.signerId,
    signerName: signer?.name ?? '',
    signerRole: signer?.role ?? '',
    meaning: part?.meaning ?? 'performed',
    values: act.values,
    draftedByName: act.draftedById === null ? null : (setting.actors.get(act.draftedById)?.name ?? null),
    overrides: [],
    protocolVersion: setting.protocolVersion,
    amends: null,
    amendReason: null,
  };
  const previousDigest = setting.lastDigests.get(childId) ?? nothingBefore;
  const { digest, signedText } = signedContentOf(childId, bare);
  setting.lastDigests.set(childId, digest);
  return {
    kind: 'milestone-signed',
    childId,
    milestone: act.milestone,
    after: {
      signature: { ...bare, digest },
      draftedById: act.draftedById,
      previousDigest,
      signedOn: act.at.slice(0, 10),
      signedText,
    },
  };
};

export const demoEvents = (childId: string, act: SampleAct, setting: DemoSetting): TrailEvent[] => {
  switch (act.kind) {
    case 'register':
      return [
        { kind: 'child-registered', childId, after: { fields: act.fields, protocolVersion: setting.protocolVersion } },
      ];
    case 'assign':
      return [{ kind: 'trainees-assigned', childId, after: { memberIds: act.memberIds } }];
    case 'claim':
      return [
        {
          kind: 'milestone-claimed',
          childId,
          milestone: act.milestone,
          after: { part: act.part, memberId: act.memberId },
        },
      ];
    case 'release':
      return [
        {
          kind: 'milestone-released',
          childId,
          milestone: act.milestone,
          after: { part: act.part, memberId: act.memberId, reason: act.reason },
        },
      ];
    case 'sign':
      return [signedEvent(childId, act, setting)];
    case 'draft':
      return [
        {
          kind: 'draft-saved',
          childId,
          milestone: act.milestone,
          after: {
            part: act.part,
            occurrence: act.occurrence,
            values: act.values,
            performedOn: act.performedOn,
            isReady: act.isReady,
          },
        },
      ];
    case 'hold':
      return [
        {
          kind: 'milestone-held',
          childId,
          milestone: act.milestone,
          after: { reason: act.reason, heldOn: act.heldOn, reviewOn: act.reviewOn },
        },
      ];
    case 'waive':
      return [
        {
          kind: 'milestone-waived',
          childId,
          milestone: act.milestone,
          after: {
            id: setting.newId(),
            occurrence: act.occurrence,
            kind: act.waiverKind,
            reason: act.reason,
            note: act.note,
            secondName: null,
            offerAgainOn: null,
            waivedOn: act.waivedOn,
          },
        },
      ];
    case 'book':
      return [{ kind: 'booking-set', childId, milestone: act.milestone, after: { on: act.on, reason: '' } }];
    case 'import':
      return [
        {
          kind: 'history-imported',
          childId,
          milestone: act.milestone,
          after: {
            performedOn: act.performedOn,
            precision: act.precision,
            isUnverified: act.isUnverified,
            results: {},
            source: 'Papers that the family brought',
          },
        },
      ];
    case 'transfer':
      return [{ kind: 'child-transferred', childId, after: { on: act.on, to: act.to, reason: act.reason } }];
    case 'own':
      return [
        {
          kind: 'own-milestone-added',
          childId,
          milestone: act.rule.id,
          after: { rule: act.rule, reason: act.reason, addedOn: act.finding.on },
        },
      ];
  }
};
