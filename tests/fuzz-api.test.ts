/**
 * Wild input to every operation: never a surprise, always a problem document of the list, nothing written on a refusal,
 * nothing told of the inside. Bounded here; FUZZ_RUNS and FUZZ_SEED make it longer or other.
 */
import fc from 'fast-check';
import supertest from 'supertest';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { z } from 'zod';
import { apiPrefix } from '@weftway/contract/operation';
import type { Operation } from '@weftway/contract/operation';
import { operations } from '@weftway/contract/operations';
import { problems } from '@weftway/contract/problems';
import { endpoints } from '../apps/api/src/endpoints.ts';
import { addChild, write } from '../apps/api/src/testing/pathway-builders.ts';
import { createTestApp, openBrowser } from '../apps/api/src/testing/test-app.ts';
import type { TestApp, TestBrowser, TestPerson } from '../apps/api/src/testing/test-app.ts';

const runs = Number(process.env['FUZZ_RUNS'] ?? 8);
const seed = Number(process.env['FUZZ_SEED'] ?? 20261201);

type Schema = Readonly<Record<string, unknown>>;

const nasty = fc.constantFrom(
  "' OR 1=1--",
  '"; drop table children; --',
  '<img src=x onerror=alert(1)>',
  '{{7*7}}',
  '=1+1',
  'a\r\nBcc: x@example.org',
  '\u0000',
  '\u202eright',
  '\ud800',
  '..%2f..%2f',
  '/etc/passwd',
  'a'.repeat(5000),
  '',
  ' ',
  '1e309',
  'null',
  '__proto__',
  'constructor',
  '💙'.repeat(40),
);
const anything = fc.jsonValue({ maxDepth: 3 });

const schemasIn = (value: unknown): Schema[] => (Array.isArray(value) ? (value as Schema[]) : []);

const textOf = (schema: Schema): fc.Arbitrary<unknown> => {
  if (schema['format'] === 'date')
    return fc.oneof(
      fc.constantFrom('2026-11-30', '2026-12-01', '2027-02-01', '2026-02-30', '0000-00-00', '9999-12-31'),
      nasty,
    );
  if (schema['format'] === 'email')
    return fc.oneof(fc.constantFrom('a@tern-estuary.example', 'x@y', '@', `${'a'.repeat(260)}@example.org`), nasty);
  return fc.oneof(
    fc.string({ maxLength: 40 }),
    fc.constantFrom(
      'milestone',
      'SURG-01',
      'nurse',
      'Because it is so',
      'TE-7001',
      'Tern Quay',
      'a sentence that is long enough to be a password',
    ),
    nasty,
  );
};

const objectOf = (schema: Schema, depth: number): fc.Arbitrary<unknown> => {
  const properties = (schema['properties'] ?? {}) as Record<string, Schema>; // JSON Schema
  const known = fc.record(
    Object.fromEntries(Object.entries(properties).map(([name, value]) => [name, valueOf(value, depth + 1)])),
  );
  const missing = fc.record(
    Object.fromEntries(Object.entries(properties).map(([name, value]) => [name, valueOf(value, depth + 1)])),
    { requiredKeys: [] },
  );
  const extra = fc
    .tuple(known, fc.dictionary(fc.string({ maxLength: 8 }), anything, { maxKeys: 2 }))
    .map(([object, more]) => ({ ...object, ...more }));
  return fc.oneof({ weight: 6, arbitrary: known }, { weight: 2, arbitrary: missing }, { weight: 1, arbitrary: extra });
};

/** Values that fit a schema nearly always, and sometimes not at all. */
const valueOf = (schema: Schema, depth = 0): fc.Arbitrary<unknown> => {
  const wild = (fitting: fc.Arbitrary<unknown>) =>
    fc.oneof({ weight: 12, arbitrary: fitting }, { weight: 1, arbitrary: anything });
  if (depth > 6) return anything;
  const choices = [...schemasIn(schema['anyOf']), ...schemasIn(schema['oneOf'])];
  if (choices.length > 0) return wild(fc.oneof(...choices.map((one) => valueOf(one, depth + 1))));
  if (Array.isArray(schema['enum'])) return wild(fc.constantFrom(...(schema['enum'] as unknown[])));
  if ('const' in schema) return wild(fc.constant(schema['const']));
  switch (schema['type']) {
    case 'object':
      return wild(objectOf(schema, depth));
    case 'array':
      return wild(fc.array(valueOf((schema['items'] ?? {}) as Schema, depth + 1), { maxLength: 3 }));
    case 'string':
      return wild(textOf(schema));
    case 'integer':
    case 'number':
      return wild(
        fc.oneof(fc.integer({ min: 0, max: 60 }), fc.constantFrom(-1, 0.5, 1e308, Number.MAX_SAFE_INTEGER, 2 ** 53)),
      );
    case 'boolean':
      return wild(fc.boolean());
    case 'null':
      return wild(fc.constant(null));
    default:
      return anything;
  }
};

