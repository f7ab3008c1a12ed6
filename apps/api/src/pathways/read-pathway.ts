import { readPathway } from '@weftway/contract/pathway';
import { endpoint } from '../http/endpoint.ts';
import { answered } from '../http/outcome.ts';
import { openPathway } from './open-pathway.ts';
import { pathwayOf } from './pathway-view.ts';

export const readPathwayEndpoint = endpoint<typeof readPathway>({
  operation: readPathway,
  can: { action: 'read', subject: 'Child' },
  version: (pathway) => pathway.version,
  handle: async (ask) => {
    const opened = await openPathway(ask, ask.params.childId);
    if (opened.kind === 'refused') return opened;
    return answered(await pathwayOf(ask.trx, opened.record, ask.actor), opened.record.child.id);
  },
});
