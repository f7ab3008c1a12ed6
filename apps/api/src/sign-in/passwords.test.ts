import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestApp, openBrowser, testPassword } from '../testing/test-app.ts';
import type { TestApp } from '../testing/test-app.ts';
import { lettersTo, tokenTo } from '../testing/letters.ts';

let test: TestApp;
beforeAll(async () => {
  test = await createTestApp();
});
afterAll(() => test.close());

const email = (person: string): string => `${person}@tern-estuary.example`;
const fresh = 'seven herons wait by the lock';
const canSignIn = async (person: string, password: string): Promise<boolean> =>
  openBrowser(test.app, email(person), password).then(
    () => true,
    () => false,
  );

const askReset = async (address: string) =>
  (await openBrowser(test.app, null)).post('/password-reset-requests', { email: address });
const reset = async (token: string, password: string) =>
  (await openBrowser(test.app, null)).post('/password-resets', { token, password });
const trailOf = (memberId: string) =>
  test
    .db('trail_lines')
    .where({ member_id: memberId })
    .whereIn('kind', ['password-set', 'password-changed', 'signed-out'])
    .orderBy('seq')
    .select('kind', 'actor_name');

describe('a forgotten password', () => {
  it('answers and works the same whether or not the account exists', async () => {
    const before = await test.db('outbox').count({ total: '*' }).first();
    const [known, unknown] = [await askReset(email('surgeon')), await askReset('nobody@elsewhere.example')];
    expect([known.status, unknown.status]).toEqual([202, 202]);
    expect(known.text).toBe(unknown.text);
    expect((await test.db('outbox').count({ total: '*' }).first())?.['total']).toBe(Number(before?.['total']) + 2);
    expect(await lettersTo(test, 'nobody@elsewhere.example')).toEqual([]);
    expect((await lettersTo(test, email('surgeon')))[0]?.subject).toBe('Set a new Weftway password');
  });

  it('is set anew by the mailed link, once; every session ends', async () => {
    const browser = await test.as('nurse');
    await askReset(email('nurse'));
    const token = await tokenTo(test, email('nurse'));
    expect((await reset(token, fresh)).status).toBe(200);
    expect((await browser.get('/my-sessions')).status).toBe(401);
    expect(await canSignIn('nurse', fresh)).toBe(true);
    expect(await trailOf('nurse')).toEqual(
      expect.arrayContaining([
        { kind: 'password-set', actor_name: 'Nobody signed in' },
        { kind: 'signed-out', actor_name: 'Nobody signed in' },
      ]),
    );
    expect((await reset(token, 'another long sentence of words')).body.type).toBe('/problems/link-not-valid');
  });

  it('keeps only a digest of the link, and wipes the letter once it is sent', async () => {
    await askReset(email('ent'));
    const token = await tokenTo(test, email('ent'));
    const stored = JSON.stringify([await test.db('mailed_links').select('*'), await test.db('outbox').select('*')]);
    expect(stored).not.toContain(token);
    expect(Buffer.from(token, 'base64url')).toHaveLength(32);
  });

  it('the link runs out after thirty minutes', async () => {
    await askReset(email('ent-2'));
    const token = await tokenTo(test, email('ent-2'));
    test.setNow('2026-12-01T09:30:01.000Z');
    expect((await reset(token, fresh)).body.type).toBe('/problems/link-not-valid');
    test.setNow('2026-12-01T09:00:00.000Z');
  });

  it('two who use one link at once: one gets through', async () => {
    await askReset(email('dentist-2'));
    const token = await tokenTo(test, email('dentist-2'));
    const answers = await Promise.all([reset(token, fresh), reset(token, fresh)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 410]);
  });

  it('A09 a stopped owner gets in by reset; nobody can keep her out', async () => {
    const key = `account:${email('dentist')}`;
    await test
      .db('sign_in_failures')
      .insert({ account_key: key, failures: 150, wait_until: null, changed_at: '2026-12-01T08:00:00.000Z' });
    expect(await canSignIn('dentist', testPassword)).toBe(false);
    await askReset(email('dentist'));
    expect((await reset(await tokenTo(test, email('dentist')), fresh)).status).toBe(200);
    expect(await canSignIn('dentist', fresh)).toBe(true);
  });

  it('sends no more than three letters that could still be opened', async () => {
    for (let index = 0; index < 6; index += 1) await askReset(email('audiologist'));
    expect(await lettersTo(test, email('audiologist'))).toHaveLength(3);
  });

  it('a link in a letter starts with our own address, whatever host the asker named', async () => {
    const browser = await openBrowser(test.app, null);
    await browser.post('/password-reset-requests', { email: email('geneticist') }).set('host', 'evil.example');
    expect((await lettersTo(test, email('geneticist')))[0]?.body).toContain('http://127.0.0.1:4310/new-password#');
  });

  it.each([
    ['A10 a season and a year', 'Summer2026!!!!!'],
    ['A10 the team and a year', 'Tern Estuary 2026'],
    ['A10 fifteen times a', 'a'.repeat(15)],
    ['A10 the own name twice', 'Test prosthodontistTest prosthodontist'],
  ])('%s is refused at the field; the link stays good', async (_what, password) => {
    const before = await lettersTo(test, email('prosthodontist'));
    if (before.length === 0) await askReset(email('prosthodontist'));
    const answer = await reset(await tokenTo(test, email('prosthodontist')), password);
    expect(answer.status).toBe(400);
    expect(answer.body.errors).toEqual([{ pointer: '/password', detail: expect.stringMatching(/^This (is|repeats)/) }]);
  });

  it('a password is 15 to 128 characters, an emoji being one', async () => {
    await askReset(email('anaesthetist'));
    const token = await tokenTo(test, email('anaesthetist'));
    expect((await reset(token, 'fourteen chars')).body.errors[0].pointer).toBe('/password');
    expect((await reset(token, `${'seven herons wait '.repeat(7)}🦊🦊🦊`)).body.errors[0].detail).toBe(
      'Use at most 128 characters.',
    );
  });

  it('A11 a 128-character passphrase with blanks and emoji works; its first 127 characters do not', async () => {
    await askReset(email('orthodontist'));
    const phrase = [...`🦊 ${'herons wait by the lock and the tide turns '.repeat(4)}`].slice(0, 127).join('') + '🐢';
    expect([...phrase]).toHaveLength(128);
    expect((await reset(await tokenTo(test, email('orthodontist')), phrase)).status).toBe(200);
    expect(await canSignIn('orthodontist', [...phrase].slice(0, 127).join(''))).toBe(false);
    expect(await canSignIn('orthodontist', phrase)).toBe(true);
  });
});

