import type { KeyboardEvent } from 'react';
import type { PlacedItem } from '../layout/ruler-layout.ts';
import { borderPath, thinUnder } from '../layout/window-shape.ts';
import { RulerMark } from './ruler-mark.tsx';
import { GhostBody, WindowBody } from './window-body.tsx';

interface RulerWindowProps {
  readonly placed: PlacedItem;
  readonly name: string;
  readonly todayX: number;
  readonly patterns: string;
  readonly isStop: boolean;
  readonly isSelected: boolean;
  readonly isDimmed: boolean;
  readonly onSelect: () => void;
  readonly onFocus: () => void;
  readonly onHover: (isOver: boolean) => void;
  readonly onKeyDown: (event: KeyboardEvent<SVGGElement>) => void;
}

/** One milestone on its thread: ghost, window, mark, and the ring when chosen or focused. */
export function RulerWindow(props: RulerWindowProps) {
  const { placed, todayX, patterns, isSelected } = props;
  const { item, body, ghost } = placed;
  const half = Math.max(body?.height ?? 0, 12) / 2;
  const ring = {
    left: Math.min(body?.left ?? placed.markX - 6, placed.markX - 6) - 3,
    right: Math.max(body?.right ?? placed.markX + 6, placed.markX + 6) + 3,
    y: placed.y,
    height: half * 2 + 6,
    isCutLeft: false,
    isCutRight: false,
  };
  return (
    <g
      role="gridcell"
      data-key={item.key}
      tabIndex={props.isStop ? 0 : -1}
      aria-label={props.name}
      aria-selected={isSelected}
      onClick={props.onSelect}
      onKeyDown={props.onKeyDown}
      onFocus={props.onFocus}
      onMouseEnter={() => props.onHover(true)}
      onMouseLeave={() => props.onHover(false)}
      className="group cursor-pointer outline-none"
    >
      <rect
        x={placed.left - 6}
        width={placed.right - placed.left + 12}
        y={placed.y - 12}
        height="24"
        fill="transparent"
      />
      <g opacity={props.isDimmed ? 0.5 : undefined}>
        {ghost === null ? null : <GhostBody ends={ghost} />}
        {body === null ? null : (
          <WindowBody
            state={item.state}
            ends={body}
            closingX={placed.closingX}
            todayX={todayX}
            patterns={patterns}
            isThin={body.right - body.left < thinUnder}
          />
        )}
        <RulerMark state={item.state} unowned={item.unowned} x={placed.markX} y={placed.y} />
      </g>
      <path
        d={borderPath(ring)}
        fill="none"
        strokeWidth="3"
        className={`stroke-focus ${isSelected ? '' : 'opacity-0 group-focus-visible:opacity-100'}`}
      />
    </g>
  );
}
