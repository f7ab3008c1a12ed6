/** Children in care by their lead clinician. */
import type { Knex } from 'knex';

/** Of children who are with another team as well: they may come back. */
export const childrenLedBy = async (db: Knex, memberId: string): Promise<string[]> => {
  const rows: { id: string }[] = await db('children')
    .where({ lead_clinician_id: memberId })
    .whereNull('care_ended_on')
    .orderBy('id')
    .select('id');
  return rows.map(({ id }) => id);
};
