/** Slows guessing down, per account and per password proof, without telling whether the account exists. */
import type { Knex } from 'knex';
import { limits } from '../limits.ts';

interface FailureRow {
  readonly failures: number;
  readonly wait_until: string | null;
}

const waitAfter = (failures: number): number => {
  const { free, firstWait, longestWait } = limits.guessing;
  return failures <= free ? 0 : Math.min(longestWait, firstWait * 2 ** Math.min(20, failures - free - 1));
};

/**
 * Counts an attempt and says whether it may be tried at all. Looked at and counted in one transaction, before the hash
 * is checked, so that guesses sent side by side all count and only the first of them passes.
 */
export const mayTry = (db: Knex, key: string, now: Date): Promise<boolean> =>
  db.transaction(async (trx) => {
    const fresh = { account_key: key, failures: 0, wait_until: null, changed_at: now.toISOString() };
    await trx('sign_in_failures').insert(fresh).onConflict('account_key').ignore();
    const row: FailureRow | undefined = await trx('sign_in_failures')
      .where({ account_key: key })
      .first('failures', 'wait_until');
    const before = row?.failures ?? 0;
    const isWaiting = row !== undefined && row.wait_until !== null && row.wait_until > now.toISOString();
    const wait = waitAfter(before + 1);
    const waitUntil = wait === 0 ? null : new Date(now.getTime() + wait * 1000).toISOString();
    await trx('sign_in_failures')
      .where({ account_key: key })
      .update({ failures: before + 1, wait_until: waitUntil, changed_at: now.toISOString() });
    return !isWaiting && before < limits.guessing.stopAt;
  });

export const forgetAttempts = async (db: Knex, key: string): Promise<void> => {
  await db('sign_in_failures').where({ account_key: key }).delete();
};

/** The address as typed, in the form in which it is stored and counted. */
export const asEmail = (typed: string): string => typed.normalize('NFC').trim().toLowerCase();

export const accountKey = (typedEmail: string): string => `account:${asEmail(typedEmail)}`;
export const proofKey = (memberId: string): string => `proof:${memberId}`;
