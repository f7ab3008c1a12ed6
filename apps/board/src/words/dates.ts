/** What the calendar package leaves to the screens: the weekday before a date, and spans in their largest sensible unit. */
import { formatDate } from '@weftway/calendar/format-date';
import { toEpochDay, type PlainDate } from '@weftway/calendar/plain-date';

const weekdayNames = ['Sun', 'Mon', 'Tue', 'Wed', 'Thu', 'Fri', 'Sat'] as const;

/** "Tue 6 Oct 2026" */
export function formatDateWithDay(date: PlainDate): string {
  const weekday = weekdayNames[(((toEpochDay(date) + 4) % 7) + 7) % 7] ?? '';
  return `${weekday} ${formatDate(date)}`;
}

/** "12 days", "9 weeks", "18 months", "3 years"; the sign is dropped. */
export function formatSpan(days: number): string {
  const length = Math.abs(days);
  if (length < 21) return counted(length, 'day');
  if (length < 112) return counted(Math.round(length / 7), 'week');
  const months = Math.round(length / 30.4375);
  if (months < 36) return counted(months, 'month');
  return counted(Math.round(length / 365.25), 'year');
}

function counted(number: number, unit: string): string {
  return `${String(number)} ${unit}${number === 1 ? '' : 's'}`;
}
