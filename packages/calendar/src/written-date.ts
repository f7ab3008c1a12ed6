/**
 * Dates as people and spreadsheets write them: `2026-10-06`, `6/10/2026`, `6.10.2026`, `6 Oct 2026`, `Oct 6, 2026`, and
 * dates known only to the month (`10/2026`, `Oct 2026`) or the year (`2026`).
 * Which of two figures is the day is for the caller to say. A year has four figures; two are never guessed at.
 * A month stands for its 15th and a year for its 1 July (ruling 32 of the pathway); the precision goes with the date.
 */
import { readPlainDate, type PlainDate } from './plain-date.ts';

export type DateOrder = 'day-first' | 'month-first';
export type WrittenDateFault = 'not-a-date' | 'no-such-day' | 'other-order' | 'short-year' | 'day-number';

export type WrittenDate =
  | {
      readonly kind: 'date';
      readonly date: PlainDate;
      readonly precision: 'day' | 'month' | 'year';
      /** Read the other way round it would be another day. */
      readonly isAmbiguous: boolean;
    }
  | { readonly kind: 'fault'; readonly fault: WrittenDateFault };

const monthNames = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'];
const wholeMonthNames = [
  'january',
  'february',
  'march',
  'april',
  'may',
  'june',
  'july',
  'august',
  'september',
  'october',
  'november',
  'december',
];

const fault = (kind: WrittenDateFault): WrittenDate => ({ kind: 'fault', fault: kind });

const dateOf = (year: number, month: number, day: number): PlainDate | null => {
  const pad = (number: number, width: number): string => String(number).padStart(width, '0');
  const reading = readPlainDate(`${pad(year, 4)}-${pad(month, 2)}-${pad(day, 2)}`);
  return reading.kind === 'date' ? reading.date : null;
};

const dayOf = (year: number, month: number, day: number, isAmbiguous = false): WrittenDate => {
  const date = dateOf(year, month, day);
  return date === null ? fault('no-such-day') : { kind: 'date', date, precision: 'day', isAmbiguous };
};

const monthOf = (year: number, month: number): WrittenDate => {
  const date = dateOf(year, month, 15);
  return date === null ? fault('no-such-day') : { kind: 'date', date, precision: 'month', isAmbiguous: false };
};

/** 1 to 12; 0 when the word is no month. */
const monthNumber = (word: string): number => {
  const small = word.toLowerCase();
  if (small === 'sept') return 9;
  return monthNames.indexOf(small) + 1 || wholeMonthNames.indexOf(small) + 1;
};

const twoFigures = (first: number, second: number, year: number, order: DateOrder): WrittenDate => {
  const [day, month] = order === 'day-first' ? [first, second] : [second, first];
  const reading = dayOf(year, month, day, first <= 12 && second <= 12 && first !== second);
  if (reading.kind === 'fault' && dateOf(year, day, month) !== null) return fault('other-order');
  return reading;
};

const figuresOf = (text: string, order: DateOrder): WrittenDate | null => {
  const yearFirst = /^(\d{4})[-/.](\d{1,2})[-/.](\d{1,2})$/.exec(text);
  if (yearFirst !== null) return dayOf(Number(yearFirst[1]), Number(yearFirst[2]), Number(yearFirst[3]));
  const whole = /^(\d{1,2})[-/. ](\d{1,2})[-/. ](\d{4})$/.exec(text);
  if (whole !== null) return twoFigures(Number(whole[1]), Number(whole[2]), Number(whole[3]), order);
  if (/^\d{1,2}[-/. ]\d{1,2}[-/. ]\d{2}$/.test(text)) return fault('short-year');
  const monthAndYear = /^(\d{1,2})[-/.](\d{4})$/.exec(text);
  if (monthAndYear !== null) return monthOf(Number(monthAndYear[2]), Number(monthAndYear[1]));
  const yearAndMonth = /^(\d{4})[-/.](\d{1,2})$/.exec(text);
  if (yearAndMonth !== null) return monthOf(Number(yearAndMonth[1]), Number(yearAndMonth[2]));
  return null;
};

const wordsOf = (text: string): WrittenDate | null => {
  const dayFirst = /^(\d{1,2})(?:st|nd|rd|th)?[-/. ]{1,2}([a-z]{3,9})\.?,?[-/. ]{1,2}(\d{2,4})$/i.exec(text);
  const monthFirst = /^([a-z]{3,9})\.? (\d{1,2})(?:st|nd|rd|th)?,? (\d{2,4})$/i.exec(text);
  const parts = dayFirst === null ? monthFirst && [monthFirst[2], monthFirst[1], monthFirst[3]] : dayFirst.slice(1);
  if (parts !== null) {
    const [day = '', word = '', year = ''] = parts;
    if (monthNumber(word) === 0) return fault('not-a-date');
    return year.length === 4 ? dayOf(Number(year), monthNumber(word), Number(day)) : fault('short-year');
  }
  const monthAndYear = /^([a-z]{3,9})\.?[-/ ](\d{4})$/i.exec(text);
  const month = monthNumber(monthAndYear?.[1] ?? '');
  return month === 0 ? null : monthOf(Number(monthAndYear?.[2]), month);
};

/** Reads a date as written; blanks around it and a midnight behind it (as spreadsheets write) are ignored. */
export function readWrittenDate(text: string, order: DateOrder = 'day-first'): WrittenDate {
  const trimmed = text
    .trim()
    .replace(/\s+/g, ' ')
    .replace(/[T ]00:00(?::00(?:\.0+)?)?Z?$/, '');
  const year = /^\d{4}$/.test(trimmed) ? dateOf(Number(trimmed), 7, 1) : null;
  if (year !== null) return { kind: 'date', date: year, precision: 'year', isAmbiguous: false };
  // Spreadsheets keep days as whole numbers since 1900; 5 figures are the years from 1927 on.
  if (/^\d{5}$/.test(trimmed)) return fault('day-number');
  return figuresOf(trimmed, order) ?? wordsOf(trimmed) ?? fault('not-a-date');
}
