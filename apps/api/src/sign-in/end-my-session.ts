import { endMySession } from '@weftway/contract/session';
import { endpoint } from '../http/endpoint.ts';
import { done, refused } from '../http/outcome.ts';
import { signedOut } from './signed-out.ts';
import { endSession } from './sessions-store.ts';
import { sessionsOfMember } from './session-view.ts';

/** Only the asker's own: anybody else's is not found. */
export const endMySessionEndpoint = endpoint<typeof endMySession>({
  operation: endMySession,
  can: 'signed-in',
  handle: async ({ trx, params, actor }) => {
    const own = await sessionsOfMember(trx, actor.id);
    if (!own.some(({ id }) => id === params.sessionId)) return refused('not-found');
    return done([signedOut(actor.id, 'ended-elsewhere', 1)], async () => {
      await endSession(trx, params.sessionId);
      return { done: true as const };
    });
  },
});