const jsonSchema = (schema: z.ZodType): Schema =>
  z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any' }) as Schema; // plain JSON

let app: TestApp;
let childId: string;
const browsers = new Map<TestPerson, TestBrowser>();
const people = ['coordinator', 'surgeon', 'administrator', 'nurse'] as const satisfies readonly TestPerson[];

beforeAll(async () => {
  app = await createTestApp();
  childId = await addChild(app);
  await write(app, [
    { kind: 'milestone-claimed', childId, milestone: 'TEAM-04', after: { part: 'milestone', memberId: 'surgeon' } },
  ]);
  for (const person of people) browsers.set(person, await app.as(person));
});
afterAll(async () => app.close());

/** Tables that a refused call may still write to: counters of wrong passwords, the session itself, mail of a reset, and in the trail the refused sign-in alone. */
const free: readonly string[] = [
  'sign_in_failures',
  'sessions',
  'outbox',
  'idempotency_keys',
  'trail_payloads',
  'trail_lines',
];
let counted: string | null = null;

/** Rows of every table, as one text to compare. */
const stateOf = async (): Promise<string> => {
  if (counted === null) {
    const tables: { name: string }[] = await app.db.raw(
      `select name from sqlite_master where type = 'table' and name not like 'sqlite_%' and name not like 'knex_%'`,
    );
    counted = tables
      .filter(({ name }) => !free.includes(name))
      .map(({ name }) => `select '${name}' as name, count(*) as rows from ${name}`)
      .join(' union all ');
  }
  const rows: unknown = await app.db.raw(
    `${counted} union all select 'trail', count(*) from trail_lines where kind <> 'sign-in-refused' union all select 'versions', sum(version + pathway_version) from children`,
  );
  return JSON.stringify(rows);
};

