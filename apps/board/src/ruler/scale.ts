/** The stretched time scale of the age ruler. Ages are months of 30.4375 days; positions run from 0 to 1. */
import { daysBetween, type PlainDate } from '@weftway/calendar/plain-date';

export const daysPerMonth = 30.4375;
export const firstAge = -5;
export const lastAge = 252;

export type SegmentName =
  'before-birth' | 'first-six-months' | 'to-eighteen-months' | 'early-years' | 'school' | 'growing-up';

export interface Segment {
  readonly name: SegmentName;
  readonly from: number;
  readonly to: number;
  readonly share: number;
}

export const segments: readonly Segment[] = [
  { name: 'before-birth', from: -5, to: 0, share: 0.045 },
  { name: 'first-six-months', from: 0, to: 6, share: 0.2 },
  { name: 'to-eighteen-months', from: 6, to: 18, share: 0.155 },
  { name: 'early-years', from: 18, to: 72, share: 0.22 },
  { name: 'school', from: 72, to: 144, share: 0.2 },
  { name: 'growing-up', from: 144, to: 252, share: 0.18 },
];

export const periods = ['all', 'first-18-months', 'early-years', 'school', 'growing-up'] as const;
export type Period = (typeof periods)[number];

const closerShare = 0.76;
const closerSegments: Readonly<Record<Exclude<Period, 'all'>, readonly SegmentName[]>> = {
  'first-18-months': ['first-six-months', 'to-eighteen-months'],
  'early-years': ['early-years'],
  school: ['school'],
  'growing-up': ['growing-up'],
};

/** The segments with the shares that hold when looking closer at one period; the shares always sum to 1. */
export function segmentsOf(period: Period): readonly Segment[] {
  if (period === 'all') return segments;
  const chosen = closerSegments[period];
  const chosenSum = segments
    .filter((segment) => chosen.includes(segment.name))
    .reduce((sum, { share }) => sum + share, 0);
  return segments.map((segment) =>
    chosen.includes(segment.name)
      ? { ...segment, share: (segment.share / chosenSum) * closerShare }
      : { ...segment, share: (segment.share / (1 - chosenSum)) * (1 - closerShare) },
  );
}

/** Age in months of 30.4375 days; negative before birth. */
export function ageOnRuler(birth: PlainDate, on: PlainDate): number {
  return daysBetween(birth, on) / daysPerMonth;
}

/** Where an age lies, 0 to 1; ages outside the ruler lie on its ends. */
export function positionOfAge(age: number, period: Period = 'all'): number {
  const clamped = Math.min(Math.max(age, firstAge), lastAge);
  let start = 0;
  for (const { from, to, share } of segmentsOf(period)) {
    if (clamped <= to) return start + (share * (clamped - from)) / (to - from);
    start += share;
  }
  return 1;
}

/** The age that lies at a position; the inverse of `positionOfAge`. */
export function ageOfPosition(position: number, period: Period = 'all'): number {
  const clamped = Math.min(Math.max(position, 0), 1);
  let start = 0;
  for (const { from, to, share } of segmentsOf(period)) {
    if (clamped <= start + share) return from + ((clamped - start) / share) * (to - from);
    start += share;
  }
  return lastAge;
}

/** The period that an age belongs to. */
export function periodOfAge(age: number): Exclude<Period, 'all'> {
  if (age < 18) return 'first-18-months';
  if (age < 72) return 'early-years';
  return age < 144 ? 'school' : 'growing-up';
}

/** The whole life where it fits, else the child's present segment. */
export function defaultPeriod(rulerWidth: number, age: number): Period {
  return rulerWidth < 1100 ? periodOfAge(age) : 'all';
}
