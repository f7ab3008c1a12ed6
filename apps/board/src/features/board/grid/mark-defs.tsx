import { MarkShape } from '../../../marks/mark-shapes.tsx';
import type { BoardRow } from '../../../queries/board-model.ts';
import { boardStates } from '../board-filter.ts';

const grounds = ['paper', 'bleached'] as const;
export type MarkGround = (typeof grounds)[number];

const symbolId = (state: string, isUnowned: boolean, ground: MarkGround): string =>
  `board-mark-${state}-${isUnowned ? 'loose' : 'held'}-${ground}`;

/** Every mark once; the thousands on the board only point here. */
export function MarkDefs() {
  return (
    <svg aria-hidden="true" width="0" height="0" className="absolute">
      {grounds.flatMap((ground) =>
        boardStates.flatMap((state) =>
          [false, true].map((isUnowned) => (
            <symbol
              key={`${state} ${ground} ${String(isUnowned)}`}
              id={symbolId(state, isUnowned, ground)}
              viewBox="0 0 16 25"
              overflow="visible"
              fill="none"
            >
              <MarkShape
                state={state}
                unowned={isUnowned}
                ground={ground === 'paper' ? 'fill-paper' : 'fill-bleached'}
              />
            </symbol>
          )),
        ),
      )}
    </svg>
  );
}

interface MarkUseProps {
  readonly row: BoardRow;
  readonly x: number;
  readonly y: number;
  readonly ground: MarkGround;
}

const size = 12.5;

/** A mark at a place inside a drawing. */
export function MarkUse({ row, x, y, ground }: MarkUseProps) {
  return (
    <use href={`#${symbolId(row.state, row.isUnowned, ground)}`} x={x} y={y} width={size} height={(size * 25) / 16} />
  );
}
