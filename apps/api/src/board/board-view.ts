/** What the board reads from the projection: plain arrays, since objects and their names cost more than the query. */
import type BetterSqlite3 from 'better-sqlite3';
import type { Knex } from 'knex';
import type { MilestoneRule } from '@weftway/pathway/protocol';
import { rulesOf } from '../pathways/whole-protocol.ts';
import { loadProtocol } from '../protocol/protocol-store.ts';
import type { ChildOnBoard, MemberOnBoard, RowColumns } from './board-encoding.ts';

export interface BoardStamp {
  readonly version: number;
  /** Moves with every change of a member. */
  readonly team: string;
}

export const readStamp = async (db: Knex): Promise<BoardStamp> => {
  const rows: BoardStamp[] = await db.raw(
    `select board_counter.version as version, (select count(*) || '.' || sum(members.version) from members) as team from board_counter`,
  );
  const stamp = rows[0];
  if (stamp === undefined) throw new Error('The board has no counter');
  return stamp;
};

export const readMembers = async (db: Knex): Promise<Map<string, MemberOnBoard>> => {
  const rows: { id: string; name: string; standing: string; disciplines: string; status: string }[] = await db(
    'members',
  ).select('id', 'name', 'standing', 'disciplines', 'status');
  return new Map(
    rows.map((row) => [
      row.id,
      {
        id: row.id,
        name: row.name,
        standing: row.standing,
        disciplines: JSON.parse(row.disciplines) as string[],
        isActive: row.status === 'active',
      },
    ]), // written from the closed list
  );
};

/** Ids of the children that changed after a version, at most `most` of them. */
export const readChangedIds = async (db: Knex, since: number, most: number): Promise<string[]> => {
  const rows: { child_id: string }[] = await db('board_children')
    .where('changed_at_version', '>', since)
    .orderBy('changed_at_version')
    .limit(most)
    .select('child_id');
  return rows.map((row) => row.child_id);
};

export const readAllIds = async (db: Knex): Promise<string[]> => {
  const rows: { id: string }[] = await db('children').orderBy('id').select('id');
  return rows.map((row) => row.id);
};

/** Rows as arrays, past the query builder; the connection goes back at once. */
const readArrays = async <Row extends readonly unknown[]>(
  db: Knex,
  queries: readonly string[],
  ids: string,
): Promise<Row[][]> => {
  const client = db.client as {
    acquireConnection: () => Promise<BetterSqlite3.Database>;
    releaseConnection: (connection: unknown) => Promise<void>;
  }; // Knex leaves its client untyped
  const connection = await client.acquireConnection();
  try {
    return queries.map((sql) => connection.prepare(sql).raw(true).all(ids) as Row[]); // the columns of the query
  } finally {
    await client.releaseConnection(connection);
  }
};

type ChildColumns = readonly [string, string, string, string, string | null, string | null, number];

const inIds = '(select value from json_each(?))';

const childQuery = `select id, family_name, first_name, site, born_on, lead_clinician_id, protocol_version from children where id in ${inIds} order by id`;
const rowQuery = `select child_id, milestone, state, is_due + 2 * (squeezed_days is not null) + 4 * is_lapsed, earliest, latest, owners
  from board_rows where is_on_board = 1 and child_id in ${inIds} order by child_id, milestone`;
const traineeQuery = `select child_id, member_id from assignments where child_id in ${inIds} order by child_id, member_id`;
const ownQuery = `select child_id, rule from own_milestones where child_id in ${inIds}`;

const groupByFirst = <Row extends readonly unknown[]>(rows: readonly Row[]): Map<string, Row[]> => {
  const groups = new Map<string, Row[]>();
  let last: Row[] = [];
  let lastId: unknown = null;
  for (const row of rows) {
    if (row[0] !== lastId) {
      lastId = row[0];
      last = groups.get(String(lastId)) ?? [];
      groups.set(String(lastId), last);
    }
    last.push(row);
  }
  return groups;
};

/** These children with their rows; those that left the board come without any. */
export const readChildrenOnBoard = async (db: Knex, childIds: readonly string[]): Promise<ChildOnBoard[]> => {
  const [children = [], rows = [], trainees = [], own = []] = await readArrays<readonly unknown[]>(
    db,
    [childQuery, rowQuery, traineeQuery, ownQuery],
    JSON.stringify(childIds),
  );
  const rowsOf = groupByFirst(rows);
  const traineesOf = groupByFirst(trainees);
  const ownOf = groupByFirst(own);
  const found: ChildOnBoard[] = [];
  for (const [id, familyName, firstName, site, bornOn, leadId, version] of children as unknown as ChildColumns[]) {
    // the columns of childQuery
    const added = (ownOf.get(id) ?? []).map((row) => JSON.parse(String(row[1])) as MilestoneRule); // validated when it was added
    const rules = rulesOf(await loadProtocol(db, version));
    found.push({
      id,
      familyName,
      firstName,
      site,
      bornOn,
      leadId,
      trainees: (traineesOf.get(id) ?? []).map((row) => String(row[1])),
      rules: added.length === 0 ? rules : new Map([...rules, ...added.map((rule) => [rule.id, rule] as const)]),
      rows: (rowsOf.get(id) ?? []) as readonly unknown[] as readonly RowColumns[], // the columns of rowQuery
    });
  }
  return found;
};
