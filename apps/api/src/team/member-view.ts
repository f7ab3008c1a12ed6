/** Members as everybody on the team sees them. */
import type { Knex } from 'knex';
import type { Member } from '@weftway/contract/member';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { Discipline } from '@weftway/team/disciplines';
import { countOpenClaims } from './open-claims-view.ts';

interface MemberRow {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly standing: Member['standing'];
  readonly disciplines: string;
  readonly supervisor_id: string | null;
  readonly status: Member['status'];
  readonly version: number;
  readonly invited_at: string | null;
  readonly left_on: string | null;
  readonly cover_by_id: string | null;
  readonly cover_from: string | null;
  readonly cover_until: string | null;
}

const columns = [
  'id',
  'name',
  'email',
  'standing',
  'disciplines',
  'supervisor_id',
  'status',
  'version',
  'invited_at',
  'left_on',
  'cover_by_id',
  'cover_from',
  'cover_until',
] as const;

const date = (text: string): PlainDate => text as PlainDate; // stored as a checked date

const coverOf = ({ cover_by_id: byId, cover_from: from, cover_until: until }: MemberRow): Member['cover'] =>
  byId === null || from === null || until === null ? null : { byId, from: date(from), until: date(until) };

const memberOf = (row: MemberRow, openClaims: number): Member => ({
  id: row.id,
  name: row.name,
  email: row.email,
  standing: row.standing,
  disciplines: JSON.parse(row.disciplines) as Discipline[], // written from the closed list
  supervisorId: row.supervisor_id,
  status: row.status,
  version: row.version,
  invitedAt: row.invited_at,
  leftOn: row.left_on === null ? null : date(row.left_on),
  cover: coverOf(row),
  openClaims,
});

/** The kinds of people who have accounts on the team; families and outside clinicians are no members. */
const onTeam = ['member', 'trainee', 'administrator', 'auditor'] as const;

export const listMemberViews = async (db: Knex): Promise<Member[]> => {
  const rows: MemberRow[] = await db('members')
    .whereIn('standing', onTeam)
    .orderBy('name')
    .orderBy('id')
    .select(...columns);
  const counts = await countOpenClaims(db);
  return rows.map((row) => memberOf(row, counts.get(row.id) ?? 0));
};

const findBy = async (
  db: Knex,
  where: { readonly id: string } | { readonly email: string },
): Promise<Member | null> => {
  const row: MemberRow | undefined = await db('members')
    .where(where)
    .whereIn('standing', onTeam)
    .modify((query) => ('email' in where ? query.whereNot({ status: 'left' }) : query))
    .first(...columns);
  if (row === undefined) return null;
  const counts = await countOpenClaims(db, row.id);
  return memberOf(row, counts.get(row.id) ?? 0);
};

export const findMember = (db: Knex, id: string): Promise<Member | null> => findBy(db, { id });
/** Whoever has the address today; that of somebody who has left is free. */
export const findMemberByEmail = (db: Knex, email: string): Promise<Member | null> => findBy(db, { email });

/** For an id that was looked up before in the same transaction. */
export const memberView = async (db: Knex, id: string): Promise<Member> => {
  const member = await findMember(db, id);
  if (member === null) throw new Error('A member vanished within a transaction');
  return member;
};

/** Ids of the members whose work this member covers on a day; the last day of the cover counts. */
export const coveredBy = async (db: Knex, memberId: string, today: string): Promise<string[]> => {
  const rows: { id: string }[] = await db('members')
    .where({ cover_by_id: memberId, status: 'active' })
    .where('cover_from', '<=', today)
    .where('cover_until', '>=', today)
    .orderBy('id')
    .select('id');
  return rows.map(({ id }) => id);
};

export const teamName = async (db: Knex): Promise<string> => {
  const row: { name: string } | undefined = await db('team').first('name');
  return row?.name ?? '';
};

/** The team's name and sites: words that anybody could guess. */
export const teamPlaces = async (db: Knex): Promise<string[]> => {
  const row: { name: string; sites: string } | undefined = await db('team').first('name', 'sites');
  return row === undefined ? [] : [row.name, ...(JSON.parse(row.sites) as string[])]; // written from the contract
};
