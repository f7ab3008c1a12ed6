/** Where everything on the board stands: columns from the width at hand, and one line of the page after the other. */
import { boardBins } from '../../ruler/board-axis.ts';
import type { BoardRow } from '../../queries/board-model.ts';
import type { Strip } from './board-strips.ts';

export interface Column {
  readonly left: number;
  readonly width: number;
}

export interface BoardColumns {
  readonly gutter: number;
  readonly bins: readonly Column[];
}

const laneGutter = 186;

export const columnsOf = (width: number): BoardColumns => {
  const whole = boardBins.reduce((sum, bin) => sum + bin.width, 0);
  const scale = Math.max(0.55, (width - laneGutter) / whole);
  let left = laneGutter;
  const bins = boardBins.map((bin) => {
    const column = { left: Math.round(left), width: Math.round(bin.width * scale) };
    left += bin.width * scale;
    return column;
  });
  return { gutter: laneGutter, bins };
};

export const rolledHeight = 29;
export const nameHeight = 24;
const secondLine = 24;
export const markStep = 14.5;
/** Room for "+132" at the end of a bin that holds more than it can draw. */
const moreRoom = 34;
const binInset = 12;

export interface MarkPlace {
  readonly row: BoardRow;
  readonly x: number;
  readonly line: number;
}

export interface BinMarks {
  readonly marks: readonly MarkPlace[];
  /** How many more there are than can be drawn. */
  readonly more: number;
}

const mostLines = 2;

/** As many marks as fit on at most two lines. */
export const marksOf = (rows: readonly BoardRow[], width: number): BinMarks => {
  const perLine = Math.max(1, Math.floor((width - binInset) / markStep));
  const fitsAll = rows.length <= perLine * mostLines;
  const room = fitsAll ? perLine * mostLines : perLine * mostLines - Math.ceil(moreRoom / markStep);
  const shown = rows.slice(0, Math.max(1, room));
  return {
    marks: shown.map((row, at) => ({
      row,
      x: binInset / 2 + (at % perLine) * markStep,
      line: Math.floor(at / perLine),
    })),
    more: rows.length - shown.length,
  };
};

export type BoardLine =
  | {
      readonly kind: 'rolled';
      readonly key: string;
      readonly strip: Strip;
      readonly bins: readonly BinMarks[];
      readonly height: number;
    }
  | {
      readonly kind: 'names';
      readonly key: string;
      readonly strip: Strip;
      /** One name in each bin, or none. */
      readonly rows: readonly (BoardRow | null)[];
      readonly isFirst: boolean;
      readonly height: number;
    };

const rolledLine = (strip: Strip, columns: BoardColumns): BoardLine => {
  const bins = strip.bins.map((rows, at) => marksOf(rows, columns.bins[at]?.width ?? 0));
  const needsTwo = bins.some((bin) => bin.marks.some((mark) => mark.line > 0));
  return { kind: 'rolled', key: strip.key, strip, bins, height: rolledHeight + (needsTwo ? secondLine : 0) };
};

const nameLines = (strip: Strip): BoardLine[] => {
  const count = Math.max(1, ...strip.bins.map((bin) => bin.length));
  const pad = 4;
  return Array.from({ length: count }, (_unused, at) => ({
    kind: 'names' as const,
    key: `${strip.key} ${String(at)}`,
    strip,
    rows: strip.bins.map((bin) => bin[at] ?? null),
    isFirst: at === 0,
    height: nameHeight + (at === 0 ? pad : 0) + (at === count - 1 ? pad : 0),
  }));
};

export const linesOf = (
  strips: readonly Strip[],
  unrolled: ReadonlySet<string>,
  columns: BoardColumns,
): readonly BoardLine[] =>
  strips.flatMap((strip) => (unrolled.has(strip.key) ? nameLines(strip) : [rolledLine(strip, columns)]));
