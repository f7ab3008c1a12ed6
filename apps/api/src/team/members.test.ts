import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Member } from '@weftway/contract/member';
import { createTestApp, openBrowser } from '../testing/test-app.ts';
import type { TestApp } from '../testing/test-app.ts';
import { hold, registerChild } from '../testing/held-work.ts';
import { lettersTo, tokenTo } from '../testing/letters.ts';

let test: TestApp;
beforeAll(async () => {
  test = await createTestApp();
  await registerChild(test, 'child-1', 'TE-0001');
  await hold(test, 'child-1', 'surgeon-2', 'SURG-01', 'milestone');
  await hold(test, 'child-1', 'surgeon-2', 'SURG-03', 'milestone');
});
afterAll(() => test.close());

const email = (name: string): string => `${name}@tern-estuary.example`;
const pell = {
  name: 'Ann Pell',
  email: email('ann.pell'),
  standing: 'member',
  disciplines: ['nurse'],
  supervisorId: null,
};
const invite = async (fields: object) => (await test.as('administrator')).post('/members', { ...pell, ...fields });
const memberOf = async (id: string): Promise<Member> => {
  const { members } = (await (await test.as('auditor')).get('/members')).body as { members: Member[] };
  const found = members.find((one) => one.id === id);
  if (found === undefined) throw new Error(`No member ${id}`);
  return found;
};
const fieldsOf = ({ name, email: address, standing, disciplines, supervisorId }: Member) => ({
  name,
  email: address,
  standing,
  disciplines,
  supervisorId,
});
const edit = async (id: string, change: object) => {
  const member = await memberOf(id);
  const browser = await test.as('administrator');
  return browser.patch(`/members/${id}`, { ...fieldsOf(member), ...change }).set('if-match', `"${member.version}"`);
};

describe('the list of members', () => {
  it('shows everyone with the open work that they hold', async () => {
    expect((await memberOf('surgeon-2')).openClaims).toBe(2);
    expect((await memberOf('surgeon')).openClaims).toBe(0);
  });

  it('is not for somebody who is not signed in', async () => {
    expect((await (await openBrowser(test.app, null)).get('/members')).status).toBe(401);
  });
});

