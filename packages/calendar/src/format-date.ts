/** How dates are written on screen and on paper: "6 Oct 2026", the same on every machine. */
import { partsOfEpochDay } from './civil-date.ts';
import { toEpochDay, type PlainDate } from './plain-date.ts';

const monthNames = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

/** "6 Oct 2026" */
export function formatDate(date: PlainDate): string {
  const { year, month, day } = partsOfEpochDay(toEpochDay(date));
  return `${day} ${monthNames[month - 1] ?? ''} ${year}`;
}

/** A date known only to the month or the year: "Oct 2026", "2026"; whole dates as `formatDate`. */
export function formatDateOfPrecision(date: PlainDate, precision: 'day' | 'month' | 'year'): string {
  if (precision === 'day') return formatDate(date);
  const { year, month } = partsOfEpochDay(toEpochDay(date));
  return precision === 'year' ? String(year) : `${monthNames[month - 1] ?? ''} ${year}`;
}
