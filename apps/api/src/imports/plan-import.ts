/** A whole file against the caseload: what each row would do, and every problem. Pure: nothing is read or written here. */
import { isDeepStrictEqual } from 'node:util';
import type { DateOrder } from '@weftway/calendar/written-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { ImportColumn, ImportFault } from '@weftway/contract/caseload-import';
import { childFieldsSchema } from '@weftway/contract/child';
import type { ChildFields } from '@weftway/contract/child';
import { childDateDoubts, childDateFaults } from '@weftway/contract/child-date-rules';
import { fault, readCsvFile, warning } from './csv-file.ts';
import type { FileRow } from './csv-file.ts';
import { columnsToAdd, readHeader } from './header-row.ts';
import { RowCells } from './row-cells.ts';
import { fieldsFromRow } from './row-fields.ts';
import { historyFromRow } from './row-history.ts';
import type { HistoryEntry } from './row-history.ts';

export interface KnownChild {
  readonly id: string;
  readonly fields: ChildFields;
  /** `milestone|date` of every completion. */
  readonly recorded: ReadonlySet<string>;
  readonly recordedMilestones: ReadonlySet<string>;
}

export interface KnownCaseload {
  /** By record number in small letters. */
  readonly children: ReadonlyMap<string, KnownChild>;
  /** Record numbers by name and birth. */
  readonly namesakes: ReadonlyMap<string, string>;
  readonly nameKeyOf: (firstName: string, familyName: string) => string;
  readonly sites: readonly string[];
  readonly protocolMilestones: ReadonlySet<string>;
}

export interface PlannedRow {
  readonly row: number;
  readonly action: 'add' | 'update' | 'unchanged' | 'refused';
  readonly childId: string | null;
  readonly before: ChildFields | null;
  readonly fields: ChildFields;
  readonly history: readonly HistoryEntry[];
}

export interface PlannedImport {
  readonly rows: readonly PlannedRow[];
  readonly faults: readonly ImportFault[];
}

export interface ImportAsk {
  readonly text: string;
  readonly dateOrder: DateOrder;
  readonly today: PlainDate;
}

const columnOf: Readonly<Record<keyof ChildFields, ImportColumn>> = {
  firstName: 'first_name',
  familyName: 'family_name',
  recordNumber: 'record_number',
  bornOn: 'birth_date',
  dueOn: 'due_date',
  isBirthEstimated: 'birth_date',
  gestation: 'gestation',
  sex: 'sex',
  cleft: 'cleft',
  isCleftProvisional: 'cleft',
  flags: 'flags',
  syndromes: 'syndromes',
  referredOn: 'referral_date',
  prenatalReferralOn: 'referral_date',
  teamStartOn: 'team_start',
  site: 'site',
  leadClinicianId: 'record_number',
  contacts: 'contact_name',
  alerts: 'alerts',
  notes: 'notes',
};
const contactColumns: Readonly<Record<string, ImportColumn>> = {
  name: 'contact_name',
  relation: 'contact_relation',
  phone: 'contact_phone',
  email: 'contact_email',
  language: 'language',
};

const columnOfIssue = (path: readonly PropertyKey[]): ImportColumn => {
  if (path[0] === 'contacts') return contactColumns[String(path[2])] ?? 'contact_name';
  return columnOf[String(path[0]) as keyof ChildFields] ?? 'record_number'; // paths of the schema's own fields
};

/** Fields as the contract would take them; the shape's problems go to their columns. */
const parsedFields = (cells: RowCells, fields: ChildFields): ChildFields => {
  const parsed = childFieldsSchema.safeParse(fields);
  if (parsed.success) return parsed.data;
  const told = new Set(cells.faults.filter(({ severity }) => severity === 'fault').map(({ column }) => column));
  for (const issue of parsed.error.issues) {
    const column = columnOfIssue(issue.path);
    if (!told.has(column)) cells.fault(column, issue.message);
  }
  return fields;
};

const lookAtDates = (cells: RowCells, fields: ChildFields, today: PlainDate): void => {
  for (const { field, detail } of childDateFaults(fields, today)) cells.fault(columnOf[field], detail);
  for (const { field, detail } of childDateDoubts(fields, today)) cells.warn(columnOf[field], detail);
};

const lookAtNewChild = (
  cells: RowCells,
  fields: ChildFields,
  places: ReadonlyMap<ImportColumn, number>,
  known: KnownCaseload,
): void => {
  const missing = columnsToAdd.filter(
    (column) => !places.has(column) && !(column === 'birth_date' && places.has('due_date')),
  );
  if (missing.length > 0)
    cells.fault(
      'record_number',
      `No child has this record number, and the file lacks ${missing.join(', ')} to add one.`,
    );
  if (places.has('cleft') && cells.text('cleft') === '')
    cells.fault('cleft', 'Write the cleft code; ....... when there is no cleft.');
  if (cells.text('site') === '' && known.sites.length > 1)
    cells.warn('site', `No site is given; ${fields.site} is taken.`);
  const namesake =
    fields.bornOn === null
      ? undefined
      : known.namesakes.get(`${known.nameKeyOf(fields.firstName, fields.familyName)}|${fields.bornOn}`);
  if (namesake !== undefined)
    cells.warn('record_number', `A child with this name and birth date is on the list as ${namesake}.`);
};

