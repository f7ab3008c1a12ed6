import { listMembers } from '@weftway/contract/member';
import { endpoint } from '../http/endpoint.ts';
import { answered } from '../http/outcome.ts';
import { listMemberViews } from './member-view.ts';

export const listMembersEndpoint = endpoint<typeof listMembers>({
  operation: listMembers,
  can: { action: 'read', subject: 'Team' },
  handle: async ({ trx }) => answered({ members: await listMemberViews(trx) }),
});
