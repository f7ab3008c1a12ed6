import { rulerWords } from '../words/ruler.ts';
import { TodayFlag } from './drawing/axis-head.tsx';
import { myWorkPosition, myWorkTicks, todayPosition } from './my-work-axis.ts';
import { textWidth } from './layout/text-width.ts';
import { useMeasuredWidth } from './use-measured-width.ts';

/** Head of the shared axis of My work: labels and the today flag; stands over a column of bars on the `weeks` scale. */
export function WeeksAxis() {
  const [box, width] = useMeasuredWidth<HTMLDivElement>(360);
  const today = width * todayPosition;
  return (
    <div ref={box} className="w-full min-w-0" aria-hidden="true">
      <svg width={width} height="26" className="text-fine figures block overflow-visible">
        {placedWeeks(width, today).map(({ x, text }) => (
          <text key={text} x={x} y="15" textAnchor="middle" className="fill-ink-2">
            {text}
          </text>
        ))}
        <TodayFlag x={today} />
      </svg>
    </div>
  );
}

/** The outer labels first; those that would meet another, the flag or the edge are dropped whole. */
function placedWeeks(width: number, today: number): readonly { x: number; text: string }[] {
  const taken = [{ left: today - 24, right: today + 24 }];
  const order = myWorkTicks.toSorted((a, b) => Math.abs(b.week) - Math.abs(a.week));
  return order.flatMap(({ week, name }) => {
    const text = rulerWords.myWorkTicks[name];
    const half = textWidth(text, 'regular') / 2;
    const x = Math.min(width * myWorkPosition(week * 7), width - half);
    if (x - half < 0 || taken.some((span) => x - half < span.right + 6 && x + half > span.left - 6)) return [];
    taken.push({ left: x - half, right: x + half });
    return [{ x, text }];
  });
}

/** Lines down a column of bars: hairlines under the labels and the today line; fills its positioned parent. */
export function WeeksGrid() {
  return (
    <svg aria-hidden="true" className="pointer-events-none absolute inset-0 size-full">
      {myWorkTicks.map(({ week, name }) => (
        <line
          key={name}
          x1={percent(myWorkPosition(week * 7))}
          x2={percent(myWorkPosition(week * 7))}
          y1="0"
          y2="100%"
          className="stroke-hair"
        />
      ))}
      <line
        x1={percent(todayPosition)}
        x2={percent(todayPosition)}
        y1="0"
        y2="100%"
        className="stroke-ink"
        strokeWidth="1.8"
      />
    </svg>
  );
}

function percent(position: number): string {
  return `${String(position * 100)}%`;
}
