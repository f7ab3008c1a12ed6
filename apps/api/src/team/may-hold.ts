/** Which colleagues may take an open milestone over: by the protocol's own rule; a trainee is never handed one. */
import type { Member } from '@weftway/contract/member';
import { mayClaim } from '@weftway/pathway/sign-off-claim';
import type { OpenClaim } from './open-claims-view.ts';

export const mayHold = (claim: OpenClaim, member: Member, leadId = claim.leadClinicianId): boolean => {
  if (member.status !== 'active' || member.standing !== 'member' || claim.rule === null) return false;
  const { id, name, standing, disciplines } = member;
  return mayClaim(claim.rule, claim.part, {
    id,
    name,
    standing,
    disciplines,
    isLeadClinician: leadId === id,
  });
};

/** Who may lead the care of children: full members of a clinical discipline. */
export const canLead = ({ status, standing, disciplines }: Member): boolean =>
  status === 'active' && standing === 'member' && disciplines.some((one) => one !== 'coordinator');
