import { daysBetween, type PlainDate } from '@weftway/calendar/plain-date';
import { firstWeek, lastWeek, myWorkPosition } from '../my-work-axis.ts';
import type { RulerWindow } from '../ruler-item.ts';
import { leastWidth } from './window-shape.ts';

export type BarScale = 'own' | 'weeks';

interface BarPositions {
  readonly left: number;
  readonly right: number;
  readonly closing: number;
  readonly today: number;
  readonly isCutLeft: boolean;
  readonly isCutRight: boolean;
  readonly todayAnchor: 'start' | 'middle' | 'end';
}

/** Pixels of one window on a bar of `width`. The own scale runs evenly from the first to the last of its dates and today. */
export function barPositions(of: {
  window: RulerWindow;
  today: PlainDate;
  scale: BarScale;
  width: number;
}): BarPositions {
  const { window, today, width } = of;
  const opens = daysBetween(today, window.earliest);
  const closes = daysBetween(today, window.latest);
  const x = of.scale === 'weeks' ? (days: number) => width * myWorkPosition(days) : ownScale(opens, closes, width);
  const left = x(opens);
  const right = Math.max(x(closes), left + leastWidth);
  const now = x(0);
  return {
    left,
    right,
    closing: x(daysBetween(today, window.closing)),
    today: now,
    isCutLeft: of.scale === 'weeks' && opens < firstWeek * 7,
    isCutRight: of.scale === 'weeks' && closes > lastWeek * 7,
    todayAnchor: now < 24 ? 'start' : now > width - 24 ? 'end' : 'middle',
  };
}

function ownScale(opens: number, closes: number, width: number): (days: number) => number {
  const first = Math.min(opens, 0);
  const last = Math.max(closes, 0);
  const margin = width * 0.12;
  return (days) => margin + ((width - 2 * margin) * (days - first)) / Math.max(1, last - first);
}