describe('inviting', () => {
  it('sends one letter without a word about care; joining by it and signing in works', async () => {
    const answer = await invite({});
    expect(answer.status).toBe(201);
    expect(answer.body).toMatchObject({ status: 'invited', version: 1, openClaims: 0 });
    const [letter] = await lettersTo(test, pell.email);
    expect(letter?.subject).toBe('You are invited to Weftway');
    const token = await tokenTo(test, pell.email);
    const browser = await openBrowser(test.app, null);
    expect((await browser.post('/invitation-views', { token })).body).toEqual({
      name: 'Ann Pell',
      email: pell.email,
      team: 'Tern Estuary Cleft Team',
      invitedBy: 'Test administrator',
    });
    expect((await browser.post('/invitation-views', { token })).status).toBe(200);
    expect(
      (await browser.post('/invitation-acceptances', { token, password: 'Ann Pell Ann Pell' })).body.errors[0].pointer,
    ).toBe('/password');
    expect(
      (await browser.post('/invitation-acceptances', { token, password: 'seven herons wait by the lock' })).status,
    ).toBe(200);
    expect(
      (await browser.post('/invitation-acceptances', { token, password: 'seven herons wait by the lock' })).body.type,
    ).toBe('/problems/link-not-valid');
    await openBrowser(test.app, pell.email, 'seven herons wait by the lock');
    const lines = await test.db('trail_lines').where({ member_id: answer.body.id }).orderBy('seq').select('kind');
    expect(lines.map(({ kind }) => kind)).toEqual(['member-invited', 'member-joined', 'password-set', 'signed-in']);
  });

  it('the address of somebody who has left is free, and belongs to whoever has it now', async () => {
    const first = (await invite({ email: email('comes.back') })).body as Member;
    const administrator = await test.as('administrator');
    expect((await administrator.post(`/members/${first.id}/leaving`, { items: [], reason: 'Went' })).status).toBe(200);
    const second = await invite({ email: email('comes.back') });
    expect(second.status).toBe(201);
    expect(second.body.id).not.toBe(first.id);
    const token = await tokenTo(test, email('comes.back'));
    const password = 'seven herons wait by the lock';
    expect(
      (await (await openBrowser(test.app, null)).post('/invitation-acceptances', { token, password })).status,
    ).toBe(200);
    const back = await openBrowser(test.app, email('comes.back'), password);
    expect((await back.get('/session')).body.me.id).toBe(second.body.id);
    expect((await invite({ email: email('comes.back') })).status).toBe(409);
  });

  it('the link runs out after seven days', async () => {
    await invite({ email: email('late.comer') });
    const token = await tokenTo(test, email('late.comer'));
    test.setNow('2026-12-08T09:00:01.000Z');
    const browser = await openBrowser(test.app, null);
    expect((await browser.post('/invitation-views', { token })).body.type).toBe('/problems/link-not-valid');
    test.setNow('2026-12-01T09:00:00.000Z');
  });

  it('again: the old link stops, the new one works, the trail says so', async () => {
    const { id } = (await invite({ email: email('again') })).body as Member;
    const first = await tokenTo(test, email('again'));
    test.setNow('2026-12-01T09:00:01.000Z');
    expect((await (await test.as('administrator')).post(`/members/${id}/invitation`)).status).toBe(200);
    const second = await tokenTo(test, email('again'));
    const browser = await openBrowser(test.app, null);
    expect((await browser.post('/invitation-views', { token: first })).status).toBe(410);
    expect((await browser.post('/invitation-views', { token: second })).status).toBe(200);
    expect(
      await test.db('trail_lines').where({ member_id: id, kind: 'member-invited-again' }).first('actor_id'),
    ).toEqual({ actor_id: 'administrator' });
    test.setNow('2026-12-01T09:00:00.000Z');
  });

  it('again of somebody who has joined is refused', async () => {
    const answer = await (await test.as('administrator')).post('/members/nurse/invitation');
    expect(answer.body).toMatchObject({ type: '/problems/already-done', detail: 'Test nurse has joined already.' });
  });

  it('a member id that nobody has is not found', async () => {
    expect((await (await test.as('administrator')).post('/members/nobody/invitation')).status).toBe(404);
  });

  it.each([
    ['an address that is none', { email: 'ann at home' }, '/email'],
    ['no name', { name: ' ' }, '/name'],
    ['a member without a discipline', { disciplines: [] }, '/disciplines'],
    ['an administrator with one', { standing: 'administrator' }, '/disciplines'],
    ['a trainee without a supervisor', { standing: 'trainee' }, '/supervisorId'],
    ['a trainee under another discipline', { standing: 'trainee', supervisorId: 'surgeon' }, '/supervisorId'],
    [
      'a trainee under a trainee',
      { standing: 'trainee', disciplines: ['surgeon'], supervisorId: 'trainee' },
      '/supervisorId',
    ],
    ['a member with a supervisor', { supervisorId: 'nurse' }, '/supervisorId'],
  ])('%s is pointed at', async (_what, fields, pointer) => {
    const answer = await invite({ email: email('new.person'), ...fields });
    expect(answer.status).toBe(400);
    expect(answer.body.errors[0].pointer).toBe(pointer);
  });

  it('an address that somebody has is refused at the field', async () => {
    const answer = await invite({ email: email('nurse').toUpperCase() });
    expect(answer.body).toMatchObject({
      type: '/problems/duplicate-record',
      errors: [{ pointer: '/email', detail: 'This is the address of Test nurse.' }],
    });
  });

  it('repeated with the same key invites once', async () => {
    const browser = await test.as('administrator');
    const body = { ...pell, email: email('twice') };
    const [first, second] = [
      await browser.post('/members', body).set('idempotency-key', 'invite-twice'),
      await browser.post('/members', body).set('idempotency-key', 'invite-twice'),
    ];
    expect(second.body.id).toBe(first.body.id);
    expect(await lettersTo(test, email('twice'))).toHaveLength(1);
  });

  it.each(['coordinator', 'surgeon', 'trainee', 'auditor'] as const)('is not for a %s', async (person) => {
    expect((await (await test.as(person)).post('/members', pell)).body.type).toBe('/problems/not-allowed');
  });
});

