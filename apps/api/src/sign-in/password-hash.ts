/**
 * Password hashing: argon2id, 19 MiB, two passes, one lane (an equal-cost setting of the OWASP password storage sheet).
 * At most two at once; a longer queue than the limit is refused rather than letting memory grow.
 */
import { hash, verify } from '@node-rs/argon2';
import { limits } from '../limits.ts';

const settings = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

let running = 0;
const waiting: (() => void)[] = [];

export class HashingBusy extends Error {
  /** Read by the error door. */
  readonly code = 'HASHING_BUSY';
}

const inTurn = async <T>(work: () => Promise<T>): Promise<T> => {
  if (running >= limits.hashing.atOnce) {
    if (waiting.length >= limits.hashing.queue) throw new HashingBusy('Too many passwords at once');
    await new Promise<void>((resolve) => waiting.push(resolve));
  }
  running += 1;
  try {
    return await work();
  } finally {
    running -= 1;
    waiting.shift()?.();
  }
};

/** Exactly as typed but for Unicode NFC; never trimmed, never cut. */
const asTyped = (password: string): string => password.normalize('NFC');

export const hashPassword = (password: string): Promise<string> => inTurn(() => hash(asTyped(password), settings));

export const matchesHash = (stored: string, password: string): Promise<boolean> =>
  inTurn(() => verify(stored, asTyped(password)));

let dummy: Promise<string> | null = null;

/** The same work for somebody who does not exist. Always false. */
export const matchesNobody = async (password: string): Promise<false> => {
  await matchesHash(await dummyHash(), password);
  return false;
};

/** Made once, before the first sign-in, so that the first unknown address costs no more than a known one. */
export const dummyHash = (): Promise<string> => {
  dummy ??= hashPassword('nobody has this passphrase');
  return dummy;
};
