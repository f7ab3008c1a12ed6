import { canOfMember } from '@weftway/abilities/ability-for';
import { setCover } from '@weftway/contract/member';
import type { Member } from '@weftway/contract/member';
import type { FieldFault } from '@weftway/contract/problems';
import { endpoint } from '../http/endpoint.ts';
import { done, refused } from '../http/outcome.ts';
import { findMember, memberView } from './member-view.ts';

type Cover = Exclude<Member['cover'], null>;

const coverFaults = (cover: Cover, member: Member, colleague: Member | null, today: string): FieldFault[] => {
  const faults: FieldFault[] = [];
  const isColleague =
    colleague !== null &&
    colleague.id !== member.id &&
    colleague.status === 'active' &&
    colleague.standing === 'member';
  if (!isColleague)
    faults.push({ pointer: '/cover/byId', detail: 'Choose a colleague who is a full member of the team.' });
  if (cover.until < cover.from) faults.push({ pointer: '/cover/until', detail: 'The last day lies before the first.' });
  else if (cover.until < today) faults.push({ pointer: '/cover/until', detail: 'This is over already.' });
  return faults;
};

export const setCoverEndpoint = endpoint<typeof setCover>({
  operation: setCover,
  can: { action: 'cover', subject: 'Team' },
  handle: async ({ trx, params, body, ability, today }) => {
    const member = await findMember(trx, params.memberId);
    if (member === null) return refused('not-found');
    if (!canOfMember(ability, 'cover', 'Team', member.id))
      return refused('not-allowed', { detail: 'The coordinator or an administrator sets cover for others.' });
    if (member.status !== 'active') return refused('not-allowed', { detail: `${member.name} has no open account.` });
    if (body.cover !== null) {
      const errors = coverFaults(body.cover, member, await findMember(trx, body.cover.byId), today);
      if (errors.length > 0) return refused('bad-input', { errors });
    }
    return done(
      [{ kind: 'cover-set', memberId: member.id, before: { cover: member.cover }, after: { cover: body.cover } }],
      () => memberView(trx, member.id),
    );
  },
});
