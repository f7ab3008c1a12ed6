import fc from 'fast-check';
import { Temporal } from 'temporal-polyfill';
import { expect, it } from 'vitest';
import { fromEpochDay, plainDate } from './plain-date.ts';
import { addSpan, readSpan, span } from './span.ts';

it.each([
  ['2y6m', { months: 30, days: 0 }],
  ['-30d', { months: 0, days: -30 }],
  ['-6m', { months: -6, days: 0 }],
  ['10w', { months: 0, days: 70 }],
  ['1y2m3w4d', { months: 14, days: 25 }],
  ['0d', { months: 0, days: 0 }],
])('%s is read', (text, expected) => {
  expect(readSpan(text)).toEqual(expected);
});

it.each(['', '-', '3', 'm3', '3m2y', '1.5m', '+3m', '3 m'])('"%s" is not a span', (text) => {
  expect(readSpan(text)).toBeNull();
  expect(() => span(text)).toThrow('is not a span');
});

it('months are added before days: 31 January and 1m1d is 1 March', () => {
  expect(addSpan(plainDate('2026-01-31'), span('1m1d'))).toBe('2026-03-01');
});

it('a span adds up as in Temporal', () => {
  const parts = fc.record({ years: fc.nat(25), months: fc.nat(30), weeks: fc.nat(60), days: fc.nat(400) });
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 40_000 }), parts, (start, { years, months, weeks, days }) => {
      const from = fromEpochDay(start);
      const other = Temporal.PlainDate.from(from).add({ years, months }).add({ weeks, days });
      expect(addSpan(from, span(`${String(years)}y${String(months)}m${String(weeks)}w${String(days)}d`))).toBe(
        other.toString(),
      );
    }),
  );
});
