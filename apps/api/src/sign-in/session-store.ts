/**
 * Sessions in SQLite through the Knex store, with two guards: an error never escapes as an unhandled rejection (the
 * library throws inside a promise that nobody awaits), and a session is touched at most once a minute.
 * The store keeps only a digest of the session id, so a copy of the database gives no usable cookie.
 */
import { createHash } from 'node:crypto';
import { ConnectSessionKnexStore } from 'connect-session-knex';
import type { Knex } from 'knex';

type Base = InstanceType<typeof ConnectSessionKnexStore>;

const touchEveryMs = 60_000;

export const storedIdOf = (sessionId: string): string => createHash('sha256').update(sessionId).digest('hex');

export class SessionStore extends ConnectSessionKnexStore {
  readonly #touched = new Map<string, number>();

  constructor(db: Knex, cleanupInterval: number) {
    super({ knex: db, tableName: 'sessions', createTable: false, cleanupInterval });
  }

  override get(...[id, callback]: Parameters<Base['get']>) {
    return super.get(storedIdOf(id), callback).catch(() => null);
  }

  override set(...[id, session, callback]: Parameters<Base['set']>) {
    return super.set(storedIdOf(id), session, callback).catch(() => undefined);
  }

  override destroy(...[id, callback]: Parameters<Base['destroy']>) {
    this.#touched.delete(id);
    return super.destroy(storedIdOf(id), callback).catch(() => 0);
  }

  override async touch(...[id, session, callback]: Parameters<Base['touch']>) {
    const last = this.#touched.get(id) ?? 0;
    if (Date.now() - last < touchEveryMs) {
      callback?.();
      return;
    }
    this.#touched.set(id, Date.now());
    if (this.#touched.size > 10_000) this.#touched.clear();
    try {
      await super.touch(storedIdOf(id), session, callback);
    } catch {
      callback?.();
    }
  }
}
