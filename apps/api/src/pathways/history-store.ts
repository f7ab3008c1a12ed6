/** What happened to one child, from the trail, newest first. */
import type { Knex } from 'knex';

interface HistoryRow {
  readonly seq: number;
  readonly at: string;
  readonly kind: string;
  readonly actor_name: string;
  readonly milestone: string | null;
  readonly after: string;
}

/** More than a child meets in years of daily work; older lines are in the audit trail. */
const most = 1000;

export const historyOf = async (db: Knex, childId: string): Promise<HistoryRow[]> =>
  db('trail_lines')
    .join('trail_payloads', 'trail_payloads.seq', 'trail_lines.seq')
    .where('trail_lines.child_id', childId)
    .orderBy('trail_lines.seq', 'desc')
    .limit(most)
    .select(
      'trail_lines.seq',
      'trail_lines.at',
      'trail_lines.kind',
      'trail_lines.actor_name',
      'trail_lines.milestone',
      'trail_payloads.after',
    );
