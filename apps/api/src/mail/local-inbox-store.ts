/** Letters that stay on this machine, where no mail server is set. */
import type { Knex } from 'knex';

export interface KeptMail {
  readonly id: string;
  readonly at: string;
  readonly recipient: string;
  readonly subject: string;
  readonly body: string;
}

/** The id is the letter's own, so that a second delivery changes nothing. */
export const keepMail = async (db: Knex, mail: KeptMail): Promise<void> => {
  await db('local_inbox').insert(mail).onConflict('id').ignore();
};

/** Newest first. */
export const keptMails = async (db: Knex): Promise<KeptMail[]> =>
  db('local_inbox')
    .orderBy('at', 'desc')
    .orderBy('id', 'desc')
    .limit(100)
    .select('id', 'at', 'recipient', 'subject', 'body');
