import fc from 'fast-check';
import { Temporal } from 'temporal-polyfill';
import { describe, expect, it } from 'vitest';
import { ageInMonths, ageOn, ageText, shortAgeText } from './age.ts';
import { addDays, fromEpochDay, plainDate } from './plain-date.ts';

const born = plainDate('2018-03-10');

describe('how an age is said', () => {
  it.each([
    [0, '0 days', '0 d'],
    [1, '1 day', '1 d'],
    [7, '1 week', '1 w'],
    [77, '11 weeks', '11 w'],
    [111, '15 weeks', '15 w'],
    [112, '3 months', '3 m'],
    [160, '5 months', '5 m'],
    [730, '23 months', '23 m'],
    [731, '2 years', '2 y'],
    [765, '2 years 1 month', '2 y 1 m'],
    [3050, '8 years 4 months', '8 y 4 m'],
    [-1, 'not yet born', 'unborn'],
  ])('after %i days', (days, text, short) => {
    expect([ageText(born, addDays(born, days)), shortAgeText(born, addDays(born, days))]).toEqual([text, short]);
  });
});

describe('the age itself', () => {
  it('is that of Temporal', () => {
    const anyDay = fc.integer({ min: 0, max: 40_000 });
    fc.assert(
      fc.property(anyDay, fc.nat(9000), (start, days) => {
        const [from, to] = [fromEpochDay(start), fromEpochDay(start + days)];
        const other = Temporal.PlainDate.from(from).until(Temporal.PlainDate.from(to), { largestUnit: 'years' });
        expect(ageOn(from, to)).toEqual({ years: other.years, months: other.months, days: other.days });
        expect(ageInMonths(from, to)).toBe(other.years * 12 + other.months);
      }),
    );
  });

  it('before birth there is none', () => {
    expect(() => ageOn(born, addDays(born, -1))).toThrow('is before the birth');
    expect(ageInMonths(born, addDays(born, -1))).toBe(-1);
  });
});
