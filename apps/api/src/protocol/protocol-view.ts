/** The versions of the protocol as the screens list them. */
import type { Knex } from 'knex';
import type { z } from 'zod';
import type { protocolHeadSchema } from '@weftway/contract/protocol';

export type ProtocolHead = z.infer<typeof protocolHeadSchema>;

interface HeadRow {
  readonly version: number;
  readonly name: string;
  readonly status: 'draft' | 'active' | 'retired';
  readonly changes: string;
  readonly created_at: string;
  readonly created_by: string | null;
  readonly activated_at: string | null;
  readonly activated_by: string | null;
  readonly agreed_by: string | null;
  readonly children: number;
}

/** The first version is written before there is anybody to name. */
const founding = 'Founding of the team';

const fromRow = (row: HeadRow): ProtocolHead => ({
  version: row.version,
  name: row.name,
  status: row.status,
  changes: row.changes,
  createdAt: row.created_at,
  createdBy: row.created_by ?? founding,
  activatedAt: row.activated_at,
  activatedBy: row.activated_at === null ? null : (row.activated_by ?? founding),
  agreedBy: row.agreed_by,
  children: row.children,
});

/** One row is a version with the names of those who made it and how many children follow it. */
const heads = (db: Knex) =>
  db('protocols')
    .leftJoin('members as makers', 'makers.id', 'protocols.created_by_id')
    .leftJoin('members as activators', 'activators.id', 'protocols.activated_by_id')
    .select(
      'protocols.version',
      'protocols.name',
      'protocols.status',
      'protocols.changes',
      'protocols.created_at',
      'makers.name as created_by',
      'protocols.activated_at',
      'activators.name as activated_by',
      'protocols.agreed_by',
      db('children').whereRaw('children.protocol_version = protocols.version').count('*').as('children'),
    );

export const listProtocolHeads = async (db: Knex): Promise<ProtocolHead[]> => {
  const rows: HeadRow[] = await heads(db).orderBy('protocols.version', 'desc');
  return rows.map(fromRow);
};

export const protocolHeadOf = async (db: Knex, version: number): Promise<ProtocolHead | null> => {
  const row: HeadRow | undefined = await heads(db).where('protocols.version', version).first();
  return row === undefined ? null : fromRow(row);
};

export const nextProtocolVersion = async (db: Knex): Promise<number> => {
  const [row]: { version: number | null }[] = await db('protocols').max({ version: 'protocols.version' });
  return (row?.version ?? 0) + 1;
};

/** Children in care who follow another version. */
export const childrenOnOtherVersions = async (db: Knex, version: number): Promise<readonly string[]> => {
  const rows: { id: string }[] = await db('children')
    .whereNot('children.protocol_version', version)
    .whereNull('children.transferred_on')
    .whereNull('children.care_ended_on')
    .orderBy('children.id')
    .select('children.id');
  return rows.map((row) => row.id);
};
