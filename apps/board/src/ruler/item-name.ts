import { formatDate } from '@weftway/calendar/format-date';
import { milestoneStateNames } from '@weftway/pathway/milestone-state';
import { rulerWords } from '../words/ruler.ts';
import type { RulerItem, RulerLane } from './ruler-item.ts';

/** Name, state, window, owner: the order in which it is read out. */
export function itemName(item: RulerItem, lane: RulerLane | undefined): string {
  const owner = item.unowned ? rulerWords.noOne : (item.ownerName ?? lane?.ownerName ?? rulerWords.noOne);
  return [item.label, milestoneStateNames[item.state].toLowerCase(), when(item), owner].join(', ');
}

function when({ knotOn, window }: RulerItem): string {
  if (knotOn !== null) return rulerWords.doneOn(formatDate(knotOn));
  return window === null
    ? rulerWords.noWindow
    : rulerWords.window(formatDate(window.earliest), formatDate(window.latest));
}
