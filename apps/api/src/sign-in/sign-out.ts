import { signOut } from '@weftway/contract/session';
import { endpoint } from '../http/endpoint.ts';
import { done } from '../http/outcome.ts';
import { leaveSession } from './session-start.ts';
import { signedOut } from './signed-out.ts';
import { sessionOf } from './session-view.ts';

/** The session ends even when the trail cannot take its line. */
export const signOutEndpoint = endpoint<typeof signOut>({
  operation: signOut,
  can: 'anyone',
  handle: async ({ services, actor, request, response, today }) => {
    await leaveSession(request);
    response.setHeader('Clear-Site-Data', '"cache"');
    const events = actor === null ? [] : [signedOut(actor.id, 'signed-out', 1)];
    return done(events, () => sessionOf({ services, request, actor: null, today, renewsToken: true }));
  },
});
