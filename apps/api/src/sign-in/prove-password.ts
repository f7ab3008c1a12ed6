/** A signed-in person proves who they are once more before they sign. */
import type { Actor } from '../http/endpoint.ts';
import { refused } from '../http/outcome.ts';
import type { Refused } from '../http/outcome.ts';
import type { Services } from '../http/services.ts';
import { findPasswordHash } from './credential-store.ts';
import { forgetAttempts, mayTry, proofKey } from './guessing.ts';
import { matchesHash, matchesNobody } from './password-hash.ts';

/** Null when the password is the actor's; else how to refuse, pointing at the field of the body that held it. */
export const isPasswordOf = async (
  { db, now }: Services,
  actor: Actor,
  password: string,
  pointer = '/password',
): Promise<Refused | null> => {
  const key = proofKey(actor.id);
  if (!(await mayTry(db, key, now())))
    return refused('too-many', { detail: 'Too many wrong passwords. Wait a little, then try again.' });
  const stored = await findPasswordHash(db, actor.id);
  const isRight = stored === null ? await matchesNobody(password) : await matchesHash(stored, password);
  if (!isRight) return refused('wrong-password', { errors: [{ pointer, detail: 'That is not your password.' }] });
  await forgetAttempts(db, key);
  return null;
};
