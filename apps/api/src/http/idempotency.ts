/** A creating call repeated with the same key gets the stored answer; the key is kept for a day. */
import type { Knex } from 'knex';
import { limits } from '../limits.ts';

interface KeyRow {
  readonly operation: string;
  readonly body_hash: string;
  readonly answer: string;
}

type Found =
  { readonly kind: 'new' } | { readonly kind: 'other' } | { readonly kind: 'same'; readonly answer: unknown };

interface Call {
  readonly actorId: string;
  readonly key: string;
  readonly operation: string;
  readonly bodyHash: string;
  /** UTC instant. */
  readonly now: string;
}

/** Forgets keys that are past their time, then looks this one up. */
export const findAnswered = async (trx: Knex, { actorId, key, operation, bodyHash, now }: Call): Promise<Found> => {
  const oldest = new Date(Date.parse(now) - limits.idempotencyKept * 1000).toISOString();
  await trx('idempotency_keys').where('at', '<', oldest).delete();
  const row: KeyRow | undefined = await trx('idempotency_keys')
    .where({ actor_id: actorId, key })
    .first('operation', 'body_hash', 'answer');
  if (row === undefined) return { kind: 'new' };
  if (row.operation !== operation || row.body_hash !== bodyHash) return { kind: 'other' };
  return { kind: 'same', answer: JSON.parse(row.answer) as unknown };
};

export interface KeptAnswer {
  readonly actorId: string;
  readonly key: string;
  readonly operation: string;
  readonly bodyHash: string;
  readonly status: number;
  readonly answer: unknown;
  readonly at: string;
}

export const keepAnswer = async (trx: Knex, kept: KeptAnswer): Promise<void> => {
  await trx('idempotency_keys').insert({
    actor_id: kept.actorId,
    key: kept.key,
    operation: kept.operation,
    body_hash: kept.bodyHash,
    status: kept.status,
    answer: JSON.stringify(kept.answer),
    at: kept.at,
  });
};
