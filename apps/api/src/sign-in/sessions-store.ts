/** Ends sessions in the database; the browser's cookie then opens nothing. */
import type { Knex } from 'knex';
import { limits } from '../limits.ts';
import { sessionsOfMember } from './session-view.ts';

export const endSession = async (trx: Knex, storedId: string): Promise<void> => {
  await trx('sessions').where({ sid: storedId }).delete();
};

/** Every session of a member, but for the one to keep. */
export const endSessionsOf = async (trx: Knex, memberId: string, keptStoredId: string | null): Promise<void> => {
  await trx('sessions')
    .whereRaw("json_extract(sess, '$.passport.user') = ?", [memberId])
    .modify((query) => (keptStoredId === null ? query : query.whereNot({ sid: keptStoredId })))
    .delete();
};

/** Makes room for one more: the oldest end. */
export const endOldestSessions = async (db: Knex, memberId: string): Promise<void> => {
  const sessions = await sessionsOfMember(db, memberId);
  for (const { id } of sessions.slice(limits.sessionsPerMember - 1)) await endSession(db, id);
};
