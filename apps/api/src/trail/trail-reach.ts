/** How far into the trail somebody may look, by the permission table. */
import { canOfMember } from '@weftway/abilities/ability-for';
import type { WeftwayAbility } from '@weftway/abilities/ability-for';

export interface TrailReach {
  /** Set: only what this member did. */
  readonly onlyBy: string | null;
  /** Children's names, and what stood before and after. */
  readonly seesContent: boolean;
}

/** Nobody's id: whoever may see this may see everybody's. */
const somebodyElse = '';

export const trailReachOf = (ability: WeftwayAbility, memberId: string): TrailReach => {
  const seesAll = canOfMember(ability, 'read', 'Trail', somebodyElse);
  const whose = seesAll ? somebodyElse : memberId;
  return { onlyBy: seesAll ? null : memberId, seesContent: canOfMember(ability, 'read-content', 'Trail', whose) };
};
