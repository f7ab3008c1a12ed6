import { promisify } from 'node:util';
import zlib from 'node:zlib';
import { toEpochDay } from '@weftway/calendar/plain-date';
import { readBoardChanges } from '@weftway/contract/board';
import type { BoardChanges } from '@weftway/contract/board';
import { endpoint } from '../http/endpoint.ts';
import type { Ready } from '../http/outcome.ts';
import { BoardEncoder } from './board-encoding.ts';
import { boardReaderOf, seesEveryone } from './board-reader.ts';
import { readChangedIds, readChildrenOnBoard, readMembers, readStamp } from './board-view.ts';

const gzip = promisify<Buffer, Buffer>(zlib.gzip);

/** Further behind than this, reading the whole board is the smaller work. */
const mostChildren = 100;

export const readBoardChangesEndpoint = endpoint<typeof readBoardChanges>({
  operation: readBoardChanges,
  can: { action: 'read', subject: 'Board' },
  handle: async ({ trx, ability, actor, today, query, acceptsGzip }) => {
    const stamp = await readStamp(trx);
    const head = { version: stamp.version, day: toEpochDay(today), team: stamp.team };
    const ids = stamp.version === query.since ? [] : await readChangedIds(trx, query.since, mostChildren + 1);
    // Who sees only assigned children must not learn the ids of others, nor keep a child that was taken from them.
    const isWhole =
      query.since > stamp.version ||
      ids.length > mostChildren ||
      (ids.length > 0 && !seesEveryone(boardReaderOf(ability, actor.id)));
    const etag = `"c${query.since}-${stamp.version}-${today}-${stamp.team}-${actor.id}"`;
    const send = async (changes: BoardChanges): Promise<Ready> => {
      const body = Buffer.from(JSON.stringify(changes));
      return {
        kind: 'ready',
        etag,
        isSame: false,
        encoding: acceptsGzip ? 'gzip' : 'identity',
        body: acceptsGzip ? await gzip(body) : body,
      };
    };
    if (isWhole || ids.length === 0) return send({ ...head, isWhole, members: [], milestones: [], children: [] });
    const encoder = new BoardEncoder();
    const children = (await readChildrenOnBoard(trx, ids)).map((child) => encoder.child(child));
    return send({
      ...head,
      isWhole,
      members: encoder.members(await readMembers(trx)),
      milestones: encoder.milestones,
      children,
    });
  },
});
