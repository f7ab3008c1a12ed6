/** Password hashes. They never reach the trail; who set one and when does. */
import type { Knex } from 'knex';

export interface Credential {
  readonly memberId: string;
  readonly passwordHash: string;
  readonly status: string;
}

interface CredentialRow {
  readonly member_id: string;
  readonly password_hash: string;
  readonly status: string;
}

export const findCredentialByEmail = async (db: Knex, email: string): Promise<Credential | null> => {
  const row: CredentialRow | undefined = await db('members')
    .join('credentials', 'credentials.member_id', 'members.id')
    .where({ email })
    // Somebody who left may have had the address before.
    .orderByRaw("members.status = 'left', members.id desc")
    .first('credentials.member_id', 'credentials.password_hash', 'members.status');
  return row === undefined ? null : { memberId: row.member_id, passwordHash: row.password_hash, status: row.status };
};

export const findPasswordHash = async (db: Knex, memberId: string): Promise<string | null> => {
  const row: { password_hash: string } | undefined = await db('credentials')
    .where({ member_id: memberId })
    .first('password_hash');
  return row?.password_hash ?? null;
};

export const keepPasswordHash = async (
  trx: Knex,
  memberId: string,
  passwordHash: string,
  at: string,
): Promise<void> => {
  await trx('credentials')
    .insert({ member_id: memberId, password_hash: passwordHash, changed_at: at })
    .onConflict('member_id')
    .merge();
};
