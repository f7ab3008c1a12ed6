import { useEffect, useState, type RefObject } from 'react';
import { milestoneStateNames } from '@weftway/pathway/milestone-state';
import { Mark } from '../../../marks/mark.tsx';
import type { BoardModel, BoardRow } from '../../../queries/board-model.ts';
import { markStep, type BoardLine } from '../board-layout.ts';
import { ageOf, childName, holdersText, timeOf, windowOf } from '../row-words.ts';

interface BoardTipProps {
  readonly body: RefObject<HTMLElement | null>;
  readonly lines: readonly BoardLine[];
  readonly model: BoardModel;
}

interface Shown {
  readonly row: BoardRow;
  readonly x: number;
  readonly y: number;
}

const waitMs = 350;
const lineHeight = 24;

type Marks = Extract<BoardLine, { kind: 'rolled' }>['bins'][number]['marks'];

/** The row of the mark that is nearest to a point of its bin. */
const nearestTo = (marks: Marks, x: number, y: number): BoardRow | null => {
  const distance = (mark: Marks[number]) => Math.hypot(mark.x + markStep / 2 - x, mark.line * lineHeight + 14 - y);
  const [first, ...others] = marks;
  if (first === undefined) return null;
  return others.reduce((near, mark) => (distance(mark) < distance(near) ? mark : near), first).row;
};

/** The row under the pointer: by its name, or the mark of a rolled bin that is nearest. */
const rowUnder = (event: Event, lines: readonly BoardLine[], model: BoardModel): BoardRow | null => {
  if (!(event.target instanceof Element)) return null;
  const named = event.target.closest<HTMLElement>('[data-row]')?.dataset['row'];
  if (named !== undefined) return model.rows.find((row) => row.id === named) ?? null;
  const bin = event.target.closest<HTMLElement>('[data-bin]');
  if (bin === null || !(event instanceof globalThis.MouseEvent)) return null;
  const strip = bin.closest<HTMLElement>('[data-strip]')?.dataset['strip'];
  const line = lines.find((one) => one.kind === 'rolled' && one.strip.key === strip);
  const place = bin.getBoundingClientRect();
  const marks = line?.kind === 'rolled' ? line.bins[Number(bin.dataset['bin'])]?.marks : undefined;
  return nearestTo(marks ?? [], event.clientX - place.left, event.clientY - place.top);
};

/** Who, what, how long, with whom: after a moment over a mark or a name, or with the focus on it. */
export function BoardTip({ body, lines, model }: BoardTipProps) {
  const [shown, setShown] = useState<Shown | null>(null);
  useEffect(() => {
    const element = body.current;
    if (element === null) return;
    let timer: ReturnType<typeof setTimeout> | undefined;
    let last: BoardRow | null = null;
    const hide = () => {
      clearTimeout(timer);
      last = null;
      setShown(null);
    };
    const follow = (event: Event) => {
      const row = rowUnder(event, lines, model);
      if (row === null) return hide();
      if (row === last) return;
      hide();
      last = row;
      const place = (event.target as Element).getBoundingClientRect(); // rowUnder found a row under an element
      const x = event instanceof globalThis.MouseEvent ? event.clientX : place.left;
      timer = setTimeout(() => setShown({ row, x, y: place.bottom }), waitMs);
    };
    const onKey = (event: Event) => {
      if (event instanceof globalThis.KeyboardEvent && event.key === 'Escape') hide();
    };
    element.addEventListener('mousemove', follow);
    element.addEventListener('focusin', follow);
    for (const name of ['mouseleave', 'mousedown', 'focusout']) element.addEventListener(name, hide);
    document.addEventListener('keydown', onKey);
    window.addEventListener('scroll', hide, { passive: true });
    return () => {
      clearTimeout(timer);
      element.removeEventListener('mousemove', follow);
      element.removeEventListener('focusin', follow);
      for (const name of ['mouseleave', 'mousedown', 'focusout']) element.removeEventListener(name, hide);
      document.removeEventListener('keydown', onKey);
      window.removeEventListener('scroll', hide);
    };
  }, [body, lines, model]);
  if (shown === null) return null;
  const { row } = shown;
  return (
    <div
      role="tooltip"
      style={{
        left: Math.max(8, Math.min(shown.x + 12, window.innerWidth - 270)),
        top: shown.y > window.innerHeight - 130 ? shown.y - 132 : shown.y + 8,
      }}
      className="bg-bleached shadow-lift text-small pointer-events-none fixed z-30 flex w-63 flex-col gap-0.5 rounded px-3 py-2"
    >
      <span>
        <b>{childName(row)}</b> {ageOf(row, model.day)}
      </span>
      <span className="flex items-center gap-1.5">
        <Mark state={row.state} size={13} title={null} ground="bleached" />
        {row.milestone.title}, {milestoneStateNames[row.state].toLowerCase()}, {timeOf(row, model.day)}
      </span>
      <span className="text-fine text-ink-2">{windowOf(row)}</span>
      <span className="text-fine text-ink-2">{holdersText(row, model)}</span>
    </div>
  );
}
