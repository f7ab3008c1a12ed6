import { memo } from 'react';
import type { BoardModel, BoardRow } from '../../../queries/board-model.ts';
import { boardWords } from '../../../words/board.ts';
import type { BoardColumns, BoardLine } from '../board-layout.ts';
import { initialsOf, rowName } from '../row-words.ts';
import { LaneHead } from './lane-head.tsx';
import { MarkUse } from './mark-defs.tsx';

interface NameLineProps {
  readonly line: Extract<BoardLine, { kind: 'names' }>;
  readonly model: BoardModel;
  readonly columns: BoardColumns;
  /** The place with the focus, when it is on this line. */
  readonly focused: string | null;
}

/** A change elsewhere makes a new board of the same rows: lines that look the same are left alone. */
const looksSame = (before: NameLineProps, after: NameLineProps): boolean => {
  const [a, b] = [before.line, after.line];
  if (
    before.columns !== after.columns ||
    before.focused !== after.focused ||
    before.model.day !== after.model.day ||
    a.isFirst !== b.isFirst
  )
    return false;
  if (a.isFirst && (a.strip.count !== b.strip.count || a.strip.loose !== b.strip.loose)) return false;
  return a.rows.every(
    (row, at) =>
      row === b.rows[at] && (row === null || before.model.fresh.has(row.id) === after.model.fresh.has(row.id)),
  );
};

/** One name in each bin of an unrolled lane. */
export const NameLine = memo(function NameLine({ line, model, columns, focused }: NameLineProps) {
  return (
    <>
      {line.isFirst ? (
        <LaneHead strip={line.strip} isUnrolled isFocused={focused === `lane ${line.strip.key}`} />
      ) : null}
      {line.rows.map((row, at) =>
        row === null ? null : (
          <NameCell
            key={row.id}
            row={row}
            model={model}
            at={at}
            columns={columns}
            isFocused={focused === row.id}
            isFirst={line.isFirst}
            isFresh={model.fresh.has(row.id)}
          />
        ),
      )}
    </>
  );
}, looksSame);

interface NameCellProps {
  readonly row: BoardRow;
  readonly model: BoardModel;
  readonly at: number;
  readonly columns: BoardColumns;
  readonly isFocused: boolean;
  readonly isFirst: boolean;
  readonly isFresh: boolean;
}

/** In a narrow bin the loose end alone says that nobody holds it. */
const roomForOwner = 112;

function NameCell({ row, model, at, columns, isFocused, isFirst, isFresh }: NameCellProps) {
  const { left, width } = columns.bins[at] ?? { left: 0, width: 0 };
  const initials = initialsOf(row, model);
  const ground = isFresh ? 'bg-indigo-wash' : 'hover:bg-linen';
  return (
    <div
      role="gridcell"
      aria-colindex={at + 2}
      aria-label={rowName(row, model)}
      tabIndex={isFocused ? 0 : -1}
      data-row={row.id}
      data-place={row.id}
      style={{ left: left + 2, width: width - 4, top: isFirst ? 4 : 0 }}
      className={`text-small absolute flex h-6 cursor-pointer scroll-mt-32 scroll-mb-8 items-center gap-1.5 rounded px-1 transition-colors select-none focus-visible:z-10 focus-visible:outline-offset-0 ${ground}`}
    >
      <svg aria-hidden="true" width="13" height="16" className="shrink-0 overflow-visible">
        <MarkUse row={row} x={0} y={2} ground="bleached" />
      </svg>
      <span className="grow truncate">{row.child.shortName}</span>
      {width < roomForOwner ? null : initials === null ? (
        <span className="text-fine text-madder font-semibold whitespace-nowrap">{boardWords.noOne}</span>
      ) : (
        <span className="text-initials text-ink-2">{initials}</span>
      )}
    </div>
  );
}
