/**
 * What the signatures of a child add up to. The signatures of one occurrence stand together; of each part the last
 * entry counts, an amendment before what it amends. An occurrence is done when every part is signed.
 */
import type { Evidence } from '@weftway/contract/pathway';
import type { MilestoneRule } from '@weftway/pathway/protocol';
import type { SignatureRow, WaiverRow } from './pathway-store.ts';
import { ruleIdOf } from './whole-protocol.ts';

export interface SignedOccurrence {
  readonly milestone: string;
  readonly occurrence: number;
  /** Every entry, oldest first. */
  readonly entries: readonly SignatureRow[];
  /** The entry that counts for each part. */
  readonly standing: readonly SignatureRow[];
  readonly isComplete: boolean;
  /** Half signed and then waived: its signatures stand, the next occurrence begins afresh. */
  readonly isWaived: boolean;
}

const parsed = new WeakMap<object, Evidence>();

/** The evidence of a stored entry, parsed once a row: facts, findings and roots all read it. */
export const evidenceOf = (row: { readonly evidence: string }): Evidence => {
  const known = parsed.get(row);
  if (known !== undefined) return known;
  const evidence = JSON.parse(row.evidence) as Evidence; // written from the contract's schema
  parsed.set(row, evidence);
  return evidence;
};

/** Values that are there, by field name. */
export const plainValues = (evidence: Evidence): Record<string, string> => {
  const values: Record<string, string> = {};
  for (const [name, { value }] of Object.entries(evidence)) if (value !== null && value !== '') values[name] = value;
  return values;
};

const standingOf = (entries: readonly SignatureRow[]): SignatureRow[] => {
  const byPart = new Map<string, SignatureRow>();
  for (const row of entries) byPart.set(row.part, row);
  return [...byPart.values()];
};

export const signedOccurrences = (
  { signatures, waivers }: { readonly signatures: readonly SignatureRow[]; readonly waivers: readonly WaiverRow[] },
  rules: ReadonlyMap<string, MilestoneRule>,
): SignedOccurrence[] => {
  const groups = new Map<string, SignatureRow[]>();
  for (const row of signatures) {
    const key = `${row.milestone}#${row.occurrence}`;
    const group = groups.get(key);
    if (group === undefined) groups.set(key, [row]);
    else group.push(row);
  }
  return [...groups.values()].flatMap((entries) => {
    const [first] = entries;
    if (first === undefined) return [];
    const standing = standingOf(entries);
    const needed =
      rules.get(ruleIdOf(first.milestone))?.signatures.map(({ part }) => part) ?? standing.map(({ part }) => part);
    const isComplete = needed.every((part) => standing.some((entry) => entry.part === part));
    const { milestone, occurrence } = first;
    const isWaived =
      !isComplete && waivers.some((waiver) => waiver.milestone === milestone && waiver.occurrence === occurrence);
    return [{ milestone, occurrence, entries, standing, isComplete, isWaived }];
  });
};

/** The occurrence of which some part is signed and another is not, if there is one. */
export const halfSigned = (occurrences: readonly SignedOccurrence[], key: string): SignedOccurrence | null =>
  occurrences.find((one) => one.milestone === key && !one.isComplete && !one.isWaived) ?? null;
