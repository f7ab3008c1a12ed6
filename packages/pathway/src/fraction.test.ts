import { expect, it } from 'vitest';
import { fraction, isAtLeast } from './fraction.ts';

it('fractions are compared without rounding', () => {
  expect(isAtLeast(fraction('1/3'), fraction('1/3'))).toBe(true);
  expect(isAtLeast(fraction('333333333/1000000000'), fraction('1/3'))).toBe(false);
  expect(isAtLeast(fraction('2/4'), fraction('1/2'))).toBe(true);
  expect([isAtLeast(fraction('1'), fraction('3/4')), isAtLeast(fraction('0'), fraction('1/4'))]).toEqual([true, false]);
});

it.each(['', '1/0', '-1/2', '0.5', 'half'])('"%s" is not a fraction', (text) => {
  expect(() => fraction(text)).toThrow('is not a fraction such as 1/2.');
});
