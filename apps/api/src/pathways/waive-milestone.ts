import { canMilestone } from '@weftway/abilities/ability-for';
import { waiveMilestone } from '@weftway/contract/pathway';
import type { FieldFault } from '@weftway/contract/problems';
import { waiveFaults } from '@weftway/pathway/sign-off-waive';
import type { WaiveRefusalCode } from '@weftway/pathway/sign-off-waive';
import type { Refusal } from '@weftway/pathway/sign-off-person';
import { endpoint } from '../http/endpoint.ts';
import { done, refused } from '../http/outcome.ts';
import type { Refused } from '../http/outcome.ts';
import { findPersonByName } from './members-store.ts';
import { occurrenceToSign, openMilestone, personOf, subjectOfWhole } from './open-pathway.ts';
import { viewPathway } from './pathway-view.ts';

const pointers: Readonly<Partial<Record<WaiveRefusalCode, string>>> = {
  'reason-missing': '/reason',
  'reason-not-listed': '/reason',
  'second-discipline-needed': '/secondName',
  'offer-again-needed': '/offerAgainOn',
  'offer-again-not-ahead': '/offerAgainOn',
};

const refusalOf = (faults: readonly Refusal<WaiveRefusalCode>[]): Refused | null => {
  if (faults.length === 0) return null;
  const unpointed = faults.find((fault) => pointers[fault.code] === undefined);
  if (unpointed?.code === 'not-your-discipline') return refused('not-allowed', { detail: unpointed.message });
  if (unpointed !== undefined)
    return refused('milestone-state-refuses', { detail: unpointed.message, extra: { reason: unpointed.code } });
  const errors: FieldFault[] = faults.map((fault) => ({ pointer: pointers[fault.code] ?? '', detail: fault.message }));
  return refused('bad-input', { errors });
};

export const waiveMilestoneEndpoint = endpoint<typeof waiveMilestone>({
  operation: waiveMilestone,
  can: { action: 'waive', subject: 'Milestone' },
  confirmsPassword: true,
  handle: async (ask) => {
    const { trx, actor, ability, body, params, today, services } = ask;
    const opened = await openMilestone(ask, params);
    if (opened.kind === 'refused') return opened;
    if (!canMilestone(ability, 'waive', subjectOfWhole(opened)))
      return refused('not-allowed', { detail: 'Waiving this is for a clinician who could sign it.' });
    const secondName = body.secondName === '' ? null : body.secondName;
    // The second decision is another member's, found by name, so that the discipline that the protocol asks for is proved.
    const second = secondName === null ? null : await findPersonByName(trx, secondName);
    const refusal = refusalOf(
      waiveFaults({
        rule: opened.rule,
        planned: opened.planned,
        person: personOf(opened.record, actor),
        second,
        kind: body.kind,
        reason: body.reason,
        offerAgainOn: body.offerAgainOn,
        today,
      }),
    );
    if (refusal !== null) return refusal;
    return done(
      [
        {
          kind: 'milestone-waived',
          childId: params.childId,
          milestone: opened.key,
          before: { state: opened.planned?.state ?? null },
          after: {
            id: services.newId(),
            occurrence: occurrenceToSign(opened),
            kind: body.kind,
            reason: body.reason,
            note: body.note,
            secondName: second?.name ?? secondName,
            offerAgainOn: body.offerAgainOn,
            waivedOn: today,
          },
        },
      ],
      () => viewPathway(trx, params.childId, actor),
    );
  },
});
