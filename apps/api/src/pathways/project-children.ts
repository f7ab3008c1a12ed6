/**
 * The board's projection: state, dates, next change and owners of every milestone on the path. It is made from the
 * facts by the planner and can be thrown away and made again; only rows that changed are written.
 */
import { setImmediate } from 'node:timers/promises';
import type { Knex } from 'knex';
import { addMonths } from '@weftway/calendar/plain-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import { planPathway } from '@weftway/pathway/plan-pathway';
import type { PlannedMilestone } from '@weftway/pathway/pathway-plan';
import type { MilestoneRule } from '@weftway/pathway/protocol';
import { loadProtocol } from '../protocol/protocol-store.ts';
import { pathwayFactsOf } from './pathway-facts-of.ts';
import { loadPathways } from './pathway-store.ts';
import type { PathwayRecord } from './pathway-store.ts';
import { halfSigned, signedOccurrences } from './signed-entries.ts';
import type { SignedOccurrence } from './signed-entries.ts';
import { protocolOf, rulesOf } from './whole-protocol.ts';

export interface BoardRowRecord {
  readonly child_id: string;
  readonly milestone: string;
  readonly milestone_id: string;
  readonly lane: string;
  readonly state: string;
  readonly is_due: number;
  readonly squeezed_days: number | null;
  readonly is_lapsed: number;
  readonly occurrence: number;
  readonly earliest: string | null;
  readonly target: string | null;
  readonly latest: string | null;
  readonly closing: string | null;
  readonly changes_on: string | null;
  readonly owners: string;
  readonly is_unowned: number;
  readonly is_on_board: number;
}

const finished: readonly string[] = ['signed', 'waived', 'transferred'];

/** What opens within six months is on the board: the last day of opening that is shown. */
export const sixMonthsAfter = (today: string): string => addMonths(today as PlainDate, 6); // the team's checked local date

const isOnBoard = (planned: PlannedMilestone, horizon: string, careEnded: boolean): boolean => {
  if (careEnded || finished.includes(planned.state)) return false;
  if (planned.state !== 'ahead')
    return planned.window !== null || planned.state === 'partly-signed' || planned.state === 'held';
  return planned.window !== null && planned.window.earliest <= horizon;
};

/** Each part that is still to be signed, with its holder or nobody. Claims stay over repeating occurrences. */
const ownersOf = (
  record: PathwayRecord,
  occurrences: readonly SignedOccurrence[],
  key: string,
  rule: MilestoneRule,
): [string, string | null][] => {
  const signed = halfSigned(occurrences, key)?.standing.map((row) => row.part) ?? [];
  return rule.signatures
    .filter(({ part }) => !signed.includes(part))
    .map(({ part }) => [
      part,
      record.claims.find((claim) => claim.milestone === key && claim.part === part)?.member_id ?? null,
    ]);
};

const rowOf = (
  record: PathwayRecord,
  occurrences: readonly SignedOccurrence[],
  planned: PlannedMilestone,
  rule: MilestoneRule,
  horizon: string,
): BoardRowRecord => {
  const owners = finished.includes(planned.state) ? [] : ownersOf(record, occurrences, planned.key, rule);
  return {
    child_id: record.child.id,
    milestone: planned.key,
    milestone_id: planned.id,
    lane: rule.lane,
    state: planned.state,
    is_due: planned.isDue ? 1 : 0,
    squeezed_days: planned.squeezedByDays,
    is_lapsed: planned.isLapsed ? 1 : 0,
    occurrence: planned.occurrence,
    earliest: planned.window?.earliest ?? null,
    target: planned.window?.target ?? null,
    latest: planned.window?.latest ?? null,
    closing: planned.window?.closing ?? null,
    changes_on: planned.changesOn,
    owners: JSON.stringify(owners),
    is_unowned: owners.some(([, memberId]) => memberId === null) ? 1 : 0,
    is_on_board: isOnBoard(planned, horizon, record.child.care_ended_on !== null) ? 1 : 0,
  };
};

