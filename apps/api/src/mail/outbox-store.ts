/**
 * Letters waiting to be sent. A row is written in the transaction of its cause; the sender takes it up afterwards.
 * Once sent, the text is wiped, since links stand in it.
 */
import type { Knex } from 'knex';
import type { Letter } from './mail-texts.ts';
import { oneLine, plainAddress } from './mail-address.ts';

export interface OutboxRow {
  readonly id: string;
  readonly kind: 'mail' | 'reset-request';
  readonly at: string;
  readonly recipient: string;
  readonly subject: string;
  readonly body: string;
  readonly tries: number;
  readonly next_try_at: string;
}

export interface NewMail extends Letter {
  readonly id: string;
  readonly to: string;
  /** UTC instant. */
  readonly at: string;
}

const waiting = (id: string, at: string) => ({ id, at, tries: 0, next_try_at: at, sent_at: null, last_error: null });

export const queueMail = async (trx: Knex, { id, to, subject, text, at }: NewMail): Promise<void> => {
  await trx('outbox').insert({
    ...waiting(id, at),
    kind: 'mail',
    recipient: plainAddress(to),
    subject: oneLine(subject),
    body: text,
  });
};

export interface ResetRequest {
  readonly id: string;
  readonly email: string;
  readonly origin: string;
  readonly at: string;
}

/** The body of a request holds what the link starts with. */
export const queueResetRequest = async (trx: Knex, { id, email, origin, at }: ResetRequest): Promise<void> => {
  await trx('outbox').insert({
    ...waiting(id, at),
    kind: 'reset-request',
    recipient: plainAddress(email),
    subject: '',
    body: origin,
  });
};

export const dueMail = async (db: Knex, now: string): Promise<OutboxRow[]> =>
  db('outbox')
    .whereNull('sent_at')
    .where('next_try_at', '<=', now)
    .orderBy('next_try_at')
    .limit(50)
    .select('id', 'kind', 'at', 'recipient', 'subject', 'body', 'tries', 'next_try_at');

/** Takes a row for one try, until the lease runs out; false when another sender was faster. */
export const claimMail = async (db: Knex, row: OutboxRow, leaseUntil: string): Promise<boolean> => {
  const changed = await db('outbox')
    .where({ id: row.id, next_try_at: row.next_try_at })
    .whereNull('sent_at')
    .update({ next_try_at: leaseUntil, tries: row.tries + 1 });
  return changed === 1;
};

export const mailWasSent = async (db: Knex, id: string, at: string): Promise<void> => {
  await db('outbox').where({ id }).update({ sent_at: at, body: '', last_error: null });
};

/** `error` is a code of the mail server or its library, never its text. */
export const mailWaits = async (db: Knex, id: string, nextTryAt: string, error: string): Promise<void> => {
  await db('outbox').where({ id }).update({ next_try_at: nextTryAt, last_error: error });
};

/** A request becomes a letter that is due at once, or is laid aside when nobody has that address. */
export const answerResetRequest = async (trx: Knex, id: string, letter: Letter | null, at: string): Promise<void> => {
  const change =
    letter === null
      ? { sent_at: at, body: '' }
      : { kind: 'mail', subject: letter.subject, body: letter.text, tries: 0, next_try_at: at };
  await trx('outbox').where({ id }).update(change);
};
