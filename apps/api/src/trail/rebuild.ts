/**
 * Makes a database again from the trail alone: every line goes through the same door as when it was new, so that facts
 * and trail cannot say different things. What never enters the trail (passwords, links, sessions) is not made again.
 */
import type { Knex } from 'knex';
import type { EventKind } from '@weftway/contract/trail';
import { projectChildren } from '../pathways/project-children.ts';
import { appendEvents } from './append-events.ts';
import type { TrailEvent } from './trail-event.ts';

interface StoredLine {
  readonly seq: number;
  readonly at: string;
  readonly kind: EventKind;
  readonly actor_id: string | null;
  readonly actor_name: string;
  readonly actor_role: string;
  readonly child_id: string | null;
  readonly member_id: string | null;
  readonly milestone: string | null;
  readonly request_id: string;
  readonly hash: string;
  readonly before: string;
  readonly after: string;
}

const linesAtOnce = 500;

/** Lines after `seq` with what they held, oldest first. */
const linesAfter = async (db: Knex, seq: number): Promise<StoredLine[]> =>
  db('trail_lines')
    .join('trail_payloads', 'trail_payloads.seq', 'trail_lines.seq')
    .where('trail_lines.seq', '>', seq)
    .orderBy('trail_lines.seq')
    .limit(linesAtOnce)
    .select(
      'trail_lines.seq',
      'trail_lines.at',
      'trail_lines.kind',
      'trail_lines.actor_id',
      'trail_lines.actor_name',
      'trail_lines.actor_role',
      'trail_lines.child_id',
      'trail_lines.member_id',
      'trail_lines.milestone',
      'trail_lines.request_id',
      'trail_lines.hash',
      'trail_payloads.before',
      'trail_payloads.after',
    );

const eventOf = (line: StoredLine): TrailEvent => {
  const event: unknown = {
    kind: line.kind,
    ...(line.child_id === null ? {} : { childId: line.child_id }),
    ...(line.member_id === null ? {} : { memberId: line.member_id }),
    ...(line.milestone === null ? {} : { milestone: line.milestone }),
    before: JSON.parse(line.before) as unknown,
    after: JSON.parse(line.after) as unknown,
  };
  return event as TrailEvent; // the trail holds only events that were written as such
};

const writeAgain = async (trx: Knex, line: StoredLine): Promise<void> => {
  const author = {
    at: line.at,
    actorId: line.actor_id,
    actorName: line.actor_name,
    actorRole: line.actor_role,
    requestId: line.request_id,
  };
  const seq = await appendEvents(trx, [eventOf(line)], author);
  const written: { hash: string } | undefined = await trx('trail_lines').where({ seq }).first('hash');
  if (seq !== line.seq || written?.hash !== line.hash)
    throw new Error(`Line ${String(line.seq)} of the trail does not come out as it was written.`);
};

/**
 * Fills `target`, a migrated and empty database, from the trail of `source`; the board is made for `today`.
 * Throws at the first line that does not come out with its own number and hash. Answers how many lines were written.
 */
export const rebuild = async (source: Knex, target: Knex, today: string): Promise<number> => {
  let last = 0;
  for (let lines = await linesAfter(source, last); lines.length > 0; lines = await linesAfter(source, last)) {
    const chunk = lines;
    await target.transaction(async (trx) => {
      for (const line of chunk) await writeAgain(trx, line);
    });
    last = chunk.at(-1)?.seq ?? last;
  }
  await target.transaction(async (trx) => {
    const children: { id: string }[] = await trx('children').orderBy('id').select('id');
    await projectChildren(
      trx,
      children.map(({ id }) => id),
      today,
    );
  });
  return last;
};
