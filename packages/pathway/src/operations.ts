/**
 * Checks that belong to single operations: one fitness check for each booked operation, one wound check for each
 * operation done (ruling on one entry per operation).
 * A booking that moves keeps its signed check while that is still fresh on the new day.
 */
import { addSpanToDay } from '@weftway/calendar/span';
import { toEpochDay } from '@weftway/calendar/plain-date';
import { never, type Dated } from './child-record.ts';
import type { CompiledMilestone } from './compiled-protocol.ts';
import { applyArrival } from './late-arrival.ts';
import type { Completion, Side } from './pathway-facts.ts';
import { completionsOf, type Planning, type Row } from './planning.ts';
import { emptyRow } from './plan-row.ts';
import { layWindow } from './window-draft.ts';

const none: readonly never[] = [];

/** One operation of a child: booked, done or both. `key` is empty for a booking that names no operation. */
interface Operation {
  readonly key: string;
  readonly id: string;
  readonly bookedOn: number;
  readonly doneOn: number;
  readonly isUnverified: boolean;
}

/** The rows of a milestone whose clock is a booked or a performed operation. */
export function operationRows(planning: Planning, milestone: CompiledMilestone): Row[] {
  const all = operationsOf(planning);
  const isBefore = milestone.clockFrom === 'operation-booked';
  const rows: Row[] = [];
  for (const operation of all) {
    const row = isBefore ? fitnessRow(planning, milestone, operation) : woundRow(planning, milestone, operation, all);
    if (row !== null) rows.push(row);
  }
  return rows;
}

function operationsOf(planning: Planning): Operation[] {
  const found: Operation[] = [];
  for (const milestone of planning.compiled.milestones) {
    if (!milestone.rule.isOperation) continue;
    const sides: readonly (Side | null)[] = milestone.rule.perSide ? planning.child.gumSides : [null];
    for (const side of sides) {
      const operation = operationOf(planning, milestone, side, sides.length > 1);
      if (operation !== null) found.push(operation);
    }
  }
  const { unnamedBooking } = planning.child;
  if (unnamedBooking !== never && found.every((operation) => operation.doneOn !== unnamedBooking)) {
    found.push({ key: '', id: '', bookedOn: unnamedBooking, doneOn: never, isUnverified: false });
  }
  return found;
}

function operationOf(
  planning: Planning,
  milestone: CompiledMilestone,
  side: Side | null,
  isKeyed: boolean,
): Operation | null {
  const { index, rule } = milestone;
  const done = completionsOf(planning, index, side);
  const last = done[done.length - 1];
  const bookedOn = lastBooking(planning, index, side);
  if (last === undefined && bookedOn === never) return null;
  if (rule.id === 'GROW-04' && last !== undefined && !isOperated(last, bookedOn)) return null;
  if (rule.id === 'EAR-07' && isWithAnother(planning, last?.on ?? bookedOn, index)) return null;
  return {
    key: isKeyed && side !== null ? `${rule.id}:${side}` : rule.id,
    id: rule.id,
    bookedOn,
    doneOn: last?.on ?? never,
    isUnverified: last?.fact.isUnverified === true,
  };
}

function lastBooking(planning: Planning, index: number, side: Side | null): number {
  const bookings = (planning.child.booked[index] ?? none).filter((one) => one.suffix === '' || one.suffix === side);
  return bookings[bookings.length - 1]?.on ?? never;
}

/** The last nose operation is an offer; it counts as an operation when it was booked or its record says so. */
function isOperated(entry: Dated<Completion>, bookedOn: number): boolean {
  return bookedOn !== never || entry.fact.results?.['operated'] === 'yes';
}

/** Tubes placed or planned on the day of another operation have no entry of their own. */
function isWithAnother(planning: Planning, day: number, index: number): boolean {
  return planning.compiled.milestones.some(
    (other) =>
      other.rule.isOperation &&
      other.index !== index &&
      [...(planning.child.done[other.index] ?? none), ...(planning.child.booked[other.index] ?? none)].some(
        (one) => one.on === day,
      ),
  );
}

