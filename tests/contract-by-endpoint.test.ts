/** What the contract says of each operation holds where it is served: shape, refusals, versions, answers. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { apiPrefix } from '@weftway/contract/operation';
import { operations } from '@weftway/contract/operations';
import type { Operation } from '@weftway/contract/operation';
import { problemSchema, problems } from '@weftway/contract/problems';
import supertest from 'supertest';
import { endpoints, missingOperations } from '../apps/api/src/endpoints.ts';
import { addChild, pointersOf, problemOf, write } from '../apps/api/src/testing/pathway-builders.ts';
import { createTestApp, openBrowser } from '../apps/api/src/testing/test-app.ts';
import type { TestApp, TestBrowser } from '../apps/api/src/testing/test-app.ts';

const bodyFieldsOf = (operation: Operation): readonly string[] =>
  Object.keys((operation.body as unknown as { shape?: object }).shape ?? {}); // strict objects have a shape
const isChange = (operation: Operation): boolean => operation.method !== 'GET';
const served = endpoints.map((endpoint) => [endpoint.operation.name, endpoint] as const);

describe('the list of operations', () => {
  it('is served whole, each once, under its own method and path', () => {
    expect(missingOperations()).toEqual([]);
    const names = endpoints.map(({ operation }) => operation.name);
    expect(new Set(names).size).toBe(names.length);
    const routes = endpoints.map(({ operation }) => `${operation.method} ${operation.path.replace(/:\w+/g, ':')}`);
    expect(new Set(routes).size).toBe(routes.length);
    expect(operations.every((operation) => names.includes(operation.name))).toBe(true);
  });

  it.each(served)('%s declares the refusals that it can give', (_name, endpoint) => {
    const { operation, can, confirmsPassword, version } = endpoint;
    const declared = operation.problems;
    if (can !== 'anyone') expect(declared).toContain('not-signed-in');
    if (typeof can === 'object') expect(declared).toContain('not-allowed');
    if (isChange(operation)) expect(declared).toContain('forged-request');
    if (operation.ifMatch === 'required')
      expect(declared).toEqual(expect.arrayContaining(['changed-meanwhile', 'version-needed']));
    if (confirmsPassword === true) {
      expect(declared).toEqual(expect.arrayContaining(['wrong-password', 'too-many']));
      expect(bodyFieldsOf(operation)).toContain('password');
    }
    if (operation.isRepeatable) expect(operation.method).toBe('POST');
    if (version !== undefined) expect([200, 201]).toContain(operation.status);
    expect(new Set(declared).size).toBe(declared.length);
  });

  it.each(
    served.filter(([, { operation }]) =>
      /\/milestones\/:milestone\/(sign-off|amendments|waiver|confirmation)$/.test(operation.path),
    ),
  )('%s asks for the password again', (_name, endpoint) => {
    expect(endpoint.confirmsPassword).toBe(true);
  });
});

const samples: Readonly<Record<string, string>> = { milestone: 'SURG-01', memberId: 'nurse', version: '1' };

describe('every operation', () => {
  let test: TestApp;
  let childId: string;
  let coordinator: TestBrowser;
  let administrator: TestBrowser;
  let surgeon: TestBrowser;
  beforeAll(async () => {
    test = await createTestApp();
    childId = await addChild(test, { bornOn: '2026-03-01', referredOn: null });
    await write(test, [{ kind: 'trainees-assigned', childId, after: { memberIds: ['trainee'] } }]);
    [coordinator, administrator, surgeon] = [
      await test.as('coordinator'),
      await test.as('administrator'),
      await test.as('surgeon'),
    ];
  }, 30_000);
  afterAll(() => test.close());
  const pathOf = (operation: Operation): string =>
    operation.path.replace(/:(\w+)/g, (_all, name: string) =>
      name === 'childId' ? childId : (samples[name] ?? 'none-of-these'),
    );

  const send = async (
    browser: TestBrowser,
    operation: Operation,
    body: object,
    headers: Readonly<Record<string, string>> = {},
  ) => {
    const method = operation.method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete'; // the five methods of the contract
    const request =
      method === 'get'
        ? browser.get(pathOf(operation))
        : method === 'delete'
          ? browser.delete(pathOf(operation))
          : browser[method](pathOf(operation), body);
    for (const [name, value] of Object.entries(headers)) request.set(name, value);
    return request;
  };
  /** Somebody whom the table lets through this route. */
  const through = async (operation: Operation, body: object, headers: Readonly<Record<string, string>> = {}) => {
    for (const browser of [surgeon, coordinator, administrator]) {
      const answer = await send(browser, operation, body, headers);
      if (answer.status !== 403 && answer.status !== 401) return answer;
    }
    throw new Error(`Nobody gets through to ${operation.name}`);
  };
  const leavesSession = (operation: Operation): boolean => operation.name === 'signOut' || operation.name === 'signIn';

  it.each(served.filter(([, { operation }]) => operation.method === 'GET'))(
    '%s answers what the contract says, or a problem that it declares',
    async (_name, { operation, version }) => {
      const answer = await through(operation, {});
      if (answer.status >= 400) {
        const problem = problemSchema.parse(answer.body);
        expect(answer.headers['content-type']).toContain('application/problem+json');
        expect(operation.problems.map((one) => `/problems/${one}`)).toContain(problem.type);
        return;
      }
      expect(answer.status).toBe(operation.status);
      const read = operation.answer.safeParse(answer.body);
      expect(read.success ? [] : read.error.issues).toEqual([]);
      if (version !== undefined) expect(answer.headers['etag']).toMatch(/^"\d+"$/);
    },
  );

  it.each(served.filter(([, { operation }]) => isChange(operation) && !leavesSession(operation)))(
    '%s points at a field that it does not know',
    async (_name, { operation }) => {
      if (operation.method === 'DELETE') return;
      const answer = await through(
        operation,
        { juggling: true },
        operation.ifMatch === 'required' ? { 'if-match': '"1"' } : {},
      );
      expect(problemOf(answer)).toBe('/problems/bad-input');
      expect(pointersOf(answer)).toContain('/juggling');
    },
  );

  it.each(served.filter(([, { operation }]) => isChange(operation)))(
    '%s refuses a call without the token of the session, or from elsewhere',
    async (_name, { operation }) => {
      const agent = supertest.agent(test.app);
      const method = operation.method.toLowerCase() as 'post' | 'put' | 'patch' | 'delete'; // changes only
      const bare = await agent[method](apiPrefix + pathOf(operation)).send({});
      expect(problemOf(bare)).toBe('/problems/forged-request');
      const foreign = await openBrowser(test.app, null);
      const answer = await send(foreign, operation, {}, { origin: 'https://elsewhere.example' });
      expect(problemOf(answer)).toBe('/problems/forged-request');
    },
  );

  it.each(served.filter(([, { operation }]) => operation.path.includes(':childId')))(
    '%s does not find a child that is not there, nor an id that is none',
    async (_name, { operation }) => {
      if (operation.method !== 'GET') return;
      for (const id of ['no-such-child', 'not%20an%20id'])
        expect((await surgeon.get(pathOf(operation).replace(childId, id))).status).toBe(404);
    },
  );

  it('that two people can edit asks for the version, and refuses one that cannot be read', async () => {
    const url = `/children/${childId}/milestones/SURG-01/draft`;
    const body = { part: 'milestone', values: {}, performedOn: null, isReady: false };
    expect(problemOf(await surgeon.put(url, body))).toBe('/problems/version-needed');
    for (const tag of ['0', 'W/"0"', '"a"', '*'])
      expect(problemOf(await surgeon.put(url, body).set('if-match', tag))).toBe('/problems/bad-input');
    expect((await surgeon.put(url, body).set('if-match', '"0"')).status).toBe(200);
  });

  it('that can be repeated keeps its answer for a day, for its own caller and its own content', async () => {
    const url = `/children/${childId}/findings`;
    const body = { name: 'vpi_suspected', on: '2026-11-30', isPresent: true, note: '' };
    const key = 'once-and-once-only';
    const first = await surgeon.post(url, body).set('idempotency-key', key);
    expect(first.status).toBe(200);
    expect((await surgeon.post(url, body).set('idempotency-key', key)).body).toEqual(first.body);
    expect(problemOf(await surgeon.post(url, { ...body, note: 'More' }).set('idempotency-key', key))).toBe(
      '/problems/same-key-other-body',
    );
    expect(problems['same-key-other-body'].status).toBe(422);
    expect(
      (await (await test.as('speech-therapist')).post(url, { ...body, note: 'Mine' }).set('idempotency-key', key))
        .status,
    ).toBe(200);
    expect(problemOf(await surgeon.post(url, body).set('idempotency-key', 'short'))).toBe('/problems/bad-input');
    test.setNow('2026-12-02T10:00:00.000Z');
    const nextDay = await test.as('surgeon');
    expect((await nextDay.post(url, { ...body, note: 'A day later' }).set('idempotency-key', key)).status).toBe(200);
    test.setNow('2026-12-01T09:00:00.000Z');
  });
});
