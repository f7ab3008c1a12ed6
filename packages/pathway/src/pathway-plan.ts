/** What the planner answers for one child: every milestone with its window, state, waits and the reasons of its dates. */
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { MilestoneState } from './milestone-state.ts';
import type { MilestoneId, MilestoneKey, Side } from './pathway-facts.ts';

/** The clinical words that the audit command prints. */
export const clinicalStatuses = [
  'not_applicable',
  'waived',
  'signed_off',
  'awaiting_sign_off',
  'held',
  'overdue',
  'blocked',
  'closing',
  'due',
  'window_open',
  'upcoming',
  'transferred',
  'not_started',
] as const;
export type ClinicalStatus = (typeof clinicalStatuses)[number];

export interface PlannedWindow {
  readonly earliest: PlainDate;
  readonly target: PlainDate;
  readonly latest: PlainDate;
  /** First day of the closing part: latest minus the closing days. */
  readonly closing: PlainDate;
}

/**
 * One step of the reckoning of a date. The first step names the base (`days` 0); the dates of the steps follow one
 * another: previous date + `days` = `date`, and the last `date` is the date that is explained.
 */
export interface ReasonStep {
  /** Which rule: a code from a closed list, worded by the screen. */
  readonly rule: ReasonRule;
  readonly days: number;
  readonly date: PlainDate;
  /** The span of the protocol that was added, `9m`. */
  readonly span?: string;
  /** The event that the rule read. */
  readonly event?: { readonly name: string; readonly on: PlainDate };
  readonly note?: string;
  /** `Protocol 1, SURG-03` and, where the rule quotes one, the published sources. */
  readonly source: string;
}

export const reasonRules = [
  'base-birth',
  'base-due-date',
  'base-corrected',
  'base-referral',
  'base-event',
  'base-booking',
  'base-finding',
  'base-team-start',
  'base-last-occurrence',
  'base-root',
  'span',
  'variant-span',
  'repeat-span',
  'age-span',
  'catch-up-span',
  'gate-moved',
  'target-not-before-earliest',
  'not-before-age',
  'not-after-latest',
  'root-rule',
  'team-start-moved',
  'estimated-birth',
] as const;
export type ReasonRule = (typeof reasonRules)[number];

export interface Wait {
  readonly milestone: MilestoneKey;
  readonly type: 'gate' | 'check' | 'soft';
  readonly isMet: boolean;
  /** Why not: or, when met, how (`waived`, `not-on-path`). */
  readonly cause:
    | 'met'
    | 'not-signed'
    | 'too-soon'
    | 'stale'
    | 'result'
    | 'unverified'
    | 'waived'
    | 'waived-decide'
    | 'not-on-path'
    | 'no-event';
  /** Completion that was read. */
  readonly on?: PlainDate;
  /** Stale from / met from this day, where known. */
  readonly until?: PlainDate;
  readonly note?: string;
}

export interface PlannedOccurrence {
  readonly occurrence: number;
  readonly on: PlainDate;
  readonly kind: 'signed' | 'waived' | 'missed';
  readonly window: PlannedWindow | null;
}

export interface PlannedMilestone {
  readonly key: MilestoneKey;
  readonly id: MilestoneId;
  readonly side: Side | null;
  /** The operation that this check belongs to, `SURG-01` of `CARE-04:SURG-01`. */
  readonly forOperation: MilestoneKey | null;
  /** 1-based number of the occurrence now awaited; of the last one when all are done. */
  readonly occurrence: number;
  readonly state: MilestoneState;
  readonly clinical: ClinicalStatus;
  /** Open and its target date reached. */
  readonly isDue: boolean;
  /** Days by which the opening lies past the latest date, else null. */
  readonly squeezedByDays: number | null;
  readonly isLapsed: boolean;
  /**
   * Signed, and another milestone asks for a fresh one or for its result: it may be recorded once more at any time
   * (an airway screen that went stale, a test to repeat).
   */
  readonly isRenewable: boolean;
  readonly window: PlannedWindow | null;
  /** Days past the latest date, 0 when in time; also counted while held or partly signed. */
  readonly daysLate: number;
  readonly waitsFor: readonly Wait[];
  /** Milestones whose dates or state depend on this one. */
  readonly moves: readonly MilestoneKey[];
  readonly reasons: {
    readonly earliest: readonly ReasonStep[];
    readonly target: readonly ReasonStep[];
    readonly latest: readonly ReasonStep[];
  };
  /** Why there is no window, or a remark: worded by the screen. */
  readonly remark: string | null;
  /** Earlier occurrences, oldest first. */
  readonly past: readonly PlannedOccurrence[];
  /** Expected targets of the next occurrences if each is done on its target, at most 40. */
  readonly rhythm: readonly PlainDate[];
  /** Next day on which the state changes by itself, or null. */
  readonly changesOn: PlainDate | null;
}

export interface OffPathMilestone {
  readonly key: MilestoneKey;
  readonly id: MilestoneId;
  readonly clinical: 'not_applicable' | 'not_started';
  readonly reason: string;
}

export interface PathwayPlan {
  readonly today: PlainDate;
  readonly milestones: readonly PlannedMilestone[];
  readonly offPath: readonly OffPathMilestone[];
  /** Base dates in use. */
  readonly base: { readonly birth: PlainDate; readonly corrected: PlainDate; readonly isExpected: boolean };
  readonly alarms: readonly {
    readonly name: 'lost-to-follow-up' | 'review-overdue' | 'graft-blind' | 'squeezed';
    readonly since: PlainDate;
    readonly milestone: MilestoneKey;
  }[];
}
