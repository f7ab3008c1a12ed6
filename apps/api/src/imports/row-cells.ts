/** One row of the file with its problems: cells by column name, dates read in the chosen order. */
import type { DateOrder, WrittenDateFault } from '@weftway/calendar/written-date';
import { readWrittenDate } from '@weftway/calendar/written-date';
import { formatDate } from '@weftway/calendar/format-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { ImportColumn, ImportFault } from '@weftway/contract/caseload-import';
import { looksLikeFormula, looksMisread } from './cell-words.ts';
import { fault, warning } from './csv-file.ts';
import type { FileRow } from './csv-file.ts';

export interface ReadDate {
  readonly date: PlainDate;
  readonly precision: 'day' | 'month' | 'year';
}

const dateFaults: Readonly<Record<WrittenDateFault, (order: DateOrder) => string>> = {
  'not-a-date': () => 'This is not a date we can read. Write it like 2026-10-06 or 6 Oct 2026.',
  'no-such-day': () => 'This day does not exist.',
  'other-order': (order) =>
    `Read with the ${order === 'day-first' ? 'day' : 'month'} first, this day does not exist. Choose the other order for the file, or write the date like 2026-10-06.`,
  'short-year': () => 'Write the year with four figures.',
  'day-number': () => 'This is a spreadsheet’s day number. Format the column as a date and save the file again.',
};

const columnsWithSigns: readonly ImportColumn[] = ['contact_phone', 'cleft'];
// eslint-disable-next-line no-control-regex -- finding control characters is the purpose
const controlCharacter = /[\u0000-\u0008\u000b-\u001f\u007f\u2028\u2029]/;

export class RowCells {
  readonly row: number;
  readonly faults: ImportFault[] = [];
  readonly #cells: readonly string[];
  readonly #places: ReadonlyMap<ImportColumn, number>;
  readonly #order: DateOrder;

  constructor(file: FileRow, places: ReadonlyMap<ImportColumn, number>, order: DateOrder) {
    this.row = file.row;
    this.#cells = file.cells;
    this.#places = places;
    this.#order = order;
    for (const [column, index] of places) this.#look(column, file.cells[index] ?? '');
  }

  #look(column: ImportColumn, cell: string): void {
    if (cell.includes('\uFFFD'))
      this.fault(column, 'Some letters of this cell were lost. Save the file as UTF-8 and choose it again.');
    else if (controlCharacter.test(cell))
      this.fault(column, 'This cell holds hidden control characters. Save the file as UTF-8 text.');
    else if (looksMisread(cell))
      this.warn(column, 'This looks like letters read in the wrong encoding. Compare with the original.');
    if (!columnsWithSigns.includes(column) && looksLikeFormula(cell))
      this.warn(column, 'This looks like a formula. It is kept as plain text.');
  }

  /** The cell without outer blanks; '' when it is empty or the file has no such column. */
  text(column: ImportColumn): string {
    const index = this.#places.get(column);
    return index === undefined ? '' : (this.#cells[index] ?? '').normalize('NFC').trim();
  }

  fault(column: ImportColumn | '', message: string): void {
    this.faults.push(fault(this.row, column, column === '' ? '' : this.text(column), message));
  }

  warn(column: ImportColumn, message: string): void {
    this.faults.push(warning(this.row, column, this.text(column), message));
  }

  /** What `read` makes of a cell that is not empty; points at it when that is nothing. */
  value<T>(column: ImportColumn, read: (cell: string) => T | null, message: string): T | undefined {
    const text = this.text(column);
    if (text === '') return undefined;
    const value = read(text);
    if (value === null) this.fault(column, message);
    return value ?? undefined;
  }

  date(column: ImportColumn): ReadDate | undefined {
    const text = this.text(column);
    if (text === '') return undefined;
    const reading = readWrittenDate(text, this.#order);
    if (reading.kind === 'fault') {
      this.fault(column, dateFaults[reading.fault](this.#order));
      return undefined;
    }
    if (reading.isAmbiguous)
      this.warn(
        column,
        `Read as ${formatDate(reading.date)}; with the ${this.#order === 'day-first' ? 'month' : 'day'} first it would be another day.`,
      );
    return { date: reading.date, precision: reading.precision };
  }
}
