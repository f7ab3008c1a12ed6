/** Which milestones of children are done, whether signed here or imported. */
import type { Knex } from 'knex';

export interface DoneMilestone {
  readonly milestone: string;
  readonly on: string;
}

interface DoneRow {
  readonly child_id: string;
  readonly milestone: string;
  readonly performed_on: string;
}

/** One row is a milestone of a child with the day on which it was done. */
export const completionsOf = async (
  db: Knex,
  childIds: readonly string[],
): Promise<ReadonlyMap<string, DoneMilestone[]>> => {
  const wanted = JSON.stringify(childIds);
  const rows: DoneRow[] = await db.raw(
    `select child_id, milestone, performed_on from imported_completions where child_id in (select value from json_each(?))
     union select child_id, milestone, performed_on from signatures where child_id in (select value from json_each(?))`,
    [wanted, wanted],
  );
  const byChild = new Map<string, DoneMilestone[]>();
  for (const row of rows)
    byChild.set(row.child_id, [
      ...(byChild.get(row.child_id) ?? []),
      { milestone: row.milestone, on: row.performed_on },
    ]);
  return byChild;
};