describe('changing my password', () => {
  it('A05 ends my other sessions and keeps this one, under a new id', async () => {
    const [here, there] = [await test.as('paediatrician'), await test.as('paediatrician')];
    const before = (await here.get('/my-sessions')).body.sessions.find((one: { isThis: boolean }) => one.isThis).id;
    expect((await here.put('/my-password', { current: testPassword, next: fresh })).status).toBe(200);
    expect((await there.get('/my-sessions')).status).toBe(401);
    const after = (await here.get('/my-sessions')).body.sessions;
    expect(after).toHaveLength(1);
    expect(after[0].id).not.toBe(before);
    expect(await canSignIn('paediatrician', fresh)).toBe(true);
    expect((await lettersTo(test, email('paediatrician')))[0]?.subject).toBe('Your Weftway password was changed');
    expect(await trailOf('paediatrician')).toEqual(
      expect.arrayContaining([
        { kind: 'password-changed', actor_name: 'Test paediatrician' },
        { kind: 'signed-out', actor_name: 'Test paediatrician' },
      ]),
    );
  });

  it('asks for the present one and points at it', async () => {
    const browser = await test.as('coordinator');
    const answer = await browser.put('/my-password', { current: 'not my password at all', next: fresh });
    expect(answer.status).toBe(403);
    expect(answer.body.errors).toEqual([{ pointer: '/current', detail: 'That is not your password.' }]);
  });

  it('refuses the same one again', async () => {
    const browser = await test.as('coordinator');
    const answer = await browser.put('/my-password', { current: testPassword, next: testPassword });
    expect(answer.body.errors).toEqual([{ pointer: '/next', detail: 'This is the password you have now.' }]);
  });

  it('needs somebody signed in', async () => {
    const browser = await openBrowser(test.app, null);
    expect((await browser.put('/my-password', { current: 'x', next: fresh })).status).toBe(401);
  });
});

describe('my sessions', () => {
  it('are listed and can be ended one by one', async () => {
    const [here, there] = [await test.as('psychologist'), await test.as('psychologist')];
    const list = (await here.get('/my-sessions')).body.sessions as { id: string; isThis: boolean }[];
    expect(list.map(({ isThis }) => isThis).sort()).toEqual([false, true]);
    const other = list.find(({ isThis }) => !isThis)?.id ?? '';
    expect((await here.delete(`/my-sessions/${other}`)).status).toBe(200);
    expect((await there.get('/my-sessions')).status).toBe(401);
    expect((await here.get('/my-sessions')).body.sessions).toHaveLength(1);
  });

  it("somebody else's session is not found", async () => {
    const [mine, theirs] = [await test.as('surgeon-2'), await test.as('nurse-2')];
    const id = (await theirs.get('/my-sessions')).body.sessions[0].id as string;
    expect((await mine.delete(`/my-sessions/${id}`)).status).toBe(404);
    expect((await theirs.get('/my-sessions')).status).toBe(200);
  });
});

describe('the local inbox', () => {
  it('is read by anybody in demo mode', async () => {
    await askReset(email('surgeon-2'));
    const answer = await (await openBrowser(test.app, null)).get('/local-inbox');
    expect(answer.body.mails[0]).toMatchObject({ to: email('surgeon-2'), subject: 'Set a new Weftway password' });
  });
});
