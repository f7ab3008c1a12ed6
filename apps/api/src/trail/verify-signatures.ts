/** Holds each signature against the line that wrote it: same words, same digest, right place in the child's chain. */
import type { Signature } from '@weftway/contract/pathway';
import { canonicalText, digestOf } from './trail-chain.ts';
import { signaturesById } from './verify-view.ts';
import type { AskRows, StoredSignature } from './verify-view.ts';
import type { StoredLine } from './verify-lines.ts';

export const signedKinds: readonly string[] = ['milestone-signed', 'signature-amended'];

interface SignedPayload {
  readonly signature: Signature;
  readonly previousDigest: string;
  readonly signedText?: string;
}

const payloadOf = ({ after }: StoredLine): SignedPayload | null => JSON.parse(after ?? 'null') as SignedPayload | null; // what a line that signs writes

/** Id of the signature that a line wrote; null when the line wrote none, or nothing that can be read. */
const signatureIdOf = (stored: StoredLine): string | null => {
  if (!signedKinds.includes(stored.line.kind)) return null;
  try {
    return payloadOf(stored)?.signature.id ?? null;
  } catch {
    // An altered payload is named by its digest, a moment later.
    return null;
  }
};

/** The signatures that a page of lines speaks of. */
export const signaturesOf = async (
  ask: AskRows,
  page: readonly StoredLine[],
): Promise<ReadonlyMap<string, StoredSignature>> =>
  signaturesById(
    ask,
    page.flatMap((stored) => signatureIdOf(stored) ?? []),
  );

/** What does not fit between a line that signed and the signature that is kept, or null. */
export const signatureFault = (stored: StoredLine, signatures: ReadonlyMap<string, StoredSignature>): string | null => {
  const { seq } = stored.line;
  const payload = payloadOf(stored); // its digest was proved just before
  const kept = payload === null ? undefined : signatures.get(payload.signature.id);
  if (payload === null || kept === undefined) return `The signature that line ${seq} speaks of is missing.`;
  if (canonicalText(kept.signature) !== canonicalText(payload.signature))
    return `The signature that line ${seq} wrote was altered.`;
  if ((kept.signedText ?? null) !== (payload.signedText ?? null))
    return `The words that were signed in line ${seq} were altered.`;
  if (kept.signedText !== null && digestOf(kept.signedText) !== kept.signature.digest)
    return `The digest signed in line ${seq} does not fit the words that were signed.`;
  if (kept.previousDigest !== payload.previousDigest)
    return `The signature of line ${seq} was cut from the one before it.`;
  if (kept.digestBefore !== null && kept.digestBefore !== payload.previousDigest)
    return `The signature of line ${seq} does not follow the child's signature before it.`;
  return null;
};
