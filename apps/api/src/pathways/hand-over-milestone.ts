import { abilityFor, canMilestone } from '@weftway/abilities/ability-for';
import { handOverMilestone } from '@weftway/contract/pathway';
import { endpoint } from '../http/endpoint.ts';
import type { AskOfActor } from '../http/endpoint.ts';
import { done, fieldRefused, refused } from '../http/outcome.ts';
import type { Refused } from '../http/outcome.ts';
import { isPartSigned } from './claim-milestone.ts';
import { findPerson } from './members-store.ts';
import { claimOf, openMilestone, partRefusal, subjectOfPart } from './open-pathway.ts';
import type { OpenedMilestone } from './open-pathway.ts';
import { viewPathway } from './pathway-view.ts';
import { beginRefusal } from './state-refusal.ts';

type Ask = AskOfActor<typeof handOverMilestone>;

/** Refuses when the asker may not hand this over, or read another holder than the present one. */
const holderRefusal = async ({ trx, ability, body }: Ask, opened: OpenedMilestone): Promise<Refused | null> => {
  const held = claimOf(opened.record, opened.key, body.part);
  const current =
    held === null ? null : { milestone: held.milestone, part: held.part, memberId: held.member_id, since: held.since };
  if (!canMilestone(ability, 'hand-over', subjectOfPart(opened, body.part))) {
    return held === null
      ? refused('not-allowed', { detail: 'The coordinator hands out what nobody holds.' })
      : refused('milestone-not-yours', { detail: 'Its holder or the coordinator hands it over.', extra: { current } });
  }
  if ((held?.member_id ?? null) === body.from) return null;
  const holder = held === null ? null : await findPerson(trx, held.member_id);
  return refused('milestone-already-claimed', {
    detail: holder === null ? 'Nobody holds this any more.' : `${holder.name} holds this now.`,
    extra: { current, holder: holder?.name ?? null },
  });
};

/** The target must be on the team today and be one who may hold it. */
const targetRefusal = async ({ trx, body }: Ask, opened: OpenedMilestone): Promise<Refused | null> => {
  const target = await findPerson(trx, body.to);
  if (target?.isActive !== true) return fieldRefused('/to', 'Choose somebody who is on the team today.');
  return canMilestone(abilityFor(target), 'claim', subjectOfPart(opened, body.part))
    ? null
    : fieldRefused('/to', `${target.name} may not hold this.`);
};

export const handOverMilestoneEndpoint = endpoint<typeof handOverMilestone>({
  operation: handOverMilestone,
  can: { action: 'hand-over', subject: 'Milestone' },
  handle: async (ask) => {
    const { trx, actor, body, params } = ask;
    const opened = await openMilestone(ask, params);
    if (opened.kind === 'refused') return opened;
    const refusal =
      partRefusal(opened.rule, body.part) ??
      (await holderRefusal(ask, opened)) ??
      (await targetRefusal(ask, opened)) ??
      beginRefusal(opened, 'record');
    if (refusal !== null) return refusal;
    if (isPartSigned(opened, body.part))
      return refused('milestone-state-refuses', {
        detail: 'This part is signed already.',
        extra: { reason: 'already-signed' },
      });
    const { part, from, to } = body;
    const events =
      to === from
        ? []
        : [
            {
              kind: 'milestone-handed-over' as const,
              childId: params.childId,
              milestone: opened.key,
              memberId: to,
              before: { holder: from },
              after: { part, from, to, reason: '' },
            },
          ];
    return done(events, () => viewPathway(trx, params.childId, actor));
  },
});
