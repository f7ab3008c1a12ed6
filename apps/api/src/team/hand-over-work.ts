import { canOfMember } from '@weftway/abilities/ability-for';
import { handOverWork } from '@weftway/contract/member';
import { endpoint } from '../http/endpoint.ts';
import { done, refused } from '../http/outcome.ts';
import { handOverEvents } from './hand-over-events.ts';
import { findMember } from './member-view.ts';

export const handOverWorkEndpoint = endpoint<typeof handOverWork>({
  operation: handOverWork,
  can: { action: 'hand-over', subject: 'Team' },
  handle: async ({ trx, params, body, ability }) => {
    const member = await findMember(trx, params.memberId);
    if (member === null) return refused('not-found');
    if (!canOfMember(ability, 'hand-over', 'Team', member.id))
      return refused('not-allowed', { detail: 'The coordinator or an administrator hands on the work of others.' });
    const result = await handOverEvents(trx, member, body);
    return result.kind === 'refused' ? result : done(result.events, async () => ({ moved: result.events.length }));
  },
});