function fitnessRow(planning: Planning, milestone: CompiledMilestone, operation: Operation): Row | null {
  // One done before a booking still to come was an earlier operation.
  const isAhead = operation.bookedOn > Math.max(operation.doneOn, planning.child.today);
  const isDone = operation.doneOn !== never && !isAhead;
  const day = isDone ? operation.doneOn : operation.bookedOn;
  const signed = checkFor(planning, milestone, operation, (entry) => isFreshOn(planning, entry.on, day));
  if (isDone && signed === null) return null;
  const row = emptyRow(planning, milestone, null, operation.key);
  const base = { day: operation.bookedOn === never ? day : operation.bookedOn, rule: 'base-booking' } as const;
  lay(row, base.day, base.rule, operation);
  finish(planning, row, signed);
  return row;
}

function woundRow(
  planning: Planning,
  milestone: CompiledMilestone,
  operation: Operation,
  all: readonly Operation[],
): Row | null {
  if (operation.doneOn === never) return null;
  const later = all.filter((other) => other.doneOn > operation.doneOn).map((other) => other.doneOn);
  const next = Math.min(...later, Number.MAX_SAFE_INTEGER);
  const signed = checkFor(
    planning,
    milestone,
    operation,
    (entry) => entry.on >= operation.doneOn && (entry.suffix !== '' || entry.on < next),
  );
  const row = emptyRow(planning, milestone, null, operation.key);
  lay(row, operation.doneOn, 'base-event', operation);
  if (signed === null && operation.doneOn < planning.child.teamStart)
    row.offPath = applyArrival(planning, row, row.draft, {
      rhythm: null,
      rowOf: () => null,
      asOf: planning.child.today,
    });
  row.isGateShut = operation.isUnverified;
  finish(planning, row, signed);
  return row;
}

function lay(row: Row, day: number, rule: 'base-booking' | 'base-event', operation: Operation): void {
  const { milestone } = row;
  const details = { event: { name: operation.key, on: day } };
  const [variant] = milestone.variants;
  // The one variant of such a milestone is for the operation on the palate.
  if (operation.id === 'SURG-03' && variant !== undefined) {
    layWindow(row.draft, { day, rule, details }, variant, 'variant-span');
  } else layWindow(row.draft, { day, rule, details }, milestone.plain, 'span');
}

function isFreshOn(planning: Planning, on: number, day: number): boolean {
  return on <= day && addSpanToDay(on, planning.compiled.fitnessFor) >= day;
}

/** The completion that belongs to an operation: named by its key, or plain and fitting in time. */
function checkFor(
  planning: Planning,
  milestone: CompiledMilestone,
  operation: Operation,
  fits: (entry: Dated<Completion>) => boolean,
): Dated<Completion> | null {
  const entries = planning.child.done[milestone.index] ?? none;
  const own = entries.filter((entry) => entry.suffix === '' || entry.suffix === operation.key);
  return own.filter(fits).pop() ?? null;
}

function finish(planning: Planning, row: Row, signed: Dated<Completion> | null): void {
  const { child } = planning;
  const { index } = row.milestone;
  const isOwn = (entry: { readonly suffix: string }): boolean => entry.suffix === '' || entry.suffix === row.operation;
  const waiver = (child.waived[index] ?? none).filter(isOwn).pop();
  if (waiver !== undefined && (signed === null || waiver.on > signed.on)) {
    row.fixed = 'waived';
    row.remark = waiver.fact.reason;
    return;
  }
  if (signed !== null) {
    row.offPath = null;
    row.fixed = 'signed_off';
    return;
  }
  if ((child.parts[index] ?? none).some(isOwn)) row.fixed = 'awaiting_sign_off';
  for (const hold of child.held[index] ?? none) {
    if (isOwn(hold)) row.heldUntil = Math.max(row.heldUntil, toEpochDay(hold.fact.reviewOn));
  }
}
