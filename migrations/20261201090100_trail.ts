import type { Knex } from 'knex';

/** A chained line holds digests; the payload table beside it holds what stood before and after. */
export const up = async (db: Knex): Promise<void> => {
  for (const statement of [
    `create table trail_lines (
      seq integer primary key,
      at text not null,
      kind text not null,
      actor_id text,
      actor_name text not null,
      actor_role text not null,
      child_id text,
      member_id text,
      milestone text,
      request_id text not null,
      before_digest text not null,
      after_digest text not null,
      previous_hash text not null,
      hash text not null
    ) strict`,
    `create index trail_lines_child on trail_lines (child_id, seq)`,
    `create index trail_lines_member on trail_lines (member_id, seq)`,
    `create index trail_lines_actor on trail_lines (actor_id, seq)`,
    `create index trail_lines_kind on trail_lines (kind, seq)`,
    `create index trail_lines_at on trail_lines (at)`,
    `create table trail_payloads (
      seq integer primary key references trail_lines (seq),
      before text not null,
      after text not null
    ) strict`,
    ...['trail_lines', 'trail_payloads'].flatMap((table) =>
      ['update', 'delete'].map(
        (verb) =>
          `create trigger ${table}_no_${verb} before ${verb} on ${table} begin select raise(abort, 'the trail is append-only'); end`,
      ),
    ),
    // "insert or replace" deletes without firing the triggers above.
    ...['trail_lines', 'trail_payloads'].map(
      (table) =>
        `create trigger ${table}_no_replace before insert on ${table} when exists (select 1 from ${table} where seq = new.seq) begin select raise(abort, 'the trail is append-only'); end`,
    ),
  ]) {
    await db.raw(statement);
  }
};

export const down = async (db: Knex): Promise<void> => {
  await db.schema.dropTable('trail_payloads');
  await db.schema.dropTable('trail_lines');
};
