import { formatDate } from '@weftway/calendar/format-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import { milestoneStateNames, type MilestoneState } from '@weftway/pathway/milestone-state';
import { useId } from 'react';
import { rulerWords } from '../words/ruler.ts';
import { WindowBody } from './drawing/window-body.tsx';
import { WindowPatterns } from './drawing/window-patterns.tsx';
import { barPositions, type BarScale } from './layout/bar-positions.ts';
import type { RulerWindow } from './ruler-item.ts';
import { useMeasuredWidth } from './use-measured-width.ts';
import { textWidth } from './layout/text-width.ts';
import { bodyHeight } from './layout/window-shape.ts';

interface WindowBarProps {
  readonly state: MilestoneState;
  readonly window: RulerWindow;
  readonly today: PlainDate;
  /** `own`: just this window, with its dates under it. `weeks`: the shared axis of My work. */
  readonly scale?: BarScale;
}

/** One window on a linear thread, for the side sheet and for a row of My work. */
export function WindowBar({ state, window, today, scale = 'own' }: WindowBarProps) {
  const [box, width] = useMeasuredWidth<HTMLDivElement>(360);
  const patterns = useId();
  const isOwn = scale === 'own';
  const at = barPositions({ window, today, scale, width });
  const y = isOwn ? 26 : 20;
  const height = bodyHeight(state, Math.max(at.right - at.left, 19), 14);
  const opens = formatDate(window.earliest);
  const closes = formatDate(window.latest);
  const both = textWidth(opens, 'regular') + textWidth(closes, 'regular') + 12;
  const firstDateX = Math.max(0, Math.min(at.left, width - both));
  return (
    <div ref={box} className="w-full min-w-0">
      <svg
        role="img"
        aria-label={`${milestoneStateNames[state]}, ${rulerWords.window(opens, closes)}`}
        width={width}
        height={isOwn ? 52 : 40}
        className="block overflow-visible"
      >
        <WindowPatterns id={patterns} />
        <line x1="0" x2={width} y1={y} y2={y} className="stroke-thread" strokeWidth={isOwn ? 2 : 1.1} />
        <WindowBody
          state={state}
          ends={{ left: at.left, right: at.right, y, height, isCutLeft: at.isCutLeft, isCutRight: at.isCutRight }}
          closingX={state === 'closing' ? at.closing : null}
          todayX={at.today}
          patterns={patterns}
        />
        {isOwn ? (
          <g className="text-fine figures" aria-hidden="true">
            <line x1={at.today} x2={at.today} y1={y - 11} y2={y + 9} className="stroke-ink" strokeWidth="1.8" />
            <text x={at.today} y="11" textAnchor={at.todayAnchor} className="fill-ink font-semibold">
              {rulerWords.today}
            </text>
            <text x={firstDateX} y={y + 24} className="fill-ink-2">
              {opens}
            </text>
            <text x={Math.max(at.right, firstDateX + both)} y={y + 24} textAnchor="end" className="fill-ink-2">
              {closes}
            </text>
          </g>
        ) : null}
      </svg>
    </div>
  );
}
