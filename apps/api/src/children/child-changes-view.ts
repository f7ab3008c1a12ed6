/** The history of one record, from the lines of the trail that are about the record itself. */
import { isDeepStrictEqual } from 'node:util';
import type { Knex } from 'knex';
import type { ChildChange } from '@weftway/contract/child-history';

interface LineRow {
  readonly seq: number;
  readonly at: string;
  readonly kind: string;
  readonly actor_name: string;
  readonly actor_role: string;
  readonly before: string;
  readonly after: string;
}

const shownKinds = [
  'child-registered',
  'child-edited',
  'child-transferred',
  'child-returned',
  'care-ended',
  'lead-handed-on',
  'trainees-assigned',
  'child-moved-to-protocol',
];

type Payload = Readonly<Record<string, unknown>> | null;

const differences = (before: Payload, after: Payload): ChildChange['changes'] =>
  Object.keys(after ?? {})
    .filter((field) => field !== 'reason' && !isDeepStrictEqual(before?.[field] ?? null, after?.[field] ?? null))
    .map((field) => ({ field, before: before?.[field] ?? null, after: after?.[field] ?? null }));

const changeOf = (row: LineRow): ChildChange => {
  const before = JSON.parse(row.before) as Payload; // written by appendEvents
  const after = JSON.parse(row.after) as Payload; // written by appendEvents
  const inner = (payload: Payload): Payload =>
    payload !== null && 'fields' in payload ? (payload['fields'] as Payload) : payload; // records are kept under `fields`
  return {
    seq: row.seq,
    at: row.at,
    kind: row.kind,
    actorName: row.actor_name,
    actorRole: row.actor_role,
    reason: typeof after?.['reason'] === 'string' ? after['reason'] : '',
    changes: row.kind === 'child-registered' ? [] : differences(inner(before), inner(after)),
  };
};

/** Newest first, before line `before` when given; one more than `limit` tells that more follow. */
export const viewChildChanges = async (
  db: Knex,
  childId: string,
  page: { readonly before: number | null; readonly limit: number },
): Promise<ChildChange[]> => {
  const query = db('trail_lines')
    .join('trail_payloads', 'trail_payloads.seq', 'trail_lines.seq')
    .where('trail_lines.child_id', childId)
    .whereIn('trail_lines.kind', shownKinds)
    .orderBy('trail_lines.seq', 'desc')
    .limit(page.limit + 1)
    .select(
      'trail_lines.seq',
      'trail_lines.at',
      'trail_lines.kind',
      'trail_lines.actor_name',
      'trail_lines.actor_role',
      'trail_payloads.before',
      'trail_payloads.after',
    );
  if (page.before !== null) void query.where('trail_lines.seq', '<', page.before);
  const rows: LineRow[] = await query;
  return rows.map(changeOf);
};
