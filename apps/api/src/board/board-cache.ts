/**
 * The board, ready as bytes. Each child's columns are kept as text, so that a change costs the children that changed
 * and one compression; as long as nothing changes, the same bytes are sent again.
 */
import { promisify } from 'node:util';
import { setImmediate as nextTurn } from 'node:timers/promises';
import zlib from 'node:zlib';
import type { Knex } from 'knex';
import { toEpochDay } from '@weftway/calendar/plain-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import { BoardEncoder } from './board-encoding.ts';
import { readAllIds, readChangedIds, readChildrenOnBoard, readMembers, readStamp } from './board-view.ts';
import type { BoardStamp } from './board-view.ts';

const gzip = promisify<zlib.InputType, zlib.ZlibOptions, Buffer>(zlib.gzip);

interface KeptChild {
  readonly trainees: readonly string[];
  readonly text: string;
}

export interface ReadyBoard {
  readonly etag: string;
  readonly gzip: Buffer;
}

/** Who sees the same board: everyone who sees all children, or one person who sees only assigned ones. */
export interface BoardReader {
  readonly key: string;
  readonly sees: (trainees: readonly string[]) => boolean;
}

const idsAtOnce = 400;

export class BoardCache {
  #encoder = new BoardEncoder();
  #children = new Map<string, KeptChild>();
  #stamp: BoardStamp = { version: -1, team: '' };
  #ready = new Map<string, Promise<ReadyBoard>>();
  #refreshing: Promise<void> = Promise.resolve();

  /** The name of the bytes that this reader would get now, without making them. */
  etagOf(stamp: BoardStamp, today: string, reader: BoardReader): string {
    return `"b${stamp.version}-${today}-${stamp.team}-${reader.key}"`;
  }

  async read(db: Knex, stamp: BoardStamp, today: string, reader: BoardReader): Promise<ReadyBoard> {
    const known = this.#ready.get(this.etagOf(stamp, today, reader));
    if (known !== undefined) return known;
    // One after the other, so that the kept children never go back to an older version.
    this.#refreshing = this.#refreshing.catch(() => undefined).then(() => this.#refresh(db));
    await this.#refreshing;
    const etag = this.etagOf(this.#stamp, today, reader);
    const made = this.#ready.get(etag) ?? this.#make(db, etag, today, reader);
    this.#ready.set(etag, made);
    made.catch(() => this.#ready.delete(etag));
    return made;
  }

  async #refresh(db: Knex): Promise<void> {
    const stamp = await readStamp(db);
    if (stamp.version === this.#stamp.version && stamp.team === this.#stamp.team) return;
    const isFirst = this.#stamp.version < 0 || stamp.version < this.#stamp.version;
    if (isFirst) {
      this.#encoder = new BoardEncoder();
      this.#children = new Map();
    }
    const ids = isFirst ? await readAllIds(db) : await readChangedIds(db, this.#stamp.version, Number.MAX_SAFE_INTEGER);
    for (let start = 0; start < ids.length; start += idsAtOnce) {
      if (start > 0) await nextTurn();
      await this.#keep(db, ids.slice(start, start + idsAtOnce));
    }
    this.#ready.clear();
    this.#stamp = stamp;
  }

  async #keep(db: Knex, ids: readonly string[]): Promise<void> {
    for (const child of await readChildrenOnBoard(db, ids)) {
      if (child.rows.length === 0) this.#children.delete(child.id);
      else this.#children.set(child.id, { trainees: child.trainees, text: JSON.stringify(this.#encoder.child(child)) });
    }
  }

  async #make(db: Knex, etag: string, today: string, reader: BoardReader): Promise<ReadyBoard> {
    const team = await readMembers(db);
    this.#encoder.know(team.keys());
    const parts: string[] = [];
    for (const child of this.#children.values()) if (reader.sees(child.trainees)) parts.push(child.text);
    const head = {
      version: this.#stamp.version,
      day: toEpochDay(today as PlainDate),
      team: this.#stamp.team, // the team's checked local date
      members: this.#encoder.members(team),
      milestones: this.#encoder.milestones,
    };
    const text = `${JSON.stringify(head).slice(0, -1)},"children":[${parts.join(',')}]}`;
    return { etag, gzip: await gzip(text, { level: 4 }) };
  }
}
