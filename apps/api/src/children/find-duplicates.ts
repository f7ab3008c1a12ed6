import { findDuplicates } from '@weftway/contract/child';
import { endpoint } from '../http/endpoint.ts';
import { answered } from '../http/outcome.ts';
import { findDuplicateChildren } from './duplicate-view.ts';

export const findDuplicatesEndpoint = endpoint<typeof findDuplicates>({
  operation: findDuplicates,
  can: { action: 'register', subject: 'Child' },
  handle: async ({ trx, body }) => answered({ candidates: await findDuplicateChildren(trx, body, body.exceptId) }),
});
