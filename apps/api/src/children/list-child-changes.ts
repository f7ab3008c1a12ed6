import { listChildChanges } from '@weftway/contract/child-history';
import { endpoint } from '../http/endpoint.ts';
import { answered, fieldRefused } from '../http/outcome.ts';
import { reachChild } from './child-reach.ts';
import { viewChildChanges } from './child-changes-view.ts';

export const listChildChangesEndpoint = endpoint<typeof listChildChanges>({
  operation: listChildChanges,
  can: { action: 'read', subject: 'Child' },
  handle: async (ask) => {
    const { trx, params, query } = ask;
    const reached = await reachChild(ask, params.childId, ['read']);
    if (reached.kind === 'refused') return reached;
    const before = query.cursor === undefined ? null : Number(query.cursor);
    if (before !== null && !Number.isSafeInteger(before))
      return fieldRefused('/cursor', 'This is not a place in the list. Start again from the first page.');
    const changes = await viewChildChanges(trx, params.childId, { before, limit: query.limit });
    const items = changes.slice(0, query.limit);
    return answered({ items, next: changes.length > query.limit ? String(items.at(-1)?.seq) : null }, params.childId);
  },
});
