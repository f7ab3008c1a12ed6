import {
  DndContext,
  DragOverlay,
  KeyboardSensor,
  MeasuringStrategy,
  MouseSensor,
  TouchSensor,
  useDraggable,
  useSensor,
  useSensors,
  type DragEndEvent,
  type DragMoveEvent,
  type DragStartEvent,
  type UniqueIdentifier,
} from '@dnd-kit/core';
import { useRef, useState, type ReactNode, type RefObject, type SyntheticEvent } from 'react';
import { Mark } from '../../../marks/mark.tsx';
import type { BoardModel, BoardRow } from '../../../queries/board-model.ts';
import { boardWords } from '../../../words/board.ts';
import { childName } from '../row-words.ts';
import { memberOfPlace, myHands, nextPlace, placeUnder } from './drag-places.ts';
import { DragThread, type ThreadEnds } from './drag-thread.tsx';

interface BoardDragProps {
  readonly model: BoardModel;
  /** What stands at the side; it learns what is being carried. */
  readonly side: (carried: BoardRow | null) => ReactNode;
  readonly children: ReactNode;
  /** What dropping at a place would do, in words. */
  readonly describe: (row: BoardRow, place: string) => string;
  readonly onClaim: (row: BoardRow) => void;
  readonly onHandOver: (row: BoardRow, memberId: string) => void;
}

const source = 'row';
const keys = { start: ['KeyM'], cancel: ['Escape'], end: ['Space', 'Enter', 'KeyM'] };
const measuring = { droppable: { strategy: MeasuringStrategy.Always } };

export function BoardDrag({ model, side, children, describe, onClaim, onHandOver }: BoardDragProps) {
  const pickedRef = useRef<string | null>(null);
  const [carried, setCarried] = useState<BoardRow | null>(null);
  const thread = useRef<((ends: ThreadEnds) => void) | null>(null);
  const sensors = useSensors(
    useSensor(MouseSensor, { activationConstraint: { distance: 6 } }),
    useSensor(TouchSensor, { activationConstraint: { delay: 250, tolerance: 6 } }),
    useSensor(KeyboardSensor, { keyboardCodes: keys, coordinateGetter: nextPlace, scrollBehavior: 'auto' }),
  );

  const onDragStart = (_event: DragStartEvent) =>
    setCarried(model.rows.find((row) => row.id === pickedRef.current) ?? null);
  const onDragMove = ({ active, delta }: DragMoveEvent) => {
    const from = active.rect.current.initial;
    if (from === null) return;
    const start = { x: from.left + 18, y: from.top + from.height / 2 };
    thread.current?.({ from: start, to: { x: start.x + delta.x, y: start.y + delta.y } });
  };
  const onDragEnd = ({ over }: DragEndEvent) => {
    const row = carried;
    setCarried(null);
    if (row === null || over === null) return;
    const member = memberOfPlace(String(over.id));
    if (over.id === myHands) onClaim(row);
    else if (member !== null) onHandOver(row, member);
  };

  const what = (id: UniqueIdentifier | undefined): string =>
    carried === null || id === undefined ? '' : describe(carried, String(id));
  return (
    <DndContext
      sensors={sensors}
      collisionDetection={placeUnder}
      measuring={measuring}
      autoScroll={false}
      onDragStart={onDragStart}
      onDragMove={onDragMove}
      onDragEnd={onDragEnd}
      onDragCancel={() => setCarried(null)}
      accessibility={{
        screenReaderInstructions: { draggable: boardWords.dragHow },
        announcements: {
          onDragStart: () => {
            const row = model.rows.find((one) => one.id === pickedRef.current);
            return row === undefined ? undefined : boardWords.pickedUp(`${row.milestone.title}, ${childName(row)}`);
          },
          onDragOver: ({ over }) => (over === null ? boardWords.overNothing : boardWords.over(what(over.id))),
          onDragEnd: ({ over }) => (over === null ? boardWords.notDropped : boardWords.dropped(what(over.id))),
          onDragCancel: () => boardWords.notDropped,
        },
      }}
    >
      <DragSource pickedRef={pickedRef}>{children}</DragSource>
      {side(carried)}
      {carried === null ? null : <DragThread followRef={thread} />}
      <DragOverlay dropAnimation={null} zIndex={50}>
        {carried === null ? null : <Ghost row={carried} />}
      </DragOverlay>
    </DndContext>
  );
}

interface DragSourceProps {
  readonly pickedRef: RefObject<string | null>;
  readonly children: ReactNode;
}

/**
 * One source for all rows: which row is meant is read from where the gesture begins. Thousands of sources would each
 * be told of every move.
 */
function DragSource({ pickedRef, children }: DragSourceProps) {
  const { listeners, setNodeRef } = useDraggable({ id: source });
  const begin = (event: SyntheticEvent, name: 'onMouseDown' | 'onTouchStart' | 'onKeyDown') => {
    const cell = event.target instanceof Element ? event.target.closest<HTMLElement>('[data-row]') : null;
    const id = cell?.dataset['row'];
    if (cell === null || id === undefined) return;
    pickedRef.current = id;
    setNodeRef(cell);
    const listen: unknown = listeners?.[name];
    if (typeof listen === 'function') listen(event);
  };
  return (
    <div
      role="presentation"
      className="min-w-0 grow"
      onMouseDown={(event) => begin(event, 'onMouseDown')}
      onTouchStart={(event) => begin(event, 'onTouchStart')}
      onKeyDown={(event) => begin(event, 'onKeyDown')}
    >
      {children}
    </div>
  );
}

/** A single line of text in the hand. */
function Ghost({ row }: { readonly row: BoardRow }) {
  return (
    // Left of the hand, so that the place under it can be read.
    <div className="relative h-6">
      <div className="bg-bleached shadow-lift text-small absolute right-full -mr-5 flex w-max items-center gap-1.5 rounded px-3 py-1.5 whitespace-nowrap">
        <Mark state={row.state} size={13} title={null} ground="bleached" />
        <b>{row.child.shortName}</b> {row.milestone.title}
      </div>
    </div>
  );
}
