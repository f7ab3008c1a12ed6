/** Searches the registry; trainees see the children they are assigned to. */
import { canChild } from '@weftway/abilities/ability-for';
import { listChildren } from '@weftway/contract/child';
import { endpoint } from '../http/endpoint.ts';
import { answered, fieldRefused } from '../http/outcome.ts';
import { findChildRow } from './child-view.ts';
import { readRegistrySearch } from './registry-query.ts';
import { viewRegistry } from './registry-view.ts';

export const listChildrenEndpoint = endpoint<typeof listChildren>({
  operation: listChildren,
  can: { action: 'read', subject: 'Child' },
  handle: async ({ trx, query, ability, actor }) => {
    const after = query.cursor ?? null;
    if (after !== null && (await findChildRow(trx, after)) === null)
      return fieldRefused('/cursor', 'This is not a place in the list. Start again from the first page.');
    const seesAll = canChild(ability, 'read', { trainees: [] });
    const { rows, total, next } = await viewRegistry(trx, {
      search: readRegistrySearch(query.q ?? ''),
      order: query.order,
      limit: query.limit,
      after,
      assignedTo: seesAll ? null : actor.id,
    });
    return answered({ items: rows, total, next });
  },
});
