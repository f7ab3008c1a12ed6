/** What the permission rules read of one part of a milestone, made from its rule in the protocol. */
import type { MilestoneSubject } from './ability-for.ts';

/** The members of a milestone rule that say who may hold and sign what. */
export interface HoldingRule {
  readonly mayClaim: readonly string[];
  readonly signatures: readonly { readonly part: string; readonly disciplines: readonly string[] }[];
  readonly waiverNeeds?: readonly (readonly string[])[] | undefined;
}

export interface HoldingChild {
  readonly leadClinicianId: string | null;
  readonly trainees: readonly string[];
}

/** Who may hold a part: its signers, and those who may claim the milestone without signing its other part. */
export const holdersOfPart = (rule: HoldingRule, part: string): readonly string[] => {
  const signers = rule.signatures
    .filter((signature) => signature.part === part)
    .flatMap(({ disciplines }) => disciplines);
  const others = rule.signatures
    .filter((signature) => signature.part !== part)
    .flatMap(({ disciplines }) => disciplines);
  return [...new Set([...signers, ...rule.mayClaim.filter((discipline) => !others.includes(discipline))])];
};

/** One part, for claiming, drafting, handing over, signing and amending. `ownerId`: who holds the part now. */
export const partSubject = (
  rule: HoldingRule,
  part: string,
  child: HoldingChild,
  ownerId: string | null,
): MilestoneSubject => ({
  mayClaim: holdersOfPart(rule, part),
  maySign: rule.signatures.filter((signature) => signature.part === part).flatMap(({ disciplines }) => disciplines),
  ownerId,
  leadClinicianId: child.leadClinicianId,
  trainees: child.trainees,
});

/** The milestone as a whole, for pausing, waiving, booking and confirming: any signer or decider of it. */
export const wholeSubject = (rule: HoldingRule, child: HoldingChild): MilestoneSubject => ({
  mayClaim: rule.mayClaim,
  maySign: [
    ...new Set([...rule.signatures.flatMap(({ disciplines }) => disciplines), ...(rule.waiverNeeds ?? []).flat()]),
  ],
  ownerId: null,
  leadClinicianId: child.leadClinicianId,
  trainees: child.trainees,
});
