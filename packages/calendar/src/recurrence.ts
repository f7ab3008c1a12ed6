/**
 * Repeating days over the rrule library, with floating dates only: a date goes in as midnight UTC and only its date
 * part comes out, because the library's own time zones depend on the machine.
 * The calendar-month rhythm is ours: RFC 5545 leaves out a month without the day, the pathway takes its last day.
 */
import { fromEpochDay, plainDate, toEpochDay, addMonthsToDay, type PlainDate } from './plain-date.ts';
import { RRule, rrulestr } from './rrule-library.ts';
import type { Span } from './span.ts';

const msPerDay = 86_400_000;

/** The first dates, at most `limit`, of an RFC 5545 rule (`FREQ=WEEKLY;COUNT=10`) that starts on a date. */
export function datesOfRule(
  rule: string,
  start: PlainDate,
  limit: number,
  leftOut: readonly PlainDate[] = [],
): PlainDate[] {
  const lines = [`DTSTART:${compact(start)}`, `RRULE:${rule}`, ...leftOut.map((date) => `EXDATE:${compact(date)}`)];
  const dates: PlainDate[] = [];
  rrulestr(lines.join('\n'), { forceset: true }).all((date) => {
    if (dates.length < limit) dates.push(fromEpochDay(Math.floor(date.getTime() / msPerDay)));
    return dates.length < limit;
  });
  return dates;
}

/** The next `count` dates after `start`, each one step after the one before; whole-day steps by the library. */
export function rhythm(start: PlainDate, step: Span, count: number): PlainDate[] {
  if (count <= 0) return [];
  if (step.months === 0) return everySoManyDays(start, step.days, count);
  const dates: PlainDate[] = [];
  let day = toEpochDay(start);
  for (let index = 0; index < count; index += 1) {
    day = addMonthsToDay(day, step.months) + step.days;
    dates.push(fromEpochDay(day));
  }
  return dates;
}

function everySoManyDays(start: PlainDate, days: number, count: number): PlainDate[] {
  if (days <= 0) return [];
  const rule = new RRule({
    freq: RRule.DAILY,
    interval: days,
    dtstart: new Date(toEpochDay(start) * msPerDay),
    count: count + 1,
  });
  return rule
    .all()
    .slice(1)
    .map((date) => plainDate(date.toISOString().slice(0, 10)));
}

function compact(date: PlainDate): string {
  return `${date.replaceAll('-', '')}T000000Z`;
}
