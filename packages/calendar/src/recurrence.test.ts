import { expect, it } from 'vitest';
import { plainDate } from './plain-date.ts';
import { datesOfRule, rhythm } from './recurrence.ts';
import { span } from './span.ts';

const start = plainDate('2026-01-31');

it('a weekly rhythm goes by seven days', () => {
  expect(rhythm(start, span('7d'), 3)).toEqual(['2026-02-07', '2026-02-14', '2026-02-21']);
});

it('a rhythm of months takes the last day of a short month and goes on from there', () => {
  expect(rhythm(start, span('1m'), 3)).toEqual(['2026-02-28', '2026-03-28', '2026-04-28']);
});

it('no count or no step gives no dates', () => {
  expect([rhythm(start, span('7d'), 0), rhythm(start, span('0d'), 3), rhythm(start, span('0d'), -1)]).toEqual([
    [],
    [],
    [],
  ]);
});

it('a rule leaves out what it is told to', () => {
  const dates = datesOfRule('FREQ=WEEKLY', plainDate('2026-03-02'), 3, [plainDate('2026-03-09')]);
  expect(dates).toEqual(['2026-03-02', '2026-03-16', '2026-03-23']);
});
