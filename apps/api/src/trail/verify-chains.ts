/**
 * Proves the whole trail: chain, gaps, order, digests of what stood before and after, signatures, the log of reads,
 * anchors. Reads in pages; needs the same memory for any length.
 */
import { anchorFault, readAnchors } from './trail-anchors.ts';
import { beginning, isBreak, nextLine, nextRead } from './verify-lines.ts';
import type { Break, Head } from './verify-lines.ts';
import { signatureFault, signaturesOf, signedKinds } from './verify-signatures.ts';
import { countSignatures, hashOfLine, linesAfter, signatureWithoutLine } from './verify-view.ts';
import type { AskRows } from './verify-view.ts';
import type { StoredAccessLine } from './access-log.ts';

/** Lines that are proved in one go before others get their turn. */
const pageSize = 250;

export interface Proof {
  /** Lines that were proved. */
  readonly lines: number;
  readonly broken: Break | null;
}

/** What a proof of the log of reads needs of it. */
export interface ReadsSource {
  readonly after: (seq: number, limit: number) => readonly StoredAccessLine[];
  readonly hashOf: (seq: number) => string | null;
}

/** `null` as file: no anchors are kept. */
export interface Anchors {
  readonly file: string | null;
}

interface Walk {
  readonly head: Head;
  readonly signatures: number;
  readonly broken: Break | null;
}

const provePage = async (ask: AskRows, from: Walk): Promise<Walk & { readonly isEnd: boolean }> => {
  let { head, signatures } = from;
  const page = await linesAfter(ask, head.seq, pageSize);
  const kept = await signaturesOf(ask, page);
  for (const stored of page) {
    const next = nextLine(head, stored);
    if (isBreak(next)) return { head, signatures, broken: next, isEnd: true };
    if (signedKinds.includes(stored.line.kind)) {
      signatures += 1;
      const why = signatureFault(stored, kept);
      if (why !== null)
        return { head, signatures, broken: { seq: next.seq, kind: stored.line.kind, why }, isEnd: true };
    }
    head = next;
  }
  return { head, signatures, broken: null, isEnd: page.length < pageSize };
};

const changesAnchorBreak = async (ask: AskRows, file: string | null): Promise<Break | null> => {
  if (file === null) return null;
  for await (const anchor of readAnchors(file)) {
    if (anchor === null)
      return { seq: 0, kind: 'anchor', why: 'The file of anchors cannot be read: a line in it was altered.' };
    const why = anchorFault(anchor.changes, anchor.at, await hashOfLine(ask, anchor.changes.seq));
    if (why !== null) return { seq: anchor.changes.seq, kind: 'anchor', why };
  }
  return null;
};

const strayBreak = async (ask: AskRows, signedLines: number): Promise<Break | null> => {
  if ((await countSignatures(ask)) === signedLines) return null;
  const id = await signatureWithoutLine(ask);
  return {
    seq: 0,
    kind: 'signature',
    why:
      id === null
        ? 'There are more lines that signed than signatures.'
        : `No line of the trail wrote the signature ${id}.`,
  };
};

/** Proves the trail of changes. */
export const proveChanges = async (ask: AskRows, { file }: Anchors): Promise<Proof> => {
  let walk: Walk & { readonly isEnd: boolean } = { head: beginning, signatures: 0, broken: null, isEnd: false };
  while (!walk.isEnd) {
    walk = await provePage(ask, walk);
    // A long proof lets the requests of others through between its pages.
    await new Promise((resolve) => setImmediate(resolve));
  }
  const broken = walk.broken ?? (await changesAnchorBreak(ask, file)) ?? (await strayBreak(ask, walk.signatures));
  return { lines: walk.head.seq, broken };
};

const readsAnchorBreak = async (reads: ReadsSource, file: string | null): Promise<Break | null> => {
  if (file === null) return null;
  for await (const anchor of readAnchors(file)) {
    if (anchor === null) continue; // said by the proof of changes
    const why = anchorFault(anchor.reads, anchor.at, reads.hashOf(anchor.reads.seq));
    if (why !== null) return { seq: anchor.reads.seq, kind: 'anchor', why };
  }
  return null;
};

/** Proves the log of reads. */
export const proveReads = async (reads: ReadsSource, { file }: Anchors): Promise<Proof> => {
  let head = beginning;
  for (;;) {
    const page = reads.after(head.seq, pageSize);
    for (const line of page) {
      const next = nextRead(head, line);
      if (isBreak(next)) return { lines: head.seq, broken: next };
      head = next;
    }
    if (page.length < pageSize) return { lines: head.seq, broken: await readsAnchorBreak(reads, file) };
    await new Promise((resolve) => setImmediate(resolve));
  }
};
