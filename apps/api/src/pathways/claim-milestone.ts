import { canMilestone } from '@weftway/abilities/ability-for';
import { claimMilestone } from '@weftway/contract/pathway';
import { endpoint } from '../http/endpoint.ts';
import { done, refused } from '../http/outcome.ts';
import { findPerson } from './members-store.ts';
import { claimOf, openMilestone, partRefusal, subjectOfPart } from './open-pathway.ts';
import type { OpenedMilestone } from './open-pathway.ts';
import { viewPathway } from './pathway-view.ts';
import { halfSigned } from './signed-entries.ts';
import { beginRefusal } from './state-refusal.ts';

export const isPartSigned = ({ occurrences, key }: OpenedMilestone, part: string): boolean =>
  halfSigned(occurrences, key)?.standing.some((row) => row.part === part) ?? false;

export const claimMilestoneEndpoint = endpoint<typeof claimMilestone>({
  operation: claimMilestone,
  can: { action: 'claim', subject: 'Milestone' },
  handle: async (ask) => {
    const { trx, actor, ability, body, params } = ask;
    const opened = await openMilestone(ask, params);
    if (opened.kind === 'refused') return opened;
    const view = () => viewPathway(trx, params.childId, actor);
    const unknown = partRefusal(opened.rule, body.part);
    if (unknown !== null) return unknown;
    if (!canMilestone(ability, 'claim', subjectOfPart(opened, body.part))) {
      return refused('not-allowed', { detail: 'This is for somebody of another discipline to take on.' });
    }
    const held = claimOf(opened.record, opened.key, body.part);
    if (held?.member_id === actor.id) return done([], view);
    if (held !== null) {
      const holder = await findPerson(trx, held.member_id);
      return refused('milestone-already-claimed', {
        detail: `${holder?.name ?? 'Somebody'} holds this already.`,
        extra: {
          current: { milestone: held.milestone, part: held.part, memberId: held.member_id, since: held.since },
          holder: holder?.name ?? null,
        },
      });
    }
    const refusal = beginRefusal(opened, 'record');
    if (refusal !== null) return refusal;
    if (isPartSigned(opened, body.part))
      return refused('milestone-state-refuses', {
        detail: 'This part is signed already.',
        extra: { reason: 'already-signed' },
      });
    return done(
      [
        {
          kind: 'milestone-claimed',
          childId: params.childId,
          milestone: opened.key,
          memberId: actor.id,
          before: { holder: null },
          after: { part: body.part, memberId: actor.id },
        },
      ],
      view,
    );
  },
});
