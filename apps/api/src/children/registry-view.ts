/** The registry: one page of children, with what is late, closing or held by nobody. */
import type { Knex } from 'knex';
import type { ChildRow } from '@weftway/contract/child';
import type { RegistrySearch } from './registry-query.ts';

export interface RegistryAsk {
  readonly search: RegistrySearch;
  readonly order: 'name' | 'birth' | 'late';
  readonly limit: number;
  /** Id of the last child of the page before. */
  readonly after: string | null;
  /** Set: only children that this member is assigned to. */
  readonly assignedTo: string | null;
}

interface Counts {
  readonly late: number;
  readonly closing: number;
  readonly unowned: number;
}

interface ListedRow {
  readonly id: string;
  readonly first_name: string;
  readonly family_name: string;
  readonly record_number: string;
  readonly born_on: string | null;
  readonly due_on: string | null;
  readonly cleft: string;
  readonly site: string;
  readonly lead_clinician_id: string | null;
  readonly alerts: string;
  readonly transferred_on: string | null;
  readonly care_ended_on: string | null;
}

type CountedRow = ListedRow & Counts;

/** One row of the answer is a child with what is open on the board. */
const countsFor = (db: Knex) =>
  db('board_rows')
    .where('board_rows.is_on_board', 1)
    .groupBy('board_rows.child_id')
    .select(
      'board_rows.child_id',
      db.raw(`sum(board_rows.state = 'late') as late`),
      db.raw(`sum(board_rows.state = 'closing') as closing`),
      db.raw(`sum(board_rows.is_unowned = 1 and board_rows.state <> 'ahead') as unowned`),
    );

const matching = (db: Knex, ask: RegistryAsk) => {
  const query = db('children');
  const { words, date } = ask.search;
  for (const word of words) void query.whereRaw('instr(children.search_text, ?) > 0', [word]);
  if (date !== null)
    void query.where((either) => void either.where('children.born_on', date).orWhere('children.due_on', date));
  // Care that has ended is on no list; the record is found by asking for it.
  if (words.length === 0 && date === null) void query.whereNull('children.care_ended_on');
  if (ask.assignedTo !== null)
    void query.whereExists(
      db('assignments')
        .whereRaw('assignments.child_id = children.id')
        .where('assignments.member_id', ask.assignedTo)
        .select(db.raw('1')),
    );
  return query;
};

const listed = [
  'children.id',
  'children.first_name',
  'children.family_name',
  'children.record_number',
  'children.born_on',
  'children.due_on',
  'children.cleft',
  'children.site',
  'children.lead_clinician_id',
  'children.alerts',
  'children.transferred_on',
  'children.care_ended_on',
] as const;
const day = `coalesce(children.born_on, children.due_on)`;

const pageByName = (db: Knex, ask: RegistryAsk) => {
  const query = matching(db, ask)
    .select(...listed)
    .orderByRaw('children.search_text, children.id');
  if (ask.after !== null)
    void query.whereRaw(
      '(children.search_text, children.id) > (select last.search_text, last.id from children as last where last.id = ?)',
      [ask.after],
    );
  return query;
};

const pageByBirth = (db: Knex, ask: RegistryAsk) => {
  const query = matching(db, ask)
    .select(...listed)
    .orderByRaw(`${day} desc, children.id desc`);
  if (ask.after !== null)
    void query.whereRaw(
      `(${day}, children.id) < (select coalesce(last.born_on, last.due_on), last.id from children as last where last.id = ?)`,
      [ask.after],
    );
  return query;
};

const weight = `coalesce(open_work.late, 0) * 1000000 + coalesce(open_work.closing, 0) * 1000 + coalesce(open_work.unowned, 0)`;

const pageByUrgency = (db: Knex, ask: RegistryAsk) => {
  const query = matching(db, ask)
    .with('open_work', countsFor(db))
    .leftJoin('open_work', 'open_work.child_id', 'children.id')
    .select(...listed)
    .orderByRaw(`-(${weight}), children.search_text, children.id`);
  if (ask.after !== null) {
    void query.whereRaw(
      `(-(${weight}), children.search_text, children.id) >
       (select -(${weight}), last.search_text, last.id from children as last left join open_work on open_work.child_id = last.id where last.id = ?)`,
      [ask.after],
    );
  }
  return query;
};

const withCounts = async (db: Knex, rows: readonly ListedRow[]): Promise<CountedRow[]> => {
  const counts: ({ child_id: string } & Counts)[] = await countsFor(db).whereIn(
    'board_rows.child_id',
    rows.map((row) => row.id),
  );
  const byChild = new Map(counts.map((count) => [count.child_id, count]));
  return rows.map((row) => ({
    ...row,
    late: byChild.get(row.id)?.late ?? 0,
    closing: byChild.get(row.id)?.closing ?? 0,
    unowned: byChild.get(row.id)?.unowned ?? 0,
  }));
};

const rowOf = (row: CountedRow): ChildRow => ({
  id: row.id,
  firstName: row.first_name,
  familyName: row.family_name,
  recordNumber: row.record_number,
  // Stored as checked dates.
  bornOn: row.born_on as ChildRow['bornOn'],
  dueOn: row.due_on as ChildRow['dueOn'],
  cleft: row.cleft,
  site: row.site,
  leadClinicianId: row.lead_clinician_id,
  alerts: (JSON.parse(row.alerts) as { text: string }[]).map((alert) => alert.text), // written from the contract's schema
  late: row.late,
  closing: row.closing,
  unowned: row.unowned,
  transferredOn: row.transferred_on as ChildRow['transferredOn'],
  careEndedOn: row.care_ended_on as ChildRow['careEndedOn'],
});

const pages = { name: pageByName, birth: pageByBirth, late: pageByUrgency } as const;

export interface RegistryPage {
  readonly rows: ChildRow[];
  readonly total: number;
  /** Id of the last row when more follow. */
  readonly next: string | null;
}

export const viewRegistry = async (db: Knex, ask: RegistryAsk): Promise<RegistryPage> => {
  const count: { total: number } | undefined = await matching(db, ask).first(db.raw('count(*) as total'));
  const found: ListedRow[] = await pages[ask.order](db, ask).limit(ask.limit + 1);
  const shown = found.slice(0, ask.limit);
  const last = shown.at(-1);
  return {
    rows: (await withCounts(db, shown)).map(rowOf),
    total: count?.total ?? 0,
    next: found.length > ask.limit && last !== undefined ? last.id : null,
  };
};
