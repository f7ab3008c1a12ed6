/** What was typed into the search of the registry: words in any order, a record number, a birth date. */
import { readWrittenDate } from '@weftway/calendar/written-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import { foldText } from './search-text.ts';

export interface RegistrySearch {
  readonly words: readonly string[];
  readonly date: PlainDate | null;
}

const dateInside = /\d{4}-\d{1,2}-\d{1,2}|\d{1,2}[-/.]\d{1,2}[-/.]\d{4}|\d{1,2}\.? [A-Za-z]{3,9}\.? \d{4}/;

/** A whole date anywhere in the text is a birth date, day before month; all else are words. */
export const readRegistrySearch = (text: string): RegistrySearch => {
  const found = dateInside.exec(text)?.[0];
  const reading = found === undefined ? null : readWrittenDate(found.replace('. ', ' '));
  const date = reading?.kind === 'date' && reading.precision === 'day' ? reading.date : null;
  const rest = date === null || found === undefined ? text : text.replace(found, ' ');
  return {
    words: foldText(rest.replaceAll(',', ' '))
      .split(' ')
      .filter((word) => word !== ''),
    date,
  };
};
