/**
 * The cells of a CSV file, and what is wrong with the file as a file. Rows are counted as a spreadsheet shows them: the
 * header is row 1. After a broken quotation mark reading goes on with the next line, so that one mistake hides no other.
 */
import { parse } from 'csv-parse/sync';
import { mostImportRows } from '@weftway/contract/caseload-import';
import type { ImportFault } from '@weftway/contract/caseload-import';

export interface FileRow {
  readonly row: number;
  readonly cells: readonly string[];
}

export interface CsvFile {
  readonly header: readonly string[];
  readonly rows: readonly FileRow[];
  readonly faults: readonly ImportFault[];
}

export const fault = (row: number, column: string, value: string, message: string): ImportFault => ({
  row,
  column,
  value: value.slice(0, 120),
  message,
  severity: 'fault',
});
export const warning = (row: number, column: string, value: string, message: string): ImportFault => ({
  ...fault(row, column, value, message),
  severity: 'warning',
});

/** After so many broken quotation marks the file is not worth going on with. */
const mostQuoteFaults = 40;

/** Comma, semicolon or tab, whichever the first line holds most of. */
const delimiterOf = (text: string): string => {
  const firstLine = text.slice(0, 10_000).split(/\r?\n/, 1)[0] ?? '';
  const counts = [',', ';', '\t'].map((sign) => ({ sign, count: firstLine.split(sign).length }));
  return counts.reduce((most, one) => (one.count > most.count ? one : most)).sign;
};

const quoteMessages: Readonly<Record<string, string>> = {
  CSV_QUOTE_NOT_CLOSED:
    'A quotation mark is opened on this row and never closed. Close it, or write two of them for one in the text.',
  CSV_INVALID_CLOSING_QUOTE:
    'There is text behind a closing quotation mark. Write two quotation marks for one in the text.',
  INVALID_OPENING_QUOTE:
    'A quotation mark stands in the middle of a cell. Put the whole cell in quotation marks and write two for one in the text.',
};

interface Stretch {
  readonly records: readonly (readonly string[])[];
  /** Lines that were read well, and why reading stopped. */
  readonly goodLines: number;
  readonly stopped: string | null;
}

const codeOf = (error: unknown): string =>
  error instanceof Error && 'code' in error ? String(error.code) : 'unreadable';

const readStretch = (text: string, delimiter: string): Stretch => {
  const records: string[][] = [];
  let goodLines = 0;
  try {
    parse(text, {
      delimiter,
      relax_column_count: true,
      skip_empty_lines: false,
      on_record: (record: string[], context) => {
        records.push(record);
        goodLines = context.lines;
        return null;
      },
    });
    return { records, goodLines, stopped: null };
  } catch (error) {
    return { records, goodLines, stopped: codeOf(error) };
  }
};

/** Where line `count` ends: the index of the first character after it. */
const afterLines = (text: string, count: number): number => {
  let at = 0;
  for (let line = 0; line < count; line += 1) {
    const end = text.indexOf('\n', at);
    if (end < 0) return text.length;
    at = end + 1;
  }
  return at;
};

export const readCsvFile = (raw: string): CsvFile => {
  const text = raw
    .replace(/^\uFEFF/, '')
    .replaceAll('\r\n', '\n')
    .replaceAll('\r', '\n');
  const delimiter = delimiterOf(text);
  const faults: ImportFault[] = [];
  const rows: FileRow[] = [];
  let row = 0;
  let rest = text;
  while (rest !== '') {
    const stretch = readStretch(rest, delimiter);
    for (const cells of stretch.records) rows.push({ row: (row += 1), cells });
    if (stretch.stopped === null) break;
    row += 1;
    const start = afterLines(rest, stretch.goodLines);
    const end = afterLines(rest, stretch.goodLines + 1);
    faults.push(
      fault(
        row,
        '',
        rest.slice(start, end).trim(),
        quoteMessages[stretch.stopped] ?? 'This row cannot be read as comma-separated text.',
      ),
    );
    if (faults.length >= mostQuoteFaults) {
      faults.push(fault(row, '', '', 'Reading stopped here: too many broken quotation marks.'));
      break;
    }
    rest = rest.slice(end);
  }
  const [header, ...others] = rows;
  const filled = others.filter(({ cells }) => cells.some((cell) => cell.trim() !== ''));
  if (header === undefined || filled.length === 0)
    faults.push(fault(1, '', '', 'The file holds no children: it needs a header row and one row for each child.'));
  if (filled.length > mostImportRows)
    faults.push(
      fault(filled[mostImportRows]?.row ?? 1, '', '', `A file can hold ${mostImportRows} children. Split it.`),
    );
  return { header: header?.cells ?? [], rows: filled.slice(0, mostImportRows), faults };
};
