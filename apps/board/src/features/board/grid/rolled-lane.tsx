import { memo } from 'react';
import { milestoneStateNames } from '@weftway/pathway/milestone-state';
import { boardBins } from '../../../ruler/board-axis.ts';
import { boardWords } from '../../../words/board.ts';
import { boardStates } from '../board-filter.ts';
import type { BinMarks, BoardColumns, BoardLine } from '../board-layout.ts';
import type { BoardRow } from '../../../queries/board-model.ts';
import { LaneHead } from './lane-head.tsx';
import { MarkUse } from './mark-defs.tsx';

interface RolledLaneProps {
  readonly line: Extract<BoardLine, { kind: 'rolled' }>;
  readonly columns: BoardColumns;
  readonly isFocused: boolean;
}

const lineHeight = 24;
const markTop = 8;

/** The same rows in the same bins look the same, whichever board they belong to. */
const looksSame = (before: RolledLaneProps, after: RolledLaneProps): boolean => {
  const [a, b] = [before.line.strip, after.line.strip];
  if (
    before.columns !== after.columns ||
    before.isFocused !== after.isFocused ||
    before.line.height !== after.line.height ||
    a.loose !== b.loose ||
    a.isOwn !== b.isOwn
  )
    return false;
  return a.bins.every(
    (rows, at) => rows.length === b.bins[at]?.length && rows.every((row, place) => row === b.bins[at]?.[place]),
  );
};

/** Marks on a thread; the whole of a bin is the target. */
export const RolledLane = memo(function RolledLane({ line, columns, isFocused }: RolledLaneProps) {
  const { strip } = line;
  return (
    <>
      <LaneHead strip={strip} isUnrolled={false} isFocused={isFocused} />
      <span
        aria-hidden="true"
        style={{ left: columns.gutter }}
        className={`absolute top-[14px] right-0 ${strip.isOwn ? 'bg-indigo h-[2px]' : 'bg-thread h-px'}`}
      />
      {line.bins.map((bin, at) => (
        <RolledBin
          key={boardBins[at]?.name ?? at}
          bin={bin}
          at={at}
          rows={strip.bins[at] ?? []}
          columns={columns}
          height={line.height}
        />
      ))}
    </>
  );
}, looksSame);

interface RolledBinProps {
  readonly bin: BinMarks;
  readonly at: number;
  readonly rows: readonly BoardRow[];
  readonly columns: BoardColumns;
  readonly height: number;
}

function RolledBin({ bin, at, rows, columns, height }: RolledBinProps) {
  const { left, width } = columns.bins[at] ?? { left: 0, width: 0 };
  const parts = boardStates.flatMap((state) => {
    const count = rows.filter((row) => row.state === state).length;
    return count === 0 ? [] : [boardWords.binPart(count, milestoneStateNames[state].toLowerCase())];
  });
  const lastLine = bin.marks[bin.marks.length - 1]?.line ?? 0;
  return (
    <div
      role="gridcell"
      aria-colindex={at + 2}
      aria-label={boardWords.binSum(boardWords.bins[boardBins[at]?.name ?? ''] ?? '', parts)}
      data-bin={at}
      style={{ left, width, height }}
      className="hover:bg-linen absolute top-0 cursor-pointer mix-blend-normal"
    >
      {bin.marks.length === 0 ? null : (
        <svg aria-hidden="true" width={width} height={height} className="pointer-events-none block overflow-visible">
          {bin.marks.map((mark) => (
            <MarkUse key={mark.row.id} row={mark.row} x={mark.x} y={markTop + mark.line * lineHeight} ground="paper" />
          ))}
          {bin.more === 0 ? null : (
            <text
              x={width - 4}
              y={markTop + 10 + lastLine * lineHeight}
              textAnchor="end"
              className="text-fine figures fill-ink-2"
            >
              {boardWords.more(bin.more)}
            </text>
          )}
        </svg>
      )}
    </div>
  );
}
