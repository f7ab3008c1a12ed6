/** What a seeded signature covers, as canonical text, and its digest. */
import type { Signature } from '@weftway/contract/pathway';
import { canonicalText, digestOf } from '../trail/trail-chain.ts';

export const signedContentOf = (
  childId: string,
  signature: Omit<Signature, 'digest'>,
): { readonly signedText: string; readonly digest: string } => {
  const signedText = canonicalText({ childId, ...signature });
  return { signedText, digest: digestOf(signedText) };
};
