import { describe, expect, test } from 'vitest';
import { boardBinOf, boardBins } from './board-axis.ts';
import { myWorkPosition } from './my-work-axis.ts';

describe('the board axis', () => {
  test.each([
    [-400, '3-months-late'],
    [-92, '3-months-late'],
    [-91, '1-to-3-months-late'],
    [-29, '1-to-3-months-late'],
    [-28, 'under-4-weeks-late'],
    [-1, 'under-4-weeks-late'],
    [0, '2-weeks-left'],
    [14, '2-weeks-left'],
    [15, '2-to-6-weeks-left'],
    [42, '2-to-6-weeks-left'],
    [43, '6-to-12-weeks'],
    [84, '6-to-12-weeks'],
    [85, '3-to-6-months'],
    [182, '3-to-6-months'],
    [183, 'longer'],
  ])('puts a window that closes in %d days into %s', (days, name) => {
    expect(boardBins[boardBinOf(days)]?.name).toBe(name);
  });
});

describe('the axis of My work', () => {
  test.each([
    [-100, 0],
    [-63, 0],
    [0, 0.25],
    [42, 0.65],
    [196, 1],
    [500, 1],
  ])('puts %d days from today at %d', (days, position) => {
    expect(myWorkPosition(days)).toBeCloseTo(position, 10);
  });
});
