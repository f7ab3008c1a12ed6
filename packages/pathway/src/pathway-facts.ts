/**
 * What has happened to one child so far, as the planner reads it. Facts are stored; states and windows never are.
 * A fact dated after the day on which the planner is asked has not happened yet.
 */
import type { PlainDate } from '@weftway/calendar/plain-date';

export type Sex = 'female' | 'male' | 'unknown';
export type Side = 'R' | 'L';

/** `SURG-03`, per side `ORTH-05:R`, for one operation `CARE-04:SURG-01`. */
export type MilestoneKey = string;
/** `SURG-03` */
export type MilestoneId = string;

/** One completed occurrence: all its signatures given (or taken over from another team). */
export interface Completion {
  readonly milestone: MilestoneKey;
  readonly on: PlainDate;
  /** Evidence values that other rules read, by field name. */
  readonly results?: Readonly<Record<string, string>>;
  /** Imported and not yet confirmed by a surgeon of this team. */
  readonly isUnverified?: boolean;
  readonly precision?: 'day' | 'month' | 'year';
}

/** One of two signatures, or a trainee's draft, of the occurrence that is now awaited. */
export interface PartCompletion {
  readonly milestone: MilestoneKey;
  readonly part: string;
  readonly on: PlainDate;
  readonly kind: 'signed' | 'drafted';
}

export interface Waiver {
  readonly milestone: MilestoneKey;
  readonly on: PlainDate;
  readonly reason: string;
  /** `waived`: the child could have had it; `not-recoverable`: the chance ended. */
  readonly kind: 'waived' | 'not-recoverable';
}

export interface Hold {
  readonly milestone: MilestoneKey;
  readonly on: PlainDate;
  readonly reviewOn: PlainDate;
  readonly reason: string;
}

export interface Finding {
  readonly name: string;
  readonly on: PlainDate;
  /**
   * Found late: milestones that it switches on count from this day. Absent: so for facts of the body (`palate`, `smcp`,
   * `robin` ...), not for decisions and triggers.
   */
  readonly isLate?: boolean;
}

export interface RootReading {
  readonly on: PlainDate;
  /** Fraction of the final root length, exact: `1/2`. */
  readonly stage: string;
  readonly side: Side;
}

export interface PathwayFacts {
  /** Null before birth. */
  readonly birth: PlainDate | null;
  /** Expected date of birth; the provisional base before birth. */
  readonly due: PlainDate | null;
  readonly isBirthEstimated: boolean;
  readonly gestation: { readonly weeks: number; readonly days: number } | null;
  readonly sex: Sex;
  /** Seven LAHSHAL places. */
  readonly cleft: string;
  /** Facts without a date of their own: `robin`, `airway`, `smcp`, `syndrome`, `jaw_surgery_planned` ... */
  readonly flags: readonly string[];
  readonly teamStart: PlainDate | null;
  readonly transferredOn: PlainDate | null;
  readonly findings: readonly Finding[];
  readonly completions: readonly Completion[];
  readonly parts: readonly PartCompletion[];
  readonly waivers: readonly Waiver[];
  readonly holds: readonly Hold[];
  readonly bookings: readonly { readonly milestone: MilestoneKey; readonly on: PlainDate }[];
  readonly roots: readonly RootReading[];
}
