/** Care moves to another team, or comes back. */
import { transferChild } from '@weftway/contract/child';
import { endpoint } from '../http/endpoint.ts';
import { done, fieldRefused } from '../http/outcome.ts';
import { reachChild } from './child-reach.ts';
import { viewChild } from './child-view.ts';

export const transferChildEndpoint = endpoint<typeof transferChild>({
  operation: transferChild,
  can: { action: 'transfer', subject: 'Child' },
  version: (child) => child.version,
  handle: async (ask) => {
    const { trx, body, today } = ask;
    const reached = await reachChild(ask, ask.params.childId, ['transfer']);
    if (reached.kind === 'refused') return reached;
    const { row } = reached;
    const childId = row.id;
    const before = { on: row.transferred_on, to: row.transferred_to };
    if (body.on === null) {
      if (row.transferred_on === null) return fieldRefused('/on', 'Care has not moved away, so it cannot come back.');
      return done([{ kind: 'child-returned', childId, before, after: { reason: body.reason } }], () =>
        viewChild(trx, childId),
      );
    }
    if (body.on > today)
      return fieldRefused('/on', 'This day is still to come. Record the move when care has gone over.');
    if (row.born_on !== null && body.on < row.born_on) return fieldRefused('/on', 'This day is before the birth.');
    if (body.to === '') return fieldRefused('/to', 'Say which team takes over.');
    return done(
      [{ kind: 'child-transferred', childId, before, after: { on: body.on, to: body.to, reason: body.reason } }],
      () => viewChild(trx, childId),
    );
  },
});
