import { describe, expect, test } from 'vitest';
import { marksOf, columnsOf, linesOf } from './board-layout.ts';
import { headsOf, stripsOf, unrolledAtFirst, type Strip } from './board-strips.ts';
import { aBoard, aRow, palateRepair, testDay } from './testing-board.ts';

const stripsFor = (
  rows: Parameters<typeof aBoard>[0],
  own: readonly ('surgeon' | 'speech-therapist' | 'coordinator')[] = [],
  discipline: 'surgeon' | null = null,
): readonly Strip[] => {
  const board = aBoard(rows);
  return stripsOf({ rows: board.rows, heads: headsOf(board), day: testDay, own, discipline });
};
const strip = (strips: readonly Strip[], key: string): Strip => {
  const found = strips.find((one) => one.key === key);
  if (found === undefined) throw new Error(`No lane ${key}`);
  return found;
};

describe('lanes by time to close', () => {
  test.each([
    [-92, 0],
    [-91, 1],
    [-29, 1],
    [-28, 2],
    [-1, 2],
    [0, 3],
    [14, 3],
    [15, 4],
    [42, 4],
    [43, 5],
    [84, 5],
    [85, 6],
    [182, 6],
    [183, 7],
  ])('a window that closes in %i days stands in bin %i', (closesIn, bin) => {
    expect(strip(stripsFor([aRow({ closesIn })]), 'speech').bins[bin]).toHaveLength(1);
  });

  test('without a window it stands at the far end', () => {
    expect(strip(stripsFor([aRow({ closesIn: null, state: 'held' })]), 'speech').bins[7]).toHaveLength(1);
  });

  test('in a bin late stands before closing before open, then the earliest close, then the surname', () => {
    const rows = [
      aRow({ childId: 'a', familyName: 'Zhao', closesIn: 5 }),
      aRow({ childId: 'b', familyName: 'Aksoy', closesIn: 5 }),
      aRow({ childId: 'c', familyName: 'Pell', closesIn: 2 }),
      aRow({ childId: 'd', familyName: 'Zhao', state: 'closing', closesIn: 9 }),
    ];
    expect(strip(stripsFor(rows), 'speech').bins[3]?.map((row) => row.child.id)).toEqual(['d', 'c', 'b', 'a']);
  });

  test('a busy lane is cut into strips, and each counts its loose ends', () => {
    const strips = stripsFor([
      aRow({ milestone: palateRepair, holders: [null] }),
      aRow({ childId: 'c-2', milestone: palateRepair }),
    ]);
    expect(strip(strips, 'palate')).toMatchObject({ count: 2, loose: 1, lane: 'surgery' });
    expect(strip(strips, 'surgery').count).toBe(0);
  });

  test('own lanes start unrolled; for somebody without any, the lane with most late ones', () => {
    const rows = [aRow({ state: 'late', closesIn: -3 }), aRow({ milestone: palateRepair })];
    expect(unrolledAtFirst(stripsFor(rows, ['surgeon']))).toEqual(['palate']);
    expect(unrolledAtFirst(stripsFor(rows, ['coordinator']))).toEqual(['speech']);
  });

  test("a long lane of one's own starts rolled, so that the rest of the board is seen", () => {
    const rows = Array.from({ length: 25 }, (_unused, at) =>
      aRow({ childId: `c-${String(at)}`, milestone: palateRepair }),
    );
    expect(unrolledAtFirst(stripsFor(rows, ['surgeon']))).toEqual([]);
    expect(unrolledAtFirst(stripsFor(rows.slice(0, 24), ['surgeon']))).toEqual(['palate']);
  });

  test('lanes of a discipline leave the others out', () => {
    expect(stripsFor([aRow({}), aRow({ milestone: palateRepair })], [], 'surgeon').map((one) => one.key)).toEqual([
      'palate',
    ]);
  });
});

describe('marks of a rolled bin', () => {
  const rows = Array.from({ length: 200 }, (_unused, at) => aRow({ childId: `c-${String(at)}` }));

  test('as many are drawn as fit on two lines, and the rest is a number', () => {
    const { marks, more } = marksOf(rows, 150);
    expect(marks.length + more).toBe(200);
    expect(Math.max(...marks.map((mark) => mark.line))).toBe(1);
    expect(Math.max(...marks.map((mark) => mark.x))).toBeLessThan(150);
  });

  test('a few stand on one line without a number', () => {
    expect(marksOf(rows.slice(0, 5), 150)).toMatchObject({ more: 0 });
  });

  test('an unrolled lane has as many lines as its fullest bin', () => {
    const strips = stripsFor([aRow({ childId: 'a' }), aRow({ childId: 'b' }), aRow({ childId: 'c', closesIn: 100 })]);
    const lines = linesOf([strip(strips, 'speech')], new Set(['speech']), columnsOf(1200));
    expect(lines).toHaveLength(2);
    expect(lines[0]).toMatchObject({ kind: 'names', isFirst: true });
  });
});
