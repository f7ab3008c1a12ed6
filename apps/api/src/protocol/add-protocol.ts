import { addProtocol } from '@weftway/contract/protocol';
import { endpoint } from '../http/endpoint.ts';
import { done, refused } from '../http/outcome.ts';
import { protocolBytes, readSentProtocol } from './protocol-reading.ts';
import { nextProtocolVersion, protocolHeadOf } from './protocol-view.ts';
import type { ProtocolHead } from './protocol-view.ts';

export const addProtocolEndpoint = endpoint<typeof addProtocol>({
  operation: addProtocol,
  can: { action: 'propose', subject: 'Protocol' },
  bodyLimit: protocolBytes,
  handle: async ({ trx, body }) => {
    const reading = readSentProtocol(body.protocol);
    if (!reading.ok) {
      return refused('protocol-has-faults', {
        detail:
          reading.faults.length === 1
            ? 'One fault has to be put right first.'
            : `${reading.faults.length} faults have to be put right first.`,
        errors: reading.faults.map((fault) => ({ pointer: `/protocol${fault.pointer}`, detail: fault.message })),
        extra: { faults: reading.faults },
      });
    }
    // Numbers are given here, whatever number the sent document carries.
    const version = await nextProtocolVersion(trx);
    const document = { ...reading.protocol, version, changes: body.changes };
    return done(
      [{ kind: 'protocol-added', after: { version, document, changes: body.changes } }],
      async (): Promise<ProtocolHead> => {
        const head = await protocolHeadOf(trx, version);
        if (head === null) throw new Error(`Protocol ${version} was not kept`);
        return head;
      },
    );
  },
});
