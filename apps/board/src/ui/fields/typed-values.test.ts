import { expect, test } from 'vitest';
import { parseTypedDate } from './typed-date.ts';
import { parseTypedNumber, stepNumber } from './typed-number.ts';

test.each([
  ['6/10/2026', '2026-10-06'],
  ['06.10.2026', '2026-10-06'],
  ['6-10-2026', '2026-10-06'],
  ['6 10 2026', '2026-10-06'],
  ['6 Oct 2026', '2026-10-06'],
  ['6 october 2026', '2026-10-06'],
  ['6oct2026', '2026-10-06'],
  [' 2026-10-06 ', '2026-10-06'],
  ['29 Feb 2024', '2024-02-29'],
])('reads %s as a date', (typed, date) => {
  expect(parseTypedDate(typed)).toBe(date);
});

test.each(['', '31/2/2026', '29 Feb 2026', '13/13/2026', '6 Xyz 2026', '6/10/26', 'tomorrow'])(
  'reads no date in "%s"',
  (typed) => {
    expect(parseTypedDate(typed)).toBeNull();
  },
);

test.each([
  ['', null],
  ['6.2', 6.2],
  ['6,2', 6.2],
  ['-3', -3],
  ['.5', 0.5],
  ['62 mm', Number.NaN],
  ['6,,2', Number.NaN],
])('reads "%s" as the number %s', (typed, number) => {
  expect(parseTypedNumber(typed)).toBe(number);
});

test('a step keeps the decimals of the text and of the step', () => {
  expect(stepNumber('6.2', 0.1)).toBe('6.3');
  expect(stepNumber('0.3', -0.1)).toBe('0.2');
  expect(stepNumber('', 10)).toBe('10');
});
