/** Protocol documents, parsed once a version: an active or retired version never changes. */
import type { Knex } from 'knex';
import { protocolSchema } from '@weftway/pathway/protocol';
import type { Protocol } from '@weftway/pathway/protocol';

const known = new WeakMap<object, Map<number, Protocol>>();

const cacheOf = (db: Knex): Map<number, Protocol> => {
  // Transactions come and go; the client underneath them stays.
  const key = db.client.config as object; // one configuration object per database
  const cache = known.get(key) ?? new Map<number, Protocol>();
  known.set(key, cache);
  return cache;
};

/** Throws when the version does not exist. */
export const loadProtocol = async (db: Knex, version: number): Promise<Protocol> => {
  const cache = cacheOf(db);
  const cached = cache.get(version);
  if (cached !== undefined) return cached;
  const row: { document: string } | undefined = await db('protocols').where({ version }).first('document');
  if (row === undefined) throw new Error(`No protocol version ${version}`);
  const protocol = protocolSchema.parse(JSON.parse(row.document));
  cache.set(version, protocol);
  return protocol;
};

export const activeProtocolVersion = async (db: Knex): Promise<number> => {
  const row: { version: number } | undefined = await db('protocols').where({ status: 'active' }).first('version');
  if (row === undefined) throw new Error('No protocol is active');
  return row.version;
};

/** Null when there is no such version. */
export const protocolStatus = async (db: Knex, version: number): Promise<'draft' | 'active' | 'retired' | null> => {
  const row: { status: 'draft' | 'active' | 'retired' } | undefined = await db('protocols')
    .where({ version })
    .first('status');
  return row?.status ?? null;
};
