/** Makes a version the one that new children follow; moves the others only when asked to. */
import { activateProtocol } from '@weftway/contract/protocol';
import { endpoint } from '../http/endpoint.ts';
import { done, refused } from '../http/outcome.ts';
import type { TrailEvent } from '../trail/trail-event.ts';
import { moveEvents } from './moved-children.ts';
import { activeProtocolVersion } from './protocol-store.ts';
import { protocolHeadOf } from './protocol-view.ts';

export const activateProtocolEndpoint = endpoint<typeof activateProtocol>({
  operation: activateProtocol,
  can: { action: 'activate', subject: 'Protocol' },
  confirmsPassword: true,
  handle: async ({ trx, params, body, today }) => {
    const { version } = params;
    const head = await protocolHeadOf(trx, version);
    if (head === null) return refused('not-found');
    if (head.status === 'active') return refused('already-done', { detail: `Version ${version} is the active one.` });
    const activated: TrailEvent = {
      kind: 'protocol-activated',
      before: { version: await activeProtocolVersion(trx) },
      after: { version, agreedBy: body.agreedBy, reason: body.reason },
    };
    const moved = body.moveOpenChildren
      ? await moveEvents(trx, version, `Protocol ${version} became the active one: ${body.reason}`, today)
      : [];
    return done([activated, ...moved], async () => (await protocolHeadOf(trx, version)) ?? head);
  },
});
