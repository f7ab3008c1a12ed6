import fc from 'fast-check';
import { Temporal } from 'temporal-polyfill';
import { describe, expect, it } from 'vitest';
import {
  addDays,
  addMonths,
  addWeeks,
  comparePlainDates,
  daysBetween,
  fromEpochDay,
  laterOf,
  plainDate,
  readPlainDate,
  toEpochDay,
} from './plain-date.ts';

/** Days of the years 1600 to 2400, so that every rule of leap years is met. */
const anyDay = fc.integer({ min: -135_140, max: 157_054 }).map(fromEpochDay);

describe('reading a date', () => {
  it.each(['2026-02-29', '2026-13-01', '2026-00-10', '2026-04-31', '0000-01-01'])(
    '%s is not a day of the calendar',
    (text) => {
      expect(readPlainDate(text)).toEqual({ kind: 'fault', fault: 'no-such-day' });
      expect(() => plainDate(text)).toThrow(`"${text}" is not a day of the calendar.`);
    },
  );

  it.each(['6 Oct 2026', '2026-1-06', '20261006', '2026-10-06T00:00', ''])('"%s" is not written as a date', (text) => {
    expect(readPlainDate(text)).toEqual({ kind: 'fault', fault: 'not-iso' });
    expect(() => plainDate(text)).toThrow('is not a date written as 2026-10-06.');
  });

  it('a leap day is a day in leap years only', () => {
    expect(readPlainDate('2000-02-29').kind).toBe('date');
    expect(readPlainDate('1900-02-29').kind).toBe('fault');
  });
});

describe('the arithmetic is that of Temporal', () => {
  it('days and months', () => {
    fc.assert(
      fc.property(anyDay, fc.integer({ min: -600, max: 600 }), (date, count) => {
        const other = Temporal.PlainDate.from(date);
        expect(addMonths(date, count)).toBe(other.add({ months: count }).toString());
        expect(addDays(date, count * 7)).toBe(other.add({ days: count * 7 }).toString());
        expect(addWeeks(date, count)).toBe(other.add({ weeks: count }).toString());
      }),
    );
  });

  it('differences', () => {
    fc.assert(
      fc.property(anyDay, anyDay, (from, to) => {
        const days = Temporal.PlainDate.from(from).until(Temporal.PlainDate.from(to)).days;
        expect(daysBetween(from, to)).toBe(days);
      }),
    );
  });

  it('to whole days and back', () => {
    fc.assert(
      fc.property(anyDay, (date) => {
        expect(fromEpochDay(toEpochDay(date))).toBe(date);
      }),
    );
    expect(toEpochDay(plainDate('1970-01-01'))).toBe(0);
    expect(fromEpochDay(-719_162)).toBe('0001-01-01');
  });
});

it('dates compare by time', () => {
  const [early, late] = [plainDate('2026-02-28'), plainDate('2026-03-01')];
  expect([comparePlainDates(early, late), comparePlainDates(late, early), comparePlainDates(early, early)]).toEqual([
    -1, 1, 0,
  ]);
  expect([laterOf(early, late), laterOf(late, early)]).toEqual([late, late]);
});
