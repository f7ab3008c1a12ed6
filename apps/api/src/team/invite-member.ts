import { inviteMember } from '@weftway/contract/member';
import { endpoint } from '../http/endpoint.ts';
import { done, refused } from '../http/outcome.ts';
import { sendInvitation } from './invitation.ts';
import { memberFaults } from './member-rules.ts';
import { findMemberByEmail, listMemberViews, memberView } from './member-view.ts';
import { emailTaken } from './email-taken.ts';

export const inviteMemberEndpoint = endpoint<typeof inviteMember>({
  operation: inviteMember,
  can: { action: 'manage', subject: 'Team' },
  handle: async ({ trx, services, body, actor, request, now }) => {
    const errors = memberFaults(body, null, await listMemberViews(trx));
    if (errors.length > 0) return refused('bad-input', { errors });
    const known = await findMemberByEmail(trx, body.email);
    if (known !== null) return emailTaken(known);
    const id = services.newId();
    return done([{ kind: 'member-invited', memberId: id, after: { fields: body, invitedAt: now } }], async () => {
      await sendInvitation(trx, services, { memberId: id, email: body.email, madeById: actor.id, request, now });
      return memberView(trx, id);
    });
  },
});
