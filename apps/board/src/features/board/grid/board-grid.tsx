import {
  memo,
  useCallback,
  useEffect,
  useMemo,
  useRef,
  useState,
  type FocusEvent,
  type KeyboardEvent,
  type MouseEvent,
} from 'react';
import { useMeasuredWidth } from '../../../ruler/use-measured-width.ts';
import type { BoardModel, BoardRow } from '../../../queries/board-model.ts';
import { boardWords } from '../../../words/board.ts';
import { columnsOf, linesOf, type BoardColumns, type BoardLine } from '../board-layout.ts';
import { rowsOfStrip, type Strip } from '../board-strips.ts';
import { BinHeads, BinRules } from './bin-heads.tsx';
import { BoardTip } from './board-tip.tsx';
import { gridMove, placeText, type GridPlace } from './grid-moves.ts';
import { MarkDefs } from './mark-defs.tsx';
import { NameLine } from './name-line.tsx';
import { RolledLane } from './rolled-lane.tsx';
import { useKeptFocus } from './use-kept-focus.ts';
import { useLinesInSight } from './use-board-lines.ts';

export interface RowActs {
  readonly onOpen: (row: BoardRow) => void;
  readonly onClaim: (row: BoardRow) => void;
  /** Everything that can be done with a row, beside the element that stands for it. */
  readonly onActions: (row: BoardRow, anchor: HTMLElement, view: 'all' | 'hand-to') => void;
}

interface BoardGridProps extends RowActs {
  readonly model: BoardModel;
  readonly strips: readonly Strip[];
  readonly unrolled: ReadonlySet<string>;
  readonly onUnroll: (strip: string) => void;
}

const moves = new Set(['ArrowUp', 'ArrowDown', 'ArrowLeft', 'ArrowRight', 'Home', 'End']);

/** What a key does to the row with the focus. */
const rowKeys: Readonly<Partial<Record<string, 'open' | 'claim' | 'hand-to' | 'all'>>> = {
  Enter: 'open',
  c: 'claim',
  C: 'claim',
  h: 'hand-to',
  H: 'hand-to',
  '.': 'all',
  ContextMenu: 'all',
};

const placeOn = (line: BoardLine, focus: GridPlace | null): string | null => {
  if (focus === null || line.strip.key !== focus.strip) return null;
  if (focus.row === null) return line.kind === 'rolled' || line.isFirst ? placeText(focus) : null;
  return line.kind === 'names' && line.rows.some((row) => row?.id === focus.row) ? focus.row : null;
};

const cellUnder = (event: { readonly target: EventTarget }, selector: string): HTMLElement | null =>
  event.target instanceof Element ? event.target.closest<HTMLElement>(selector) : null;

