/**
 * From which day a window counts: birth, corrected birth, a referral, an event, a booking or a finding
 * (published date rules, 3).
 */
import { addMonthsToDay } from '@weftway/calendar/plain-date';
import { type ChildRecord, type Dated } from './child-record.ts';
import type { SpanWindow } from './compiled-protocol.ts';
import { completionsOf, ofSide, until, type Planning, type Row } from './planning.ts';
import { sideOfNeed } from './gates.ts';
import type { WindowBase } from './window-draft.ts';

/** Targets at or beyond this age are not corrected for prematurity. */
const correctedBelowMonths = 24;
/** Earliest age at which the speech-valve work-up can be done by a child that does not co-operate yet. */
const workUpFromMonths = 42;

export type BaseReading =
  | { readonly kind: 'base'; readonly base: WindowBase; readonly isUnverified: boolean }
  | { readonly kind: 'missing'; readonly what: 'event' | 'booking'; readonly name: string };

function found(base: WindowBase, isUnverified = false): BaseReading {
  return { kind: 'base', base, isUnverified };
}

/** The two bases that most milestones share, read once for a child. */
export function sharedBases(child: ChildRecord): { readonly birth: BaseReading; readonly corrected: BaseReading } {
  return {
    birth: found({ day: child.birth, rule: child.isBorn ? 'base-birth' : 'base-due-date' }),
    corrected: found({ day: child.corrected, rule: 'base-corrected' }),
  };
}

/** The base of a milestone's first window, of facts not later than `asOf`. */
export function clockBase(planning: Planning, row: Row, window: SpanWindow, asOf: number): BaseReading {
  const { child } = planning;
  const { rule, clockFrom } = row.milestone;
  switch (clockFrom) {
    case 'birth':
      return planning.birth;
    case 'corrected':
      return isCorrected(window) && child.isBorn ? planning.corrected : planning.birth;
    case 'referral':
      return referralBase(planning, 'birth_referral', ['referral']);
    case 'prenatal-referral':
      return referralBase(planning, 'prenatal_referral', []);
    case 'event':
      return eventBase(planning, row, asOf);
    case 'booking':
      return bookingBase(planning, row);
    case 'finding':
      return findingBase(planning, row);
    case 'operation-booked':
    case 'operation-done':
      return { kind: 'missing', what: 'booking', name: rule.id };
  }
}

function isCorrected(window: SpanWindow): boolean {
  return window.target.months < correctedBelowMonths;
}

/** Birth, or the expected date while the child is not born. */
export function birthBase(planning: Planning): WindowBase {
  return { day: planning.child.birth, rule: planning.child.isBorn ? 'base-birth' : 'base-due-date' };
}

function referralBase(planning: Planning, name: string, others: readonly string[]): BaseReading {
  const { child } = planning;
  const day = [name, ...others].map((one) => child.findings.get(one)).find((one) => one !== undefined);
  if (day !== undefined) return found({ day, rule: 'base-referral' });
  if (name === 'birth_referral' && !child.isBorn) return found(birthBase(planning));
  return { kind: 'missing', what: 'event', name };
}

/** The milestone whose completion starts the clock: the hearing test after tubes counts from them without a palate repair. */
export function eventIndex(planning: Planning, row: Row): number {
  const index = row.milestone.clockIndex;
  if (row.milestone.rule.id !== 'EAR-05') return index;
  const repair = planning.compiled.milestones[index];
  const tubes = planning.compiled.indexOf.get('EAR-07');
  if (repair === undefined || tubes === undefined || completionsOf(planning, index, null).length > 0) return index;
  const hasRepair = repair.applies === null || repair.applies(planning.child.truth);
  const isWaived = (planning.child.waived[index] ?? []).length > 0;
  return !hasRepair || (isWaived && completionsOf(planning, tubes, null).length > 0) ? tubes : index;
}

function eventBase(planning: Planning, row: Row, asOf: number): BaseReading {
  const index = eventIndex(planning, row);
  const entry = latest(until(completionsOf(planning, index, sideOfNeed(planning, index, row.side)), asOf));
  const name = planning.compiled.milestones[index]?.rule.id ?? '';
  if (entry === undefined) return { kind: 'missing', what: 'event', name };
  const base = { day: entry.on, rule: 'base-event', details: { event: { name, on: entry.on } } } as const;
  return found(base, entry.fact.isUnverified === true);
}

function bookingBase(planning: Planning, row: Row): BaseReading {
  const index = row.milestone.clockIndex;
  const entry = latest(ofSide(planning.child.booked[index] ?? [], row.side));
  const name = planning.compiled.milestones[index]?.rule.id ?? '';
  if (entry === undefined) return { kind: 'missing', what: 'booking', name };
  return found({ day: entry.on, rule: 'base-booking', details: { event: { name, on: entry.on } } });
}

function findingBase(planning: Planning, row: Row): BaseReading {
  const clock = row.milestone.rule.clock;
  const name = clock.from === 'finding' ? clock.finding : '';
  const day = planning.child.findings.get(name);
  if (day === undefined) return { kind: 'missing', what: 'event', name };
  const base: WindowBase = { day, rule: 'base-finding', details: { event: { name, on: day } } };
  if (!isRedated(planning, row)) return found(base);
  const readyDay = addMonthsToDay(planning.child.birth, workUpFromMonths);
  return found(
    readyDay > day ? { day: readyDay, rule: 'base-birth', details: { span: '3y6m', note: 're-dated' } } : base,
  );
}

/** "Cannot co-operate yet: re-date to 3.5 y" is recorded among the waivers, but it moves the trigger and waives nothing. */
export function isRedating(waiver: { readonly fact: { readonly reason: string } }): boolean {
  return /re-?date/i.test(waiver.fact.reason);
}

function isRedated(planning: Planning, row: Row): boolean {
  return (planning.child.waived[row.milestone.index] ?? []).some(isRedating);
}

function latest<T>(entries: readonly Dated<T>[]): Dated<T> | undefined {
  return entries[entries.length - 1];
}
