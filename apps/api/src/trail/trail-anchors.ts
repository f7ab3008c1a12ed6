/**
 * Where the chains stood, written every hour and at the stop to a file of its own. A chain that was cut at its end
 * still holds in itself; only a note kept elsewhere can tell that lines are gone. Best kept on another disk.
 */
import fs from 'node:fs';
import { createInterface } from 'node:readline';
import { z } from 'zod';
import type { Head } from './verify-lines.ts';

const headSchema = z.object({ seq: z.int(), hash: z.string() });
const anchorSchema = z.object({ at: z.string(), changes: headSchema, reads: headSchema });
export type Anchor = z.infer<typeof anchorSchema>;

/** Adds one line and waits until it is on the disk. */
export const writeAnchor = (file: string, anchor: Anchor): void => {
  const handle = fs.openSync(file, 'a', 0o600);
  try {
    fs.writeSync(handle, `${JSON.stringify(anchor)}\n`);
    fs.fsyncSync(handle);
  } finally {
    fs.closeSync(handle);
  }
};

/** Null for a line that is no anchor. */
const anchorOf = (line: string): Anchor | null => {
  try {
    return anchorSchema.parse(JSON.parse(line));
  } catch {
    return null;
  }
};

/** One anchor after another, in constant memory; a missing file has none. */
export async function* readAnchors(file: string): AsyncGenerator<Anchor | null> {
  if (!fs.existsSync(file)) return;
  const lines = createInterface({ input: fs.createReadStream(file, 'utf8'), crlfDelay: Infinity });
  for await (const line of lines) if (line.trim() !== '') yield anchorOf(line);
}

/** What an anchor says against a chain, or null when it fits. */
export const anchorFault = (anchored: Head, at: string, hashAt: string | null): string | null => {
  if (anchored.seq === 0) return null;
  if (hashAt === null) return `The anchor of ${at} knows line ${anchored.seq}, which is gone: the end was cut off.`;
  return hashAt === anchored.hash
    ? null
    : `Line ${anchored.seq} is not the one that the anchor of ${at} knows: the chain was made anew.`;
};
