import { openInvitation } from '@weftway/contract/session';
import { endpoint } from '../http/endpoint.ts';
import { answered, refused } from '../http/outcome.ts';
import { findMember, teamName } from '../team/member-view.ts';
import { findLink } from './mailed-link-store.ts';

/** Shows whom the letter is for; nothing is used up by looking, since mail scanners open links. */
export const openInvitationEndpoint = endpoint<typeof openInvitation>({
  operation: openInvitation,
  can: 'anyone',
  handle: async ({ trx, body, now }) => {
    const link = await findLink(trx, 'invitation', body.token, now);
    const member = link === null ? null : await findMember(trx, link.memberId);
    if (link === null || member === null || member.status !== 'invited') return refused('link-not-valid');
    const inviter = link.madeById === null ? null : await findMember(trx, link.madeById);
    return answered({
      name: member.name,
      email: member.email,
      team: await teamName(trx),
      invitedBy: inviter?.name ?? '',
    });
  },
});
