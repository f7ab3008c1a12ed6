import { readChild } from '@weftway/contract/child';
import { endpoint } from '../http/endpoint.ts';
import { answered } from '../http/outcome.ts';
import { reachChild } from './child-reach.ts';
import { childOf } from './child-view.ts';

export const readChildEndpoint = endpoint<typeof readChild>({
  operation: readChild,
  can: { action: 'read', subject: 'Child' },
  version: (child) => child.version,
  handle: async (ask) => {
    const reached = await reachChild(ask, ask.params.childId, ['read']);
    if (reached.kind === 'refused') return reached;
    return answered(childOf(reached.row, reached.traineeIds), reached.row.id);
  },
});
