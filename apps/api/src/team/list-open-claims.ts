import { canOfMember, canSome } from '@weftway/abilities/ability-for';
import { listOpenClaims } from '@weftway/contract/member';
import type { Member } from '@weftway/contract/member';
import { endpoint } from '../http/endpoint.ts';
import { answered, refused } from '../http/outcome.ts';
import { childrenLedBy } from './led-children-view.ts';
import { canLead, mayHold } from './may-hold.ts';
import { findMember, listMemberViews } from './member-view.ts';
import { openClaimsOf } from './open-claims-view.ts';
import type { OpenClaim } from './open-claims-view.ts';

/** The lead goes on to somebody when its holder leaves. */
const mayHoldOnceLead = (claim: OpenClaim, member: Member, colleague: Member): boolean =>
  claim.leadClinicianId === member.id && canLead(colleague) && mayHold(claim, colleague, colleague.id);

export const listOpenClaimsEndpoint = endpoint<typeof listOpenClaims>({
  operation: listOpenClaims,
  can: { action: 'hand-over', subject: 'Team' },
  handle: async ({ trx, params, ability }) => {
    const member = await findMember(trx, params.memberId);
    if (member === null) return refused('not-found');
    if (!canOfMember(ability, 'hand-over', 'Team', member.id)) return refused('not-allowed');
    const colleagues = (await listMemberViews(trx)).filter(({ id }) => id !== member.id);
    // Whoever opens no child sees which record it is, not whose.
    const seesNames = canSome(ability, 'read', 'Child');
    const claims = await openClaimsOf(trx, member.id);
    return answered({
      claims: claims.map((claim) => ({
        childId: claim.childId,
        childName: seesNames ? claim.childName : claim.recordNumber,
        milestone: claim.milestone,
        part: claim.part,
        title: claim.title,
        state: claim.state,
        latest: claim.latest,
        mayHold: colleagues.filter((colleague) => mayHold(claim, colleague)).map(({ id }) => id),
        mayHoldAsLead: colleagues
          .filter((colleague) => !mayHold(claim, colleague) && mayHoldOnceLead(claim, member, colleague))
          .map(({ id }) => id),
      })),
      leads: (await childrenLedBy(trx, member.id)).length,
      mayLead: colleagues.filter(canLead).map(({ id }) => id),
    });
  },
});
