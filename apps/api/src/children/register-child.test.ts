import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { childFields } from '../testing/child-fields.ts';
import { createTestApp } from '../testing/test-app.ts';
import type { TestApp } from '../testing/test-app.ts';

let test: TestApp;
beforeEach(async () => {
  test = await createTestApp();
});
afterEach(() => test.close());

const register = async (
  person: 'coordinator' | 'nurse' | 'surgeon' | 'administrator' | 'trainee',
  fields: object,
  isDistinct = false,
) => (await test.as(person)).post('/children', { fields, isDistinct });

describe('adding a child', () => {
  it('stores what was typed, plans the pathway and leaves a line in the trail', async () => {
    const answer = await register('coordinator', childFields({ cleft: '...SHAL' }));
    expect(answer.status).toBe(201);
    expect(answer.body).toMatchObject({
      version: 1,
      fields: { cleft: '•••SHAL', recordNumber: 'TE-0001' },
      icd10: { code: 'Q37.5' },
      traineeIds: [],
      careEnded: null,
    });
    expect(answer.headers['etag']).toBe('"1"');
    const lines = await test.db('trail_lines').where({ child_id: answer.body.id }).select('kind', 'actor_id');
    expect(lines).toEqual([{ kind: 'child-registered', actor_id: 'coordinator' }]);
    const rows = await test.db('board_rows').where({ child_id: answer.body.id });
    expect(rows.length).toBeGreaterThan(20);
  });

  it('takes an expected child by the expected date alone', async () => {
    const answer = await register(
      'nurse',
      childFields({
        bornOn: null,
        dueOn: '2027-02-01',
        gestation: null,
        referredOn: null,
        teamStartOn: null,
        prenatalReferralOn: '2026-11-20',
      }),
    );
    expect(answer.status).toBe(201);
    expect(answer.body.fields).toMatchObject({ bornOn: null, dueOn: '2027-02-01' });
  });

  it.each(['surgeon', 'administrator', 'trainee'] as const)('is not for the %s', async (person) => {
    const answer = await register(person, childFields());
    expect(answer.status).toBe(403);
    expect(await test.db('children').count({ n: '*' })).toEqual([{ n: 0 }]);
  });

  it('lets the coordinator enter a provisional code only, and a nurse a confirmed one', async () => {
    const refusal = await register('coordinator', childFields({ isCleftProvisional: false }));
    expect(refusal.status).toBe(400);
    expect(refusal.body.errors).toEqual([
      { pointer: '/fields/isCleftProvisional', detail: expect.stringContaining('provisional') },
    ]);
    expect((await register('nurse', childFields({ isCleftProvisional: false }))).status).toBe(201);
  });

  it.each([
    ['a birth still to come', { bornOn: '2026-12-02' }, '/fields/bornOn'],
    ['a day that does not exist', { bornOn: '2026-02-30' }, '/fields/bornOn'],
    ['neither birth nor expected date', { bornOn: null, referredOn: null, teamStartOn: null }, '/fields/bornOn'],
    [
      'an expected date over 42 weeks away',
      { bornOn: null, dueOn: '2027-10-01', referredOn: null, teamStartOn: null },
      '/fields/dueOn',
    ],
    [
      'an expected date long past',
      { bornOn: null, dueOn: '2026-10-01', referredOn: null, teamStartOn: null },
      '/fields/dueOn',
    ],
    ['a first contact before birth', { teamStartOn: '2026-10-05' }, '/fields/teamStartOn'],
    ['a referral before birth in the wrong field', { referredOn: '2026-10-05' }, '/fields/referredOn'],
    ['a gestation that cannot be', { gestation: { weeks: 12, days: 0 } }, '/fields/gestation/weeks'],
    ['a letter of the code in the wrong place', { cleft: '•••XHAL' }, '/fields/cleft'],
    ['a site that the team does not have', { site: 'Elsewhere' }, '/fields/site'],
    ['a lead clinician who is none', { leadClinicianId: 'coordinator' }, '/fields/leadClinicianId'],
    [
      'an e-mail that is none',
      {
        contacts: [
          {
            name: 'Ada',
            relation: 'mother',
            phone: '',
            email: 'ada@',
            language: '',
            needsInterpreter: false,
            mayConsent: true,
          },
        ],
      },
      '/fields/contacts/0/email',
    ],
    ['a field that is not known', { isAdmin: true }, '/fields/isAdmin'],
  ])('points at %s', async (_what, overrides, pointer) => {
    const answer = await register('coordinator', { ...childFields(), ...overrides });
    expect(answer.status).toBe(400);
    expect(answer.body.errors.map((error: { pointer: string }) => error.pointer)).toContain(pointer);
  });

  it('lets an unlikely gestation through', async () => {
    expect((await register('coordinator', childFields({ gestation: { weeks: 21, days: 5 } }))).status).toBe(201);
  });

  it('warns about a child of the same name once, and believes that it is another child', async () => {
    await register('coordinator', childFields());
    const namesake = childFields({ recordNumber: 'TE-0002', firstName: 'OKÓNJO', familyName: 'amara' });
    const warned = await register('coordinator', namesake);
    expect(warned.status).toBe(409);
    expect(warned.body).toMatchObject({
      type: '/problems/duplicate-record',
      candidates: [{ recordNumber: 'TE-0001', why: ['name-and-birth'] }],
    });
    expect((await register('coordinator', namesake, true)).status).toBe(201);
  });

  it('never takes a record number twice', async () => {
    await register('coordinator', childFields());
    const answer = await register(
      'coordinator',
      childFields({ recordNumber: 'te-0001', firstName: 'Tomasz', familyName: 'Zając' }),
      true,
    );
    expect(answer.status).toBe(409);
    expect(answer.body.errors).toEqual([
      { pointer: '/fields/recordNumber', detail: 'Another child has this record number.' },
    ]);
  });

  it('answers a repeated call with the same child', async () => {
    const browser = await test.as('coordinator');
    const body = { fields: childFields(), isDistinct: false };
    const first = await browser.post('/children', body).set('idempotency-key', 'one-intent-1');
    const again = await browser.post('/children', body).set('idempotency-key', 'one-intent-1');
    expect(again.body.id).toBe(first.body.id);
  });

  it('keeps scripts and database words as text', async () => {
    const name = `<img src=x onerror=alert(1)> ' OR 1=1--`;
    const answer = await register('coordinator', childFields({ firstName: name, familyName: '__proto__' }));
    expect(answer.body.fields).toMatchObject({ firstName: name, familyName: '__proto__' });
  });
});
