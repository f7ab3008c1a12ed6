/**
 * Year, month and day of the Gregorian calendar to and from whole days since 1970-01-01.
 * Years are counted from March so that the leap day ends a year and month lengths follow one formula
 * (Howard Hinnant, "chrono-compatible low-level date algorithms"); tested against Temporal.
 */
export interface CivilDate {
  readonly year: number;
  readonly month: number;
  readonly day: number;
}

/** Whether the year has a 29 February. */
export function isLeapYear(year: number): boolean {
  return (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0;
}

/** Number of days of a month, 1 to 12. */
export function monthLength(year: number, month: number): number {
  if (month === 2) return isLeapYear(year) ? 29 : 28;
  return month === 4 || month === 6 || month === 9 || month === 11 ? 30 : 31;
}

/** Whole days since 1970-01-01 of a day of the calendar; month 1 to 12. */
export function epochDayOfParts(year: number, month: number, day: number): number {
  const marchYear = month <= 2 ? year - 1 : year;
  const era = Math.floor(marchYear / 400);
  const yearOfEra = marchYear - era * 400;
  const monthFromMarch = month > 2 ? month - 3 : month + 9;
  const dayOfYear = (((153 * monthFromMarch + 2) / 5) | 0) + day - 1;
  return era * 146097 + yearOfEra * 365 + (yearOfEra >> 2) - ((yearOfEra / 100) | 0) + dayOfYear - 719468;
}

/** Year, month (1 to 12) and day of a whole day since 1970-01-01. */
export function partsOfEpochDay(epochDay: number): CivilDate {
  const shifted = epochDay + 719468;
  const era = Math.floor(shifted / 146097);
  const dayOfEra = shifted - era * 146097;
  const leaps = Math.floor(dayOfEra / 1460) - Math.floor(dayOfEra / 36524) + Math.floor(dayOfEra / 146096);
  const yearOfEra = Math.floor((dayOfEra - leaps) / 365);
  const dayOfYear = dayOfEra - (365 * yearOfEra + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100));
  const monthFromMarch = Math.floor((5 * dayOfYear + 2) / 153);
  const month = monthFromMarch < 10 ? monthFromMarch + 3 : monthFromMarch - 9;
  return {
    year: yearOfEra + era * 400 + (month <= 2 ? 1 : 0),
    month,
    day: dayOfYear - Math.floor((153 * monthFromMarch + 2) / 5) + 1,
  };
}
