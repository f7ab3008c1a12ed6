import { readSession } from '@weftway/contract/session';
import { endpoint } from '../http/endpoint.ts';
import { answered } from '../http/outcome.ts';
import { sessionOf } from './session-view.ts';

/** Brings the token that a change must carry, so this is the one anonymous question that makes a session. */
export const readSessionEndpoint = endpoint<typeof readSession>({
  operation: readSession,
  can: 'anyone',
  handle: async ({ services, request, actor, today }) => answered(await sessionOf({ services, request, actor, today })),
});
