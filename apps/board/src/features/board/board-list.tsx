import { useRef } from 'react';
import { Mark } from '../../marks/mark.tsx';
import { LooseEndMark } from '../../marks/legend.tsx';
import type { BoardModel, BoardRow } from '../../queries/board-model.ts';
import { ChevronIcon } from '../../ui/icons.tsx';
import { boardWords } from '../../words/board.ts';
import { rowsOfStrip, type Strip } from './board-strips.ts';
import { useLinesInSight } from './grid/use-board-lines.ts';
import { holdersText, rowName, timeOf } from './row-words.ts';

interface BoardListProps {
  readonly model: BoardModel;
  readonly strips: readonly Strip[];
  readonly unrolled: ReadonlySet<string>;
  readonly onUnroll: (strip: string) => void;
  readonly onActions: (row: BoardRow, anchor: HTMLElement, view: 'all') => void;
}

type ListLine = { readonly key: string; readonly height: number; readonly strip: Strip; readonly row: BoardRow | null };

const headHeight = 44;
const rowHeight = 56;

/** On a narrow screen each lane is a list by urgency, with everything that the board can do. */
export function BoardList({ model, strips, unrolled, onUnroll, onActions }: BoardListProps) {
  const body = useRef<HTMLDivElement>(null);
  const lines = strips.flatMap((strip): ListLine[] => [
    { key: strip.key, height: headHeight, strip, row: null },
    ...(unrolled.has(strip.key)
      ? rowsOfStrip(strip).map((row) => ({ key: row.id, height: rowHeight, strip, row }))
      : []),
  ]);
  const { inSight, height } = useLinesInSight(body, lines, -1);
  return (
    <div ref={body} role="list" style={{ height }} className="no-print relative mb-8">
      {inSight.map(({ line, top }) => (
        <div
          key={line.key}
          role="listitem"
          style={{ top, height: line.height }}
          className={`border-hair absolute inset-x-0 border-t ${line.row === null ? '' : 'bg-bleached'}`}
        >
          {line.row === null ? (
            <ListLane strip={line.strip} isUnrolled={unrolled.has(line.strip.key)} onUnroll={onUnroll} />
          ) : (
            <ListRow row={line.row} model={model} onActions={onActions} />
          )}
        </div>
      ))}
    </div>
  );
}

interface ListLaneProps {
  readonly strip: Strip;
  readonly isUnrolled: boolean;
  readonly onUnroll: (strip: string) => void;
}

function ListLane({ strip, isUnrolled, onUnroll }: ListLaneProps) {
  return (
    <button
      type="button"
      aria-expanded={isUnrolled}
      onClick={() => onUnroll(strip.key)}
      className="text-body flex size-full items-center gap-2 px-6 text-left focus-visible:-outline-offset-3 max-sm:px-5"
    >
      <span className={isUnrolled ? '' : '-rotate-90'}>
        <ChevronIcon size={12} />
      </span>
      <span className="truncate font-semibold">{strip.name}</span>
      <span className="text-small text-ink-2 figures">{strip.count}</span>
      {strip.loose === 0 ? null : (
        <span className="text-small text-madder figures ml-auto flex items-center gap-1.5 font-semibold">
          <LooseEndMark size={14} />
          {boardWords.looseTitle(strip.loose)}
        </span>
      )}
    </button>
  );
}

interface ListRowProps {
  readonly row: BoardRow;
  readonly model: BoardModel;
  readonly onActions: (row: BoardRow, anchor: HTMLElement, view: 'all') => void;
}

function ListRow({ row, model, onActions }: ListRowProps) {
  return (
    <button
      type="button"
      aria-label={rowName(row, model)}
      onClick={(event) => onActions(row, event.currentTarget, 'all')}
      className={`flex size-full items-center gap-3 px-6 text-left transition-colors focus-visible:-outline-offset-3 max-sm:px-5 ${model.fresh.has(row.id) ? 'bg-indigo-wash' : ''}`}
    >
      <Mark state={row.state} unowned={row.isUnowned} size={14} title={null} ground="bleached" />
      <span className="flex min-w-0 grow flex-col">
        <span className="text-body truncate font-semibold">{row.child.shortName}</span>
        <span className="text-small text-ink-2 truncate">{row.milestone.title}</span>
      </span>
      <span className="flex shrink-0 flex-col items-end">
        <span className={`text-small figures ${row.state === 'late' ? 'text-madder font-semibold' : ''}`}>
          {timeOf(row, model.day)}
        </span>
        <span className={`text-fine max-w-32 truncate ${row.isUnowned ? 'text-madder font-semibold' : 'text-ink-2'}`}>
          {row.isUnowned ? boardWords.noOne : holdersText(row, model)}
        </span>
      </span>
    </button>
  );
}
