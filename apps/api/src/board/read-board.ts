import zlib from 'node:zlib';
import type { Knex } from 'knex';
import { readBoard } from '@weftway/contract/board';
import { endpoint } from '../http/endpoint.ts';
import type { Ready } from '../http/outcome.ts';
import { BoardCache } from './board-cache.ts';
import { boardReaderOf } from './board-reader.ts';
import { readStamp } from './board-view.ts';

/** One cache for each open database. */
const caches = new WeakMap<Knex, BoardCache>();

const cacheOf = (db: Knex): BoardCache => {
  const known = caches.get(db) ?? new BoardCache();
  caches.set(db, known);
  return known;
};

const nothing = Buffer.alloc(0);

export const readBoardEndpoint = endpoint<typeof readBoard>({
  operation: readBoard,
  can: { action: 'read', subject: 'Board' },
  handle: async ({ trx, services, ability, actor, today, ifNoneMatch, acceptsGzip }): Promise<Ready> => {
    const cache = cacheOf(services.db);
    const reader = boardReaderOf(ability, actor.id);
    const stamp = await readStamp(trx);
    const etag = cache.etagOf(stamp, today, reader);
    const encoding = acceptsGzip ? 'gzip' : 'identity';
    if (ifNoneMatch === etag) return { kind: 'ready', etag, isSame: true, encoding, body: nothing };
    const board = await cache.read(services.db, stamp, today, reader);
    return {
      kind: 'ready',
      etag,
      isSame: false,
      encoding,
      body: acceptsGzip ? board.gzip : zlib.gunzipSync(board.gzip),
    };
  },
});
