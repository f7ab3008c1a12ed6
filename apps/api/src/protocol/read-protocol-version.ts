import { readProtocolVersion } from '@weftway/contract/protocol';
import { endpoint } from '../http/endpoint.ts';
import { answered, refused } from '../http/outcome.ts';
import { loadProtocol } from './protocol-store.ts';
import { protocolHeadOf } from './protocol-view.ts';

export const readProtocolVersionEndpoint = endpoint<typeof readProtocolVersion>({
  operation: readProtocolVersion,
  can: { action: 'read', subject: 'Protocol' },
  handle: async ({ trx, params }) => {
    const head = await protocolHeadOf(trx, params.version);
    return head === null ? refused('not-found') : answered({ head, protocol: await loadProtocol(trx, params.version) });
  },
});
