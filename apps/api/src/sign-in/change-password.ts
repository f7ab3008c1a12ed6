import { changePassword } from '@weftway/contract/session';
import { endpoint } from '../http/endpoint.ts';
import { done, fieldRefused } from '../http/outcome.ts';
import { passwordChangedLetter } from '../mail/mail-texts.ts';
import { queueMail } from '../mail/outbox-store.ts';
import { teamName } from '../team/member-view.ts';
import { keepPasswordHash } from './credential-store.ts';
import { hashPassword } from './password-hash.ts';
import { passwordFaultFor } from './password-fault-for.ts';
import { isPasswordOf } from './prove-password.ts';
import { startSession } from './session-start.ts';
import { storedIdOf } from './session-store.ts';
import { endingSessions } from './signed-out.ts';
import { endSessionsOf } from './sessions-store.ts';

/** Ends the member's other sessions and gives this one a new id. */
export const changePasswordEndpoint = endpoint<typeof changePassword>({
  operation: changePassword,
  can: 'signed-in',
  inTransaction: false,
  handle: async ({ trx, services, body, actor, request, now }) => {
    const proof = await isPasswordOf(services, actor, body.current, '/current');
    if (proof !== null) return proof;
    const fault =
      body.next === body.current ? 'This is the password you have now.' : await passwordFaultFor(trx, actor, body.next);
    if (fault !== null) return fieldRefused('/next', fault);
    const hash = await hashPassword(body.next);
    const startedAt = request.session.startedAt ?? now;
    return {
      ...done(
        [
          { kind: 'password-changed', memberId: actor.id, after: {} },
          ...(await endingSessions(trx, actor.id, 'password', storedIdOf(request.sessionID))),
        ],
        async () => {
          await startSession(request, actor, startedAt, now);
          return { done: true as const };
        },
      ),
      secrets: async (inner) => {
        await keepPasswordHash(inner, actor.id, hash, now);
        await endSessionsOf(inner, actor.id, null);
        await queueMail(inner, {
          ...passwordChangedLetter(await teamName(inner)),
          id: services.newId(),
          to: actor.email,
          at: now,
        });
        return null;
      },
    };
  },
});
