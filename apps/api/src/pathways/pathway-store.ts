/** Loads everything recorded about children's pathways, in a few queries for any number of children. */
import type { Knex } from 'knex';
import type { Evidence, Signature } from '@weftway/contract/pathway';
import type { ChildRowRecord } from '../children/child-view.ts';

export interface ChildRecord extends ChildRowRecord {
  readonly pathway_version: number;
}

export interface ClaimRow {
  readonly child_id: string;
  readonly milestone: string;
  readonly part: string;
  readonly member_id: string;
  readonly since: string;
}
export interface DraftRow {
  readonly child_id: string;
  readonly milestone: string;
  readonly part: string;
  readonly occurrence: number;
  readonly version: number;
  readonly evidence: string;
  readonly performed_on: string | null;
  readonly by_id: string;
  readonly at: string;
  readonly is_ready: 0 | 1;
}
export interface SignatureRow {
  readonly id: string;
  readonly child_id: string;
  readonly milestone: string;
  readonly part: string;
  readonly occurrence: number;
  readonly performed_on: string;
  readonly signed_at: string;
  readonly signed_on: string;
  readonly signer_id: string;
  readonly signer_name: string;
  readonly signer_role: string;
  readonly meaning: string;
  readonly evidence: string;
  readonly drafted_by_id: string | null;
  readonly drafted_by_name: string | null;
  readonly overrides: string;
  readonly protocol_version: number;
  readonly digest: string;
  readonly previous_digest: string;
  readonly amends: string | null;
  readonly amend_reason: string | null;
}
export interface ImportedRow {
  readonly child_id: string;
  readonly milestone: string;
  readonly performed_on: string;
  readonly date_precision: 'day' | 'month' | 'year';
  readonly is_unverified: 0 | 1;
  readonly results: string;
  readonly source: string;
}
export interface HoldRow {
  readonly child_id: string;
  readonly milestone: string;
  readonly reason: string;
  readonly held_on: string;
  readonly review_on: string;
  readonly by_id: string;
}
export interface WaiverRow {
  readonly id: string;
  readonly child_id: string;
  readonly milestone: string;
  readonly occurrence: number;
  readonly kind: 'waived' | 'not-recoverable';
  readonly reason: string;
  readonly note: string;
  readonly second_name: string | null;
  readonly offer_again_on: string | null;
  readonly waived_on: string;
  readonly by_id: string;
}
export interface BookingRow {
  readonly child_id: string;
  readonly milestone: string;
  readonly booked_on: string;
}
export interface FindingRow {
  readonly child_id: string;
  readonly name: string;
  readonly found_on: string;
  readonly note: string;
}
export interface OwnRow {
  readonly child_id: string;
  readonly id: string;
  readonly rule: string;
  /** The day from which its window counts. */
  readonly added_on: string;
}

/** Everything recorded about one child's pathway. */
export interface PathwayRecord {
  readonly child: ChildRecord;
  readonly claims: readonly ClaimRow[];
  readonly drafts: readonly DraftRow[];
  /** Oldest first. */
  readonly signatures: readonly SignatureRow[];
  readonly imported: readonly ImportedRow[];
  readonly holds: readonly HoldRow[];
  readonly waivers: readonly WaiverRow[];
  readonly bookings: readonly BookingRow[];
  readonly findings: readonly FindingRow[];
  readonly own: readonly OwnRow[];
  /** Ids of the trainees who work with the child. */
  readonly trainees: readonly string[];
}

/** One JSON list of a child's rows of a table, in an order that is the same at every reading. */
const listOf = (table: string, columns: readonly string[], order: string): string =>
  `(select json_group_array(json_object(${columns.map((column) => `'${column}', x.${column}`).join(', ')}) order by ${order}) from ${table} x where x.child_id = children.id) as ${table}`;

