/**
 * Spans as the trade writes them: `2y6m`, `10w`, `-30d`.
 * Years and months are calendar months and are added first, then weeks (7 days) and days (published date rules, 2).
 */
import { addMonthsToDay, fromEpochDay, toEpochDay, type PlainDate } from './plain-date.ts';

/** Calendar months and days; both carry the sign of the span. */
export interface Span {
  readonly months: number;
  readonly days: number;
}

const spanText = /^(-?)(?=\d)(?:(\d+)y)?(?:(\d+)m)?(?:(\d+)w)?(?:(\d+)d)?$/;

/** Reads a span; null when the text is not one. */
export function readSpan(text: string): Span | null {
  const match = spanText.exec(text);
  if (!match) return null;
  const sign = match[1] === '-' ? -1 : 1;
  const count = (at: number): number => Number(match[at] ?? 0);
  // `|| 0` turns the negative zero of an absent part into zero.
  return { months: sign * (count(2) * 12 + count(3)) || 0, days: sign * (count(4) * 7 + count(5)) || 0 };
}

/** A span of a checked protocol. Throws a RangeError that quotes the text when it is not a span. */
export function span(text: string): Span {
  const reading = readSpan(text);
  if (!reading) throw new RangeError(`"${text}" is not a span such as 10w, 3m, 2y6m or -30d.`);
  return reading;
}

/** Whole days since 1970-01-01 of the day a span later: months first, then days. */
export function addSpanToDay(epochDay: number, added: Span): number {
  return addMonthsToDay(epochDay, added.months) + added.days;
}

/** The date a span later: months first, then days. */
export function addSpan(date: PlainDate, added: Span): PlainDate {
  return fromEpochDay(addSpanToDay(toEpochDay(date), added));
}
