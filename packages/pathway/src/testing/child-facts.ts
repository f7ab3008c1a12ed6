/** Facts of a child for tests: only what matters to the test is named. */
import { plainDate, type PlainDate } from '@weftway/calendar/plain-date';
import type { Completion, PathwayFacts } from '../pathway-facts.ts';

/** A girl born at term on 15 January 2026 with a complete cleft of the left lip, gum and palate, and nothing recorded. */
export function childFacts(more: Partial<PathwayFacts> = {}): PathwayFacts {
  const birth = plainDate('2026-01-15');
  return {
    birth,
    due: null,
    isBirthEstimated: false,
    gestation: { weeks: 39, days: 2 },
    sex: 'female',
    cleft: '•••SHAL',
    flags: [],
    teamStart: null,
    transferredOn: null,
    findings: [{ name: 'birth_referral', on: more.birth ?? birth }],
    completions: [],
    parts: [],
    waivers: [],
    holds: [],
    bookings: [],
    roots: [],
    ...more,
  };
}

/** Completions written as milestone and dates. */
export function done(dates: Readonly<Record<string, readonly string[]>>): Completion[] {
  return Object.entries(dates).flatMap(([milestone, days]) => days.map((on) => ({ milestone, on: plainDate(on) })));
}

/** A date for tests. */
export const day = (text: string): PlainDate => plainDate(text);
