/** What must be true of a member: every fault points at the field that can mend it. */
import type { Member, MemberFields } from '@weftway/contract/member';
import type { FieldFault } from '@weftway/contract/problems';

const at = (pointer: string, detail: string): FieldFault => ({ pointer, detail });

const holdsDisciplines = (standing: Member['standing']): boolean => standing === 'member' || standing === 'trainee';

const sharesDiscipline = (a: Pick<MemberFields, 'disciplines'>, b: Pick<MemberFields, 'disciplines'>): boolean =>
  a.disciplines.some((one) => b.disciplines.includes(one));

/** Why this person could not supervise; null when they can. */
const supervisorFault = (
  trainee: MemberFields,
  supervisor: Member | undefined,
  traineeId: string | null,
): string | null => {
  if (supervisor === undefined || supervisor.id === traineeId) return 'Choose a member of the team.';
  if (supervisor.status !== 'active') return `${supervisor.name} has no open account.`;
  if (supervisor.standing !== 'member') return `${supervisor.name} is no full member and cannot supervise.`;
  return sharesDiscipline(trainee, supervisor) ? null : `${supervisor.name} works in another discipline.`;
};

const supervisionFaults = (
  fields: MemberFields,
  everyone: readonly Member[],
  memberId: string | null,
): FieldFault[] => {
  if (fields.standing !== 'trainee')
    return fields.supervisorId === null ? [] : [at('/supervisorId', 'Only a trainee has a supervisor.')];
  if (fields.supervisorId === null)
    return [at('/supervisorId', 'A trainee needs a supervisor of the same discipline.')];
  const fault = supervisorFault(
    fields,
    everyone.find(({ id }) => id === fields.supervisorId),
    memberId,
  );
  return fault === null ? [] : [at('/supervisorId', fault)];
};

const disciplineFaults = ({ standing, disciplines }: MemberFields): FieldFault[] => {
  if (new Set(disciplines).size !== disciplines.length) return [at('/disciplines', 'Name each discipline once.')];
  if (!holdsDisciplines(standing))
    return disciplines.length === 0 ? [] : [at('/disciplines', 'Administrators and auditors hold no discipline.')];
  return disciplines.length === 0 ? [at('/disciplines', 'Choose at least one discipline.')] : [];
};

/** Trainees who count on this member and have not left. */
export const traineesOf = (memberId: string, everyone: readonly Member[]): readonly Member[] =>
  everyone.filter((one) => one.supervisorId === memberId && one.status !== 'left');

/** Trainees whom this member could no longer supervise after the change. */
const strandedFaults = (member: Member, fields: MemberFields, everyone: readonly Member[]): FieldFault[] => {
  const stranded = traineesOf(member.id, everyone).filter(
    (trainee) => fields.standing !== 'member' || !sharesDiscipline(trainee, fields),
  );
  if (stranded.length === 0) return [];
  const names = stranded.map(({ name }) => name).join(', ');
  return [
    at(fields.standing === 'member' ? '/disciplines' : '/standing', `First give another supervisor to: ${names}.`),
  ];
};

export const isLastAdministrator = (member: Member, everyone: readonly Member[]): boolean =>
  member.standing === 'administrator' &&
  member.status === 'active' &&
  !everyone.some((one) => one.id !== member.id && one.standing === 'administrator' && one.status === 'active');

/** Faults of a member's fields; `member` is null for a new one. */
export const memberFaults = (
  fields: MemberFields,
  member: Member | null,
  everyone: readonly Member[],
): FieldFault[] => [
  ...disciplineFaults(fields),
  ...supervisionFaults(fields, everyone, member?.id ?? null),
  ...(member === null ? [] : strandedFaults(member, fields, everyone)),
  ...(member !== null && fields.standing !== 'administrator' && isLastAdministrator(member, everyone)
    ? [at('/standing', 'This is the last administrator. Make somebody else administrator first.')]
    : []),
];
