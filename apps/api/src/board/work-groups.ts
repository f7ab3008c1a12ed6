/** Sorts rows into the groups of My work. Pure: everything is read before. */
import type { WorkGroup } from '@weftway/contract/board';
import { placeKey } from './my-work-view.ts';
import type { KeptDraft, WorkRow } from './my-work-view.ts';

export interface WorkEntry {
  readonly row: WorkRow;
  readonly part: string;
  /** Who holds the part. */
  readonly ownerId: string | null;
  readonly note: string;
}

export type WorkEntries = Readonly<Record<WorkGroup, readonly WorkEntry[]>>;

export const ownersOfRow = (row: WorkRow): readonly (readonly [string, string | null])[] =>
  JSON.parse(row.owners) as [string, string | null][]; // written by the projection

const stateOrder = ['late', 'closing', 'open', 'partly-signed', 'waiting', 'held', 'ahead'];

/** Late before closing before open, each by the day on which it closes. */
export const byUrgency = (a: WorkEntry, b: WorkEntry): number => {
  const order = stateOrder.indexOf(a.row.state) - stateOrder.indexOf(b.row.state);
  if (order !== 0) return order;
  const closes = (a.row.latest ?? '9').localeCompare(b.row.latest ?? '9');
  return closes !== 0 ? closes : a.row.family_name.localeCompare(b.row.family_name);
};

export const entryKey = (entry: WorkEntry): string =>
  `${placeKey(entry.row.child_id, entry.row.milestone)} ${entry.part}`;

/** Where something that I hold belongs when nothing brought it back to me. */
export const groupOfMine = (
  entry: WorkEntry,
  draft: KeptDraft | undefined,
  isComplete: boolean,
  meId: string,
  maySign: boolean,
): WorkGroup | null => {
  const { state } = entry.row;
  if (state === 'waiting' || state === 'held') return 'waiting';
  if (draft?.is_ready === 1 && draft.by_id === meId && !maySign) return 'drafted';
  if (state === 'partly-signed' || draft?.is_ready === 1 || isComplete) return maySign ? 'toSign' : 'doNow';
  return state === 'ahead' ? null : 'doNow';
};

/** Each thing once, in the first group that names it; each group by urgency. */
export const withoutRepeats = (
  groups: readonly (readonly [WorkGroup, readonly WorkEntry[]])[],
): Map<WorkGroup, WorkEntry[]> => {
  const seen = new Set<string>();
  const kept = new Map<WorkGroup, WorkEntry[]>();
  for (const [group, entries] of groups) {
    const fresh = entries.filter((entry) => !seen.has(entryKey(entry)));
    const unique = [...new Map(fresh.map((entry) => [entryKey(entry), entry])).values()];
    for (const entry of unique) seen.add(entryKey(entry));
    kept.set(group, unique.sort(byUrgency));
  }
  return kept;
};
