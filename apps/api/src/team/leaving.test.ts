import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { Member } from '@weftway/contract/member';
import { createTestApp, openBrowser } from '../testing/test-app.ts';
import type { TestApp, TestPerson } from '../testing/test-app.ts';
import { childFields } from '../testing/child-fields.ts';
import { hold, registerChild, write as writeEvents } from '../testing/held-work.ts';
import { coveredBy } from './member-view.ts';

let test: TestApp;
beforeEach(async () => {
  test = await createTestApp();
  await registerChild(test, 'child-1', 'TE-0001');
  await hold(test, 'child-1', 'surgeon-2', 'SURG-01', 'milestone');
  await hold(test, 'child-1', 'surgeon-2', 'ORTH-05:R', 'operation');
});
afterEach(() => test.close());

const lip = { childId: 'child-1', milestone: 'SURG-01', part: 'milestone' };
const graft = { childId: 'child-1', milestone: 'ORTH-05:R', part: 'operation' };
const reason = 'Moves to another town';
const leave = async (id: string, items: readonly object[], by: TestPerson = 'administrator') =>
  (await test.as(by)).post(`/members/${id}/leaving`, { items, reason });
const claims = () => test.db('claims').orderBy('milestone').select('milestone', 'part', 'member_id');

describe('the list of open work', () => {
  it('names what is held and who may take it over, no trainee among them', async () => {
    const answer = await (await test.as('coordinator')).get('/members/surgeon-2/open-claims');
    expect(answer.body.claims.map((claim: { milestone: string }) => claim.milestone).sort()).toEqual([
      'ORTH-05:R',
      'SURG-01',
    ]);
    const lipClaim = answer.body.claims.find((claim: { milestone: string }) => claim.milestone === 'SURG-01');
    expect(lipClaim).toMatchObject({
      childName: 'Amara Okonjo',
      part: 'milestone',
      state: 'ahead',
      mayHold: ['surgeon'],
    });
  });

  it('shows an administrator, who opens no child, the record number in place of the name', async () => {
    const answer = await (await test.as('administrator')).get('/members/surgeon-2/open-claims');
    expect(answer.body.claims[0].childName).toBe('TE-0001');
    expect(answer.text).not.toContain('Okonjo');
  });

  it('is for oneself too, and not for a colleague or an auditor', async () => {
    expect((await (await test.as('surgeon-2')).get('/members/surgeon-2/open-claims')).status).toBe(200);
    expect((await (await test.as('surgeon')).get('/members/surgeon-2/open-claims')).status).toBe(403);
    expect((await (await test.as('auditor')).get('/members/surgeon-2/open-claims')).status).toBe(403);
    expect((await (await test.as('coordinator')).get('/members/nobody/open-claims')).status).toBe(404);
  });
});

describe('handing work over', () => {
  const handOver = async (items: readonly object[], by: TestPerson) =>
    (await test.as(by)).post('/members/surgeon-2/hand-over', { items, reason: 'Away until spring' });

  it('moves each milestone to its colleague, and writes each in the trail', async () => {
    const answer = await handOver([{ ...lip, to: 'surgeon' }], 'coordinator');
    expect(answer.body).toEqual({ moved: 1 });
    expect(await claims()).toEqual([
      { milestone: 'ORTH-05:R', part: 'operation', member_id: 'surgeon-2' },
      { milestone: 'SURG-01', part: 'milestone', member_id: 'surgeon' },
    ]);
    expect(
      await test.db('trail_lines').where({ kind: 'milestone-handed-over' }).first('child_id', 'member_id', 'actor_id'),
    ).toEqual({ child_id: 'child-1', member_id: 'surgeon', actor_id: 'coordinator' });
  });

  it('one may hand on what one holds', async () => {
    expect((await handOver([{ ...lip, to: 'surgeon' }], 'surgeon-2')).body).toEqual({ moved: 1 });
  });

  it('of a colleague is for the coordinator or an administrator', async () => {
    expect((await handOver([{ ...lip, to: 'surgeon' }], 'surgeon')).status).toBe(403);
  });

  it.each([
    ['of another discipline', 'nurse'],
    ['in training', 'trainee'],
    ['who holds it already', 'surgeon-2'],
    ['nobody knows', 'nobody'],
  ])('to somebody %s is pointed at, and nothing moves', async (_who, to) => {
    const answer = await handOver(
      [
        { ...graft, to: null },
        { ...lip, to },
      ],
      'coordinator',
    );
    expect(answer.body.errors[0].pointer).toBe('/items/1/to');
    expect((await claims()).every((claim) => claim.member_id === 'surgeon-2')).toBe(true);
  });

  it('of something that the member does not hold refuses the whole list', async () => {
    const answer = await handOver(
      [
        { ...lip, to: 'surgeon' },
        { ...lip, milestone: 'SURG-03', to: 'surgeon' },
      ],
      'coordinator',
    );
    expect(answer.body.type).toBe('/problems/milestone-not-yours');
    expect((await claims()).filter((claim) => claim.member_id === 'surgeon')).toEqual([]);
  });

  it('twice in one list is pointed at', async () => {
    expect(
      (
        await handOver(
          [
            { ...lip, to: 'surgeon' },
            { ...lip, to: null },
          ],
          'coordinator',
        )
      ).body.errors[0].pointer,
    ).toBe('/items/1');
  });
});

