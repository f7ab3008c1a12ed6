/** What members hold that is not finished. */
import type { Knex } from 'knex';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { MilestoneRule } from '@weftway/pathway/protocol';
import { loadProtocol } from '../protocol/protocol-store.ts';

interface ClaimRow {
  readonly child_id: string;
  readonly milestone: string;
  readonly milestone_id: string;
  readonly part: string;
  readonly state: string;
  readonly latest: string | null;
  readonly first_name: string;
  readonly family_name: string;
  readonly record_number: string;
  readonly protocol_version: number;
  readonly lead_clinician_id: string | null;
}

export interface OpenClaim {
  readonly childId: string;
  readonly childName: string;
  readonly recordNumber: string;
  readonly milestone: string;
  readonly part: string;
  readonly title: string;
  readonly state: string;
  readonly latest: PlainDate | null;
  readonly leadClinicianId: string | null;
  /** Null when the protocol no longer has this milestone. */
  readonly rule: MilestoneRule | null;
}

// One row is a claim on a part that still waits for its signature, of a child in care.
const openClaims = (db: Knex) =>
  db('claims')
    .join('board_rows', (join) =>
      join.on('board_rows.child_id', 'claims.child_id').andOn('board_rows.milestone', 'claims.milestone'),
    )
    .join('children', 'children.id', 'claims.child_id')
    .whereNotIn('board_rows.state', ['signed', 'waived', 'transferred'])
    .whereNull('children.care_ended_on')
    .whereRaw(
      "exists (select 1 from json_each(board_rows.owners) as owner where json_extract(owner.value, '$[0]') = claims.part)",
    );

/** How many open milestones each member holds; of one member when `memberId` is given. */
export const countOpenClaims = async (db: Knex, memberId?: string): Promise<ReadonlyMap<string, number>> => {
  const rows = (await openClaims(db)
    .modify((query) => (memberId === undefined ? query : query.where('claims.member_id', memberId)))
    .groupBy('claims.member_id')
    .select('claims.member_id', db.raw('count(*) as total'))) as { member_id: string; total: number }[]; // the two columns selected
  return new Map(rows.map((row) => [row.member_id, row.total]));
};

const ownRuleOf = async (db: Knex, childId: string, id: string): Promise<MilestoneRule | null> => {
  const row: { rule: string } | undefined = await db('own_milestones').where({ child_id: childId, id }).first('rule');
  return row === undefined ? null : (JSON.parse(row.rule) as MilestoneRule); // validated when it was added
};

const ruleOf = async (db: Knex, row: ClaimRow): Promise<MilestoneRule | null> => {
  const protocol = await loadProtocol(db, row.protocol_version);
  return protocol.milestones.find(({ id }) => id === row.milestone_id) ?? ownRuleOf(db, row.child_id, row.milestone_id);
};

/** Soonest to close first. */
export const openClaimsOf = async (db: Knex, memberId: string): Promise<OpenClaim[]> => {
  const rows = (await openClaims(db)
    .where('claims.member_id', memberId)
    .orderByRaw('board_rows.latest is null, board_rows.latest, children.family_name, claims.milestone, claims.part')
    .select(
      'claims.child_id',
      'claims.milestone',
      'claims.part',
      'board_rows.milestone_id',
      'board_rows.state',
      'board_rows.latest',
      'children.first_name',
      'children.family_name',
      'children.record_number',
      'children.protocol_version',
      'children.lead_clinician_id',
    )) as ClaimRow[]; // the columns selected
  const found: OpenClaim[] = [];
  for (const row of rows) {
    const rule = await ruleOf(db, row);
    found.push({
      childId: row.child_id,
      childName: `${row.first_name} ${row.family_name}`,
      recordNumber: row.record_number,
      milestone: row.milestone,
      part: row.part,
      title: rule?.title ?? row.milestone,
      state: row.state,
      latest: row.latest as PlainDate | null, // stored as a checked date
      leadClinicianId: row.lead_clinician_id,
      rule,
    });
  }
  return found;
};

/** Claims of a member that rest: finished, off the path, or of a child no longer in care. */
export const restingClaimsOf = async (
  db: Knex,
  memberId: string,
): Promise<{ childId: string; milestone: string; part: string }[]> => {
  const open = new Set(
    (await openClaimsOf(db, memberId)).map((claim) => `${claim.childId} ${claim.milestone} ${claim.part}`),
  );
  const rows: { child_id: string; milestone: string; part: string }[] = await db('claims')
    .where({ member_id: memberId })
    .select('child_id', 'milestone', 'part');
  return rows
    .filter((row) => !open.has(`${row.child_id} ${row.milestone} ${row.part}`))
    .map((row) => ({ childId: row.child_id, milestone: row.milestone, part: row.part }));
};