export const BoardGrid = memo(function BoardGrid({
  model,
  strips,
  unrolled,
  onUnroll,
  onOpen,
  onClaim,
  onActions,
}: BoardGridProps) {
  const [box, width] = useMeasuredWidth<HTMLDivElement>(1200);
  const body = useRef<HTMLDivElement>(null);
  const columns = useMemo(() => columnsOf(width), [width]);
  const lines = useMemo(() => linesOf(strips, unrolled, columns), [strips, unrolled, columns]);
  const [chosen, setFocus] = useState<GridPlace | null>(null);
  const first = strips[0]?.key;
  const focus = useMemo(() => chosen ?? (first === undefined ? null : { strip: first, row: null }), [chosen, first]);
  const mustFocus = useRef(false);
  const focusedIndex = lines.findIndex((line) => placeOn(line, focus) !== null);
  const { inSight, height } = useLinesInSight(body, lines, focusedIndex);

  useEffect(() => {
    if (!mustFocus.current || focus === null) return;
    mustFocus.current = false;
    const cell = body.current?.querySelector<HTMLElement>(`[data-place="${placeText(focus)}"]`);
    cell?.focus({ preventScroll: true });
    cell?.scrollIntoView({ block: 'nearest' });
  }, [focus]);

  const focusKept = useKeptFocus(body, lines, focus);

  const rowAt = useCallback(
    (id: string | undefined) => (id === undefined ? undefined : model.rows.find((row) => row.id === id)),
    [model],
  );
  const goTo = (place: GridPlace) => {
    mustFocus.current = true;
    setFocus({ ...place });
  };

  const moveBy = (key: string, from: GridPlace) => {
    const move = gridMove({ strips, unrolled }, from, key);
    if (move?.kind === 'go') goTo(move.to);
    if (move?.kind === 'unroll') onUnroll(move.strip);
  };
  const rollLane = (from: GridPlace) => {
    if (from.row !== null) goTo({ strip: from.strip, row: null });
    onUnroll(from.strip);
  };
  /** Answers whether the key does something to the row. */
  const actOn = (row: BoardRow, cell: HTMLElement, key: string): boolean => {
    const does = rowKeys[key];
    if (does === 'open') onOpen(row);
    else if (does === 'claim') onClaim(row);
    else if (does !== undefined) onActions(row, cell, does);
    return does !== undefined;
  };

  const onKeyDown = (event: KeyboardEvent<HTMLDivElement>) => {
    if (event.defaultPrevented || event.ctrlKey || event.metaKey || event.altKey) return;
    const cell = cellUnder(event, '[data-place]');
    if (cell === null || focus === null) return;
    const row = rowAt(cell.dataset['row']);
    if (moves.has(event.key)) moveBy(event.key, focus);
    else if (event.key === ' ' || (event.key === 'Enter' && row === undefined)) rollLane(focus);
    else if (row === undefined || !actOn(row, cell, event.key)) return;
    event.preventDefault();
  };

  const onFocus = (event: FocusEvent<HTMLDivElement>) => {
    const strip = cellUnder(event, '[data-strip]')?.dataset['strip'];
    const row = cellUnder(event, '[data-row]')?.dataset['row'] ?? null;
    if (strip !== undefined && (strip !== focus?.strip || row !== focus.row)) setFocus({ strip, row });
  };

  const onClick = (event: MouseEvent<HTMLDivElement>) => {
    const named = cellUnder(event, '[data-row]');
    const row = rowAt(named?.dataset['row']);
    const strip = cellUnder(event, '[data-strip]')?.dataset['strip'];
    if (strip === undefined) return;
    setFocus({ strip, row: row?.id ?? null });
    if (row !== undefined && named !== null) onActions(row, named, 'all');
    else if (cellUnder(event, '[data-lane],[data-bin]') !== null) onUnroll(strip);
  };

  const rowCount =
    1 + strips.reduce((sum, strip) => sum + (unrolled.has(strip.key) ? Math.max(1, rowsOfStrip(strip).length) : 1), 0);
  return (
    <div ref={box} className="relative min-w-0 grow">
      <MarkDefs />
      <div
        role="treegrid"
        aria-label={boardWords.grid}
        aria-rowcount={rowCount}
        aria-colcount={9}
        onKeyDown={onKeyDown}
        onClick={onClick}
        onFocus={onFocus}
        tabIndex={-1}
        className="relative outline-none"
      >
        <BinHeads columns={columns} />
        <div ref={body} role="rowgroup" style={{ height }} className="relative" {...focusKept}>
          {inSight.map(({ line, index, top }) => (
            <GridLine
              key={line.key}
              line={line}
              index={index}
              top={top}
              model={model}
              columns={columns}
              focused={placeOn(line, focus)}
            />
          ))}
          <BinRules columns={columns} />
        </div>
      </div>
      <BoardTip body={body} lines={lines} model={model} />
    </div>
  );
});

interface GridLineProps {
  readonly line: BoardLine;
  readonly index: number;
  readonly top: number;
  readonly model: BoardModel;
  readonly columns: BoardColumns;
  /** The place with the focus, when it is on this line. */
  readonly focused: string | null;
}

function GridLine({ line, index, top, model, columns, focused }: GridLineProps) {
  const isHead = line.kind === 'rolled' || line.isFirst;
  return (
    <div
      role="row"
      aria-rowindex={index + 2}
      aria-level={isHead ? 1 : 2}
      {...(isHead ? { 'aria-expanded': line.kind === 'names' } : {})}
      data-strip={line.strip.key}
      style={{ top, height: line.height }}
      className={`absolute inset-x-0 ${line.kind === 'names' ? 'bg-bleached' : ''} ${isHead ? 'border-hair border-t' : ''}`}
    >
      {line.kind === 'rolled' ? (
        <RolledLane line={line} columns={columns} isFocused={focused !== null} />
      ) : (
        <NameLine line={line} model={model} columns={columns} focused={focused} />
      )}
    </div>
  );
}
