/** The real app on a real, migrated database in memory, with one member of each kind. */
import fs from 'node:fs';
import http from 'node:http';
import os from 'node:os';
import path from 'node:path';
import type { Express } from 'express';
import type { Knex } from 'knex';
import supertest from 'supertest';
import { v7 as newId } from 'uuid';
import { apiPrefix } from '@weftway/contract/operation';
import { defaultProtocol } from '@weftway/pathway/default-protocol';
import type { Protocol } from '@weftway/pathway/protocol';
import { disciplines } from '@weftway/team/disciplines';
import type { Discipline } from '@weftway/team/disciplines';
import { createApp } from '../app.ts';
import { createLiveView } from '../board/live-view.ts';
import { openDatabase } from '../db/connection.ts';
import { readEnv } from '../env.ts';
import { createLog } from '../http/request-log.ts';
import type { Services } from '../http/services.ts';
import { hashPassword } from '../sign-in/password-hash.ts';
import { foundTeam } from '../team/found-team.ts';
import type { FoundedMember } from '../team/found-team.ts';
import { AccessLog } from '../trail/access-log.ts';

export const testPassword = 'a tide of small boats';
export const testToday = '2026-12-01';

let hashed: Promise<string> | null = null;

/** `surgeon`, `surgeon-2` (a second one), `trainee` (of the surgeon), `administrator`, `auditor` ... */
export type TestPerson = Discipline | `${Discipline}-2` | 'trainee' | 'administrator' | 'auditor';

const memberOf = (
  id: string,
  standing: 'member' | 'trainee' | 'administrator' | 'auditor',
  held: readonly Discipline[],
  supervisorId: string | null,
  passwordHash: string,
): FoundedMember => ({
  id,
  passwordHash,
  fields: { name: `Test ${id}`, email: `${id}@tern-estuary.example`, standing, disciplines: [...held], supervisorId },
});

const testMembers = (passwordHash: string): FoundedMember[] => [
  ...disciplines.flatMap((one) => [
    memberOf(one, 'member', [one], null, passwordHash),
    memberOf(`${one}-2`, 'member', [one], null, passwordHash),
  ]),
  memberOf('trainee', 'trainee', ['surgeon'], 'surgeon', passwordHash),
  memberOf('administrator', 'administrator', [], null, passwordHash),
  memberOf('auditor', 'auditor', [], null, passwordHash),
];

export interface TestApp {
  readonly app: Express;
  readonly db: Knex;
  readonly services: Services;
  /** Moves the clock; instants are UTC, the team's zone is UTC too. */
  readonly setNow: (instant: string) => void;
  /** A signed-in browser of this person, with the token of its session. */
  readonly as: (person: TestPerson) => Promise<TestBrowser>;
  readonly close: () => Promise<void>;
}

export interface TestBrowser {
  readonly get: (path: string) => supertest.Test;
  readonly post: (path: string, body?: object) => supertest.Test;
  readonly put: (path: string, body?: object) => supertest.Test;
  readonly patch: (path: string, body?: object) => supertest.Test;
  readonly delete: (path: string) => supertest.Test;
}

const servers = new WeakMap<Express, http.Server>();

/** One listening server for all requests of an app, where supertest would open and close one for each. */
const serverOf = (app: Express): http.Server => {
  const known = servers.get(app);
  if (known !== undefined) return known;
  const server = http.createServer({ keepAliveTimeout: 0 }, app).listen(0);
  server.unref();
  servers.set(app, server);
  return server;
};

export const openBrowser = async (
  app: Express,
  email: string | null,
  password: string = testPassword,
): Promise<TestBrowser> => {
  const agent = supertest.agent(serverOf(app));
  const first = await agent.get(`${apiPrefix}/session`);
  let token = String((first.body as { csrfToken: string }).csrfToken); // contract of readSession
  if (email !== null) {
    const answer = await agent.post(`${apiPrefix}/session`).set('x-csrf-token', token).send({ email, password });
    if (answer.status !== 200) throw new Error(`Sign-in of ${email} answered ${answer.status}`);
    token = String((answer.body as { csrfToken: string }).csrfToken); // contract of signIn
  }
  const change =
    (method: 'post' | 'put' | 'patch' | 'delete') =>
    (url: string, body: object = {}) =>
      agent[method](apiPrefix + url)
        .set('x-csrf-token', token)
        .send(body);
  return {
    get: (url) => agent.get(apiPrefix + url),
    post: change('post'),
    put: change('put'),
    patch: change('patch'),
    delete: change('delete'),
  };
};

export interface TestAppOptions {
  readonly now?: string;
  readonly protocol?: Protocol;
}

export const createTestApp = async (options: TestAppOptions = {}): Promise<TestApp> => {
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'weftway-test-'));
  const env = { ...readEnv({ WEFTWAY_DATA: folder, WEFTWAY_LOG: 'silent' }) };
  const db = openDatabase(':memory:');
  await db.migrate.latest();
  let instant = new Date(options.now ?? `${testToday}T09:00:00.000Z`);
  hashed ??= hashPassword(testPassword);
  const members = testMembers(await hashed);
  await db.transaction((trx) =>
    foundTeam(trx, {
      name: 'Tern Estuary Cleft Team',
      zone: 'UTC',
      sites: ['Tern Quay', 'Saltmarsh'],
      protocol: options.protocol ?? {
        ...defaultProtocol,
        settings: { ...defaultProtocol.settings, offersMolding: true },
      },
      members,
      at: instant.toISOString(),
    }),
  );
  const services: Services = {
    db,
    env,
    log: createLog('silent'),
    accessLog: new AccessLog(':memory:'),
    liveView: createLiveView(),
    now: () => instant,
    today: () => instant.toISOString().slice(0, 10),
    newId: () => newId(),
  };
  const app = createApp(services, {
    sessionSecret: 'a secret that is only good for tests',
    isSecure: false,
    sessionCleanupInterval: 0,
    limitsRate: false,
  });
  return {
    app,
    db,
    services,
    setNow: (text) => {
      instant = new Date(text);
    },
    as: (person) => openBrowser(app, `${person}@tern-estuary.example`),
    close: async () => {
      servers.get(app)?.close();
      services.accessLog.close();
      await db.destroy();
      fs.rmSync(folder, { recursive: true, force: true });
    },
  };
};
