import { plainDate } from '@weftway/calendar/plain-date';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { ageOfPosition, ageOnRuler, defaultPeriod, periodOfAge, periods, positionOfAge, segmentsOf } from './scale.ts';

describe('the age scale', () => {
  test.each([
    [-5, 0],
    [0, 0.045],
    [6, 0.245],
    [18, 0.4],
    [72, 0.62],
    [144, 0.82],
    [252, 1],
  ])('puts an age of %d months at %d of the width', (age, position) => {
    expect(positionOfAge(age)).toBeCloseTo(position, 10);
  });

  test('keeps ages outside it on its ends', () => {
    expect(positionOfAge(-40)).toBe(0);
    expect(positionOfAge(400)).toBeCloseTo(1, 10);
  });

  test('runs evenly inside a segment', () => {
    expect(positionOfAge(45)).toBeCloseTo((0.4 + 0.62) / 2, 10);
  });

  test.each(periods)('has an inverse when looking at %s', (period) => {
    fc.assert(
      fc.property(fc.double({ min: -5, max: 252, noNaN: true }), (age) => {
        expect(ageOfPosition(positionOfAge(age, period), period)).toBeCloseTo(age, 6);
      }),
    );
  });

  test.each(periods)('never runs backwards when looking at %s', (period) => {
    fc.assert(
      fc.property(
        fc.double({ min: -5, max: 252, noNaN: true }),
        fc.double({ min: 0, max: 50, noNaN: true }),
        (age, more) => {
          expect(positionOfAge(age + more, period)).toBeGreaterThanOrEqual(positionOfAge(age, period));
        },
      ),
    );
  });
});

describe('looking closer', () => {
  test.each(periods)('still shows the whole life in %s', (period) => {
    expect(segmentsOf(period).reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 10);
  });

  test('gives the chosen segments 0.76 in the ratio of their own shares', () => {
    const [, six, eighteen] = segmentsOf('first-18-months');
    expect((six?.share ?? 0) + (eighteen?.share ?? 0)).toBeCloseTo(0.76, 10);
    expect((six?.share ?? 0) / (eighteen?.share ?? 1)).toBeCloseTo(0.2 / 0.155, 10);
  });

  test.each([
    [0, 'first-18-months'],
    [17.9, 'first-18-months'],
    [18, 'early-years'],
    [100, 'school'],
    [144, 'growing-up'],
  ])('finds that %d months belong to %s', (age, period) => {
    expect(periodOfAge(age)).toBe(period);
  });

  test('is the default only where the whole life does not fit', () => {
    expect(defaultPeriod(1099, 100)).toBe('school');
    expect(defaultPeriod(1100, 100)).toBe('all');
  });
});

test('age on the ruler counts months of 30.4375 days, negative before birth', () => {
  const birth = plainDate('2020-01-01');
  expect(ageOnRuler(birth, plainDate('2024-01-01'))).toBeCloseTo(1461 / 30.4375, 10);
  expect(ageOnRuler(birth, plainDate('2019-12-02'))).toBeCloseTo(-30 / 30.4375, 10);
});
