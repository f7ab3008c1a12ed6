import supertest from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { apiPrefix } from '@weftway/contract/operation';
import type { Session } from '@weftway/contract/session';
import { createApp } from '../app.ts';
import { createTestApp, openBrowser, testPassword } from '../testing/test-app.ts';
import type { TestApp } from '../testing/test-app.ts';
import { limits } from '../limits.ts';

let test: TestApp;
beforeAll(async () => {
  test = await createTestApp();
});
afterAll(() => test.close());

const email = (person: string): string => `${person}@tern-estuary.example`;
const url = `${apiPrefix}/session`;

const cookieOf = (answer: supertest.Response): string => String(answer.headers['set-cookie'] ?? '').split(';')[0] ?? '';

/** A bare browser: cookie and token by hand. */
const arrive = async (): Promise<{ cookie: string; token: string }> => {
  const answer = await supertest(test.app).get(url);
  return { cookie: cookieOf(answer), token: (answer.body as Session).csrfToken };
};

const signIn = async (person: string, password: string, from?: { cookie: string; token: string }) => {
  const { cookie, token } = from ?? (await arrive());
  return supertest(test.app)
    .post(url)
    .set('cookie', cookie)
    .set('x-csrf-token', token)
    .send({ email: email(person), password });
};

describe('signing in', () => {
  it('answers who it is, with a fresh token', async () => {
    const before = await arrive();
    const answer = await signIn('surgeon', testPassword, before);
    const session = answer.body as Session;
    expect(answer.status).toBe(200);
    expect(session.me?.name).toBe('Test surgeon');
    expect(session.csrfToken).not.toBe(before.token);
    expect(session.demoAccounts).toEqual([]);
    expect(session.endsAt).toBe('2026-12-01T19:00:00.000Z');
  });

  it('takes the address in any case and with blanks around it', async () => {
    const { cookie, token } = await arrive();
    const answer = await supertest(test.app)
      .post(url)
      .set('cookie', cookie)
      .set('x-csrf-token', token)
      .send({ email: ' NURSE@tern-estuary.example ', password: testPassword });
    expect(answer.status).toBe(200);
  });

  it('points at what was left empty', async () => {
    const browser = await openBrowser(test.app, null);
    const answer = await browser.post('/session', { email: '', password: '' });
    expect(answer.status).toBe(400);
    expect(answer.body.errors).toEqual([
      { pointer: '/email', detail: 'Write your e-mail.' },
      { pointer: '/password', detail: 'Write your password.' },
    ]);
  });

  it('leaves a line when it works, when it is refused and at sign-out; of an unknown address nothing but the try', async () => {
    const lines = async (since: number) =>
      test
        .db('trail_lines')
        .join('trail_payloads', 'trail_payloads.seq', 'trail_lines.seq')
        .where('trail_lines.seq', '>', since)
        .orderBy('trail_lines.seq')
        .select('kind', 'member_id', 'actor_id', 'after');
    const last: { seq: number } | undefined = await test.db('trail_lines').orderBy('seq', 'desc').first('seq');
    await signIn('dentist', 'wrong wrong wrong wrong');
    await signIn('nobody.at.all', testPassword);
    const { cookie } = await arrive();
    const answer = await signIn('dentist', testPassword, { cookie, token: (await arrive()).token });
    expect(answer.status).toBe(403);
    const inside = await openBrowser(test.app, email('dentist'));
    await inside.delete('/session');
    await inside.delete('/session');
    expect(await lines(last?.seq ?? 0)).toEqual([
      { kind: 'sign-in-refused', member_id: 'dentist', actor_id: null, after: '{}' },
      { kind: 'sign-in-refused', member_id: null, actor_id: null, after: '{}' },
      { kind: 'signed-in', member_id: 'dentist', actor_id: 'dentist', after: '{}' },
      {
        kind: 'signed-out',
        member_id: 'dentist',
        actor_id: 'dentist',
        after: '{"because":"signed-out","sessions":1}',
      },
    ]);
    expect(JSON.stringify(await test.db('trail_payloads').select('before', 'after'))).not.toContain('nobody.at.all');
  });

  it('A01 a cookie from before sign-in is dead after it', async () => {
    const before = await arrive();
    await signIn('audiologist', testPassword, before);
    const answer = await supertest(test.app).get(url).set('cookie', before.cookie);
    expect((answer.body as Session).me).toBeNull();
    expect((answer.body as Session).csrfToken).not.toBe(before.token);
  });

  it('A02 a signed-out cookie opens nothing', async () => {
    const answer = await signIn('ent', testPassword);
    const cookie = cookieOf(answer);
    const token = (answer.body as Session).csrfToken;
    const out = await supertest(test.app).delete(url).set('cookie', cookie).set('x-csrf-token', token);
    expect((out.body as Session).me).toBeNull();
    expect((await supertest(test.app).get(`${apiPrefix}/my-sessions`).set('cookie', cookie)).status).toBe(401);
  });

  it('sets a cookie that scripts cannot read and other sites do not send', async () => {
    const answer = await supertest(test.app).get(url);
    expect(String(answer.headers['set-cookie'])).toMatch(/^wid=.+; Path=\/; Expires=.+; HttpOnly; SameSite=Lax$/);
  });

  it('keeps five sessions of a member; the oldest ends', async () => {
    const cookies: string[] = [];
    for (let index = 0; index < 6; index += 1) {
      test.setNow(`2026-12-01T09:0${index}:00.000Z`);
      cookies.push(cookieOf(await signIn('geneticist', testPassword)));
    }
    const answers = await Promise.all(cookies.map((cookie) => supertest(test.app).get(url).set('cookie', cookie)));
    expect(answers.map((answer) => (answer.body as Session).me !== null)).toEqual([
      false,
      true,
      true,
      true,
      true,
      true,
    ]);
    test.setNow('2026-12-01T09:00:00.000Z');
  });

  it('X04 refuses a sign-in without the token of the session, of a foreign page, as a form', async () => {
    const { cookie, token } = await arrive();
    const body = { email: email('surgeon'), password: testPassword };
    const post = () => supertest(test.app).post(url).set('cookie', cookie);
    expect((await post().send(body)).body.type).toBe('/problems/forged-request');
    expect((await post().set('x-csrf-token', token).set('origin', 'https://evil.example').send(body)).body.type).toBe(
      '/problems/forged-request',
    );
    expect((await post().set('x-csrf-token', token).set('sec-fetch-site', 'cross-site').send(body)).body.type).toBe(
      '/problems/forged-request',
    );
    expect((await post().set('x-csrf-token', token).type('form').send('email=a&password=b')).status).toBe(415);
    expect((await post().set('x-csrf-token', token).type('text/plain').send(JSON.stringify(body))).status).toBe(415);
  });

  it('X11 keeps the name of the browser without anything that acts on a terminal', async () => {
    const { cookie, token } = await arrive();
    const answer = await supertest(test.app)
      .post(url)
      .set('cookie', cookie)
      .set('x-csrf-token', token)
      .set('user-agent', 'Browser \u00e9\u0080 1')
      .send({ email: email('orthodontist'), password: testPassword });
    const list = await supertest(test.app).get(`${apiPrefix}/my-sessions`).set('cookie', cookieOf(answer));
    expect(list.body.sessions[0].device).toMatch(/^[\x20-\x7e]+$/);
  });

  it('lists the demo accounts in demo mode only, before sign-in only', async () => {
    const accounts = ((await supertest(test.app).get(url)).body as Session).demoAccounts;
    expect(accounts.find((one) => one.email === email('surgeon'))).toEqual({
      email: email('surgeon'),
      name: 'Test surgeon',
      role: 'Cleft surgeon',
      password: 'a quiet tide at tern estuary',
    });
    const live = createApp(
      { ...test.services, env: { ...test.services.env, isDemo: false } },
      {
        sessionSecret: 'a secret that is only good for tests',
        isSecure: false,
        sessionCleanupInterval: 0,
        limitsRate: false,
      },
    );
    expect(((await supertest(live).get(url)).body as Session).demoAccounts).toEqual([]);
  });
});

