/** The one connection to the main database. */
import fs from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import type BetterSqlite3 from 'better-sqlite3';
import knex from 'knex';
import type { Knex } from 'knex';
import { TsMigrationSource, TsSeedSource } from './migration-source.ts';

const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../../../..');

/** WAL alone would fall back to NORMAL on reopening; a signature must survive a power cut, so FULL is set each time. */
const pragmas = [
  'journal_mode = WAL',
  'synchronous = FULL',
  'foreign_keys = ON',
  'busy_timeout = 5000',
  'trusted_schema = OFF',
  // Without it, "insert or replace" deletes rows past the triggers that keep the trail and the signatures.
  'recursive_triggers = ON',
  'cell_size_check = ON',
  'cache_size = -64000',
  'mmap_size = 268435456',
  'temp_store = MEMORY',
];

export const knexConfig = (file: string): Knex.Config => ({
  client: 'better-sqlite3',
  connection: { filename: file },
  useNullAsDefault: true,
  pool: {
    min: 1,
    max: 1,
    afterCreate: (connection: BetterSqlite3.Database, done: (error: Error | null, connection: unknown) => void) => {
      for (const pragma of pragmas) connection.pragma(pragma);
      done(null, connection);
    },
  },
  migrations: { migrationSource: new TsMigrationSource(path.join(root, 'migrations')) },
  seeds: { seedSource: new TsSeedSource(path.join(root, 'seeds')) },
});

/** Opens the database file, making its folder when missing; `:memory:` for tests. */
export const openDatabase = (file: string): Knex => {
  if (file !== ':memory:') fs.mkdirSync(path.dirname(file), { recursive: true });
  return knex(knexConfig(file));
};
