/**
 * Proves a chain line by line. Pure: the lines come in order from whoever reads them, so that any length needs the same
 * memory. The first thing that does not fit ends the proof.
 */
import { canonicalText, digestOf, firstHash, hashOf } from './trail-chain.ts';
import type { ChainedLine } from './trail-chain.ts';

/** The first line that does not fit, and what about it does not fit. */
export interface Break {
  readonly seq: number;
  readonly kind: string;
  readonly why: string;
}

/** Where a proof has come to. */
export interface Head {
  readonly seq: number;
  readonly hash: string;
}

export const beginning: Head = { seq: 0, hash: firstHash };

export interface StoredLine {
  readonly line: ChainedLine;
  readonly previousHash: string;
  readonly hash: string;
  /** The texts whose digests the line carries; null when the payload is gone. */
  readonly before: string | null;
  readonly after: string | null;
}

export const isBreak = (result: Head | Break): result is Break => 'why' in result;

/** The chain may neither skip a number nor repeat one. */
const gapAt = (head: Head, seq: number, kind: string): Break | null => {
  const expected = head.seq + 1;
  if (seq === expected) return null;
  return seq > expected
    ? { seq: expected, kind: 'missing', why: `Line ${expected} is missing; the next one is line ${seq}.` }
    : { seq, kind, why: `Line ${seq} stands where line ${expected} belongs.` };
};

const payloadFault = ({ line, before, after }: StoredLine): string | null => {
  if (before === null || after === null) return `What line ${line.seq} says was changed is missing.`;
  if (digestOf(before) !== line.beforeDigest)
    return `What stood before line ${line.seq} was altered: its digest does not fit.`;
  return digestOf(after) === line.afterDigest
    ? null
    : `What line ${line.seq} wrote was altered: its digest does not fit.`;
};

/** One line of the trail of changes after `head`; answers the new head or the break. */
export const nextLine = (head: Head, stored: StoredLine): Head | Break => {
  const { line, previousHash, hash } = stored;
  const gap = gapAt(head, line.seq, line.kind);
  if (gap !== null) return gap;
  const broken = (why: string): Break => ({ seq: line.seq, kind: line.kind, why });
  if (previousHash !== head.hash) return broken(`Line ${line.seq} does not join the line before it.`);
  if (hashOf(previousHash, line) !== hash)
    return broken(`Line ${line.seq} itself was altered: its own hash does not fit.`);
  const fault = payloadFault(stored);
  return fault === null ? { seq: line.seq, hash } : broken(fault);
};

/** One line of the log of reads; its text is the line without its hash. */
export const nextRead = (
  head: Head,
  { hash, ...read }: { readonly seq: number; readonly operation: string; readonly hash: string },
): Head | Break => {
  const gap = gapAt(head, read.seq, read.operation);
  if (gap !== null) return gap;
  if (digestOf(head.hash + canonicalText(read)) === hash) return { seq: read.seq, hash };
  return {
    seq: read.seq,
    kind: read.operation,
    why: `Line ${read.seq} of the log of reads was altered, or does not join the line before it.`,
  };
};
