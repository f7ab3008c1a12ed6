import { addMonths, plainDate, type PlainDate } from '@weftway/calendar/plain-date';
import type { RulerItem, RulerLane, RulerWindow } from '../ruler/ruler-item.ts';

export const rulerBirth = plainDate('2018-06-03');
export const rulerToday = plainDate('2026-10-06');

export function rulerWindow(fromMonths: number, toMonths: number): RulerWindow {
  const at = (months: number): PlainDate => addMonths(rulerBirth, months);
  const middle = Math.floor((fromMonths + toMonths) / 2);
  return {
    earliest: at(fromMonths),
    target: at(middle),
    latest: at(toMonths),
    closing: at(Math.max(middle, toMonths - 1)),
  };
}

export function rulerItem(given: Pick<RulerItem, 'key' | 'label'> & Partial<RulerItem>): RulerItem {
  return {
    lane: 'surgery',
    state: 'ahead',
    unowned: false,
    window: rulerWindow(120, 132),
    knotOn: null,
    isPast: false,
    ...given,
  };
}

export const rulerLanes: readonly RulerLane[] = [
  { lane: 'surgery', name: 'Surgery', ownerName: 'Obed Nkansah', isOwn: false },
  { lane: 'speech', name: 'Speech', ownerName: 'Shirin Vaziri', isOwn: true },
  { lane: 'teeth', name: 'Teeth', ownerName: null, isOwn: false },
];