describe('guessing', () => {
  it('A06 unknown, wrong, waiting, invited and left answer the same bytes', async () => {
    await test.db('members').where({ id: 'dentist-2' }).update({ status: 'left' });
    for (let index = 0; index < 8; index += 1) await signIn('dentist', 'not the password at all');
    const answers = await Promise.all([
      signIn('nobody-of-this-name', testPassword),
      signIn('prosthodontist', 'not the password at all'),
      signIn('dentist', testPassword),
      signIn('dentist-2', testPassword),
    ]);
    const bodies = answers.map((answer) => JSON.stringify({ ...answer.body, instance: '' }));
    expect(answers.map(({ status }) => status)).toEqual([401, 401, 401, 401]);
    expect(new Set(bodies).size).toBe(1);
    expect(new Set(answers.map((answer) => answer.headers['content-length'])).size).toBe(1);
  });

  it('A06 an unknown address costs about the work of a known one', async () => {
    const spent: Record<'known' | 'unknown', number[]> = { known: [], unknown: [] };
    for (let index = 0; index < 12; index += 1) {
      for (const kind of ['known', 'unknown'] as const) {
        const from = await arrive();
        const started = performance.now();
        await signIn(kind === 'known' ? 'anaesthetist' : `nobody-${index}`, 'not the password at all', from);
        spent[kind].push(performance.now() - started);
      }
    }
    const median = (values: number[]): number => values.sort((a, b) => a - b)[Math.floor(values.length / 2)] ?? 0;
    const ratio = median(spent.known) / median(spent.unknown);
    expect(ratio).toBeGreaterThan(0.5);
    expect(ratio).toBeLessThan(2);
  });

  it('A07 twelve wrong passwords, then the right one during the wait: refused in the same words; after it: in', async () => {
    const texts = new Set<string>();
    for (let index = 0; index < 12; index += 1)
      texts.add((await signIn('psychologist', `wrong ${index} wrong wrong`)).body.detail);
    texts.add((await signIn('psychologist', testPassword)).body.detail);
    expect(texts.size).toBe(1);
    test.setNow('2026-12-01T09:20:00.000Z');
    expect((await signIn('psychologist', testPassword)).status).toBe(200);
    test.setNow('2026-12-01T09:00:00.000Z');
  });

  it('guesses sent side by side all count', async () => {
    await Promise.all(Array.from({ length: 8 }, () => signIn('paediatrician', 'not the password at all')));
    const row = await test
      .db('sign_in_failures')
      .where({ account_key: `account:${email('paediatrician')}` })
      .first('failures');
    expect(row.failures).toBe(8);
  });

  it('A08 one password over many accounts from one address is stopped after thirty a minute', async () => {
    const limited = createApp(test.services, {
      sessionSecret: 'a secret that is only good for tests',
      isSecure: false,
      sessionCleanupInterval: 0,
      limitsRate: true,
    });
    const { cookie, token } = await arrive();
    const statuses: number[] = [];
    for (let index = 0; index < limits.guessesPerAddressPerMinute + 3; index += 1) {
      const answer = await supertest(limited)
        .post(url)
        .set('cookie', cookie)
        .set('x-csrf-token', token)
        .send({ email: email(`person-${index}`), password: '' });
      statuses.push(answer.status);
    }
    expect(statuses.filter((status) => status === 429)).toHaveLength(3);
    expect(statuses.slice(-1)).toEqual([429]);
  });
});

describe('nobody signed in', () => {
  it('A17 three thousand anonymous hits leave no row in the store and no cookie', async () => {
    const before = await test.db('sessions').count({ total: '*' });
    const paths = ['/', '/ready', '/assets/none.js', '/sign-in', `${apiPrefix}/members`, `${apiPrefix}/board`];
    let cookies = 0;
    for (let round = 0; round < 3000 / 60; round += 1) {
      const answers = await Promise.all(
        Array.from({ length: 60 }, (_, index) => supertest(test.app).get(paths[index % paths.length] ?? '/')),
      );
      cookies += answers.filter((answer) => answer.headers['set-cookie'] !== undefined).length;
    }
    expect(cookies).toBe(0);
    expect(await test.db('sessions').count({ total: '*' })).toEqual(before);
  }, 60_000);
});
