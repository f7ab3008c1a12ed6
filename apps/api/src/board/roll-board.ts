/** A new day moves states by itself: only the children with something that changes today are planned again. */
import type { Knex } from 'knex';
import { projectChildren, sixMonthsAfter } from '../pathways/project-children.ts';
import type { Services } from '../http/services.ts';

/** Children with a state that changes by itself until today, or with a milestone that comes within six months. */
const idsThatMove = async (trx: Knex, today: string): Promise<string[]> => {
  const rows: { id: string }[] = await trx.raw(
    `select child_id as id from board_rows where changes_on <= ?
     union
     select board_rows.child_id from board_rows join children on children.id = board_rows.child_id
     where board_rows.state = 'ahead' and board_rows.is_on_board = 0 and board_rows.earliest <= ? and children.care_ended_on is null
     order by id`,
    [today, sixMonthsAfter(today)],
  );
  return rows.map((row) => row.id);
};

const allIds = async (trx: Knex): Promise<string[]> => {
  const rows: { id: string }[] = await trx('children').orderBy('id').select('id');
  return rows.map((row) => row.id);
};

/** Does nothing when the board already stands on today. Answers how many children were planned again. */
export const rollBoard = async (services: Services): Promise<number> => {
  const today = services.today();
  const counter: { rolled_on: string } | undefined = await services.db('board_counter').first('rolled_on');
  if (counter?.rolled_on === today) return 0;
  const { count, version } = await services.db.transaction(async (trx) => {
    await trx.raw('update board_counter set rolled_on = ?', [today]);
    // Moving back in time happens only in tests and demonstrations: then everything is planned again.
    const isForward = counter !== undefined && counter.rolled_on !== '' && counter.rolled_on < today;
    const ids = isForward ? await idsThatMove(trx, today) : await allIds(trx);
    return { count: ids.length, version: await projectChildren(trx, ids, today) };
  });
  services.liveView.changed(version);
  return count;
};
