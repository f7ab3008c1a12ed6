import fc from 'fast-check';
import { expect, test } from 'vitest';
import { periods } from '../scale.ts';
import { placedSegmentNames, placedTickLabels, plainTicks, type AxisFrame } from './ticks.ts';

const anyAxis = fc
  .record({
    width: fc.integer({ min: 400, max: 1400 }),
    period: fc.constantFrom(...periods),
    today: fc.double({ min: 0, max: 1, noNaN: true }),
  })
  .map(({ width, period, today }): AxisFrame => ({ x0: 150, width, period, todayX: 150 + width * today }));

test('tick labels never meet one another or the today line', () => {
  fc.assert(
    fc.property(anyAxis, (axis) => {
      const labels = placedTickLabels(axis).toSorted((a, b) => a.left - b.left);
      for (const [index, label] of labels.entries()) {
        expect(label.left).toBeGreaterThan(labels[index - 1]?.right ?? 0);
        expect(label.right <= axis.todayX || label.left >= axis.todayX).toBe(true);
      }
    }),
  );
});

test('names of segments never meet one another or the today flag', () => {
  fc.assert(
    fc.property(anyAxis, (axis) => {
      const names = placedSegmentNames(axis);
      for (const [index, name] of names.entries()) {
        expect(name.left).toBeGreaterThan(names[index - 1]?.right ?? 0);
        expect(name.right <= axis.todayX - 22 || name.left >= axis.todayX + 22).toBe(true);
      }
    }),
  );
});

test('a wide ruler labels birth, the months and the years', () => {
  const labels = placedTickLabels({ x0: 150, width: 1250, period: 'all', todayX: 400 }).map(({ text }) => text);
  expect(labels).toEqual(expect.arrayContaining(['birth', '3', '6 m', '1 y', '18 m', '6 y', '12 y', '16', '21 y']));
});

test('ticks too close to be told apart are left out', () => {
  expect(plainTicks('all', 1200)).toHaveLength(5 + 27 + 12 + 18 + 12 + 9 + 1);
  expect(plainTicks('growing-up', 400).filter((age) => age > 0 && age < 6)).toEqual([]);
});
