import { stayedActive } from '@weftway/contract/session';
import { endpoint } from '../http/endpoint.ts';
import { answered } from '../http/outcome.ts';
import { sessionOf } from './session-view.ts';

export const stayedActiveEndpoint = endpoint<typeof stayedActive>({
  operation: stayedActive,
  can: 'signed-in',
  inTransaction: false,
  handle: async ({ services, request, actor, today, now }) => {
    request.session.activeAt = now;
    return answered(await sessionOf({ services, request, actor, today }));
  },
});
