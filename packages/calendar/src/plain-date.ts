/**
 * Plain calendar dates, without a clock and without a time zone.
 * A date is kept as ISO text (`2026-10-06`) at the edges and as whole days since 1970-01-01 inside calculations.
 * The arithmetic is our own because the planner runs it millions of times; it is tested against Temporal.
 * Months are added as calendar months with a clamp to the last day: 31 August + 6 months = 28 February.
 */
import { epochDayOfParts, monthLength, partsOfEpochDay } from './civil-date.ts';

export type PlainDate = string & { readonly __brand: 'PlainDate' };

export type DateFault = 'not-iso' | 'no-such-day';
export type DateReading =
  { readonly kind: 'date'; readonly date: PlainDate } | { readonly kind: 'fault'; readonly fault: DateFault };

const twoDigits = Array.from({ length: 32 }, (_, number) => String(number).padStart(2, '0'));
const isoDate = /^(\d{4})-(\d{2})-(\d{2})$/;

/** Reads ISO text of the years 0001 to 9999; the fault says whether the form or the day is wrong. */
export function readPlainDate(text: string): DateReading {
  const match = isoDate.exec(text);
  if (!match) return { kind: 'fault', fault: 'not-iso' };
  const [year, month, day] = [Number(match[1]), Number(match[2]), Number(match[3])];
  if (year < 1 || month < 1 || month > 12 || day < 1 || day > monthLength(year, month)) {
    return { kind: 'fault', fault: 'no-such-day' };
  }
  // The text has just been checked; only the brand is added.
  return { kind: 'date', date: text as PlainDate };
}

/** ISO text as a date. Throws a RangeError that quotes the text when it is not a day of the calendar. */
export function plainDate(text: string): PlainDate {
  const reading = readPlainDate(text);
  if (reading.kind === 'date') return reading.date;
  throw new RangeError(
    reading.fault === 'not-iso'
      ? `"${text}" is not a date written as 2026-10-06.`
      : `"${text}" is not a day of the calendar.`,
  );
}

/** Whole days since 1970-01-01 (day 0); negative before. The text must be a date already checked. */
export function toEpochDay(date: PlainDate): number {
  const year =
    (date.charCodeAt(0) - 48) * 1000 +
    (date.charCodeAt(1) - 48) * 100 +
    (date.charCodeAt(2) - 48) * 10 +
    (date.charCodeAt(3) - 48);
  const month = (date.charCodeAt(5) - 48) * 10 + (date.charCodeAt(6) - 48);
  return epochDayOfParts(year, month, (date.charCodeAt(8) - 48) * 10 + (date.charCodeAt(9) - 48));
}

/** Days whose text is remembered: 1970 to about 2106, the lives that a team plans. */
const rememberedDays = 50_000;
const texts: (PlainDate | undefined)[] = [];

/** The date of a whole day since 1970-01-01. Texts once made are kept, since a plan names the same days again and again. */
export function fromEpochDay(epochDay: number): PlainDate {
  if (epochDay < 0 || epochDay >= rememberedDays) return textOfDay(epochDay);
  return (texts[epochDay] ??= textOfDay(epochDay));
}

function textOfDay(epochDay: number): PlainDate {
  const { year, month, day } = partsOfEpochDay(epochDay);
  const yearText = year > 999 ? String(year) : String(year).padStart(4, '0');
  const text = `${yearText}-${twoDigits[month] ?? ''}-${twoDigits[day] ?? ''}`;
  // Made from a day of the calendar, so the text is one.
  return text as PlainDate;
}

/** The date `days` later; earlier when negative. */
export function addDays(date: PlainDate, days: number): PlainDate {
  return fromEpochDay(toEpochDay(date) + days);
}

/** The date `months` calendar months later, clamped to the last day of that month. */
export function addMonths(date: PlainDate, months: number): PlainDate {
  return fromEpochDay(addMonthsToDay(toEpochDay(date), months));
}

/** The date `weeks` of seven days later. */
export function addWeeks(date: PlainDate, weeks: number): PlainDate {
  return addDays(date, weeks * 7);
}

/** Days from `from` to `to`; negative when `to` is earlier. */
export function daysBetween(from: PlainDate, to: PlainDate): number {
  return toEpochDay(to) - toEpochDay(from);
}

/** Negative when `left` is earlier, 0 on the same day, positive when later. */
export function comparePlainDates(left: PlainDate, right: PlainDate): number {
  return left < right ? -1 : left > right ? 1 : 0;
}

/** The later of two dates. */
export function laterOf(left: PlainDate, right: PlainDate): PlainDate {
  return left >= right ? left : right;
}

/** Whole days since 1970-01-01 of the day `months` calendar months later, clamped to the end of that month. */
export function addMonthsToDay(epochDay: number, months: number): number {
  if (months === 0) return epochDay;
  // The day's year, month and day are reckoned in place: an object for each addition would dominate the planner.
  const shifted = epochDay + 719468;
  const era = Math.floor(shifted / 146097);
  const dayOfEra = shifted - era * 146097;
  const yearOfEra =
    ((dayOfEra - ((dayOfEra / 1460) | 0) + ((dayOfEra / 36524) | 0) - ((dayOfEra / 146096) | 0)) / 365) | 0;
  const dayOfYear = dayOfEra - (365 * yearOfEra + (yearOfEra >> 2) - ((yearOfEra / 100) | 0));
  const monthFromMarch = ((5 * dayOfYear + 2) / 153) | 0;
  const day = dayOfYear - (((153 * monthFromMarch + 2) / 5) | 0) + 1;
  const month = monthFromMarch < 10 ? monthFromMarch + 3 : monthFromMarch - 9;
  const year = yearOfEra + era * 400 + (month <= 2 ? 1 : 0);
  const index = year * 12 + (month - 1) + months;
  const newYear = Math.floor(index / 12);
  const newMonth = index - newYear * 12 + 1;
  const longest = day <= 28 ? day : Math.min(day, monthLength(newYear, newMonth));
  return epochDayOfParts(newYear, newMonth, longest);
}
