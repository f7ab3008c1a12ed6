/** How members are said in lists. */
import { formatDate } from '@weftway/calendar/format-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { Member } from '@weftway/contract/member';
import { disciplineNames } from '@weftway/team/disciplines';
import { standingNames } from '@weftway/team/standings';
import { teamWords } from '../../words/team.ts';

export type Names = ReadonlyMap<string, string>;

export const namesOf = (members: readonly Member[]): Names => new Map(members.map(({ id, name }) => [id, name]));

export const disciplineLine = ({ disciplines }: Pick<Member, 'disciplines'>): string =>
  disciplines.map((one) => disciplineNames[one]).join(', ');

export const standingLine = ({ standing, supervisorId }: Member, names: Names): string => {
  const supervisor = supervisorId === null ? undefined : names.get(supervisorId);
  return supervisor === undefined
    ? standingNames[standing]
    : `${standingNames[standing]}, ${teamWords.under(supervisor)}`;
};

/** Cover that is on or still to come; past cover says nothing. */
export const coverLine = ({ cover }: Member, names: Names, today: PlainDate): string | null => {
  if (cover === null || cover.until < today) return null;
  const by = names.get(cover.byId) ?? '';
  return cover.from <= today
    ? teamWords.coveredUntil(by, formatDate(cover.until))
    : teamWords.coverFrom(by, formatDate(cover.from), formatDate(cover.until));
};

const dayOf = (instant: string): PlainDate => instant.slice(0, 10) as PlainDate; // an ISO instant starts with its date

export const presenceLine = (member: Member, names: Names, today: PlainDate): string => {
  if (member.status === 'left') return member.leftOn === null ? '' : teamWords.leftOn(formatDate(member.leftOn));
  if (member.status === 'invited')
    return member.invitedAt === null ? '' : teamWords.invitedOn(formatDate(dayOf(member.invitedAt)));
  return coverLine(member, names, today) ?? teamWords.active;
};
