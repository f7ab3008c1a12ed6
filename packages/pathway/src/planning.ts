/**
 * What one act of planning works with: the compiled protocol, one child's facts, and the rows worked out so far.
 */
import type { BaseReading } from './clock-base.ts';
import type { ChildRecord, Dated } from './child-record.ts';
import type { CompiledMilestone, CompiledProtocol } from './compiled-protocol.ts';
import type { Completion, Side } from './pathway-facts.ts';
import type { WindowDraft } from './window-draft.ts';

export interface PlanOptions {
  /** Leave out reasons, earlier occurrences and the projected rhythm (for whole registries). Default: with. */
  readonly reasons?: boolean;
  /** Milestones whose unstated conditions count as given, anatomy and findings apart. */
  readonly given?: ReadonlySet<string>;
  /** A signed screen whose result nobody stated counts as good. Default: it does not. */
  readonly unstatedResultsAreGood?: boolean;
}

/** One row of the plan before it is dressed: dates in days since 1970-01-01. */
export interface Row {
  readonly milestone: CompiledMilestone;
  readonly side: Side | null;
  /** Behind the colon of the key where rows stand for operations; null otherwise. */
  readonly operation: string | null;
  /** Not on the path, and why. */
  offPath: string | null;
  fixed: 'signed_off' | 'waived' | 'awaiting_sign_off' | 'not_started' | null;
  remark: string | null;
  occurrence: number;
  draft: WindowDraft;
  /** A gate that no waiting will open. */
  isGateShut: boolean;
  /** Last day on which every gate with a freshness is still fresh. */
  freshUntil: number;
  heldUntil: number;
  /** Last day before the chance is gone; -1e9 when it never goes. */
  lapseDay: number;
  /** The start has been recorded and ends the lateness. */
  isStarted: boolean;
  /** Completed but taken over unconfirmed. */
  isUnverified: boolean;
  /** Counted from the arrival on the team because the window had passed by then. */
  isCaughtUp: boolean;
  past: readonly PastOccurrence[];
  isRepeating: boolean;
}

export interface PastOccurrence {
  readonly occurrence: number;
  readonly on: number;
  readonly kind: 'signed' | 'waived' | 'missed';
  readonly draft: WindowDraft | null;
}

export interface Planning {
  readonly compiled: CompiledProtocol;
  readonly child: ChildRecord;
  readonly options: PlanOptions;
  /** The bases that most milestones share. */
  readonly birth: BaseReading;
  readonly corrected: BaseReading;
  /** Rows by number of the milestone times three, plus one for right and two for left. */
  readonly rows: (Row | undefined)[];
}

/** A day later than any the planner meets. */
export const farFuture = 1_000_000_000;

const none: readonly never[] = [];

/** Completions of a milestone, oldest first: of one side when it has sides. */
export function completionsOf(planning: Planning, index: number, side: Side | null): readonly Dated<Completion>[] {
  return ofSide(planning.child.done[index] ?? none, side);
}

/** Entries of one side; entries without a side count for both. */
export function ofSide<T extends { readonly suffix: string }>(entries: readonly T[], side: Side | null): readonly T[] {
  if (side === null || entries.length === 0) return entries;
  if (hasOnlySide(entries, side)) return entries;
  return entries.filter((entry) => entry.suffix === '' || entry.suffix === side);
}

function hasOnlySide(entries: readonly { readonly suffix: string }[], side: Side): boolean {
  for (const { suffix } of entries) if (suffix !== '' && suffix !== side) return false;
  return true;
}

/** Entries not later than a day. */
export function until<T extends { readonly on: number }>(entries: readonly T[], day: number): readonly T[] {
  const last = entries[entries.length - 1];
  return last === undefined || last.on <= day ? entries : entries.filter((entry) => entry.on <= day);
}

/** Whether a milestone is done or given up for good on every side that it has. */
export function isDoneOrWaived(planning: Planning, index: number, side: Side | null): boolean {
  const milestone = planning.compiled.milestones[index];
  if (!milestone) return false;
  const sides = milestone.rule.perSide && side === null ? planning.child.gumSides : [side];
  return (
    sides.length > 0 &&
    sides.every(
      (one) =>
        completionsOf(planning, index, one).length > 0 || ofSide(planning.child.waived[index] ?? none, one).length > 0,
    )
  );
}
