import { listMySessions } from '@weftway/contract/session';
import { endpoint } from '../http/endpoint.ts';
import { answered } from '../http/outcome.ts';
import { isThisSession, sessionsOfMember } from './session-view.ts';

export const listMySessionsEndpoint = endpoint<typeof listMySessions>({
  operation: listMySessions,
  can: 'signed-in',
  handle: async ({ trx, actor, request }) => {
    const sessions = await sessionsOfMember(trx, actor.id);
    return answered({
      sessions: sessions.map((stored) => ({
        id: stored.id,
        startedAt: stored.startedAt,
        seenAt: stored.activeAt,
        device: stored.device,
        isThis: isThisSession(stored, request),
      })),
    });
  },
});
