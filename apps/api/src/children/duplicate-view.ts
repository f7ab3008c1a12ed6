/** Children that may be the same as one about to be added: by record number, by name, by birth date. */
import type { Knex } from 'knex';
import type { ChildFields } from '@weftway/contract/child';
import { foldText } from './search-text.ts';

export interface PossibleChild {
  readonly firstName: string;
  readonly familyName: string;
  readonly recordNumber: string;
  readonly bornOn: ChildFields['bornOn'];
}

export type DuplicateReason = 'record-number' | 'name-and-birth' | 'name' | 'birth';
export interface Duplicate {
  readonly id: string;
  readonly name: string;
  readonly recordNumber: string;
  readonly bornOn: ChildFields['bornOn'];
  readonly why: DuplicateReason[];
}

interface CandidateRow {
  readonly id: string;
  readonly first_name: string;
  readonly family_name: string;
  readonly record_number: string;
  readonly born_on: string | null;
}

/** Both names in one order, so that first and family name exchanged still meet. */
export const nameKeyOf = (firstName: string, familyName: string): string =>
  [foldText(firstName), foldText(familyName)].toSorted().join('|');

const reasonsFor = (child: PossibleChild, row: CandidateRow): DuplicateReason[] => {
  const isNumber = child.recordNumber !== '' && row.record_number.toLowerCase() === child.recordNumber.toLowerCase();
  const isName = nameKeyOf(child.firstName, child.familyName) === nameKeyOf(row.first_name, row.family_name);
  const isBirth = child.bornOn !== null && row.born_on === child.bornOn;
  const isHalfName =
    foldText(child.firstName) === foldText(row.first_name) || foldText(child.familyName) === foldText(row.family_name);
  const reasons: DuplicateReason[] = isNumber ? ['record-number'] : [];
  if (isName) reasons.push(isBirth ? 'name-and-birth' : 'name');
  // Born the same day with one name in common: a twin, or the same child under another name.
  else if (isBirth && isHalfName) reasons.push('birth');
  return reasons;
};

const shown = 10;

export const findDuplicateChildren = async (
  db: Knex,
  child: PossibleChild,
  exceptId: string | null,
): Promise<Duplicate[]> => {
  const first = foldText(child.firstName);
  const family = foldText(child.familyName);
  // One row of the answer is a child that shares the number, the birth date or both names.
  const rows: CandidateRow[] = await db('children')
    .where((either) => {
      void either.whereRaw('lower(record_number) = ?', [child.recordNumber.toLowerCase()]);
      if (child.bornOn !== null) void either.orWhere('born_on', child.bornOn);
      if (first !== '' && family !== '')
        void either.orWhereRaw('(instr(search_text, ?) > 0 and instr(search_text, ?) > 0)', [first, family]);
    })
    .whereNot('id', exceptId ?? '')
    .orderBy('search_text')
    .select('id', 'first_name', 'family_name', 'record_number', 'born_on');
  return rows
    .map((row) => ({
      id: row.id,
      name: `${row.first_name} ${row.family_name}`,
      recordNumber: row.record_number,
      bornOn: row.born_on as ChildFields['bornOn'], // stored as a checked date
      why: reasonsFor(child, row),
    }))
    .filter(({ why }) => why.length > 0)
    .slice(0, shown);
};

/** Record numbers of children by name and birth, for a whole file at once. */
export const knownNamesakes = async (db: Knex): Promise<ReadonlyMap<string, string>> => {
  const rows: CandidateRow[] = await db('children')
    .whereNotNull('born_on')
    .select('id', 'first_name', 'family_name', 'record_number', 'born_on');
  return new Map(
    rows.map((row) => [`${nameKeyOf(row.first_name, row.family_name)}|${row.born_on ?? ''}`, row.record_number]),
  );
};
