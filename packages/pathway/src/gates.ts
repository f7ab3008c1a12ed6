/**
 * What a milestone waits for: gates that keep it shut, checks demanded at sign-off, and soft warnings.
 * A waived gate counts as met unless it carries a result or a freshness; a gate that is not on the path counts as met;
 * freshness reaches forwards from the test and includes its last day (published date rules 5, 17).
 */
import { fromEpochDay } from '@weftway/calendar/plain-date';
import { addSpanToDay } from '@weftway/calendar/span';
import { never, type Dated } from './child-record.ts';
import type { CompiledNeed } from './compiled-protocol.ts';
import type { Completion, Side } from './pathway-facts.ts';
import type { Wait } from './pathway-plan.ts';
import { completionsOf, farFuture, ofSide, until, type Planning, type Row } from './planning.ts';

export interface Judgement {
  readonly cause: Wait['cause'];
  readonly isMet: boolean;
  /** Completion that was read, or -1e9. */
  readonly on: number;
  /** Last fresh day where the need goes stale, else far in the future. */
  readonly freshUntil: number;
}

type RowOf = (planning: Planning, index: number, side: Side | null) => Row;

/** The side on which a prerequisite is looked up: the asker's when the prerequisite has sides, else none. */
export function sideOfNeed(planning: Planning, index: number, side: Side | null): Side | null {
  return planning.compiled.milestones[index]?.rule.perSide === true ? side : null;
}

/** Whether the result that a need asks for was good. */
export function hasGoodResult(planning: Planning, need: CompiledNeed, entry: Dated<Completion>): boolean {
  const demand = need.rule.result;
  if (demand === undefined) return true;
  const value = entry.fact.results?.[demand.field];
  return value === undefined ? planning.options.unstatedResultsAreGood === true : demand.oneOf.includes(value);
}

/** Day from which a gate counts: first completion of the present unbroken run of good results; -1e9 when there is none. */
export function firstOfGoodRun(planning: Planning, need: CompiledNeed, side: Side | null, asOf: number): number {
  const entries = until(completionsOf(planning, need.index, sideOfNeed(planning, need.index, side)), asOf);
  if (need.rule.result === undefined) return entries[0]?.on ?? never;
  let first = never;
  for (let at = entries.length - 1; at >= 0; at -= 1) {
    const entry = entries[at];
    if (!entry || !hasGoodResult(planning, need, entry)) break;
    first = entry.on;
  }
  return first;
}

/** Judges a need on a day. */
export function judge(planning: Planning, need: CompiledNeed, side: Side | null, day: number, rowOf: RowOf): Judgement {
  const needSide = sideOfNeed(planning, need.index, side);
  const entries = until(entriesOfNeed(planning, need, side), day);
  const last = entries[entries.length - 1];
  const waivers = ofSide(planning.child.waived[need.index] ?? [], needSide);
  if (last === undefined) return judgeUndone(planning, need, needSide, waivers.length > 0, rowOf);
  const freshUntil = need.freshFor === null ? farFuture : addSpanToDay(last.on, need.freshFor);
  const answer = (cause: Wait['cause'], isMet: boolean): Judgement => ({ cause, isMet, on: last.on, freshUntil });
  if (last.fact.isUnverified === true) return answer('unverified', false);
  if (!hasGoodResult(planning, need, last)) return answer('result', false);
  const isFresh = day <= freshUntil;
  if (!isFresh) return answer(waivers.some((waiver) => waiver.on > freshUntil) ? 'waived-decide' : 'stale', false);
  return answer('met', true);
}

function judgeUndone(
  planning: Planning,
  need: CompiledNeed,
  side: Side | null,
  isWaived: boolean,
  rowOf: RowOf,
): Judgement {
  const answer = (cause: Wait['cause'], isMet: boolean): Judgement => ({
    cause,
    isMet,
    on: never,
    freshUntil: farFuture,
  });
  if (need.index < 0) return answer('not-on-path', true);
  const carriesMore = need.freshFor !== null || need.rule.result !== undefined;
  if (isWaived) return carriesMore ? answer('waived-decide', false) : answer('waived', true);
  if (rowOf(planning, need.index, side).offPath !== null) return answer('not-on-path', true);
  return answer('not-signed', false);
}

/** Sets on a row whether its gates are shut today and until when their freshness lasts. */
export function applyGates(planning: Planning, row: Row, rowOf: RowOf): void {
  for (const need of row.milestone.gates) {
    if (need.when !== null && !need.when(planning.child.truth)) continue;
    const judgement = judge(planning, need, row.side, planning.child.today, rowOf);
    if (judgement.isMet) row.freshUntil = Math.min(row.freshUntil, judgement.freshUntil);
    else row.isGateShut = true;
  }
}

/** Everything that a row waits for, gates before checks before soft links, as a screen reads it. */
export function waitsOf(planning: Planning, row: Row, day: number, rowOf: RowOf): Wait[] {
  const waits: Wait[] = [];
  for (const need of row.milestone.needs) {
    if (need.index < 0 || (need.when !== null && !need.when(planning.child.truth))) continue;
    waits.push(describeWait(planning, need, row.side, day, judge(planning, need, row.side, day, rowOf)));
  }
  return waits;
}

function describeWait(
  planning: Planning,
  need: CompiledNeed,
  side: Side | null,
  day: number,
  judgement: Judgement,
): Wait {
  const opens = need.gap !== null && judgement.on !== never ? addSpanToDay(judgement.on, need.gap) : never;
  const isTooSoon = judgement.isMet && opens > day;
  const needSide = sideOfNeed(planning, need.index, side);
  const key = needSide === null ? need.rule.milestone : `${need.rule.milestone}:${needSide}`;
  const bound = isTooSoon ? opens : judgement.freshUntil;
  return {
    milestone: need.isForOperation ? `${need.rule.milestone}:${operationKey(need, side)}` : key,
    type: need.rule.type,
    isMet: judgement.isMet && !isTooSoon,
    cause: isTooSoon ? 'too-soon' : judgement.cause,
    ...(judgement.on === never ? {} : { on: fromEpochDay(judgement.on) }),
    ...(bound >= farFuture ? {} : { until: fromEpochDay(bound) }),
    ...(need.rule.note === undefined ? {} : { note: need.rule.note }),
  };
}

function operationKey(need: CompiledNeed, side: Side | null): string {
  return side === null ? need.ownerId : `${need.ownerId}:${side}`;
}

/** Completions that a need reads; a fitness check belongs to its own operation unless it names none. */
function entriesOfNeed(planning: Planning, need: CompiledNeed, side: Side | null): readonly Dated<Completion>[] {
  const entries = completionsOf(planning, need.index, sideOfNeed(planning, need.index, side));
  if (!need.isForOperation || entries.length === 0) return entries;
  const keys = ['', need.ownerId, operationKey(need, side)];
  return entries.filter((entry) => keys.includes(entry.suffix));
}
