import { checkProtocol } from '@weftway/contract/protocol';
import { endpoint } from '../http/endpoint.ts';
import { answered } from '../http/outcome.ts';
import { protocolBytes, readSentProtocol } from './protocol-reading.ts';

export const checkProtocolEndpoint = endpoint<typeof checkProtocol>({
  operation: checkProtocol,
  can: { action: 'propose', subject: 'Protocol' },
  bodyLimit: protocolBytes,
  // Nothing is written, so nobody waits for it.
  inTransaction: false,
  handle: async ({ body }) => {
    const reading = readSentProtocol(body.protocol);
    return answered({ faults: reading.ok ? [] : [...reading.faults] });
  },
});
