import { signIn } from '@weftway/contract/session';
import { endpoint } from '../http/endpoint.ts';
import { done, refused } from '../http/outcome.ts';
import { limits } from '../limits.ts';
import type { TrailEvent } from '../trail/trail-event.ts';
import { authenticate, startSession } from './session-start.ts';
import { endOldestSessions } from './sessions-store.ts';
import { signedOut } from './signed-out.ts';
import { sessionOf, sessionsOfMember } from './session-view.ts';

export const signInEndpoint = endpoint<typeof signIn>({
  operation: signIn,
  can: 'anyone',
  handle: async ({ services, request, response, today, now }) => {
    const { actor, memberId } = await authenticate(request, response);
    // The same words, and the same work, whether the address is unknown, the password wrong, the account waiting or closed.
    if (actor === null)
      return refused('wrong-credentials', {
        detail: 'Check both and try again. After several tries, wait a little or set a new password.',
        events: [{ kind: 'sign-in-refused', ...(memberId === null ? {} : { memberId }), after: {} }],
      });
    const open = await sessionsOfMember(services.db, actor.id);
    const tooMany = Math.max(0, open.length - limits.sessionsPerMember + 1);
    const events: TrailEvent[] = [
      { kind: 'signed-in', memberId: actor.id, after: {} },
      ...(tooMany === 0 ? [] : [signedOut(actor.id, 'too-many', tooMany)]),
    ];
    // The session starts once the trail has its line.
    return {
      ...done(events, async () => {
        await endOldestSessions(services.db, actor.id);
        await startSession(request, actor, now, now);
        return sessionOf({ services, request, actor, today, renewsToken: true });
      }),
      by: actor,
    };
  },
});
