/** The header: which column stands where. Other spellings are understood, unknown columns are pointed at. */
import { importAliases, importColumns } from '@weftway/contract/caseload-import';
import type { ImportColumn, ImportFault } from '@weftway/contract/caseload-import';
import { fault, warning } from './csv-file.ts';

export interface HeaderReading {
  readonly places: ReadonlyMap<ImportColumn, number>;
  readonly faults: readonly ImportFault[];
}

const plain = (name: string): string => name.toLowerCase().replace(/[\s_-]+/g, '');

const knownNames: ReadonlyMap<string, ImportColumn> = new Map(
  importColumns.flatMap((column) =>
    [column, ...importAliases[column]].map((name): [string, ImportColumn] => [plain(name), column]),
  ),
);

/** Columns without which no child can be added; a file that only updates needs the record number alone. */
export const columnsToAdd = [
  'first_name',
  'family_name',
  'birth_date',
  'cleft',
] as const satisfies readonly ImportColumn[];

export const readHeader = (cells: readonly string[]): HeaderReading => {
  const places = new Map<ImportColumn, number>();
  const faults: ImportFault[] = [];
  for (const [index, cell] of cells.entries()) {
    const column = knownNames.get(plain(cell));
    if (column === undefined) {
      if (cell.trim() === '') faults.push(warning(1, '', '', `Column ${index + 1} has no name; it is left out.`));
      else faults.push(fault(1, cell, cell, 'This column is not known. Rename it, or take it out of the file.'));
    } else if (places.has(column)) {
      faults.push(fault(1, column, cell, 'This column stands in the file twice.'));
    } else {
      places.set(column, index);
    }
  }
  if (!places.has('record_number'))
    faults.push(fault(1, 'record_number', '', 'The column record_number is missing. It tells one child from another.'));
  return { places, faults };
};
