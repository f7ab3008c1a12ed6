import { rulerWords } from '../../words/ruler.ts';
import type { PlacedLane, RulerLayout } from '../layout/ruler-layout.ts';
import { textWidth } from '../layout/text-width.ts';

/** The threads of all lanes: full up to today, thin after it; the viewer's own in indigo. */
export function Threads({ layout }: { readonly layout: RulerLayout }) {
  const { frame, lanes } = layout;
  const today = Math.max(frame.x0, Math.min(layout.todayX, frame.x0 + frame.axisWidth));
  return (
    <g aria-hidden="true">
      {lanes.map(({ lane, y }) => (
        <g key={lane.lane} className={lane.isOwn ? 'stroke-indigo' : 'stroke-thread'}>
          <line x1={frame.gutter} x2={today} y1={y} y2={y} strokeWidth={lane.isOwn ? 3.2 : 2.6} />
          <line x1={today} x2={frame.width} y1={y} y2={y} strokeWidth={lane.isOwn ? 1.5 : 1.1} />
        </g>
      ))}
    </g>
  );
}

interface LaneNameProps {
  readonly placed: PlacedLane;
  readonly gutter: number;
}

/** Lane name with its owner under it, left of the thread. */
export function LaneName({ placed, gutter }: LaneNameProps) {
  const { lane, y } = placed;
  const dye = lane.isOwn ? 'fill-indigo font-emphasis' : 'fill-ink-2';
  const isUnowned = lane.ownerName === null;
  return (
    <g role="rowheader" aria-label={rulerWords.lane(lane.name, lane.ownerName ?? rulerWords.noOne)}>
      <text x="0" y={y - 2} className={`text-small ${dye}`}>
        {clipped(lane.name, gutter - 8, 13)}
      </text>
      <text x="0" y={y + 13} className={`text-fine ${isUnowned ? 'fill-madder font-semibold' : 'fill-ink-2'}`}>
        {isUnowned ? rulerWords.noOne : clipped(lane.ownerName ?? '', gutter - 8, 12)}
      </text>
    </g>
  );
}

function clipped(text: string, room: number, size: number): string {
  if (textWidth(text, 'regular', size) <= room + 12) return text;
  let end = text.length;
  while (end > 1 && textWidth(`${text.slice(0, end)}…`, 'regular', size) > room + 6) end -= 1;
  return `${text.slice(0, end).trimEnd()}…`;
}
