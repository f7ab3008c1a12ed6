import { expect, it } from 'vitest';
import { formatDate, formatDateOfPrecision } from './format-date.ts';
import { plainDate } from './plain-date.ts';

const date = plainDate('2026-10-06');

it('a date is written with the short name of its month', () => {
  expect(formatDate(date)).toBe('6 Oct 2026');
});

it('a date known to the month or the year says no more than that', () => {
  expect([
    formatDateOfPrecision(date, 'day'),
    formatDateOfPrecision(date, 'month'),
    formatDateOfPrecision(date, 'year'),
  ]).toEqual(['6 Oct 2026', 'Oct 2026', '2026']);
});
