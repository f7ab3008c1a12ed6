import { canMilestone } from '@weftway/abilities/ability-for';
import { saveDraft } from '@weftway/contract/pathway';
import { endpoint } from '../http/endpoint.ts';
import { done, fieldRefused, refused } from '../http/outcome.ts';
import { isPartSigned } from './claim-milestone.ts';
import { dayFaults, unknownFieldFaults, valueFieldFaults } from './evidence-checks.ts';
import { occurrenceToSign, openMilestone, partRefusal, subjectOfPart } from './open-pathway.ts';
import { draftFor, viewPathway } from './pathway-view.ts';
import { hiddenFields, keepHidden } from './private-evidence.ts';
import { evidenceOf } from './signed-entries.ts';
import { stateRefusal } from './state-refusal.ts';

/** The version of a draft is that of the draft itself, 0 while there is none; a colleague's later draft is never lost. */
export const saveDraftEndpoint = endpoint<typeof saveDraft>({
  operation: saveDraft,
  can: { action: 'draft', subject: 'Milestone' },
  handle: async (ask) => {
    const { trx, actor, ability, body, params, ifMatch, today } = ask;
    const opened = await openMilestone(ask, params);
    if (opened.kind === 'refused') return opened;
    const { record, rule, key, facts } = opened;
    const unknown = partRefusal(rule, body.part);
    if (unknown !== null) return unknown;
    const subject = subjectOfPart(opened, body.part);
    if (!canMilestone(ability, 'draft', subject))
      return refused('not-allowed', { detail: 'This is for somebody of another discipline to prepare.' });
    const refusal = stateRefusal(opened, 'record');
    if (refusal !== null) return refusal;
    if (isPartSigned(opened, body.part))
      return refused('milestone-state-refuses', {
        detail: 'This part is signed already.',
        extra: { reason: 'already-signed' },
      });
    const hidden = hiddenFields(rule, actor, record.child.lead_clinician_id);
    const stored = record.drafts.find((draft) => draft.milestone === key && draft.part === body.part) ?? null;
    if ((stored?.version ?? 0) !== ifMatch) {
      return refused('changed-meanwhile', {
        detail: 'Compare the two drafts and keep the one that holds.',
        extra: { current: draftFor(record, key, body.part, hidden) },
      });
    }
    const errors = [
      ...unknownFieldFaults(rule, body.part, body.values),
      ...valueFieldFaults(rule, body.part, body.values),
      ...dayFaults(rule, body.performedOn, facts, today, '/performedOn'),
    ];
    if (errors.length > 0) return refused('bad-input', { errors });
    if (body.isReady && canMilestone(ability, 'sign', subject))
      return fieldRefused('/isReady', 'You can sign this yourself.');
    const before = stored === null ? null : evidenceOf(stored);
    return done(
      [
        {
          kind: 'draft-saved',
          childId: params.childId,
          milestone: key,
          memberId: actor.id,
          before:
            stored === null
              ? null
              : {
                  values: before,
                  performedOn: stored.performed_on,
                  isReady: stored.is_ready === 1,
                  byId: stored.by_id,
                },
          after: {
            part: body.part,
            occurrence: occurrenceToSign(opened),
            values: keepHidden(body.values, before, hidden),
            performedOn: body.performedOn,
            isReady: body.isReady,
          },
        },
      ],
      () => viewPathway(trx, params.childId, actor),
    );
  },
});
