/** Who acts on a milestone, and whether the milestone is in a state in which anybody may act on it. */
import type { Discipline } from '@weftway/team/disciplines';
import type { Standing } from '@weftway/team/standings';
import type { PlannedMilestone } from './pathway-plan.ts';
import type { MilestoneRule, Signer } from './protocol.ts';

export interface Person {
  readonly id: string;
  readonly name: string;
  readonly standing: Standing;
  readonly disciplines: readonly Discipline[];
  /** Named lead clinician of this child. */
  readonly isLeadClinician: boolean;
}

/** What the rules read of a planned milestone; null when it is not on the child's path. */
export type PlannedState =
  (Pick<PlannedMilestone, 'key' | 'state' | 'waitsFor' | 'isLapsed'> & { readonly isRenewable?: boolean }) | null;

export const stateRefusals = ['not-on-path', 'transferred', 'waived', 'already-signed'] as const;
export type StateRefusal = (typeof stateRefusals)[number];

export interface Refusal<Code extends string> {
  readonly code: Code;
  /** In plain words, for the person who was refused. */
  readonly message: string;
}

/**
 * Refusals that follow from the state alone: at most one. Whoever records or claims may do so once more where a signed
 * milestone can be renewed; it is not held or waived any more.
 */
export function stateFaults(planned: PlannedState, act: 'record' | 'other' = 'other'): Refusal<StateRefusal>[] {
  if (planned === null) return [{ code: 'not-on-path', message: 'This milestone is not on the path of this child.' }];
  switch (planned.state) {
    case 'transferred':
      return [{ code: 'transferred', message: 'The child is now cared for by another team.' }];
    case 'waived':
      return [{ code: 'waived', message: 'This milestone was waived.' }];
    case 'signed':
      if (act === 'record' && planned.isRenewable === true) return [];
      return [{ code: 'already-signed', message: 'This milestone is signed already.' }];
    default:
      return [];
  }
}

/** The ways in which a person may give this signature: own disciplines, or as lead clinician of the child. */
export function signersOf(person: Person, allowed: readonly Signer[]): Signer[] {
  return allowed.filter((signer) =>
    signer === 'lead-clinician' ? person.isLeadClinician && isClinician(person) : person.disciplines.includes(signer),
  );
}

/** Whether a member of clinical standing may decide for this milestone; the coordinator may propose, not decide. */
export function mayDecide(person: Person, rule: MilestoneRule): boolean {
  if (person.standing !== 'member') return false;
  const signing = rule.signatures.flatMap((signature) => signature.disciplines);
  const needed = (rule.waiverNeeds ?? []).flat();
  return signersOf(person, [...signing, ...needed]).some((signer) => signer !== 'coordinator');
}

const isClinician = (person: Person): boolean => person.disciplines.some((discipline) => discipline !== 'coordinator');
