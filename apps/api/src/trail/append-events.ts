/** Writes events: facts, chained line and payload, in the open transaction or not at all. */
import { setImmediate } from 'node:timers/promises';
import type { Knex } from 'knex';
import { applyEvent } from './apply-event.ts';
import { canonicalText, digestOf, firstHash, hashOf } from './trail-chain.ts';
import type { ChainedLine } from './trail-chain.ts';
import type { EventStamp, TrailEvent } from './trail-event.ts';

interface LineRow {
  readonly seq: number;
  readonly hash: string;
}

export type Author = Omit<EventStamp, 'seq'>;

const lineColumns = [
  'seq',
  'at',
  'kind',
  'actor_id',
  'actor_name',
  'actor_role',
  'child_id',
  'member_id',
  'milestone',
  'request_id',
  'before_digest',
  'after_digest',
  'previous_hash',
  'hash',
] as const;

/** One statement for many lines: an import writes tens of thousands. */
const linesAtOnce = 500;

/** Rows as arrays in the order of `columns`, which are literals of this file. */
const insertAll = async (
  trx: Knex,
  table: 'trail_lines' | 'trail_payloads',
  columns: readonly string[],
  rows: readonly unknown[][],
): Promise<void> => {
  const values = columns.map((_column, index) => `json_extract(value, '$[${index}]')`).join(', ');
  await trx.raw(`insert into ${table} (${columns.join(', ')}) select ${values} from json_each(?)`, [
    JSON.stringify(rows),
  ]);
};

/** Answers the number of the last line written. */
export const appendEvents = async (trx: Knex, events: readonly TrailEvent[], author: Author): Promise<number> => {
  const last: LineRow | undefined = await trx('trail_lines').orderBy('seq', 'desc').first('seq', 'hash');
  let seq = last?.seq ?? 0;
  let previousHash = last?.hash ?? firstHash;
  const lines: unknown[][] = [];
  const payloads: unknown[][] = [];
  const write = async (): Promise<void> => {
    await insertAll(trx, 'trail_lines', lineColumns, lines.splice(0));
    await insertAll(trx, 'trail_payloads', ['seq', 'before', 'after'], payloads.splice(0));
  };
  for (const event of events) {
    seq += 1;
    const stamp: EventStamp = { ...author, seq };
    const before = canonicalText(event.before);
    const after = canonicalText(event.after);
    // Applied as it reads in the trail, so that a rebuild writes the very same facts.
    await applyEvent(trx, { ...event, after: JSON.parse(after) } as TrailEvent, stamp); // the same payload, read back
    const line: ChainedLine = {
      seq,
      at: stamp.at,
      kind: event.kind,
      actorId: stamp.actorId,
      actorName: stamp.actorName,
      actorRole: stamp.actorRole,
      childId: event.childId ?? null,
      memberId: event.memberId ?? null,
      milestone: event.milestone ?? null,
      requestId: stamp.requestId,
      beforeDigest: digestOf(before),
      afterDigest: digestOf(after),
    };
    const hash = hashOf(previousHash, line);
    lines.push([
      seq,
      line.at,
      line.kind,
      line.actorId,
      line.actorName,
      line.actorRole,
      line.childId,
      line.memberId,
      line.milestone,
      line.requestId,
      line.beforeDigest,
      line.afterDigest,
      previousHash,
      hash,
    ]);
    payloads.push([seq, before, after]);
    if (lines.length >= linesAtOnce) {
      await write();
      // Requests that need no database are answered in between.
      await setImmediate();
    }
    previousHash = hash;
  }
  if (lines.length > 0) await write();
  return seq;
};
