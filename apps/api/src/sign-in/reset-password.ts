import { resetPassword } from '@weftway/contract/session';
import { endpoint } from '../http/endpoint.ts';
import { done, fieldRefused, refused } from '../http/outcome.ts';
import { findMember, teamName } from '../team/member-view.ts';
import { passwordChangedLetter } from '../mail/mail-texts.ts';
import { queueMail } from '../mail/outbox-store.ts';
import { keepPasswordHash } from './credential-store.ts';
import { accountKey, forgetAttempts, proofKey } from './guessing.ts';
import { findLink, useLink, voidLinks } from './mailed-link-store.ts';
import { hashPassword } from './password-hash.ts';
import { passwordFaultFor } from './password-fault-for.ts';
import { endingSessions } from './signed-out.ts';
import { endSessionsOf } from './sessions-store.ts';

/** Ends every session and the wait after wrong guesses: the owner can always get back in this way. */
export const resetPasswordEndpoint = endpoint<typeof resetPassword>({
  operation: resetPassword,
  can: 'anyone',
  handle: async ({ trx, services, body, now }) => {
    const link = await findLink(trx, 'reset', body.token, now);
    const member = link === null ? null : await findMember(trx, link.memberId);
    if (link === null || member === null || member.status !== 'active') return refused('link-not-valid');
    const fault = await passwordFaultFor(trx, member, body.password);
    if (fault !== null) return fieldRefused('/password', fault);
    const hash = await hashPassword(body.password);
    return {
      ...done(
        [
          { kind: 'password-set', memberId: member.id, after: {} },
          ...(await endingSessions(trx, member.id, 'password')),
        ],
        async () => ({ done: true as const }),
      ),
      secrets: async (inner) => {
        if (!(await useLink(inner, link, services.now().toISOString()))) return refused('link-not-valid');
        await voidLinks(inner, member.id, now, 'reset');
        await keepPasswordHash(inner, member.id, hash, now);
        await endSessionsOf(inner, member.id, null);
        await queueMail(inner, {
          ...passwordChangedLetter(await teamName(inner)),
          id: services.newId(),
          to: member.email,
          at: now,
        });
        await forgetAttempts(inner, accountKey(member.email));
        await forgetAttempts(inner, proofKey(member.id));
        return null;
      },
    };
  },
});
