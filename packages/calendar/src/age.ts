/**
 * How old someone is on a day, and how a screen says it.
 * A month or year is complete when the same day number is reached, else on the first of the next month: the rule of
 * Temporal `PlainDate.until`. A child born on 29 February has the first birthday on 1 March of a common year.
 */
import { partsOfEpochDay } from './civil-date.ts';
import { addMonthsToDay, toEpochDay, type PlainDate } from './plain-date.ts';

export interface Age {
  readonly years: number;
  readonly months: number;
  readonly days: number;
}

/** Complete months from birth to a day; -1 or less before birth. */
export function ageInMonths(birth: PlainDate, on: PlainDate): number {
  const from = partsOfEpochDay(toEpochDay(birth));
  const to = partsOfEpochDay(toEpochDay(on));
  const months = (to.year - from.year) * 12 + to.month - from.month;
  return to.day < from.day ? months - 1 : months;
}

/** Age in complete years, months and days. Throws a RangeError before birth. */
export function ageOn(birth: PlainDate, on: PlainDate): Age {
  if (on < birth) throw new RangeError(`${on} is before the birth on ${birth}.`);
  const months = ageInMonths(birth, on);
  const lastMonthDay = addMonthsToDay(toEpochDay(birth), months);
  return { years: Math.floor(months / 12), months: months % 12, days: toEpochDay(on) - lastMonthDay };
}

/** "3 days", "11 weeks" below 16 weeks, "5 months" below 24 months, then "8 years 4 months"; "not yet born" before. */
export function ageText(birth: PlainDate, on: PlainDate): string {
  const days = toEpochDay(on) - toEpochDay(birth);
  if (days < 0) return 'not yet born';
  if (days < 7) return counted(days, 'day');
  if (days < 16 * 7) return counted(Math.floor(days / 7), 'week');
  const months = ageInMonths(birth, on);
  if (months < 24) return counted(months, 'month');
  const years = counted(Math.floor(months / 12), 'year');
  return months % 12 === 0 ? years : `${years} ${counted(months % 12, 'month')}`;
}

/** The same for tight places: "3 d", "11 w", "5 m", "8 y 4 m". */
export function shortAgeText(birth: PlainDate, on: PlainDate): string {
  const days = toEpochDay(on) - toEpochDay(birth);
  if (days < 0) return 'unborn';
  if (days < 7) return `${days} d`;
  if (days < 16 * 7) return `${Math.floor(days / 7)} w`;
  const months = ageInMonths(birth, on);
  if (months < 24) return `${months} m`;
  return months % 12 === 0 ? `${months / 12} y` : `${Math.floor(months / 12)} y ${months % 12} m`;
}

function counted(count: number, unit: string): string {
  return `${count} ${unit}${count === 1 ? '' : 's'}`;
}
