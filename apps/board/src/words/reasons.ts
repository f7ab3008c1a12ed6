/** Why a date is what it is, and why something waits, in words. */
import { formatDate } from '@weftway/calendar/format-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import { readSpan } from '@weftway/calendar/span';
import type { ReasonStep, Wait } from '@weftway/pathway/pathway-plan';
import { findingWords } from './findings.ts';

/** What the words need to know of the child's path. */
export interface Naming {
  /** Title of a milestone by its id or key. */
  readonly titleOf: (key: string) => string;
  /** Null before birth. */
  readonly birth: PlainDate | null;
}

export type Which = 'earliest' | 'target' | 'latest';

const counted = (count: number, unit: string): string => `${String(count)} ${unit}${count === 1 ? '' : 's'}`;

/** `2y6m` as "2 years 6 months"; the sign is dropped. */
export const spanInWords = (text: string): string => {
  const span = readSpan(text);
  if (span === null) return text;
  const months = Math.abs(span.months);
  const days = Math.abs(span.days);
  const isWeeks = days >= 7 && days % 7 === 0 && /w/.test(text);
  const parts = [
    ...(months >= 12 ? [counted(Math.floor(months / 12), 'year')] : []),
    ...(months % 12 > 0 ? [counted(months % 12, 'month')] : []),
    ...(days === 0 ? [] : [isWeeks ? counted(days / 7, 'week') : counted(days, 'day')]),
  ];
  return parts.length === 0 ? 'the same day' : parts.join(' ');
};

const isNoSpan = (text: string): boolean => {
  const span = readSpan(text);
  return span !== null && span.months === 0 && span.days === 0;
};
const isBackwards = (text: string): boolean => text.startsWith('-');

const verbs: Readonly<Record<Which, string>> = { earliest: 'opens', target: 'is aimed at', latest: 'closes' };

/** "28 days later", "3 months sooner"; exact in days under two months. */
export const shiftInWords = (days: number): string => {
  if (days === 0) return 'no change';
  const length = Math.abs(days);
  const size = length < 60 ? counted(length, 'day') : counted(Math.round(length / 30.4375), 'month');
  return `${size} ${days > 0 ? 'later' : 'sooner'}`;
};

const eventText = (step: ReasonStep, naming: Naming): string =>
  step.event === undefined ? '' : naming.titleOf(step.event.name);
const eventDay = (step: ReasonStep): string => formatDate(step.event?.on ?? step.date);

const spanText = (step: ReasonStep, which: Which): string => {
  if (step.span === undefined) return 'The protocol sets this date';
  if (isNoSpan(step.span)) return `The protocol: ${verbs[which]} on that day`;
  const words = spanInWords(step.span);
  return isBackwards(step.span)
    ? `The protocol: ${verbs[which]} ${words} before`
    : `The protocol: ${verbs[which]} ${words} after`;
};

const rootText = (step: ReasonStep): string => {
  if (step.note === 'next-xray') return 'The root is still short: the next x-ray decides';
  if (step.note === 'before-graft') return 'At least 14 days before the graft itself closes';
  return step.span === undefined
    ? 'The root of the canine decides'
    : `The root decides: ${spanInWords(step.span)} after that x-ray`;
};

const estimateText = (note: string | undefined): string =>
  note === 'gestation-unknown'
    ? 'Weeks of pregnancy are not known, so an early birth is not allowed for'
    : 'The birth date is an estimate: six months either way';

