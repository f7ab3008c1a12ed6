/** Links sent by mail: 256 random bits that stand only in the letter; the database holds their digest. */
import { createHash, randomBytes } from 'node:crypto';
import type { Knex } from 'knex';

export type LinkPurpose = 'invitation' | 'reset';

interface LinkRow {
  readonly token_hash: string;
  readonly member_id: string;
  readonly made_by_id: string | null;
}

export interface MailedLink {
  readonly tokenHash: string;
  readonly memberId: string;
  readonly madeById: string | null;
}

const digestOfToken = (token: string): string => createHash('sha256').update(token).digest('hex');

export interface NewLink {
  readonly purpose: LinkPurpose;
  readonly memberId: string;
  readonly madeById: string | null;
  readonly now: Date;
  readonly validSeconds: number;
}

/** Answers the token, which is known to nobody afterwards but the letter's reader. */
export const makeLink = async (
  trx: Knex,
  { purpose, memberId, madeById, now, validSeconds }: NewLink,
): Promise<string> => {
  const token = randomBytes(32).toString('base64url');
  await trx('mailed_links').insert({
    token_hash: digestOfToken(token),
    purpose,
    member_id: memberId,
    made_by_id: madeById,
    expires_at: new Date(now.getTime() + validSeconds * 1000).toISOString(),
    used_at: null,
  });
  return token;
};

/** The link that this token opens now; null when it is unknown, used or has run out. */
export const findLink = async (
  db: Knex,
  purpose: LinkPurpose,
  token: string,
  now: string,
): Promise<MailedLink | null> => {
  const row: LinkRow | undefined = await db('mailed_links')
    .where({ token_hash: digestOfToken(token), purpose })
    .whereNull('used_at')
    .where('expires_at', '>', now)
    .first('token_hash', 'member_id', 'made_by_id');
  return row === undefined ? null : { tokenHash: row.token_hash, memberId: row.member_id, madeById: row.made_by_id };
};

/** One statement decides who used it first; false when somebody was faster. */
export const useLink = async (trx: Knex, link: MailedLink, now: string): Promise<boolean> => {
  const changed = await trx('mailed_links')
    .where({ token_hash: link.tokenHash })
    .whereNull('used_at')
    .where('expires_at', '>', now)
    .update({ used_at: now });
  return changed === 1;
};

/** Every open link of a member ends, of one purpose or of all. */
export const voidLinks = async (trx: Knex, memberId: string, now: string, purpose?: LinkPurpose): Promise<void> => {
  await trx('mailed_links')
    .where({ member_id: memberId, ...(purpose === undefined ? {} : { purpose }) })
    .whereNull('used_at')
    .update({ used_at: now });
};

/** How many letters of this kind were sent to a member that could still be opened. */
export const countOpenLinks = async (
  db: Knex,
  memberId: string,
  purpose: LinkPurpose,
  now: string,
): Promise<number> => {
  const row: { total: number } | undefined = await db('mailed_links')
    .where({ member_id: memberId, purpose })
    .whereNull('used_at')
    .where('expires_at', '>', now)
    .first(db.raw('count(*) as total'));
  return row?.total ?? 0;
};