/** The rows of one child as they should stand on `today`. */
export const boardRowsOf = async (db: Knex, record: PathwayRecord, today: string): Promise<BoardRowRecord[]> => {
  const protocol = await loadProtocol(db, record.child.protocol_version);
  const whole = protocolOf(protocol, record.own);
  const rules = rulesOf(whole);
  const day = today as PlainDate; // the team's checked local date
  const plan = planPathway(whole, pathwayFactsOf(record, protocol), day, { reasons: false });
  const horizon = sixMonthsAfter(today);
  const occurrences = signedOccurrences(record, rules);
  return plan.milestones.flatMap((planned) => {
    const rule = rules.get(planned.id);
    return rule === undefined ? [] : [rowOf(record, occurrences, planned, rule, horizon)];
  });
};

const columns = [
  'milestone_id',
  'lane',
  'state',
  'is_due',
  'squeezed_days',
  'is_lapsed',
  'occurrence',
  'earliest',
  'target',
  'latest',
  'closing',
  'changes_on',
  'owners',
  'is_unowned',
  'is_on_board',
] as const satisfies readonly (keyof BoardRowRecord)[];

const isSame = (a: BoardRowRecord, b: BoardRowRecord): boolean => columns.every((column) => a[column] === b[column]);

const keyed = ['child_id', 'milestone', ...columns] as const;

const upsertRows = `insert into board_rows (${keyed.join(', ')})
  select ${keyed.map((_column, index) => `json_extract(value, '$[${index}]')`).join(', ')} from json_each(?) where true
  on conflict (child_id, milestone) do update set ${columns.map((column) => `${column} = excluded.${column}`).join(', ')}`;

const writeChanged = async (
  trx: Knex,
  childId: string,
  before: readonly BoardRowRecord[],
  after: readonly BoardRowRecord[],
): Promise<boolean> => {
  const old = new Map(before.map((row) => [row.milestone, row]));
  const changed = after.filter((row) => {
    const known = old.get(row.milestone);
    old.delete(row.milestone);
    return known === undefined || !isSame(known, row);
  });
  // One short statement whatever the number of rows: an import plans thousands of children in one transaction.
  if (changed.length > 0)
    await trx.raw(upsertRows, [JSON.stringify(changed.map((row) => keyed.map((column) => row[column])))]);
  if (old.size > 0)
    await trx('board_rows')
      .where({ child_id: childId })
      .whereIn('milestone', [...old.keys()])
      .delete();
  return changed.length > 0 || old.size > 0;
};

const chunkSize = 200;

const storedRows = async (
  trx: Knex,
  childIds: readonly string[],
): Promise<ReadonlyMap<string, readonly BoardRowRecord[]>> => {
  const rows: BoardRowRecord[] = await trx.raw(
    `select child_id, milestone, ${columns.join(', ')} from board_rows where child_id in (select value from json_each(?))`,
    [JSON.stringify(childIds)],
  );
  const byChild = new Map<string, BoardRowRecord[]>();
  for (const row of rows) {
    const list = byChild.get(row.child_id);
    if (list === undefined) byChild.set(row.child_id, [row]);
    else list.push(row);
  }
  return byChild;
};

const nextVersion = async (trx: Knex): Promise<number> => {
  const rows: { version: number }[] = await trx.raw('update board_counter set version = version + 1 returning version');
  return rows[0]?.version ?? 0;
};

/**
 * Brings the rows of these children up to date and answers the version of the board. The version moves even when no
 * row changed, since a name may have.
 */
export const projectChildren = async (trx: Knex, childIds: readonly string[], today: string): Promise<number> => {
  const version = await nextVersion(trx);
  for (let start = 0; start < childIds.length; start += chunkSize) {
    const ids = childIds.slice(start, start + chunkSize);
    const records = await loadPathways(trx, ids);
    const stored = await storedRows(trx, ids);
    for (const record of records)
      await writeChanged(
        trx,
        record.child.id,
        stored.get(record.child.id) ?? [],
        await boardRowsOf(trx, record, today),
      );
    // One row per child: the version of the board at which it last changed.
    await trx.raw(
      `insert into board_children (child_id, changed_at_version)
       select children.id, ? from children where children.id in (select value from json_each(?))
       on conflict (child_id) do update set changed_at_version = excluded.changed_at_version`,
      [version, JSON.stringify(ids)],
    );
    // Requests that need no database are answered in between.
    if (childIds.length > chunkSize) await setImmediate();
  }
  return version;
};
