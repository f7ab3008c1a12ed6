/** Moves every child in care to a version, and says which of its open windows that moves. */
import type { Knex } from 'knex';
import { loadPathways } from '../pathways/pathway-store.ts';
import type { PathwayRecord } from '../pathways/pathway-store.ts';
import { boardRowsOf } from '../pathways/project-children.ts';
import type { BoardRowRecord } from '../pathways/project-children.ts';
import type { TrailEvent } from '../trail/trail-event.ts';
import { childrenOnOtherVersions } from './protocol-view.ts';

export interface MovedWindow {
  readonly milestone: string;
  readonly before: string | null;
  readonly after: string | null;
}

const finished: readonly string[] = ['signed', 'waived', 'transferred'];
const atOnce = 200;

const windowOf = (row: BoardRowRecord | undefined): string | null =>
  row === undefined || row.earliest === null ? null : `${row.earliest} to ${row.latest ?? ''}, aim ${row.target ?? ''}`;

/** Windows that are not finished and stand differently under the other version. */
export const movedWindows = (before: readonly BoardRowRecord[], after: readonly BoardRowRecord[]): MovedWindow[] => {
  const old = new Map(before.map((row) => [row.milestone, row]));
  const coming = new Map(after.map((row) => [row.milestone, row]));
  return [...new Set([...old.keys(), ...coming.keys()])].flatMap((milestone) => {
    const [was, is] = [old.get(milestone), coming.get(milestone)];
    if (finished.includes((is ?? was)?.state ?? '')) return [];
    const [from, to] = [windowOf(was), windowOf(is)];
    return from === to ? [] : [{ milestone, before: from, after: to }];
  });
};

const eventOf = async (
  trx: Knex,
  record: PathwayRecord,
  to: { readonly version: number; readonly reason: string; readonly today: string },
): Promise<TrailEvent> => {
  const { child } = record;
  const before = await boardRowsOf(trx, record, to.today);
  const after = await boardRowsOf(trx, { ...record, child: { ...child, protocol_version: to.version } }, to.today);
  return {
    kind: 'child-moved-to-protocol',
    childId: child.id,
    before: { version: child.protocol_version },
    after: { version: to.version, reason: to.reason, moved: movedWindows(before, after) },
  };
};

/** One event for each child in care that follows another version. */
export const moveEvents = async (trx: Knex, version: number, reason: string, today: string): Promise<TrailEvent[]> => {
  const ids = await childrenOnOtherVersions(trx, version);
  const events: TrailEvent[] = [];
  for (let start = 0; start < ids.length; start += atOnce) {
    for (const record of await loadPathways(trx, ids.slice(start, start + atOnce)))
      events.push(await eventOf(trx, record, { version, reason, today }));
  }
  return events;
};