const lists = [
  listOf('claims', ['child_id', 'milestone', 'part', 'member_id', 'since'], 'x.milestone, x.part'),
  listOf(
    'drafts',
    ['child_id', 'milestone', 'part', 'occurrence', 'version', 'evidence', 'performed_on', 'by_id', 'at', 'is_ready'],
    'x.milestone, x.part',
  ),
  // In the order in which they were given, which is the order of the chain of signatures.
  listOf(
    'signatures',
    [
      'id',
      'child_id',
      'milestone',
      'part',
      'occurrence',
      'performed_on',
      'signed_at',
      'signed_on',
      'signer_id',
      'signer_name',
      'signer_role',
      'meaning',
      'evidence',
      'drafted_by_id',
      'drafted_by_name',
      'overrides',
      'protocol_version',
      'digest',
      'previous_digest',
      'amends',
      'amend_reason',
    ],
    'x.rowid',
  ),
  listOf(
    'imported_completions',
    ['child_id', 'milestone', 'performed_on', 'date_precision', 'is_unverified', 'results', 'source'],
    'x.performed_on, x.milestone',
  ),
  listOf('holds', ['child_id', 'milestone', 'reason', 'held_on', 'review_on', 'by_id'], 'x.milestone'),
  listOf(
    'waivers',
    [
      'id',
      'child_id',
      'milestone',
      'occurrence',
      'kind',
      'reason',
      'note',
      'second_name',
      'offer_again_on',
      'waived_on',
      'by_id',
    ],
    'x.waived_on, x.rowid',
  ),
  listOf('bookings', ['child_id', 'milestone', 'booked_on'], 'x.milestone'),
  listOf('findings', ['child_id', 'name', 'found_on', 'note'], 'x.name'),
  listOf('own_milestones', ['child_id', 'id', 'rule', 'added_on'], 'x.id'),
  `(select json_group_array(x.member_id order by x.member_id) from assignments x where x.child_id = children.id) as trainees`,
].join(',\n');

type ListName =
  | 'claims'
  | 'drafts'
  | 'signatures'
  | 'imported_completions'
  | 'holds'
  | 'waivers'
  | 'bookings'
  | 'findings'
  | 'own_milestones'
  | 'trainees';
type LoadedRow = ChildRecord & Readonly<Record<ListName, string>>;

const recordOf = (row: LoadedRow): PathwayRecord => {
  const {
    claims,
    drafts,
    signatures,
    imported_completions: imported,
    holds,
    waivers,
    bookings,
    findings,
    own_milestones: own,
    trainees,
    ...child
  } = row;
  // Every list was built from the table's own columns just before.
  return {
    child,
    claims: JSON.parse(claims) as ClaimRow[],
    drafts: JSON.parse(drafts) as DraftRow[],
    signatures: JSON.parse(signatures) as SignatureRow[],
    imported: JSON.parse(imported) as ImportedRow[],
    holds: JSON.parse(holds) as HoldRow[],
    waivers: JSON.parse(waivers) as WaiverRow[],
    bookings: JSON.parse(bookings) as BookingRow[],
    findings: JSON.parse(findings) as FindingRow[],
    own: JSON.parse(own) as OwnRow[],
    trainees: JSON.parse(trainees) as string[],
  };
};

/** One row per child: its columns, and each list of facts as JSON, so that one query reads one moment. */
export const loadPathways = async (db: Knex, childIds: readonly string[]): Promise<PathwayRecord[]> => {
  const rows: LoadedRow[] = await db.raw(
    `select children.*, ${lists} from children where children.id in (select value from json_each(?)) order by children.id`,
    [JSON.stringify(childIds)],
  );
  return rows.map(recordOf);
};

export const loadPathway = async (db: Knex, childId: string): Promise<PathwayRecord | null> =>
  (await loadPathways(db, [childId]))[0] ?? null;

export const signatureOf = (row: SignatureRow): Signature => ({
  id: row.id,
  milestone: row.milestone,
  part: row.part,
  occurrence: row.occurrence,
  performedOn: row.performed_on as Signature['performedOn'], // stored as a checked date
  signedAt: row.signed_at,
  signerId: row.signer_id,
  signerName: row.signer_name,
  signerRole: row.signer_role,
  meaning: row.meaning,
  values: JSON.parse(row.evidence) as Evidence, // written from the contract's schema
  draftedByName: row.drafted_by_name,
  overrides: JSON.parse(row.overrides) as Signature['overrides'], // written from the contract's schema
  protocolVersion: row.protocol_version,
  digest: row.digest,
  amends: row.amends,
  amendReason: row.amend_reason,
});