const leaks =
  /sqlite|knex|node_modules|better-sqlite|\.ts:\d|\bat (?:async )?\w+ \(|select .+ from |insert into|\/apps\/api|zod/i;

const general: readonly string[] = [
  'bad-input',
  'too-large',
  'wrong-type',
  'forged-request',
  'not-found',
  'not-allowed',
  'not-signed-in',
  'too-many',
  'same-key-other-body',
];

interface Sent {
  readonly operation: Operation;
  readonly body: unknown;
  readonly url: string;
}

/** How often each status came, so that a fuzz that only ever meets the door is noticed. */
const tally = new Map<number, number>();

/** The oracle: what may be said of any answer. */
const judge = (sent: Sent, answer: supertest.Response): void => {
  tally.set(answer.status, (tally.get(answer.status) ?? 0) + 1);
  const told = `${sent.operation.method} ${sent.url} ${JSON.stringify(sent.body)?.slice(0, 600) ?? ''} → ${String(answer.status)} ${answer.text?.slice(0, 400) ?? ''}`;
  expect(answer.status, told).toBeLessThan(500);
  if (answer.status < 300) {
    const read = sent.operation.answer.safeParse(answer.body);
    expect(read.success ? [] : read.error.issues, told).toEqual([]);
    return;
  }
  if (answer.status === 304) return;
  expect(answer.headers['content-type'], told).toMatch(/^application\/problem\+json/);
  const { type, status, title, instance } = answer.body as Record<string, unknown>; // judged field by field
  const name = String(type).replace('/problems/', '');
  expect(Object.keys(problems), told).toContain(name);
  expect([...sent.operation.problems, ...general], told).toContain(name);
  expect({ status, title }, told).toEqual({
    status: answer.status,
    title: problems[name as keyof typeof problems].title,
  });
  expect(instance, told).toMatch(/^\/requests\//);
  // What was typed may come back; the inside of the service may not.
  const { errors: _errors, ...rest } = answer.body as { errors?: unknown };
  expect(JSON.stringify(rest), told).not.toMatch(leaks);
};

const paramsOf = (operation: Operation, pick: number): string =>
  operation.path.replace(/:(\w+)/g, (_whole, name: string) => {
    const right: Readonly<Record<string, string>> = {
      childId,
      milestone: pick % 3 === 0 ? 'TEAM-04' : 'TEAM-02',
      memberId: 'nurse',
      version: '1',
    };
    const odd = ['nobody', '%2e%2e%2f', "'%20or%201=1", '%00', '9'.repeat(80), 'SURG-03:X'];
    return pick % 4 === 3 ? (odd[pick % odd.length] ?? 'nobody') : (right[name] ?? 'nobody');
  });

const queryText = (value: unknown): string => {
  if (typeof value !== 'object' || value === null) return '';
  const text = Object.entries(value)
    .map(
      ([name, one]) =>
        `${encodeURIComponent(name.replace(/[\ud800-\udfff]/g, ''))}=${encodeURIComponent(String(typeof one === 'object' ? JSON.stringify(one) : one).replace(/[\ud800-\udfff]/g, ''))}`,
    )
    .join('&');
  return text === '' ? '' : `?${text}`;
};

/** These end the session of the person who calls them; they get a session of their own. */
const ending: readonly string[] = ['signOut', 'endMySession', 'changePassword', 'memberLeaves', 'editMember'];

describe('F15: wild bodies', () => {
  test.each(operations.map((operation) => [operation.name, operation] as const))(
    '%s answers each with an answer or a problem',
    async (name, operation) => {
      const isRead = operation.method === 'GET';
      const inputs = fc.sample(
        fc.tuple(
          isRead ? fc.constant(undefined) : valueOf(jsonSchema(operation.body)),
          valueOf(jsonSchema(operation.query)),
          fc.nat({ max: 999 }),
        ),
        { numRuns: runs, seed },
      );
      const can = endpoints.find((endpoint) => endpoint.operation.name === name)?.can;
      for (const [body, query, pick] of inputs) {
        const person =
          typeof can === 'object' && can.action === 'activate'
            ? 'administrator'
            : (people[pick % people.length] ?? 'coordinator');
        const browser = ending.includes(name) ? await app.as(person) : browsers.get(person);
        if (browser === undefined) throw new Error('nobody is signed in');
        const url = paramsOf(operation, pick) + queryText(query);
        const before = await stateOf();
        const method = operation.method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete'; // the methods of the contract
        const sent = body === undefined || typeof body !== 'object' || body === null ? {} : body;
        let request = method === 'get' || method === 'delete' ? browser[method](url) : browser[method](url, sent);
        if (operation.ifMatch === 'required') request = request.set('if-match', pick % 2 === 0 ? '"1"' : 'W/"x"');
        const answer = await request;
        judge({ operation, body: sent, url }, answer);
        if (answer.status >= 400) expect(await stateOf(), `${name} ${url} ${JSON.stringify(sent)}`).toBe(before);
      }
    },
  );
});

test('the wild bodies got past the door: some were done, many were bad input', () => {
  const times = (from: number, to: number) =>
    [...tally].filter(([status]) => status >= from && status < to).reduce((sum, [, count]) => sum + count, 0);
  expect(times(200, 300), JSON.stringify([...tally])).toBeGreaterThan(10);
  expect(times(400, 401), JSON.stringify([...tally])).toBeGreaterThan(100);
});

describe('bodies that are no body', () => {
  const path = `${apiPrefix}/protocol-checks`;
  let agent: ReturnType<typeof supertest.agent>;
  let token: string;
  beforeAll(async () => {
    agent = supertest.agent(app.app);
    const first = await agent.get(`${apiPrefix}/session`);
    const signedIn = await agent
      .post(`${apiPrefix}/session`)
      .set('x-csrf-token', String(first.body.csrfToken))
      .send({ email: 'surgeon@tern-estuary.example', password: 'a tide of small boats' });
    token = String(signedIn.body.csrfToken);
  });

  const send = (body: string | Buffer, type = 'application/json', url = path) => {
    const request = agent.post(url).set('x-csrf-token', token).set('content-type', type);
    // The client would write a buffer out as JSON otherwise.
    return request.serialize((raw: unknown) => raw as string).send(body as string); // passed through as it is
  };
  const problemOf = (answer: supertest.Response): [number, string] => {
    expect(answer.headers['content-type']).toMatch(/^application\/problem\+json/);
    expect(answer.text).not.toMatch(leaks);
    return [answer.status, String(answer.body.type)];
  };

  test.each(['{', '{"protocol":', '[1,', 'undefined', "{'a':1}", '{"protocol": 01}', '\u0000'])(
    'F13: malformed JSON %j is bad input',
    async (body) => {
      expect(problemOf(await send(body))).toEqual([400, '/problems/bad-input']);
    },
  );

  test('F13: ten thousand levels are refused before anything walks them', async () => {
    const deep = (open: string, close: string, inner = '') =>
      `{"protocol":${open.repeat(10_000)}${inner}${close.repeat(10_000)}}`;
    expect(problemOf(await send(deep('[', ']')))).toEqual([413, '/problems/too-large']);
    expect(problemOf(await send(deep('{"a":', '}', '1')))).toEqual([413, '/problems/too-large']);
  });

  test('F13: ten megabytes are too large, and so are too many parts', async () => {
    expect(problemOf(await send(`{"protocol":"${'x'.repeat(10 * 1024 * 1024)}"}`))).toEqual([
      413,
      '/problems/too-large',
    ]);
    expect(problemOf(await send(JSON.stringify({ protocol: Array.from({ length: 200_000 }, () => 1) })))).toEqual([
      413,
      '/problems/too-large',
    ]);
    expect(
      problemOf(
        await send(`{"email":"${'x'.repeat(300 * 1024)}","password":"x"}`, 'application/json', `${apiPrefix}/session`),
      ),
    ).toEqual([413, '/problems/too-large']);
  });

  test('X08: __proto__ and constructor are unknown fields and change nothing', async () => {
    for (const body of [
      '{"__proto__":{"isAdmin":true},"protocol":1}',
      '{"constructor":{"prototype":{"isAdmin":true}},"protocol":1}',
    ]) {
      const answer = await send(body);
      expect(answer.status).toBeLessThan(500);
      expect(({} as { isAdmin?: boolean }).isAdmin).toBeUndefined();
    }
    const inside = await send('{"protocol":{"__proto__":{"name":"A"},"milestones":[{"__proto__":{"id":"SURG-01"}}]}}');
    expect(inside.status).toBe(200);
    expect((inside.body as { faults: unknown[] }).faults.length).toBeGreaterThan(0);
    expect(({} as { name?: string }).name).toBeUndefined();
  });

  test('X12: a query key that is repeated is bad input', async () => {
    const coordinator = await openBrowser(app.app, 'coordinator@tern-estuary.example');
    expect(problemOf(await coordinator.get('/trail?limit=1&limit=2'))).toEqual([400, '/problems/bad-input']);
    expect(problemOf(await coordinator.get('/trail?child[]=a'))).toEqual([400, '/problems/bad-input']);
    expect(problemOf(await coordinator.get('/trail?sort=password'))).toEqual([400, '/problems/bad-input']);
  });

  test('X16: a key that stands twice counts once, the last', async () => {
    const answer = await send('{"protocol":1,"protocol":{"name":"A"}}');
    expect(answer.status).toBe(200);
    expect(JSON.stringify(answer.body)).toContain('/milestones');
  });

  test('X16: another encoding, a lone surrogate and a number without end are met calmly', async () => {
    const utf16 = Buffer.from('\ufeff{"protocol":1}', 'utf16le');
    expect([400, 415]).toContain((await send(utf16, 'application/json; charset=utf-7')).status);
    expect((await send(utf16)).status).toBe(400);
    expect((await send('\ufeff{"protocol":1}')).status).toBeLessThan(500);
    expect((await send('{"protocol":"\\ud800"}')).status).toBe(200);
    const endless = await send('{"protocol":{"version":1e309}}');
    expect(endless.status).toBe(200);
    expect(JSON.stringify(endless.body)).toContain('/version');
  });

  test.each(['text/plain', 'application/x-www-form-urlencoded', 'multipart/form-data; boundary=x', 'application/xml'])(
    'a body of type %s is not read',
    async (type) => {
      expect(problemOf(await send('{"protocol":1}', type))).toEqual([415, '/problems/wrong-type']);
    },
  );

  test('the service still answers after all of this', async () => {
    expect((await agent.get(`${apiPrefix}/session`)).body.me.id).toBe('surgeon');
  });
});
