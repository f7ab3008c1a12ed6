import { canChild } from '@weftway/abilities/ability-for';
import { moveToProtocol } from '@weftway/contract/pathway-of-child';
import { endpoint } from '../http/endpoint.ts';
import { done, fieldRefused, refused } from '../http/outcome.ts';
import { protocolStatus } from '../protocol/protocol-store.ts';
import { openPathway } from './open-pathway.ts';
import { viewPathway } from './pathway-view.ts';

export const moveToProtocolEndpoint = endpoint<typeof moveToProtocol>({
  operation: moveToProtocol,
  can: { action: 'move-protocol', subject: 'Child' },
  handle: async (ask) => {
    const { trx, actor, ability, body, params } = ask;
    const opened = await openPathway(ask, params.childId);
    if (opened.kind === 'refused') return opened;
    const { record } = opened;
    if (!canChild(ability, 'move-protocol', { trainees: record.trainees })) return refused('not-allowed');
    const status = await protocolStatus(trx, body.version);
    if (status === null) return fieldRefused('/version', 'There is no such version of the protocol.');
    if (status === 'draft') return fieldRefused('/version', 'This version is still a draft.');
    const from = record.child.protocol_version;
    const events =
      body.version === from
        ? []
        : [
            {
              kind: 'child-moved-to-protocol' as const,
              childId: params.childId,
              before: { version: from },
              after: { version: body.version, reason: body.reason },
            },
          ];
    return done(events, () => viewPathway(trx, params.childId, actor));
  },
});
