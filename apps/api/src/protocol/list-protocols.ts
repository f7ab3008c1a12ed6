import { listProtocols } from '@weftway/contract/protocol';
import { endpoint } from '../http/endpoint.ts';
import { answered } from '../http/outcome.ts';
import { listProtocolHeads } from './protocol-view.ts';

export const listProtocolsEndpoint = endpoint<typeof listProtocols>({
  operation: listProtocols,
  can: { action: 'read', subject: 'Protocol' },
  handle: async ({ trx }) => answered({ protocols: await listProtocolHeads(trx) }),
});
