import type { Knex } from 'knex';

export const up = async (db: Knex): Promise<void> => {
  for (const statement of [
    `create table team (
      id integer primary key check (id = 1),
      name text not null,
      zone text not null,
      sites text not null,
      version integer not null
    ) strict`,
    `create table members (
      id text primary key,
      name text not null,
      email text not null,
      standing text not null check (standing in ('member','trainee','administrator','auditor','guardian','young-person','referrer')),
      disciplines text not null,
      supervisor_id text references members (id),
      status text not null check (status in ('invited','active','left')),
      version integer not null,
      invited_at text,
      left_on text,
      cover_by_id text references members (id),
      cover_from text,
      cover_until text
    ) strict`,
    // The address of somebody who has left is free again; their row keeps it.
    `create unique index members_email on members (email) where status <> 'left'`,
    `create index members_email_of_all on members (email)`,
    `create table credentials (
      member_id text primary key references members (id),
      password_hash text not null,
      changed_at text not null
    ) strict`,
    `create table sign_in_failures (
      account_key text primary key,
      failures integer not null,
      wait_until text,
      changed_at text not null
    ) strict`,
    `create table mailed_links (
      token_hash text primary key,
      purpose text not null check (purpose in ('invitation','reset')),
      member_id text not null references members (id),
      made_by_id text references members (id),
      expires_at text not null,
      used_at text
    ) strict`,
    `create index mailed_links_member on mailed_links (member_id)`,
    // The session library compares datetime(expired); its table is made here so that the schema lives in one place.
    `create table sessions (sid text primary key, sess text not null, expired text not null)`,
    `create index sessions_expired on sessions (expired)`,
    `create table local_inbox (
      id text primary key,
      at text not null,
      recipient text not null,
      subject text not null,
      body text not null
    ) strict`,
    // A reset request names whatever address was typed; whether anybody has it is looked up by the sender, later.
    `create table outbox (
      id text primary key,
      kind text not null check (kind in ('mail','reset-request')),
      at text not null,
      recipient text not null,
      subject text not null,
      body text not null,
      tries integer not null,
      next_try_at text not null,
      sent_at text,
      last_error text
    ) strict`,
    `create index outbox_waiting on outbox (sent_at, next_try_at)`,
    `create table idempotency_keys (
      actor_id text not null,
      key text not null,
      operation text not null,
      body_hash text not null,
      status integer not null,
      answer text not null,
      version integer,
      at text not null,
      primary key (actor_id, key)
    ) strict`,
    `create index idempotency_keys_at on idempotency_keys (at)`,
  ]) {
    await db.raw(statement);
  }
};

export const down = async (db: Knex): Promise<void> => {
  for (const table of [
    'idempotency_keys',
    'outbox',
    'local_inbox',
    'sessions',
    'mailed_links',
    'sign_in_failures',
    'credentials',
    'members',
    'team',
  ]) {
    await db.schema.dropTable(table);
  }
};