describe('changing a member', () => {
  it('keeps what was typed and writes before and after into the trail', async () => {
    const answer = await edit('orthodontist', {
      name: 'Ines Calder',
      disciplines: ['orthodontist', 'molding-dentist'],
    });
    expect(answer.status).toBe(200);
    expect(answer.headers['etag']).toBe(`"${answer.body.version}"`);
    const line = await test
      .db('trail_lines')
      .join('trail_payloads', 'trail_payloads.seq', 'trail_lines.seq')
      .where({ member_id: 'orthodontist', kind: 'member-edited' })
      .first('before', 'after');
    expect(JSON.parse(line.before).fields.name).toBe('Test orthodontist');
    expect(JSON.parse(line.after).fields.disciplines).toEqual(['orthodontist', 'molding-dentist']);
  });

  it('asks for the version that was read, and shows what stands there when it is old', async () => {
    const member = await memberOf('nurse-2');
    const browser = await test.as('administrator');
    const body = { ...fieldsOf(member), name: 'Somebody Else' };
    expect((await browser.patch('/members/nurse-2', body)).status).toBe(428);
    const stale = await browser.patch('/members/nurse-2', body).set('if-match', `"${member.version - 1}"`);
    expect(stale.status).toBe(412);
    expect(stale.body.current).toMatchObject({ id: 'nurse-2', version: member.version, name: 'Test nurse-2' });
  });

  it('a supervisor cannot change lanes while a trainee counts on them', async () => {
    expect((await edit('surgeon', { disciplines: ['nurse'] })).body.errors).toEqual([
      { pointer: '/disciplines', detail: 'First give another supervisor to: Test trainee.' },
    ]);
  });

  it('nobody loses a discipline that their open work needs', async () => {
    const answer = await edit('surgeon-2', { disciplines: ['audiologist'] });
    expect(answer.body.errors[0]).toMatchObject({
      pointer: '/disciplines',
      detail: expect.stringContaining('holds 2 open milestones'),
    });
  });

  it('the last administrator stays one', async () => {
    expect((await edit('administrator', { standing: 'auditor' })).body.errors[0].pointer).toBe('/standing');
  });

  it('a new standing ends the sessions of the member; a new address is told to the old one', async () => {
    const browser = await test.as('dentist-2');
    await edit('dentist-2', { email: email('new.address') });
    expect((await browser.get('/my-sessions')).status).toBe(401);
    expect((await lettersTo(test, email('dentist-2')))[0]?.subject).toBe('Your Weftway address was changed');
  });

  it('of nobody is not found, by a colleague is not allowed', async () => {
    const body = { ...pell };
    expect((await (await test.as('administrator')).patch('/members/nobody', body).set('if-match', '"1"')).status).toBe(
      404,
    );
    expect((await (await test.as('coordinator')).patch('/members/nurse', body).set('if-match', '"1"')).status).toBe(
      403,
    );
  });
});

describe('cover', () => {
  const cover = { byId: 'nurse-2', from: '2026-12-01', until: '2026-12-12' };

  it('is set by the coordinator and by oneself, and written in the trail', async () => {
    const answer = await (await test.as('coordinator')).put('/members/nurse/cover', { cover });
    expect(answer.body.cover).toEqual(cover);
    expect((await (await test.as('nurse')).put('/members/nurse/cover', { cover: null })).body.cover).toBeNull();
    expect(await test.db('trail_lines').where({ member_id: 'nurse', kind: 'cover-set' }).count({ total: '*' })).toEqual(
      [{ total: 2 }],
    );
  });

  it('of a colleague is for the coordinator', async () => {
    expect((await (await test.as('audiologist')).put('/members/nurse/cover', { cover })).status).toBe(403);
  });

  it.each([
    ['oneself', { byId: 'nurse' }, '/cover/byId'],
    ['a trainee', { byId: 'trainee' }, '/cover/byId'],
    ['the end before the start', { until: '2026-11-30' }, '/cover/until'],
    ['a time that is over', { from: '2026-11-01', until: '2026-11-20' }, '/cover/until'],
  ])('%s is pointed at', async (_what, change, pointer) => {
    const answer = await (await test.as('coordinator')).put('/members/nurse/cover', { cover: { ...cover, ...change } });
    expect(answer.body.errors[0].pointer).toBe(pointer);
  });
});
