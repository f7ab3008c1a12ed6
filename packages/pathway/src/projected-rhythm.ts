/** Expected targets of the coming occurrences of a repeating milestone, were each done on its target. */
import { fromEpochDay, toEpochDay, type PlainDate } from '@weftway/calendar/plain-date';
import { rhythm } from '@weftway/calendar/recurrence';
import { addMonthsToDay } from '@weftway/calendar/plain-date';
import { addSpanToDay } from '@weftway/calendar/span';
import { repeatAt } from './occurrences.ts';
import type { Planning, Row } from './planning.ts';

const atMost = 40;
const endOfCareMonths = 22 * 12;

/** At most 40 dates, none after the 22nd birthday; empty where nothing repeats or nothing is awaited. */
export function projectedRhythm(planning: Planning, row: Row): PlainDate[] {
  if (!row.isRepeating || row.fixed !== null || !row.draft.hasWindow || row.offPath !== null) return [];
  const end = addMonthsToDay(planning.child.birth, endOfCareMonths);
  const dates: PlainDate[] = [];
  let last = row.draft.target;
  while (dates.length < atMost) {
    const repeat = repeatAt(planning, row, last, planning.child.today);
    if (repeat === null || repeat.eventIndex >= 0) break;
    if (repeat.byAge) last = addSpanToDay(planning.child.birth, repeat.window.target);
    else {
      const [next] = rhythm(fromEpochDay(last), repeat.window.target, 1);
      if (next === undefined) break;
      last = toEpochDay(next);
    }
    if (last > end) break;
    dates.push(fromEpochDay(last));
  }
  return dates;
}
