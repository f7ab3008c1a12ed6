import { describe, expect, test } from 'vitest';
import type { Strip } from '../board-strips.ts';
import { gridMove } from './grid-moves.ts';
import { aRow } from '../testing-board.ts';

const strip = (key: string, ...bins: (readonly string[])[]): Strip => ({
  key,
  name: key,
  lane: 'speech',
  count: bins.flat().length,
  loose: 0,
  late: 0,
  isOwn: false,
  bins: bins.map((names) => names.map((name) => aRow({ childId: name }))),
});

const strips = [strip('lip', ['a'], ['b', 'c']), strip('speech', [], ['d']), strip('teeth')];
const shape = { strips, unrolled: new Set(['lip']) };
const rowOf = (name: string): string => `${name} SPCH-02`;

describe('the arrow keys on the board', () => {
  test('down and up lead from lane to lane', () => {
    expect(gridMove(shape, { strip: 'lip', row: rowOf('b') }, 'ArrowDown')).toEqual({
      kind: 'go',
      to: { strip: 'speech', row: null },
    });
    expect(gridMove(shape, { strip: 'speech', row: null }, 'ArrowUp')).toEqual({
      kind: 'go',
      to: { strip: 'lip', row: null },
    });
    expect(gridMove(shape, { strip: 'teeth', row: null }, 'ArrowDown')).toBeNull();
  });

  test('right and left lead from child to child, across the bins', () => {
    expect(gridMove(shape, { strip: 'lip', row: null }, 'ArrowRight')).toEqual({
      kind: 'go',
      to: { strip: 'lip', row: rowOf('a') },
    });
    expect(gridMove(shape, { strip: 'lip', row: rowOf('a') }, 'ArrowRight')).toEqual({
      kind: 'go',
      to: { strip: 'lip', row: rowOf('b') },
    });
    expect(gridMove(shape, { strip: 'lip', row: rowOf('a') }, 'ArrowLeft')).toEqual({
      kind: 'go',
      to: { strip: 'lip', row: null },
    });
    expect(gridMove(shape, { strip: 'lip', row: rowOf('c') }, 'ArrowRight')).toBeNull();
  });

  test('right unrolls a rolled lane and left rolls an open one up', () => {
    expect(gridMove(shape, { strip: 'speech', row: null }, 'ArrowRight')).toEqual({ kind: 'unroll', strip: 'speech' });
    expect(gridMove(shape, { strip: 'lip', row: null }, 'ArrowLeft')).toEqual({ kind: 'unroll', strip: 'lip' });
    expect(gridMove(shape, { strip: 'speech', row: null }, 'ArrowLeft')).toBeNull();
  });

  test('home and end lead to the first and the last child of an unrolled lane', () => {
    expect(gridMove(shape, { strip: 'lip', row: null }, 'End')).toEqual({
      kind: 'go',
      to: { strip: 'lip', row: rowOf('c') },
    });
    expect(gridMove(shape, { strip: 'lip', row: rowOf('c') }, 'Home')).toEqual({
      kind: 'go',
      to: { strip: 'lip', row: rowOf('a') },
    });
  });
});
