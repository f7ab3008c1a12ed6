/** Sign-in by e-mail and password, with the same work and the same answer whether or not the account exists. */
import { Strategy } from 'passport-local';
import type { Actor } from '../http/endpoint.ts';
import type { Services } from '../http/services.ts';
import { findCredentialByEmail } from './credential-store.ts';
import { accountKey, asEmail, forgetAttempts, mayTry } from './guessing.ts';
import { dummyHash, matchesHash, matchesNobody } from './password-hash.ts';
import type { Passport } from './session-middleware.ts';
import { findActor } from './session-middleware.ts';

export interface Checked {
  readonly actor: Actor | null;
  /** Whose account was tried; null where nobody has the address. */
  readonly memberId: string | null;
}

const check = async (services: Services, typedEmail: string, password: string): Promise<Checked> => {
  const key = accountKey(typedEmail);
  const isAllowed = await mayTry(services.db, key, services.now());
  const found = await findCredentialByEmail(services.db, asEmail(typedEmail));
  const matches = found === null ? await matchesNobody(password) : await matchesHash(found.passwordHash, password);
  const memberId = found?.memberId ?? null;
  if (!matches || !isAllowed || found === null || found.status !== 'active') return { actor: null, memberId };
  await forgetAttempts(services.db, key);
  return { actor: await findActor(services, found.memberId), memberId };
};

export const useLocalStrategy = (passport: Passport, services: Services): void => {
  void dummyHash();
  passport.use(
    new Strategy({ usernameField: 'email', passwordField: 'password' }, (email, password, callback) => {
      check(services, email, password).then(
        ({ actor, memberId }) => {
          const info = { message: '', memberId };
          callback(null, actor ?? false, info);
        },
        (error: unknown) => callback(error),
      );
    }),
  );
};
