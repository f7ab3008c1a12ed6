import { readRecordChoices } from '@weftway/contract/child-history';
import { endpoint } from '../http/endpoint.ts';
import { answered } from '../http/outcome.ts';
import { viewRecordChoices } from './team-choices-view.ts';

export const readRecordChoicesEndpoint = endpoint<typeof readRecordChoices>({
  operation: readRecordChoices,
  can: { action: 'read', subject: 'Child' },
  handle: async ({ trx }) => answered(await viewRecordChoices(trx)),
});