const planRow = (
  cells: RowCells,
  places: ReadonlyMap<ImportColumn, number>,
  known: KnownCaseload,
  today: PlainDate,
): PlannedRow => {
  const child = known.children.get(cells.text('record_number').toLowerCase());
  const before = child?.fields ?? null;
  const drafted = fieldsFromRow(cells, before, known.sites);
  const { faults } = cells;
  if (before === null) lookAtNewChild(cells, drafted, places, known);
  const fields = parsedFields(cells, drafted);
  lookAtDates(cells, fields, today);
  const history = historyFromRow(cells, {
    fields,
    today,
    protocolMilestones: known.protocolMilestones,
    recorded: child?.recorded ?? new Set(),
    recordedMilestones: child?.recordedMilestones ?? new Set(),
  });
  const isRefused = faults.some(({ severity }) => severity === 'fault');
  const isSame = before !== null && history.length === 0 && isDeepStrictEqual(before, fields);
  const action = isRefused ? 'refused' : before === null ? 'add' : isSame ? 'unchanged' : 'update';
  return { row: cells.row, action, childId: child?.id ?? null, before, fields, history };
};

/** Rows that share a record number, and rows that look like one child under two numbers. */
const repeatsIn = (
  rows: readonly PlannedRow[],
  cellsOf: ReadonlyMap<number, RowCells>,
  known: KnownCaseload,
): ImportFault[] => {
  const faults: ImportFault[] = [];
  const firstByNumber = new Map<string, number>();
  const firstByName = new Map<string, number>();
  for (const { row, fields } of rows) {
    const number = cellsOf.get(row)?.text('record_number').toLowerCase() ?? '';
    const same = number === '' ? undefined : firstByNumber.get(number);
    if (same !== undefined)
      faults.push(
        fault(
          row,
          'record_number',
          cellsOf.get(row)?.text('record_number') ?? '',
          `Row ${same} has the same record number.`,
        ),
      );
    else firstByNumber.set(number, row);
    const name = `${known.nameKeyOf(fields.firstName, fields.familyName)}|${fields.bornOn ?? ''}`;
    const twin = firstByName.get(name);
    if (twin !== undefined && same === undefined && fields.bornOn !== null)
      faults.push(warning(row, 'family_name', fields.familyName, `Row ${twin} has the same name and birth date.`));
    else firstByName.set(name, row);
  }
  return faults;
};

const widthFault = (file: FileRow, width: number): ImportFault[] => {
  const { cells, row } = file;
  if (cells.length < width)
    return [
      fault(
        row,
        '',
        '',
        `This row has ${cells.length} cells, the header has ${width}. A comma or a quotation mark may be missing.`,
      ),
    ];
  return cells.slice(width).some((cell) => cell.trim() !== '')
    ? [
        fault(
          row,
          '',
          '',
          `This row has ${cells.length} cells, the header has ${width}. A text with a comma needs quotation marks.`,
        ),
      ]
    : [];
};

const bySeverityAndRow = (a: ImportFault, b: ImportFault): number =>
  a.severity === b.severity ? a.row - b.row : a.severity === 'fault' ? -1 : 1;

export const planImport = (ask: ImportAsk, known: KnownCaseload): PlannedImport => {
  const file = readCsvFile(ask.text);
  const header = readHeader(file.header);
  const fileFaults = [...file.faults, ...header.faults];
  // Without a record number no row means anything.
  if (!header.places.has('record_number')) return { rows: [], faults: fileFaults };
  const faults: ImportFault[] = [...fileFaults];
  const cellsOf = new Map<number, RowCells>();
  const planned: PlannedRow[] = [];
  for (const row of file.rows) {
    const wrongWidth = widthFault(row, file.header.length);
    faults.push(...wrongWidth);
    // Cells that moved sideways would each be a false fault.
    if (wrongWidth.length > 0) continue;
    const cells = new RowCells(row, header.places, ask.dateOrder);
    cellsOf.set(row.row, cells);
    planned.push(planRow(cells, header.places, known, ask.today));
    faults.push(...cells.faults);
  }
  const repeats = repeatsIn(planned, cellsOf, known);
  const refusedRows = new Set(repeats.filter(({ severity }) => severity === 'fault').map(({ row }) => row));
  return {
    rows: planned.map((row) => (refusedRows.has(row.row) ? { ...row, action: 'refused' } : row)),
    faults: [...faults, ...repeats].toSorted(bySeverityAndRow),
  };
};
