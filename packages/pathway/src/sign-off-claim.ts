/** Whether a person may take on a milestone, or their half of one. Each half of two signatures has its own owner. */
import type { MilestoneRule } from './protocol.ts';
import { signersOf, stateFaults, stateRefusals } from './sign-off-person.ts';
import type { Person, PlannedState, Refusal } from './sign-off-person.ts';

export const claimRefusals = [...stateRefusals, 'unknown-part', 'not-your-discipline', 'already-claimed'] as const;
export type ClaimRefusalCode = (typeof claimRefusals)[number];

export interface Claiming {
  readonly rule: MilestoneRule;
  readonly part: string;
  readonly person: Person;
  readonly planned: PlannedState;
  /** Who holds this part now. */
  readonly holderId: string | null;
  readonly isPartSigned: boolean;
}

/** Every reason for which the claim is refused; claiming again what one already holds is not refused. */
export function claimFaults({
  rule,
  part,
  person,
  planned,
  holderId,
  isPartSigned,
}: Claiming): Refusal<ClaimRefusalCode>[] {
  const faults: Refusal<ClaimRefusalCode>[] = [...stateFaults(planned, 'record')];
  const signature = rule.signatures.find((candidate) => candidate.part === part);
  if (!signature) return [...faults, { code: 'unknown-part', message: `${rule.title} has no part called “${part}”.` }];
  if (isPartSigned && faults.length === 0) {
    faults.push({ code: 'already-signed', message: `“${signature.label}” is signed already.` });
  }
  if (!mayClaim(rule, part, person)) {
    faults.push({
      code: 'not-your-discipline',
      message: `“${signature.label}” is for somebody of another discipline to take on.`,
    });
  }
  if (holderId !== null && holderId !== person.id) {
    faults.push({ code: 'already-claimed', message: 'Somebody else holds this already.' });
  }
  return faults;
}

/** Who may hold a part: those who sign it, and those who may claim the milestone without signing its other part. */
export function mayClaim(rule: MilestoneRule, part: string, person: Person): boolean {
  if (person.standing !== 'member' && person.standing !== 'trainee') return false;
  const signing = rule.signatures
    .filter((signature) => signature.part === part)
    .flatMap(({ disciplines }) => disciplines);
  if (signersOf(person, signing).length > 0) return true;
  const others = rule.signatures
    .filter((signature) => signature.part !== part)
    .flatMap(({ disciplines }) => disciplines);
  return signersOf(person, rule.mayClaim).some((signer) => !others.includes(signer));
}
