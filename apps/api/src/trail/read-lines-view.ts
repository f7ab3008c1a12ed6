/** One page of the trail of changes, newest first. */
import type { Knex } from 'knex';

export interface TrailFilter {
  readonly child?: string | undefined;
  /** Whoever acted, or was acted upon. */
  readonly member?: string | undefined;
  /** Only what this member did. */
  readonly onlyBy: string | null;
  readonly kind?: string | undefined;
  /** UTC instants, half-open. */
  readonly from?: string | undefined;
  readonly to?: string | undefined;
  /** Lines before this number. */
  readonly before?: number | undefined;
  readonly limit: number;
}

export interface TrailRow {
  readonly seq: number;
  readonly at: string;
  readonly kind: string;
  readonly actor_id: string | null;
  readonly actor_name: string;
  readonly actor_role: string;
  readonly child_id: string | null;
  readonly member_id: string | null;
  readonly milestone: string | null;
  readonly request_id: string;
  readonly hash: string;
  readonly before: string;
  readonly after: string;
  readonly first_name: string | null;
  readonly family_name: string | null;
  readonly protocol_version: number | null;
  readonly lead_clinician_id: string | null;
}

const lineColumns = [
  'seq',
  'at',
  'kind',
  'actor_id',
  'actor_name',
  'actor_role',
  'child_id',
  'member_id',
  'milestone',
  'request_id',
  'hash',
].map((name) => `trail_lines.${name}`);

/** One row is a line with its payload and, where it is about a child, that child's name of today. */
export const viewTrailLines = async (db: Knex, filter: TrailFilter): Promise<TrailRow[]> => {
  const query = db('trail_lines')
    .join('trail_payloads', 'trail_payloads.seq', 'trail_lines.seq')
    .leftJoin('children', 'children.id', 'trail_lines.child_id')
    .orderBy('trail_lines.seq', 'desc')
    .limit(filter.limit)
    .select(
      ...lineColumns,
      'trail_payloads.before',
      'trail_payloads.after',
      'children.first_name',
      'children.family_name',
      'children.protocol_version',
      'children.lead_clinician_id',
    );
  const { child, member, onlyBy, kind, from, to, before } = filter;
  if (child !== undefined) void query.where('trail_lines.child_id', child);
  if (member !== undefined)
    void query.where(
      (either) => void either.where('trail_lines.actor_id', member).orWhere('trail_lines.member_id', member),
    );
  if (onlyBy !== null) void query.where('trail_lines.actor_id', onlyBy);
  if (kind !== undefined) void query.where('trail_lines.kind', kind);
  if (from !== undefined) void query.where('trail_lines.at', '>=', from);
  if (to !== undefined) void query.where('trail_lines.at', '<', to);
  if (before !== undefined) void query.where('trail_lines.seq', '<', before);
  return query;
};

/** Names of these children, by id. */
export const childNamesOf = async (db: Knex, ids: readonly string[]): Promise<ReadonlyMap<string, string>> => {
  const rows: { id: string; first_name: string; family_name: string }[] = await db('children')
    .whereIn('children.id', [...ids])
    .select('children.id', 'children.first_name', 'children.family_name');
  return new Map(rows.map((row) => [row.id, `${row.first_name} ${row.family_name}`]));
};

export const teamZone = async (db: Knex): Promise<string> => {
  const row: { zone: string } | undefined = await db('team').first('team.zone');
  return row?.zone ?? 'UTC';
};
