/**
 * The chain: each line carries the hash of the line before it, and digests of what stood before and after.
 * hash = SHA-256(previous hash ‖ canonical JSON of the line without its hashes), hexadecimal. Canonical JSON: RFC 8785.
 */
import { createHash } from 'node:crypto';
import canonicalize from 'canonicalize';

export const firstHash = '0'.repeat(64);

export interface ChainedLine {
  readonly seq: number;
  readonly at: string;
  readonly kind: string;
  readonly actorId: string | null;
  readonly actorName: string;
  readonly actorRole: string;
  readonly childId: string | null;
  readonly memberId: string | null;
  readonly milestone: string | null;
  readonly requestId: string;
  readonly beforeDigest: string;
  readonly afterDigest: string;
}

/** RFC 8785 text of a JSON value; absent becomes `null`. */
export const canonicalText = (value: unknown): string => canonicalize(value ?? null) ?? 'null';

export const digestOf = (text: string): string => createHash('sha256').update(text, 'utf8').digest('hex');

export const hashOf = (previousHash: string, line: ChainedLine): string => digestOf(previousHash + canonicalText(line));
