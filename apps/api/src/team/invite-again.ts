import { inviteAgain } from '@weftway/contract/member';
import { endpoint } from '../http/endpoint.ts';
import { done, refused } from '../http/outcome.ts';
import { sendInvitation } from './invitation.ts';
import { findMember, memberView } from './member-view.ts';

export const inviteAgainEndpoint = endpoint<typeof inviteAgain>({
  operation: inviteAgain,
  can: { action: 'manage', subject: 'Team' },
  handle: async ({ trx, services, params, actor, request, now }) => {
    const member = await findMember(trx, params.memberId);
    if (member === null) return refused('not-found');
    if (member.status !== 'invited') {
      return refused('already-done', {
        detail: member.status === 'active' ? `${member.name} has joined already.` : `${member.name} has left.`,
      });
    }
    const before = { invitedAt: member.invitedAt };
    return done(
      [{ kind: 'member-invited-again', memberId: member.id, before, after: { invitedAt: now } }],
      async () => {
        await sendInvitation(trx, services, {
          memberId: member.id,
          email: member.email,
          madeById: actor.id,
          request,
          now,
        });
        return memberView(trx, member.id);
      },
    );
  },
});
