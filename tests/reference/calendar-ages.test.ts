/**
 * Ages, month ends and corrected ages against values computed with Temporal and compared with date-fns 4 and
 * dateutil 2.9: a month or year is complete when the same day number is reached, else on the first of the next month.
 */
import { ageOn } from '@weftway/calendar/age';
import { correctedBase, correctionDays } from '@weftway/calendar/corrected-age';
import { addMonths, daysBetween, plainDate } from '@weftway/calendar/plain-date';
import { describe, expect, it } from 'vitest';

const ages: readonly [string, string, string, number][] = [
  ['2020-02-29', '2021-02-28', '0y 11m 30d', 365],
  ['2020-02-29', '2021-03-01', '1y 0m 1d', 366],
  ['2020-02-29', '2024-02-28', '3y 11m 30d', 1460],
  ['2020-02-29', '2024-02-29', '4y 0m 0d', 1461],
  ['2020-01-31', '2020-02-29', '0y 0m 29d', 29],
  ['2020-01-31', '2020-03-01', '0y 1m 1d', 30],
  ['2021-01-31', '2021-02-28', '0y 0m 28d', 28],
  ['2021-01-31', '2021-03-01', '0y 1m 1d', 29],
  ['2021-08-31', '2021-09-30', '0y 0m 30d', 30],
  ['2021-08-31', '2021-10-01', '0y 1m 1d', 31],
  ['2024-12-31', '2025-01-01', '0y 0m 1d', 1],
  ['2023-05-15', '2023-05-15', '0y 0m 0d', 0],
  ['2023-05-15', '2023-06-14', '0y 0m 30d', 30],
  ['2023-05-15', '2023-06-15', '0y 1m 0d', 31],
  ['2022-03-30', '2023-02-28', '0y 10m 29d', 335],
  ['2022-03-30', '2023-03-30', '1y 0m 0d', 365],
  ['2024-03-31', '2024-04-30', '0y 0m 30d', 30],
  ['2024-10-27', '2025-03-30', '0y 5m 3d', 154],
  ['2019-06-10', '2024-06-09', '4y 11m 30d', 1826],
  ['2019-06-10', '2024-06-10', '5y 0m 0d', 1827],
  ['2000-02-29', '2018-02-28', '17y 11m 30d', 6574],
  ['2000-02-29', '2018-03-01', '18y 0m 1d', 6575],
];

const monthEnds: readonly [string, number, string][] = [
  ['2024-01-31', 1, '2024-02-29'],
  ['2023-01-31', 1, '2023-02-28'],
  ['2020-02-29', 12, '2021-02-28'],
  ['2020-02-29', 48, '2024-02-29'],
  ['2023-08-31', 6, '2024-02-29'],
  ['2024-05-31', 1, '2024-06-30'],
  ['2023-11-30', 3, '2024-02-29'],
  ['2024-02-29', -12, '2023-02-28'],
];

const corrections: readonly [string, number, number, string, number][] = [
  ['2024-01-10', 32, 4, '2024-03-02', 52],
  ['2024-01-10', 32, 4, '2024-03-02', 52],
  ['2023-12-31', 28, 0, '2024-03-24', 84],
  ['2024-02-29', 36, 6, '2024-03-22', 22],
  ['2024-02-29', 36, 6, '2024-03-22', 22],
  ['2024-06-01', 37, 0, '2024-06-22', 21],
  ['2024-06-01', 41, 2, '2024-05-23', -9],
];

describe('ages around month ends and leap days (computed with Temporal)', () => {
  it.each(ages)('born %s, on %s: %s', (birth, on, text, days) => {
    const age = ageOn(plainDate(birth), plainDate(on));
    expect(`${String(age.years)}y ${String(age.months)}m ${String(age.days)}d`).toBe(text);
    expect(daysBetween(plainDate(birth), plainDate(on))).toBe(days);
  });
});

describe('months added with a clamp to the last day (computed with Temporal)', () => {
  it.each(monthEnds)('%s and %i months: %s', (date, months, result) => {
    expect(addMonths(plainDate(date), months)).toBe(result);
  });
});

describe('expected date of children born early (Pediatrics 2004;114:1362-4)', () => {
  it.each(corrections)('born %s at %i weeks %i days: %s', (birth, weeks, days, termDate, early) => {
    // From 37 weeks on nothing is corrected, although the expected date lies later.
    const isEarly = weeks < 37;
    expect(correctionDays({ weeks, days })).toBe(isEarly ? early : 0);
    expect(correctedBase(plainDate(birth), { weeks, days })).toBe(isEarly ? termDate : birth);
  });
});
