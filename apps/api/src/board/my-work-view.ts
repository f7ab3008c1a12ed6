/** What My work reads: rows of the projection with their child, and what was drafted, held, handed over or let go. */
import type { Knex } from 'knex';

export interface WorkRow {
  readonly child_id: string;
  readonly first_name: string;
  readonly family_name: string;
  readonly born_on: string | null;
  readonly lead_clinician_id: string | null;
  readonly milestone: string;
  readonly milestone_id: string;
  readonly lane: string;
  readonly state: string;
  readonly is_due: number;
  readonly earliest: string | null;
  readonly target: string | null;
  readonly latest: string | null;
  readonly closing: string | null;
  readonly owners: string;
}

export interface ClaimedRow extends WorkRow {
  readonly part: string;
  readonly member_id: string;
}

const columns = [
  'board_rows.child_id',
  'children.first_name',
  'children.family_name',
  'children.born_on',
  'children.lead_clinician_id',
  'board_rows.milestone',
  'board_rows.milestone_id',
  'board_rows.lane',
  'board_rows.state',
  'board_rows.is_due',
  'board_rows.earliest',
  'board_rows.target',
  'board_rows.latest',
  'board_rows.closing',
  'board_rows.owners',
];

const rowsOnBoard = (db: Knex) =>
  db('board_rows').join('children', 'children.id', 'board_rows.child_id').where('board_rows.is_on_board', 1);

/** Unfinished milestones that these members hold, with the part that each holds. */
export const readClaimedRows = async (db: Knex, memberIds: readonly string[]): Promise<ClaimedRow[]> =>
  await rowsOnBoard(db)
    .join(
      'claims',
      (on) => void on.on('claims.child_id', 'board_rows.child_id').andOn('claims.milestone', 'board_rows.milestone'),
    )
    .whereIn('claims.member_id', [...memberIds])
    .select(...columns, 'claims.part', 'claims.member_id');

/** Parts that nobody holds, of milestones with these ids; of the children of one trainee, or of all. */
export const readLooseRows = async (
  db: Knex,
  milestoneIds: readonly string[],
  traineeId: string | null,
): Promise<WorkRow[]> => {
  const query = rowsOnBoard(db)
    .where('board_rows.is_unowned', 1)
    .whereIn('board_rows.milestone_id', [...milestoneIds])
    .whereIn('board_rows.state', ['late', 'closing', 'open', 'partly-signed']);
  if (traineeId !== null)
    void query.whereExists(
      db('assignments')
        .whereRaw('assignments.child_id = board_rows.child_id')
        .where('assignments.member_id', traineeId),
    );
  return await query.select(...columns);
};

/** Everything late, for those who watch it: of the whole team, or of children whom this member leads, and with these trainees. */
export const readLateRows = async (
  db: Knex,
  watch: { readonly isWholeTeam: boolean; readonly leadId: string; readonly traineeIds: readonly string[] },
): Promise<WorkRow[]> => {
  const query = rowsOnBoard(db).where('board_rows.state', 'late');
  if (!watch.isWholeTeam) {
    void query.where((either) => {
      void either.where('children.lead_clinician_id', watch.leadId);
      if (watch.traineeIds.length === 0) return;
      const theirs = db('claims')
        .whereRaw('claims.child_id = board_rows.child_id and claims.milestone = board_rows.milestone')
        .whereIn('claims.member_id', [...watch.traineeIds]);
      void either.orWhereExists(theirs);
    });
  }
  return await query.select(...columns);
};

export interface Place {
  readonly childId: string;
  readonly milestone: string;
}

export const placeKey = (childId: string, milestone: string): string => `${childId} ${milestone}`;

/** Rows at these places that are still on the board. */
export const readRowsAt = async (db: Knex, places: readonly Place[]): Promise<WorkRow[]> => {
  if (places.length === 0) return [];
  const wanted = new Set(places.map((place) => placeKey(place.childId, place.milestone)));
  const childIds = JSON.stringify([...new Set(places.map((place) => place.childId))]);
  const rows: WorkRow[] = await rowsOnBoard(db)
    .where('board_rows.child_id', 'in', db.raw('(select value from json_each(?))', [childIds]))
    .select(...columns);
  return rows.filter((row) => wanted.has(placeKey(row.child_id, row.milestone)));
};

