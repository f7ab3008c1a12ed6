import { acceptInvitation } from '@weftway/contract/session';
import { endpoint } from '../http/endpoint.ts';
import { done, fieldRefused, refused } from '../http/outcome.ts';
import { findMember } from '../team/member-view.ts';
import { keepPasswordHash } from './credential-store.ts';
import { findLink, useLink, voidLinks } from './mailed-link-store.ts';
import { hashPassword } from './password-hash.ts';
import { passwordFaultFor } from './password-fault-for.ts';

export const acceptInvitationEndpoint = endpoint<typeof acceptInvitation>({
  operation: acceptInvitation,
  can: 'anyone',
  handle: async ({ trx, services, body, now }) => {
    const link = await findLink(trx, 'invitation', body.token, now);
    const member = link === null ? null : await findMember(trx, link.memberId);
    if (link === null || member === null || member.status !== 'invited') return refused('link-not-valid');
    const fault = await passwordFaultFor(trx, member, body.password);
    if (fault !== null) return fieldRefused('/password', fault);
    const hash = await hashPassword(body.password);
    const events = [
      { kind: 'member-joined', memberId: member.id, after: {} },
      { kind: 'password-set', memberId: member.id, after: {} },
    ] as const;
    return {
      ...done(events, async () => ({ done: true as const })),
      secrets: async (inner) => {
        if (!(await useLink(inner, link, services.now().toISOString()))) return refused('link-not-valid');
        await voidLinks(inner, member.id, now);
        await keepPasswordHash(inner, member.id, hash, now);
        return null;
      },
    };
  },
});
