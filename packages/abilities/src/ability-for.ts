/** The CASL ability of one person, built from the permission table. Shared by API and board. */
import { AbilityBuilder, createMongoAbility, subject } from '@casl/ability';
import type { MongoAbility, MongoQuery, Subject } from '@casl/ability';
import type { Discipline } from '@weftway/team/disciplines';
import type { Standing } from '@weftway/team/standings';
import { permissionTable } from './permission-table.ts';
import type { Action, PermissionRow, Reach, Role, SubjectName } from './permission-table.ts';

export interface Person {
  readonly id: string;
  readonly standing: Standing;
  readonly disciplines: readonly Discipline[];
}

/** What the rules read of a milestone: who may claim it, who may sign the part in question, and who holds it. */
export interface MilestoneSubject {
  readonly mayClaim: readonly string[];
  readonly maySign: readonly string[];
  readonly ownerId: string | null;
  readonly leadClinicianId: string | null;
  readonly trainees: readonly string[];
}

/** What the rules read of a child. */
export interface ChildSubject {
  readonly trainees: readonly string[];
}

export type WeftwayAbility = MongoAbility<[string, Subject]>;

/** The roles of the table that a person stands in: a member's disciplines, or the standing itself. */
export const rolesOf = (person: Person): readonly Role[] => {
  if (person.standing !== 'member') return [person.standing];
  const isClinician = person.disciplines.some((discipline) => discipline !== 'coordinator');
  return isClinician ? [...person.disciplines, 'clinician'] : [...person.disciplines];
};

const laneField = (action: string): 'mayClaim' | 'maySign' | 'mayHold' =>
  action === 'claim' ? 'mayClaim' : action === 'draft' || action === 'book' ? 'mayHold' : 'maySign';

const laneConditions = (person: Person, action: string, disciplines: readonly Discipline[]): MongoQuery[] => [
  { [laneField(action)]: { $in: disciplines } },
  ...(person.standing === 'member' && disciplines.some((one) => one !== 'coordinator')
    ? [{ [laneField(action)]: { $in: ['lead-clinician'] }, leadClinicianId: person.id }]
    : []),
];

/** Disciplines that a role of the table speaks for: the coordinator's cell does not open a surgeon's lane. */
const disciplinesOfRole = (person: Person, role: Role): readonly Discipline[] => {
  if (role === 'coordinator') return ['coordinator'];
  if (role === 'clinician') return person.disciplines.filter((one) => one !== 'coordinator');
  return role === 'trainee' ? person.disciplines : person.disciplines.filter((one) => one === role);
};

const ownField = (name: SubjectName): string => (name === 'Milestone' ? 'ownerId' : 'memberId');

const conditionsFor = (person: Person, role: Role, row: PermissionRow, reach: Reach): (MongoQuery | undefined)[] => {
  const assigned = { trainees: { $in: [person.id] } };
  if (reach === 'team') return [undefined];
  if (reach === 'assigned') return row.subject === 'Child' ? [assigned] : [undefined];
  if (reach === 'own') return [{ [ownField(row.subject)]: person.id }];
  const lane = laneConditions(person, row.action, disciplinesOfRole(person, role));
  return reach === 'own-lane' ? lane : lane.map((condition) => ({ ...condition, ...assigned }));
};

/** The ability of a person; nobody signed in has none. */
export const abilityFor = (person: Person | null): WeftwayAbility => {
  const { can, build } = new AbilityBuilder<WeftwayAbility>(createMongoAbility);
  if (person === null) return build();
  const roles = rolesOf(person);
  for (const row of permissionTable as readonly PermissionRow[]) {
    for (const role of roles) {
      const reach = row.who[role];
      if (reach === undefined) continue;
      for (const conditions of conditionsFor(person, role, row, reach)) can(row.action, row.subject, conditions);
    }
  }
  return build();
};

/** May this person do this to this milestone? */
export const canMilestone = (ability: WeftwayAbility, action: Action, milestone: MilestoneSubject): boolean =>
  ability.can(
    action,
    subject('Milestone', { ...milestone, mayHold: [...milestone.mayClaim, ...milestone.maySign] }) as Subject, // a plain row with its type
  );

/** May this person do this to this child? */
export const canChild = (ability: WeftwayAbility, action: Action, child: ChildSubject): boolean =>
  ability.can(action, subject('Child', { ...child }) as Subject); // a plain row with its type

/** May this person do this at all, to some object of the kind? */
export const canSome = (ability: WeftwayAbility, action: Action, name: SubjectName): boolean =>
  ability.can(action, name);

/** May this person do this to what belongs to `memberId` (open work, cover, trail lines)? */
export const canOfMember = (
  ability: WeftwayAbility,
  action: Action,
  name: 'Team' | 'Trail',
  memberId: string,
): boolean => ability.can(action, subject(name, { memberId }) as Subject); // a plain row with its type
