import { canMilestone } from '@weftway/abilities/ability-for';
import { releaseMilestone } from '@weftway/contract/pathway';
import { endpoint } from '../http/endpoint.ts';
import { done, refused } from '../http/outcome.ts';
import { claimOf, openMilestone, partRefusal, subjectOfPart } from './open-pathway.ts';
import { viewPathway } from './pathway-view.ts';

export const releaseMilestoneEndpoint = endpoint<typeof releaseMilestone>({
  operation: releaseMilestone,
  can: { action: 'release', subject: 'Milestone' },
  handle: async (ask) => {
    const { trx, actor, ability, body, params } = ask;
    const opened = await openMilestone(ask, params);
    if (opened.kind === 'refused') return opened;
    const unknown = partRefusal(opened.rule, body.part);
    if (unknown !== null) return unknown;
    const held = claimOf(opened.record, opened.key, body.part);
    if (held === null) return refused('milestone-not-yours', { detail: 'Nobody holds this.' });
    if (!canMilestone(ability, 'release', subjectOfPart(opened, body.part))) {
      return refused('milestone-not-yours', {
        detail: 'Somebody else holds this; they or the coordinator can hand it over.',
        extra: { current: { milestone: held.milestone, part: held.part, memberId: held.member_id, since: held.since } },
      });
    }
    return done(
      [
        {
          kind: 'milestone-released',
          childId: params.childId,
          milestone: opened.key,
          memberId: held.member_id,
          before: { holder: held.member_id, since: held.since },
          after: { part: body.part, memberId: held.member_id, reason: body.reason },
        },
      ],
      () => viewPathway(trx, params.childId, actor),
    );
  },
});
