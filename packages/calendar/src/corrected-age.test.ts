import { expect, it } from 'vitest';
import { correctedBase, correctionDays } from './corrected-age.ts';
import { plainDate } from './plain-date.ts';

it.each([
  [{ weeks: 32, days: 0 }, 56],
  [{ weeks: 36, days: 6 }, 22],
  [{ weeks: 37, days: 0 }, 0],
  [{ weeks: 41, days: 3 }, 0],
  [null, 0],
])('born at %o: %i days', (gestation, days) => {
  expect(correctionDays(gestation)).toBe(days);
});

it('the corrected base is the expected date of birth', () => {
  expect(correctedBase(plainDate('2025-11-03'), { weeks: 32, days: 0 })).toBe('2025-12-29');
});
