/** What a proof of the trail reads: lines in pages, the signatures they speak of, heads. By any connection. */
import type { Signature } from '@weftway/contract/pathway';
import { signatureOf } from '../pathways/pathway-store.ts';
import type { SignatureRow } from '../pathways/pathway-store.ts';
import type { StoredLine } from './verify-lines.ts';

/** Asks the database: Knex in the server, the bare driver in the command. */
export type AskRows = (sql: string, bindings: readonly (string | number)[]) => Promise<readonly unknown[]>;

interface LineRow {
  readonly seq: number;
  readonly at: string;
  readonly kind: string;
  readonly actor_id: string | null;
  readonly actor_name: string;
  readonly actor_role: string;
  readonly child_id: string | null;
  readonly member_id: string | null;
  readonly milestone: string | null;
  readonly request_id: string;
  readonly before_digest: string;
  readonly after_digest: string;
  readonly previous_hash: string;
  readonly hash: string;
  readonly before: string | null;
  readonly after: string | null;
}

const fromRow = (row: LineRow): StoredLine => ({
  line: {
    seq: row.seq,
    at: row.at,
    kind: row.kind,
    actorId: row.actor_id,
    actorName: row.actor_name,
    actorRole: row.actor_role,
    childId: row.child_id,
    memberId: row.member_id,
    milestone: row.milestone,
    requestId: row.request_id,
    beforeDigest: row.before_digest,
    afterDigest: row.after_digest,
  },
  previousHash: row.previous_hash,
  hash: row.hash,
  before: row.before,
  after: row.after,
});

const lineColumns =
  'l.seq, l.at, l.kind, l.actor_id, l.actor_name, l.actor_role, l.child_id, l.member_id, l.milestone, l.request_id, l.before_digest, l.after_digest, l.previous_hash, l.hash, p.before, p.after';

/** One row is a line with its payload, which may be gone. */
const pageSql = `select ${lineColumns} from trail_lines l left join trail_payloads p on p.seq = l.seq where l.seq > ? order by l.seq limit ?`;

export const linesAfter = async (ask: AskRows, seq: number, limit: number): Promise<StoredLine[]> =>
  ((await ask(pageSql, [seq, limit])) as readonly LineRow[]).map(fromRow); // columns as selected

export const hashOfLine = async (ask: AskRows, seq: number): Promise<string | null> => {
  const [row] = (await ask('select hash from trail_lines where seq = ?', [seq])) as readonly { hash: string }[]; // column as selected
  return row?.hash ?? null;
};

export const headOfChanges = async (ask: AskRows): Promise<{ readonly seq: number; readonly hash: string } | null> => {
  const [row] = (await ask('select seq, hash from trail_lines order by seq desc limit 1', [])) as readonly {
    seq: number;
    hash: string;
  }[]; // columns as selected
  return row ?? null;
};

export interface StoredSignature {
  readonly signature: Signature;
  readonly signedText: string | null;
  readonly previousDigest: string;
  /** Digest of the signature that this child had before this one; null for the first. */
  readonly digestBefore: string | null;
}

type SignatureRead = SignatureRow & { readonly signed_text: string | null; readonly digest_before: string | null };

const signatureSql = `
  select s.id, s.child_id, s.milestone, s.part, s.occurrence, s.performed_on, s.signed_at, s.signed_on, s.signer_id, s.signer_name, s.signer_role, s.meaning, s.evidence, s.drafted_by_id,
    s.drafted_by_name, s.overrides, s.protocol_version, s.digest, s.signed_text, s.previous_digest, s.amends, s.amend_reason,
    (select b.digest from signatures b where b.child_id = s.child_id and b.rowid < s.rowid order by b.rowid desc limit 1) as digest_before
  from signatures s where s.id in (select value from json_each(?))`;

/** The signatures of one page of lines, by id. */
export const signaturesById = async (
  ask: AskRows,
  ids: readonly string[],
): Promise<ReadonlyMap<string, StoredSignature>> => {
  if (ids.length === 0) return new Map();
  const rows = (await ask(signatureSql, [JSON.stringify(ids)])) as readonly SignatureRead[]; // columns as selected
  return new Map(
    rows.map((row) => [
      row.id,
      {
        signature: signatureOf(row),
        signedText: row.signed_text,
        previousDigest: row.previous_digest,
        digestBefore: row.digest_before,
      },
    ]),
  );
};

export const countSignatures = async (ask: AskRows): Promise<number> => {
  const [row] = (await ask('select count(*) as count from signatures', [])) as readonly { count: number }[]; // column as selected
  return row?.count ?? 0;
};

/** A signature that no line of the trail speaks of. Slow; asked only when the counts differ. */
export const signatureWithoutLine = async (ask: AskRows): Promise<string | null> => {
  const sql = `select s.id from signatures s where not exists (
    select 1 from trail_lines l join trail_payloads p on p.seq = l.seq
    where l.child_id = s.child_id and l.kind in ('milestone-signed', 'signature-amended') and json_extract(p.after, '$.signature.id') = s.id) limit 1`;
  const [row] = (await ask(sql, [])) as readonly { id: string }[]; // column as selected
  return row?.id ?? null;
};
