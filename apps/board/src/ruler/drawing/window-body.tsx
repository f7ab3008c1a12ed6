import type { MilestoneState } from '@weftway/pathway/milestone-state';
import { borderPath, fillPath, type BodyEnds } from '../layout/window-shape.ts';
import { hatchId, pinsId } from './window-patterns.tsx';

interface Look {
  readonly fill: string;
  readonly stroke: string;
  readonly width: number;
  readonly dash?: string;
}

const looks: Readonly<Record<MilestoneState, Look>> = {
  ahead: { fill: 'fill-paper', stroke: 'stroke-thread-2', width: 1 },
  open: { fill: 'fill-indigo-wash', stroke: 'stroke-indigo', width: 1.4 },
  closing: { fill: 'fill-weld-wash', stroke: 'stroke-weld', width: 1.4 },
  late: { fill: 'fill-madder-wash', stroke: 'stroke-madder', width: 1.4 },
  waiting: { fill: 'fill-woad-wash', stroke: 'stroke-woad', width: 1.4, dash: '4 2.5' },
  held: { fill: 'fill-walnut-wash', stroke: 'stroke-walnut', width: 1.4 },
  'partly-signed': { fill: 'fill-sunk', stroke: 'stroke-thread', width: 0.8 },
  signed: { fill: 'fill-sunk', stroke: 'stroke-thread', width: 0.8 },
  waived: { fill: 'fill-paper', stroke: 'stroke-thread-2', width: 1, dash: '1 2' },
  transferred: { fill: 'fill-paper', stroke: 'stroke-thread-2', width: 1, dash: '1 2' },
};

interface WindowBodyProps {
  readonly state: MilestoneState;
  readonly ends: BodyEnds;
  /** Where the closing part begins; `null` when nothing is closing. */
  readonly closingX: number | null;
  /** Late windows fray from their end to today. */
  readonly todayX: number;
  /** Of the `WindowPatterns` in the same drawing. */
  readonly patterns: string;
  readonly isThin?: boolean;
}

/** The shape of one window, without its mark. */
export function WindowBody({ state, ends, closingX, todayX, patterns, isThin = false }: WindowBodyProps) {
  const look = looks[state];
  const closing =
    closingX === null ? null : { ...ends, left: Math.max(ends.left, closingX), isCutLeft: closingX > ends.left };
  return (
    <g fill="none" aria-hidden="true">
      <path d={fillPath(ends)} className={look.fill} />
      {state === 'held' ? <path d={fillPath(ends)} fill={`url(#${pinsId(patterns)})`} /> : null}
      {closing === null || closing.left >= ends.right - 1 ? null : (
        <>
          <path d={fillPath(closing)} fill={`url(#${hatchId(patterns)})`} />
          {closing.isCutLeft ? (
            <line
              x1={closing.left}
              x2={closing.left}
              y1={ends.y - ends.height / 2}
              y2={ends.y + ends.height / 2}
              className="stroke-weld"
            />
          ) : null}
        </>
      )}
      <path
        d={borderPath(ends)}
        className={look.stroke}
        strokeWidth={isThin ? 0.9 : look.width}
        strokeDasharray={look.dash}
      />
      {state === 'late' && todayX > ends.right ? (
        <line
          x1={ends.right}
          x2={todayX}
          y1={ends.y}
          y2={ends.y}
          className="stroke-madder"
          strokeWidth="1.6"
          strokeDasharray="2 3"
        />
      ) : null}
    </g>
  );
}

/** The old place of a window that moved. */
export function GhostBody({ ends }: { readonly ends: BodyEnds }) {
  return (
    <path
      d={borderPath(ends)}
      fill="none"
      className="stroke-ink-2"
      strokeWidth="1"
      strokeDasharray="1.5 3"
      strokeLinecap="round"
    />
  );
}
