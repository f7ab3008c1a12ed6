import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatDate } from './format-date.ts';
import { fromEpochDay } from './plain-date.ts';
import { readWrittenDate } from './written-date.ts';

const anyDate = fc.integer({ min: -25_000, max: 30_000 }).map(fromEpochDay);
const partsOf = (date: string) => date.split('-') as [string, string, string];

describe('a date as written', () => {
  it('comes back from every whole form, in either order', () => {
    fc.assert(
      fc.property(anyDate, fc.constantFrom('/', '.', '-', ' '), (date, sign) => {
        const [year, month, day] = partsOf(date);
        const read = (text: string, order: 'day-first' | 'month-first' = 'day-first') => readWrittenDate(text, order);
        expect(read(date)).toMatchObject({ date, precision: 'day', isAmbiguous: false });
        expect(read(` ${date} 00:00:00 `)).toMatchObject({ date });
        expect(read(formatDate(date))).toMatchObject({ date, isAmbiguous: false });
        expect(read([day, month, year].join(sign))).toMatchObject({ date });
        expect(read([String(Number(month)), String(Number(day)), year].join(sign), 'month-first')).toMatchObject({
          date,
        });
      }),
    );
  });

  it('is ambiguous exactly when the other order names another day', () => {
    fc.assert(
      fc.property(anyDate, (date) => {
        const [year, month, day] = partsOf(date);
        const reading = readWrittenDate(`${day}/${month}/${year}`);
        const other = readWrittenDate(`${day}/${month}/${year}`, 'month-first');
        const isOther = other.kind === 'date' && other.date !== date;
        expect(reading).toMatchObject({ isAmbiguous: isOther });
      }),
    );
  });

  it('never throws and never makes a day up', () => {
    fc.assert(
      fc.property(fc.string(), (text) => {
        const reading = readWrittenDate(text);
        if (reading.kind === 'date') expect(reading.date).toMatch(/^\d{4}-\d{2}-\d{2}$/);
      }),
    );
  });

  it.each([
    ['6 October 2026', '2026-10-06', 'day'],
    ['6th Oct 2026', '2026-10-06', 'day'],
    ['Oct 6, 2026', '2026-10-06', 'day'],
    ['6-Oct-2026', '2026-10-06', 'day'],
    ['2026/10/6', '2026-10-06', 'day'],
    ['Sept 2026', '2026-09-15', 'month'],
    ['10/2026', '2026-10-15', 'month'],
    ['2026-10', '2026-10-15', 'month'],
    ['2026', '2026-07-01', 'year'],
  ])('%s is %s, known to the %s', (text, date, precision) => {
    expect(readWrittenDate(text)).toMatchObject({ date, precision });
  });

  it.each([
    ['31/02/2026', 'no-such-day'],
    ['2026-13-01', 'no-such-day'],
    ['10/25/2026', 'other-order'],
    ['6/10/26', 'short-year'],
    ['6 Oct 26', 'short-year'],
    ['45369', 'day-number'],
    ['6 Okt 2026', 'not-a-date'],
    ['last spring', 'not-a-date'],
    ['', 'not-a-date'],
  ])('%s is no date: %s', (text, fault) => {
    expect(readWrittenDate(text)).toEqual({ kind: 'fault', fault });
  });
});
