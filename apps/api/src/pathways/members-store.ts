/** The people that acts on a pathway name: holders, targets of a hand-over, authors of drafts. */
import type { Knex } from 'knex';
import type { Discipline } from '@weftway/team/disciplines';
import type { Standing } from '@weftway/team/standings';

export interface TeamPerson {
  readonly id: string;
  readonly name: string;
  readonly standing: Standing;
  readonly disciplines: readonly Discipline[];
  readonly isActive: boolean;
}

interface MemberRow {
  readonly id: string;
  readonly name: string;
  readonly standing: Standing;
  readonly disciplines: string;
  readonly status: string;
}

const personOf = (row: MemberRow): TeamPerson => ({
  id: row.id,
  name: row.name,
  standing: row.standing,
  disciplines: JSON.parse(row.disciplines) as Discipline[], // written from the closed list
  isActive: row.status === 'active',
});

export const findPerson = async (db: Knex, memberId: string): Promise<TeamPerson | null> => {
  const row: MemberRow | undefined = await db('members')
    .where({ id: memberId })
    .first('id', 'name', 'standing', 'disciplines', 'status');
  return row === undefined ? null : personOf(row);
};

/** An active member whose name is exactly this, but for capitals; null when nobody or more than one. */
export const findPersonByName = async (db: Knex, name: string): Promise<TeamPerson | null> => {
  const rows: MemberRow[] = await db('members')
    .where({ status: 'active' })
    .whereRaw('lower(name) = lower(?)', [name.trim()])
    .select('id', 'name', 'standing', 'disciplines', 'status');
  const [row] = rows;
  return row === undefined || rows.length > 1 ? null : personOf(row);
};

export const memberNames = async (db: Knex): Promise<ReadonlyMap<string, string>> => {
  const rows: { id: string; name: string }[] = await db('members').select('id', 'name');
  return new Map(rows.map(({ id, name }) => [id, name]));
};
