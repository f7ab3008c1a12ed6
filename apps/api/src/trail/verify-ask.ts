/** Asks through the server's own connection. */
import type { Knex } from 'knex';
import type { AskRows } from './verify-view.ts';

export const askOf =
  (db: Knex): AskRows =>
  async (sql, bindings) =>
    (await db.raw(sql, [...bindings])) as readonly unknown[]; // the driver answers a list of rows
