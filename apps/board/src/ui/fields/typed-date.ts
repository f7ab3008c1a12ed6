import { readPlainDate, type PlainDate } from '@weftway/calendar/plain-date';

const monthNames = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'];

/**
 * What was typed as a date: `6/10/2026`, `6.10.2026`, `6 Oct 2026`, `6 October 2026`, `2026-10-06`.
 * Day before month always. Two-figure years and days that do not exist give `null`.
 */
export function parseTypedDate(text: string): PlainDate | null {
  const trimmed = text.trim();
  const iso = /^(\d{4})-(\d{1,2})-(\d{1,2})$/.exec(trimmed);
  if (iso !== null) return dateOf(iso[1], iso[2], iso[3]);
  const numbers = /^(\d{1,2})[/. -](\d{1,2})[/. -](\d{4})$/.exec(trimmed);
  if (numbers !== null) return dateOf(numbers[3], numbers[2], numbers[1]);
  const words = /^(\d{1,2})[ -]?([a-z]{3,9})\.?,?[ -]?(\d{4})$/i.exec(trimmed);
  if (words !== null) return dateOf(words[3], String(monthNumber(words[2] ?? '')), words[1]);
  return null;
}

function monthNumber(word: string): number {
  return monthNames.indexOf(word.slice(0, 3).toLowerCase()) + 1;
}

function dateOf(year = '', month = '', day = ''): PlainDate | null {
  const reading = readPlainDate(`${year}-${month.padStart(2, '0')}-${day.padStart(2, '0')}`);
  return reading.kind === 'date' ? reading.date : null;
}
