import { useDroppable } from '@dnd-kit/core';
import type { ReactNode } from 'react';

interface DropPlaceProps {
  readonly place: string;
  readonly title: ReactNode;
  /** What dropping here would do; shown while something is carried. */
  readonly effect?: string | undefined;
  /** Why nothing can be dropped here. */
  readonly refusal?: string | undefined;
}

/** Says before the release what the release would do. */
export function DropPlace({ place, title, effect, refusal }: DropPlaceProps) {
  const { setNodeRef, isOver } = useDroppable({ id: place });
  const isRefused = refusal !== undefined;
  const look = isOver
    ? isRefused
      ? 'border-madder bg-madder-wash'
      : 'border-indigo bg-indigo-wash border-solid'
    : 'border-thread-2';
  return (
    <div
      ref={setNodeRef}
      data-drop-place={place}
      className={`text-small flex min-h-9 flex-col justify-center gap-0.5 rounded border border-dashed px-3 py-1.5 ${look}`}
    >
      <span className={isOver ? 'font-semibold' : ''}>{title}</span>
      {(isOver || isRefused) && (refusal ?? effect) !== undefined ? (
        <span className={`text-fine ${isRefused ? 'text-madder' : 'text-ink-2'}`}>{refusal ?? effect}</span>
      ) : null}
    </div>
  );
}