const texts: Readonly<Record<ReasonStep['rule'], (step: ReasonStep, naming: Naming, which: Which) => string>> = {
  'base-birth': (step) =>
    step.note === 're-dated' ? 'Could not take part yet: counted from 3½ years of age' : 'Counted from birth',
  'base-due-date': () => 'Not born yet: counted from the expected date',
  'base-corrected': (step, naming) =>
    step.date === naming.birth ? 'Counted from birth' : 'Born early: counted from the day birth was expected',
  'base-referral': () => 'Counted from the day the referral came',
  'base-event': (step, naming) => `${eventText(step, naming)} was done on ${eventDay(step)}`,
  'base-booking': (step, naming) =>
    `${step.event === undefined ? 'The operation' : eventText(step, naming)} is booked for ${eventDay(step)}`,
  'base-finding': (step) => `${findingWords(step.event?.name ?? '')}, ${eventDay(step)}`,
  'base-team-start': () => 'Joined the team on this day',
  'base-last-occurrence': (step) => `Last time was ${eventDay(step)}`,
  'base-root': (step) =>
    `Canine root reached the ${step.event?.name === 'root-upper-bound' ? 'upper' : 'lower'} bound, x-ray of ${eventDay(step)}`,
  span: (step, _naming, which) => spanText(step, which),
  'variant-span': (step, _naming, which) => `${spanText(step, which)} (${step.note ?? 'own window'})`,
  'repeat-span': (step, _naming, which) => `${spanText(step, which)}, as every time`,
  'age-span': (step, _naming, which) => `The protocol: ${verbs[which]} at ${spanInWords(step.span ?? '')} of age`,
  'catch-up-span': (step) => `Joined late: ${spanInWords(step.span ?? '')} to make it up`,
  'gate-moved': (step, naming) =>
    step.span === undefined
      ? `Not before ${eventText(step, naming)}, done on ${eventDay(step)}`
      : `${eventText(step, naming)} on ${eventDay(step)}, then ${spanInWords(step.span)} to heal or settle`,
  'target-not-before-earliest': () => 'The aim is never before the opening',
  'not-before-age': (step) => `Never before ${spanInWords(step.span ?? '')} of age`,
  'not-after-latest': () => 'The aim is never after the latest date',
  'root-rule': (step) => rootText(step),
  'team-start-moved': () => 'Not before joining the team, or before it was found',
  'estimated-birth': (step) => estimateText(step.note),
};

export const reasonText = (step: ReasonStep, naming: Naming, which: Which): string =>
  texts[step.rule](step, naming, which);

/** The right-hand side of the reckoning: the base's own date, then how far each step moves it. */
export const reasonEffect = (step: ReasonStep, isFirst: boolean): string => {
  if (isFirst) return formatDate(step.date);
  if (step.rule === 'estimated-birth') return '';
  const isSpan =
    step.span !== undefined &&
    /span$|^root-rule$/.test(step.rule) &&
    step.note !== 'next-xray' &&
    step.note !== 'before-graft';
  if (isSpan && step.span !== undefined && isNoSpan(step.span)) return 'the same day';
  if (isSpan && step.span !== undefined) return `${isBackwards(step.span) ? '−' : '+'} ${spanInWords(step.span)}`;
  return shiftInWords(step.days);
};

/** Why something that is waited for does not count yet; or, when it does, how. */
export const waitText = (wait: Wait): string => {
  const until = wait.until === undefined ? '' : formatDate(wait.until as PlainDate);
  switch (wait.cause) {
    case 'met':
      return wait.on === undefined
        ? 'done'
        : `done ${formatDate(wait.on)}${until === '' ? '' : `, good until ${until}`}`;
    case 'not-signed':
      return 'not signed yet';
    case 'too-soon':
      return until === '' ? 'done, but too recently' : `done, counts from ${until}`;
    case 'stale':
      return until === '' ? 'too old, to be done again' : `too old since ${until}, to be done again`;
    case 'result':
      return 'done, but its result does not allow this';
    case 'unverified':
      return 'done elsewhere, not confirmed by this team';
    case 'waived':
      return 'will not be done';
    case 'waived-decide':
      return 'will not be done: somebody must decide what that means here';
    case 'not-on-path':
      return 'not needed for this child';
    case 'no-event':
      return 'its event has not come yet';
  }
};

export const reasonsWords = {
  title: 'Why these dates',
  which: 'Which date',
  whichNames: { earliest: 'Earliest', target: 'Target', latest: 'Latest' },
  totals: { earliest: 'Opens', target: 'Aimed at', latest: 'Latest' },
  noDates: 'No dates yet, so there is nothing to reckon.',
  calculation: 'A calculation, not advice.',
  waitsFor: 'Waits for',
  waitsForNothing: 'Nothing. It can be done whenever its window is open.',
  waitKinds: { gate: 'must be done first', check: 'asked for at signing', soft: 'would be good to have' },
  metOf: (met: number, all: number) => `${String(met)} of ${String(all)} met`,
  openNamed: (title: string) => `Open: ${title}`,
  claimNamed: (title: string) => `Claim: ${title}`,
  sourcesCount: (count: number) => `${String(count)} published ${count === 1 ? 'source' : 'sources'} of this rule`,
  openIt: 'open',
  claimIt: 'claim',
  willMove: 'Will move',
  movesNothing: 'Nothing else depends on it.',
} as const;
