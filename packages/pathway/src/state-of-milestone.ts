/**
 * The word for a row on a day: the table of the published date rules (7), first match wins.
 * Not applicable, waived, signed off, awaiting sign-off, held, overdue, blocked, closing, due, window open, upcoming.
 * Closing stands before "not yet open", so a squeezed item is never shown as ahead in its last weeks.
 */
import { never } from './child-record.ts';
import type { MilestoneState } from './milestone-state.ts';
import type { ClinicalStatus } from './pathway-plan.ts';
import { farFuture, type Planning, type Row } from './planning.ts';

/** The clinical word on a day, were nothing to happen until then. */
export function clinicalStatus(planning: Planning, row: Row, day: number): ClinicalStatus {
  if (row.offPath !== null) return 'not_applicable';
  if (row.fixed === 'waived' || row.fixed === 'signed_off') return row.fixed;
  if (planning.child.isTransferred) return 'transferred';
  if (row.fixed === 'awaiting_sign_off') return row.fixed;
  if (day <= row.heldUntil) return 'held';
  if (row.fixed !== null) return row.fixed;
  if (!planning.child.isBorn && row.milestone.clockFrom !== 'prenatal-referral') return 'upcoming';
  return windowStatus(row, day);
}

/** The part of the table that the window and the gates decide. */
function windowStatus(row: Row, day: number): ClinicalStatus {
  const { hasWindow, earliest, target, latest } = row.draft;
  if (!hasWindow) return 'blocked';
  if (!row.isStarted && day > lastDayInTime(row)) return 'overdue';
  if (day >= earliest && !areGatesOpen(row, day)) return 'blocked';
  if (day >= latest - row.milestone.rule.closingDays) return 'closing';
  if (day >= target) return 'due';
  return day >= earliest ? 'window_open' : 'upcoming';
}

/** The latest date, or the birth that overtook a consult before it. */
function lastDayInTime(row: Row): number {
  const { latest } = row.draft;
  const overtaken = row.milestone.rule.lapse?.after === 'birth' && row.lapseDay !== never;
  return overtaken ? Math.min(latest, row.lapseDay) : latest;
}

/** Whether every gate is met on a day. */
export function areGatesOpen(row: Row, day: number): boolean {
  return !row.isGateShut && day <= row.freshUntil;
}

/** Whether the chance has ended and a human answer is asked for. */
export function isLapsed(row: Row, day: number): boolean {
  return row.fixed === null && row.offPath === null && row.lapseDay !== never && day > row.lapseDay;
}

/** Days past the latest date, also while held or half signed; 0 when in time or done. */
export function daysLate(planning: Planning, row: Row, day: number): number {
  const isOpen = row.fixed === null || (row.fixed === 'awaiting_sign_off' && !row.isUnverified);
  if (!isOpen || row.offPath !== null || row.isStarted || planning.child.isTransferred) return 0;
  if (!planning.child.isBorn && row.milestone.clockFrom !== 'prenatal-referral') return 0;
  return row.draft.hasWindow ? Math.max(0, day - lastDayInTime(row)) : 0;
}

/** The state shown on the board: an item whose event has not come is ahead, not waiting. */
export function boardState(status: ClinicalStatus, hasWindow: boolean): MilestoneState {
  switch (status) {
    case 'waived':
    case 'held':
    case 'closing':
    case 'transferred':
      return status;
    case 'signed_off':
      return 'signed';
    case 'awaiting_sign_off':
      return 'partly-signed';
    case 'overdue':
      return 'late';
    case 'blocked':
      return hasWindow ? 'waiting' : 'ahead';
    case 'due':
    case 'window_open':
      return 'open';
    case 'upcoming':
    case 'not_started':
    case 'not_applicable':
      return 'ahead';
  }
}

/** Next day on which the word or the lapse flag changes without anything happening; -1e9 when it never does. */
export function nextChangeDay(planning: Planning, row: Row, day: number): number {
  if (row.fixed !== null || row.offPath !== null || planning.child.isTransferred || !planning.child.isBorn)
    return never;
  const { hasWindow, earliest, target, latest } = row.draft;
  const now = clinicalStatus(planning, row, day);
  const wasLapsed = isLapsed(row, day);
  let from = day;
  // The nearest border may change nothing (a target while the gate is shut); then the next one is tried.
  for (let tried = 0; tried < 7; tried += 1) {
    let next = nearer(row.heldUntil + 1, from, farFuture);
    next = nearer(row.lapseDay + 1, from, next);
    if (hasWindow) {
      next = nearer(earliest, from, next);
      next = nearer(target, from, next);
      next = nearer(latest - row.milestone.rule.closingDays, from, next);
      next = nearer(lastDayInTime(row) + 1, from, next);
      next = nearer(row.freshUntil + 1, from, next);
    }
    if (next >= farFuture) return never;
    if (clinicalStatus(planning, row, next) !== now || isLapsed(row, next) !== wasLapsed) return next;
    from = next;
  }
  return never;
}

function nearer(candidate: number, after: number, best: number): number {
  return candidate > after && candidate < best ? candidate : best;
}
