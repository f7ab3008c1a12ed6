/**
 * Who looked at what. It grows fastest, so it lives in a file and connection of its own; lines are chained and written
 * in one commit within 100 ms. When a commit fails, further reads of records are refused until it works.
 */
import Database from 'better-sqlite3';
import { canonicalText, digestOf, firstHash } from './trail-chain.ts';

export interface AccessLine {
  readonly at: string;
  readonly actorId: string;
  readonly actorName: string;
  readonly actorRole: string;
  readonly operation: string;
  /** Empty where an act that is not about a child was refused. */
  readonly childId: string;
  readonly requestId: string;
}

/** Follows the name of an operation that was refused. */
export const refusedSuffix = ' refused';

export interface StoredAccessLine extends AccessLine {
  readonly seq: number;
  readonly hash: string;
}

export interface AccessFilter {
  readonly child?: string | undefined;
  readonly member?: string | undefined;
  readonly kind?: string | undefined;
  readonly from?: string | undefined;
  readonly to?: string | undefined;
  readonly before?: number | undefined;
  readonly limit: number;
}

const schema = `
  create table if not exists access_lines (
    seq integer primary key, at text not null, actor_id text not null, actor_name text not null, actor_role text not null,
    operation text not null, child_id text not null, request_id text not null, hash text not null
  ) strict;
  create index if not exists access_lines_child on access_lines (child_id, seq);
  create index if not exists access_lines_actor on access_lines (actor_id, seq);
  create trigger if not exists access_no_update before update on access_lines begin select raise(abort, 'the log of reads is append-only'); end;
  create trigger if not exists access_no_delete before delete on access_lines begin select raise(abort, 'the log of reads is append-only'); end;
  create trigger if not exists access_no_replace before insert on access_lines when exists (select 1 from access_lines where seq = new.seq) begin select raise(abort, 'the log of reads is append-only'); end;
`;

const flushAfterMs = 100;
const columns = `seq, at, actor_id as actorId, actor_name as actorName, actor_role as actorRole, operation, child_id as childId, request_id as requestId, hash`;

/** Also for a connection of one's own, such as the command that proves the trail. */
export const readsAfter = (db: Database.Database, seq: number, limit: number): StoredAccessLine[] =>
  db
    .prepare(`select ${columns} from access_lines where seq > ? order by seq limit ?`)
    .all(seq, limit) as StoredAccessLine[]; // columns as selected

export const hashOfRead = (db: Database.Database, seq: number): string | null =>
  (db.prepare('select hash from access_lines where seq = ?').pluck().get(seq) as string | undefined) ?? null; // one text column

export class AccessLog {
  readonly #db: Database.Database;
  readonly #insert: Database.Statement;
  #waiting: AccessLine[] = [];
  #timer: NodeJS.Timeout | null = null;
  #isBroken = false;
  #last: { seq: number; hash: string };

  constructor(file: string) {
    this.#db = new Database(file);
    this.#db.pragma('journal_mode = WAL');
    this.#db.pragma('synchronous = NORMAL');
    this.#db.exec(schema);
    this.#insert = this.#db.prepare(
      'insert into access_lines values (@seq, @at, @actorId, @actorName, @actorRole, @operation, @childId, @requestId, @hash)',
    );
    const last = this.#db.prepare('select seq, hash from access_lines order by seq desc limit 1').get() as
      { seq: number; hash: string } | undefined; // columns as selected
    this.#last = last ?? { seq: 0, hash: firstHash };
  }

  /** False while lines cannot be written: then no record may be read. */
  get isWorking(): boolean {
    return !this.#isBroken;
  }

  append(line: AccessLine): void {
    this.#waiting.push(line);
    this.#timer ??= setTimeout(() => this.flush(), flushAfterMs);
  }

  flush(): void {
    if (this.#timer !== null) clearTimeout(this.#timer);
    this.#timer = null;
    if (this.#waiting.length === 0) return;
    try {
      let last = this.#last;
      this.#db.transaction(() => {
        for (const line of this.#waiting) {
          const seq = last.seq + 1;
          last = { seq, hash: digestOf(last.hash + canonicalText({ seq, ...line })) };
          this.#insert.run({ ...line, ...last });
        }
      })();
      this.#last = last;
      this.#waiting = [];
      this.#isBroken = false;
    } catch {
      this.#isBroken = true;
      this.#timer = setTimeout(() => this.flush(), 1000);
    }
  }

  /** Newest first. */
  read(filter: AccessFilter): StoredAccessLine[] {
    this.flush();
    const where: string[] = ['1 = 1'];
    const add = (sql: string, value: unknown): void => {
      if (value !== undefined) where.push(sql);
    };
    add('child_id = @child', filter.child);
    add('actor_id = @member', filter.member);
    // One word for every refusal, whatever was asked for.
    if (filter.kind === refusedSuffix.trim()) where.push(`operation like '%${refusedSuffix}'`);
    else add('operation = @kind', filter.kind);
    add('at >= @from', filter.from);
    add('at < @to', filter.to);
    add('seq < @before', filter.before);
    return this.#db
      .prepare(`select ${columns} from access_lines where ${where.join(' and ')} order by seq desc limit @limit`)
      .all(filter) as StoredAccessLine[]; // columns as selected
  }

  /** Oldest first, for a proof of the chain. */
  after(seq: number, limit: number): StoredAccessLine[] {
    this.flush();
    return readsAfter(this.#db, seq, limit);
  }

  hashOf(seq: number): string | null {
    this.flush();
    return hashOfRead(this.#db, seq);
  }

  /** The last line that was written; number 0 while there is none. */
  get head(): { readonly seq: number; readonly hash: string } {
    this.flush();
    return this.#last;
  }

  close(): void {
    this.flush();
    if (this.#timer !== null) clearTimeout(this.#timer);
    this.#db.close();
  }
}
