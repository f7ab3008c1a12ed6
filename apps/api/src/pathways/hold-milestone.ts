import { canMilestone } from '@weftway/abilities/ability-for';
import { holdMilestone } from '@weftway/contract/pathway';
import { endpoint } from '../http/endpoint.ts';
import { done, fieldRefused, refused } from '../http/outcome.ts';
import { openMilestone, subjectOfWhole } from './open-pathway.ts';
import { viewPathway } from './pathway-view.ts';
import { stateRefusal } from './state-refusal.ts';

export const holdMilestoneEndpoint = endpoint<typeof holdMilestone>({
  operation: holdMilestone,
  can: { action: 'hold', subject: 'Milestone' },
  handle: async (ask) => {
    const { trx, actor, ability, body, params, today } = ask;
    const opened = await openMilestone(ask, params);
    if (opened.kind === 'refused') return opened;
    if (!canMilestone(ability, 'hold', subjectOfWhole(opened)))
      return refused('not-allowed', { detail: 'Pausing this is for a clinician who could sign it.' });
    const refusal = stateRefusal(opened);
    if (refusal !== null) return refusal;
    const stored = opened.record.holds.find((row) => row.milestone === opened.key) ?? null;
    const place = {
      childId: params.childId,
      milestone: opened.key,
      before: stored === null ? null : { reason: stored.reason, reviewOn: stored.review_on },
    };
    const view = () => viewPathway(trx, params.childId, actor);
    if (body.hold === null) {
      return stored === null
        ? refused('milestone-state-refuses', { detail: 'This is not on hold.', extra: { reason: 'not-held' } })
        : done([{ kind: 'hold-lifted', ...place, after: { reason: '' } }], view);
    }
    if (body.hold.reviewOn <= today) return fieldRefused('/hold/reviewOn', 'The day of review must lie ahead.');
    return done(
      [
        {
          kind: 'milestone-held',
          ...place,
          after: { reason: body.hold.reason, heldOn: today, reviewOn: body.hold.reviewOn },
        },
      ],
      view,
    );
  },
});