describe('leaving', () => {
  it('cannot finish while anything would be left with nobody', async () => {
    const answer = await leave('surgeon-2', [{ ...lip, to: 'surgeon' }]);
    expect(answer.status).toBe(409);
    expect(answer.body).toMatchObject({ type: '/problems/work-left-unowned', missing: [graft] });
    expect((await claims()).every((claim) => claim.member_id === 'surgeon-2')).toBe(true);
  });

  it('hands over, lets go on purpose, closes the account and ends every session at once', async () => {
    const browser = await test.as('surgeon-2');
    const answer = await leave('surgeon-2', [
      { ...lip, to: 'surgeon' },
      { ...graft, to: null },
    ]);
    expect(answer.body).toMatchObject({ status: 'left', leftOn: '2026-12-01', name: 'Test surgeon-2', openClaims: 0 });
    expect(await claims()).toEqual([{ milestone: 'SURG-01', part: 'milestone', member_id: 'surgeon' }]);
    expect((await browser.get('/my-sessions')).status).toBe(401);
    await expect(openBrowser(test.app, 'surgeon-2@tern-estuary.example')).rejects.toThrow('401');
    const kinds = (await test.db('trail_lines').orderBy('seq', 'desc').limit(5).select('kind')).map(({ kind }) => kind);
    expect(kinds).toEqual([
      'sign-in-refused',
      'signed-out',
      'member-left',
      'milestone-released',
      'milestone-handed-over',
    ]);
    expect((await leave('surgeon-2', [])).status).toBe(404);
  });

  it('lets go of what rests, so that nothing wakes in the hands of somebody who left', async () => {
    await test
      .db('children')
      .where({ id: 'child-1' })
      .update({ care_ended_on: '2026-11-30', care_ended_reason: 'Died' });
    expect((await leave('surgeon-2', [])).status).toBe(200);
    expect(await claims()).toEqual([]);
  });

  it('hands the lead of children on in the same act, and never by saying nothing', async () => {
    const led = { fields: { ...childFields({ recordNumber: 'TE-0002' }), leadClinicianId: 'dentist' } };
    await writeEvents(test, 'child-2', [
      { kind: 'child-registered', childId: 'child-2', after: { ...led, protocolVersion: 1 } },
    ]);
    const administrator = await test.as('administrator');
    const work = await administrator.get('/members/dentist/open-claims');
    expect(work.body).toMatchObject({ leads: 1, claims: [] });
    expect(work.body.mayLead).toContain('surgeon');
    expect(work.body.mayLead).not.toEqual(expect.arrayContaining(['coordinator']));
    const silent = await leave('dentist', []);
    expect(silent.body).toMatchObject({ type: '/problems/work-left-unowned', errors: [{ pointer: '/leadTo' }] });
    const leaving = (leadTo: string | null) =>
      administrator.post('/members/dentist/leaving', { items: [], reason, leadTo });
    expect((await leaving('coordinator')).body.errors[0].pointer).toBe('/leadTo');
    expect((await leaving('dentist')).body.errors[0].pointer).toBe('/leadTo');
    expect((await leaving('nurse')).body.status).toBe('left');
    expect(await test.db('children').where({ id: 'child-2' }).first('lead_clinician_id', 'version')).toEqual({
      lead_clinician_id: 'nurse',
      version: 2,
    });
    expect(await test.db('trail_lines').where({ kind: 'lead-handed-on' }).select('child_id', 'member_id')).toEqual([
      { child_id: 'child-2', member_id: 'nurse' },
    ]);
  });

  it('of a supervisor waits until the trainees have another', async () => {
    const answer = await leave('surgeon', []);
    expect(answer.body.errors).toEqual([
      { pointer: '/trainees', detail: 'First give Test trainee another supervisor.' },
    ]);
  });

  it('of the last administrator is refused', async () => {
    expect((await leave('administrator', [])).body).toMatchObject({
      type: '/problems/not-allowed',
      detail: expect.stringContaining('last administrator'),
    });
  });

  it('asks for a reason', async () => {
    const answer = await (await test.as('administrator')).post('/members/nurse/leaving', { items: [], reason: ' ' });
    expect(answer.body.errors).toEqual([{ pointer: '/reason', detail: 'Say why.' }]);
  });

  it('is for an administrator', async () => {
    expect((await leave('nurse', [], 'coordinator')).status).toBe(403);
    expect((await leave('nobody', [])).status).toBe(404);
  });

  it('takes back an invitation that nobody answered', async () => {
    const fields = {
      name: 'Ann Pell',
      email: 'ann.pell@tern-estuary.example',
      standing: 'auditor',
      disciplines: [],
      supervisorId: null,
    };
    const { id } = (await (await test.as('administrator')).post('/members', fields)).body as Member;
    expect((await leave(id, [])).body.status).toBe('left');
    expect(await test.db('mailed_links').where({ member_id: id }).whereNull('used_at').select('purpose')).toEqual([]);
  });

  it('ends the cover that the member gave', async () => {
    const cover = { byId: 'nurse-2', from: '2026-12-01', until: '2026-12-12' };
    await (await test.as('coordinator')).put('/members/nurse/cover', { cover });
    expect(await coveredBy(test.db, 'nurse-2', '2026-12-12')).toEqual(['nurse']);
    expect(await coveredBy(test.db, 'nurse-2', '2026-12-13')).toEqual([]);
    await leave('nurse-2', []);
    expect(await coveredBy(test.db, 'nurse-2', '2026-12-12')).toEqual([]);
  });
});