export interface KeptDraft {
  readonly child_id: string;
  readonly milestone: string;
  readonly part: string;
  readonly by_id: string;
  readonly at: string;
  readonly is_ready: 0 | 1;
}

/** Drafts that somebody finished, drafts of this member, and drafts on what this member holds. */
export const readDrafts = async (db: Knex, memberId: string): Promise<KeptDraft[]> =>
  await db('drafts')
    .where('drafts.is_ready', 1)
    .orWhere('drafts.by_id', memberId)
    .orWhereExists(
      db('claims')
        .whereRaw(
          'claims.child_id = drafts.child_id and claims.milestone = drafts.milestone and claims.part = drafts.part',
        )
        .where('claims.member_id', memberId),
    )
    .select('child_id', 'milestone', 'part', 'by_id', 'at', 'is_ready');

export interface TrailPlace {
  readonly kind: 'milestone-handed-over' | 'milestone-released' | 'signature-amended' | 'draft-saved';
  readonly at: string;
  readonly actor_id: string | null;
  readonly actor_name: string;
  readonly child_id: string;
  readonly milestone: string;
  /** What happened, as JSON. */
  readonly after: string;
}

/** What colleagues did since an instant that may bring work back to somebody; newest first. */
export const readReturns = async (
  db: Knex,
  since: string,
  kinds: readonly TrailPlace['kind'][],
  notBy: string,
): Promise<TrailPlace[]> =>
  await db('trail_lines')
    .join('trail_payloads', 'trail_payloads.seq', 'trail_lines.seq')
    .whereIn('trail_lines.kind', [...kinds])
    .where('trail_lines.at', '>=', since)
    .whereNot('trail_lines.actor_id', notBy)
    .whereNotNull('trail_lines.child_id')
    .orderBy('trail_lines.seq', 'desc')
    .limit(2000)
    .select(
      'trail_lines.kind',
      'trail_lines.at',
      'trail_lines.actor_id',
      'trail_lines.actor_name',
      'trail_lines.child_id',
      'trail_lines.milestone',
      'trail_payloads.after',
    );

/** Entries of this member that a colleague amended since an instant. */
export const readAmendedEntries = async (
  db: Knex,
  memberId: string,
  since: string,
): Promise<(Place & { readonly byName: string; readonly at: string; readonly part: string })[]> =>
  await db('signatures as later')
    .join('signatures as first', 'first.id', 'later.amends')
    .where('first.signer_id', memberId)
    .whereNot('later.signer_id', memberId)
    .where('later.signed_at', '>=', since)
    .select({
      childId: 'later.child_id',
      milestone: 'later.milestone',
      byName: 'later.signer_name',
      at: 'later.signed_at',
      part: 'later.part',
    });

export interface TeamMember {
  readonly id: string;
  readonly name: string;
  readonly standing: string;
  readonly supervisor_id: string | null;
  readonly cover_by_id: string | null;
  readonly cover_from: string | null;
  readonly cover_until: string | null;
}

export const readTeam = async (db: Knex): Promise<Map<string, TeamMember>> => {
  const rows: TeamMember[] = await db('members').select(
    'id',
    'name',
    'standing',
    'supervisor_id',
    'cover_by_id',
    'cover_from',
    'cover_until',
  );
  return new Map(rows.map((row) => [row.id, row]));
};

export const readHoldsOn = async (
  db: Knex,
  memberId: string,
): Promise<{ child_id: string; milestone: string; review_on: string; by_id: string }[]> =>
  await db('holds')
    .where('holds.by_id', memberId)
    .orWhereExists(
      db('claims')
        .whereRaw('claims.child_id = holds.child_id and claims.milestone = holds.milestone')
        .where('claims.member_id', memberId),
    )
    .select('child_id', 'milestone', 'review_on', 'by_id');

/** Whose children this trainee works with. */
export const readAssignedTrainees = async (db: Knex, childIds: readonly string[]): Promise<Map<string, string[]>> => {
  const rows: { child_id: string; member_id: string }[] = await db('assignments')
    .where('child_id', 'in', db.raw('(select value from json_each(?))', [JSON.stringify(childIds)]))
    .select('child_id', 'member_id');
  const byChild = new Map<string, string[]>();
  for (const row of rows) byChild.set(row.child_id, [...(byChild.get(row.child_id) ?? []), row.member_id]);
  return byChild;
};
