/**
 * Recurrence rules with the dates printed in RFC 5545, section 3.8.5.3.
 * Dates here are floating: where the RFC ends a rule within a day, before the hour of the event, the day before is written.
 */
import { plainDate } from '@weftway/calendar/plain-date';
import { datesOfRule } from '@weftway/calendar/recurrence';
import { expect, it } from 'vitest';
import rules from './calendar/rfc5545-rules.json' with { type: 'json' };

it.each(rules)('RFC 5545, 3.8.5.3: $says', ({ from, rule, leftOut, ends, dates }) => {
  const expected = dates.split(' ');
  const limit = ends ? expected.length + 5 : expected.length;
  expect(datesOfRule(rule, plainDate(from), limit, leftOut.map(plainDate))).toEqual(expected);
});
