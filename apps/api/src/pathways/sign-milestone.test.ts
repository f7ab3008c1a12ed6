import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestApp, testPassword } from '../testing/test-app.ts';
import type { TestApp } from '../testing/test-app.ts';
import {
  addChild,
  boardRow,
  done,
  evidence,
  pathwayIn,
  pointersOf,
  problemOf,
  sign,
  signBody,
  trailOf,
  write,
} from '../testing/pathway-builders.ts';

describe('signing', () => {
  let test: TestApp;
  beforeAll(async () => {
    test = await createTestApp();
  });
  afterAll(() => test.close());

  it('shows exactly what would be signed', async () => {
    const childId = await addChild(test);
    const answer = await (
      await test.as('surgeon')
    ).post(
      `/children/${childId}/milestones/TEAM-04/signing-sheet`,
      signBody('TEAM-04', { performedOn: '2026-11-20' }, '2026-12-01'),
    );
    expect(answer.status).toBe(200);
    expect(answer.body).toMatchObject({
      meaning: expect.any(String),
      signAs: 'Test surgeon, Cleft surgeon',
      refusals: [],
      overridable: [],
      digest: expect.stringMatching(/^[0-9a-f]{64}$/),
    });
    const { sentence } = answer.body as { sentence: string };
    expect(sentence).toContain('born 20 Aug 2026, record TE-');
    expect(sentence).toContain('on 20 Nov 2026.');
    expect(await trailOf(test, childId)).toEqual(['child-registered']);
  });

  it('asks for the password', async () => {
    const childId = await addChild(test);
    const refused = await sign(test, await test.as('surgeon-2'), childId, 'TEAM-04', { password: 'a guess at random' });
    expect([problemOf(refused), pointersOf(refused)]).toEqual(['/problems/wrong-password', ['/password']]);
    expect(await trailOf(test, childId)).toEqual(['child-registered']);
  });

  it('refuses what differs from the sheet', async () => {
    const childId = await addChild(test);
    const surgeon = await test.as('surgeon');
    const body = signBody('TEAM-04', {}, '2026-12-01');
    const sheet = await surgeon.post(`/children/${childId}/milestones/TEAM-04/signing-sheet`, body);
    const { digest } = sheet.body as { digest: string };
    const [name] = Object.keys(body.values);
    const values = { ...body.values, [String(name)]: { value: null, emptyBecause: 'Another reason' } };
    const refused = await surgeon.post(`/children/${childId}/milestones/TEAM-04/sign-off`, {
      ...body,
      values,
      digest,
      overrides: [],
      password: testPassword,
    });
    expect(problemOf(refused)).toBe('/problems/signed-content-changed');
  });

  it('points at every field that stands in the way', async () => {
    const childId = await addChild(test, { bornOn: '2026-06-01' });
    const surgeon = await test.as('surgeon');
    const values = { ...evidence('SURG-01', 'milestone', { weight_g: 'heavy', stay_nights: '60' }) };
    delete values['technique'];
    const body = {
      part: 'milestone',
      performedOn: '2026-11-30',
      values,
      digest: 'none',
      overrides: [],
      password: testPassword,
    };
    const refused = await surgeon.post(`/children/${childId}/milestones/SURG-01/sign-off`, body);
    expect(problemOf(refused)).toBe('/problems/milestone-not-ready');
    expect(pointersOf(refused)).toEqual([
      '/values/technique/value',
      '/values/weight_g/value',
      '/values/stay_nights/isConfirmed',
      '/overrides',
    ]);
    expect((refused.body as { refusals: { code: string }[] }).refusals.map(({ code }) => code)).toEqual([
      'evidence-missing',
      'evidence-impossible',
      'evidence-unlikely',
      'check-override-reason-needed',
    ]);
    const unknown = await surgeon.post(`/children/${childId}/milestones/SURG-01/sign-off`, {
      ...body,
      values: { ...values, shoe_size: { value: '21' } },
    });
    expect(pointersOf(unknown)).toEqual(['/values/shoe_size']);
    expect(pointersOf(await sign(test, surgeon, childId, 'TEAM-04', { performedOn: '2026-12-02' }))).toEqual([
      '/performedOn',
    ]);
    expect(pointersOf(await sign(test, surgeon, childId, 'TEAM-04', { performedOn: '2026-05-31' }))).toEqual([
      '/performedOn',
    ]);
    expect(
      pointersOf(
        await sign(test, surgeon, childId, 'SURG-01', {
          overrides: [{ check: 'SHOE-01', reason: 'No shoes', secondName: null }],
        }),
      ),
    ).toEqual(['/overrides/0/check']);
  });

  it('cannot pass a gate, and passes a check only with a reason that is kept', async () => {
    const childId = await addChild(test, { bornOn: '2026-01-10' });
    const surgeon = await test.as('surgeon');
    const overrides = [
      { check: 'CARE-04:SURG-03', reason: 'Seen on the day', secondName: null },
      { check: 'EAR-03', reason: 'No test room', secondName: null },
      { check: 'CARE-03', reason: 'Seen on the day', secondName: null },
    ];
    const gated = await sign(test, surgeon, childId, 'SURG-03', { overrides });
    expect((gated.body as { refusals: { code: string; text: string }[] }).refusals).toMatchObject([
      { code: 'gate-unmet', text: expect.stringContaining('SURG-01') },
    ]);
    await write(test, [done(childId, 'SURG-01', '2026-04-20')]);
    const signed = pathwayIn(await sign(test, surgeon, childId, 'SURG-03', { overrides }));
    expect(signed.signatures[0]?.overrides).toEqual(overrides);
    expect(signed.history[0]?.detail).toContain('signed past CARE-04:SURG-03, EAR-03, CARE-03');
  });

  it('cannot be given twice for the same occurrence, whoever tries', async () => {
    const childId = await addChild(test);
    await sign(test, await test.as('surgeon'), childId, 'TEAM-04');
    const again = await sign(test, await test.as('surgeon-2'), childId, 'TEAM-04');
    expect(again.body).toMatchObject({
      type: '/problems/milestone-already-signed',
      detail: 'Test surgeon has signed this already.',
      current: { signerName: 'Test surgeon' },
    });
  });

  it('of two halves takes two people of two disciplines', async () => {
    const childId = await addChild(test, { bornOn: '2016-05-01', leadClinicianId: 'nurse' });
    await test.db('members').where({ id: 'nurse' }).update({ disciplines: '["coordinator","nurse"]' });
    const both = await test.as('nurse');
    expect((await sign(test, both, childId, 'TEAM-05', { part: 'record' })).status).toBe(200);
    const refused = await sign(test, both, childId, 'TEAM-05', { part: 'lead' });
    expect((refused.body as { refusals: { code: string }[] }).refusals.map(({ code }) => code)).toContain(
      'same-person-twice',
    );
    await test.db('members').where({ id: 'nurse' }).update({ disciplines: '["nurse"]' });
  });

  it('is the same act when it is sent again with the same key', async () => {
    const childId = await addChild(test);
    const surgeon = await test.as('surgeon');
    const first = await sign(test, surgeon, childId, 'TEAM-04', { key: 'key-of-the-first-visit' });
    const body = {
      ...signBody('TEAM-04', {}, '2026-12-01'),
      digest: pathwayIn(first).signatures[0]?.digest,
      overrides: [],
      password: testPassword,
    };
    const again = await surgeon
      .post(`/children/${childId}/milestones/TEAM-04/sign-off`, body)
      .set('idempotency-key', 'key-of-the-first-visit');
    expect([again.status, again.body]).toEqual([200, first.body]);
    const other = await addChild(test);
    expect(
      problemOf(
        await surgeon
          .post(`/children/${other}/milestones/TEAM-04/sign-off`, body)
          .set('idempotency-key', 'key-of-the-first-visit'),
      ),
    ).toBe('/problems/same-key-other-body');
    expect(await trailOf(test, childId)).toEqual(['child-registered', 'milestone-signed']);
  });

  it('raises findings from the day on which they were recorded', async () => {
    const childId = await addChild(test, { bornOn: '2023-09-01' });
    const pathway = pathwayIn(
      await sign(test, await test.as('speech-therapist'), childId, 'SPCH-03', {
        performedOn: '2026-10-01',
        values: { vpi_suspected: 'yes' },
      }),
    );
    expect(pathway.facts.findings).toContainEqual({ name: 'vpi_suspected', on: '2026-12-01' });
    expect(await boardRow(test, childId, 'SPCH-05')).toMatchObject({ state: 'open' });
  });

  it('of an operation before its booked day takes the booking back, so that its wound check comes', async () => {
    const childId = await addChild(test, { bornOn: '2026-06-01' });
    await write(test, [
      { kind: 'booking-set', childId, milestone: 'SURG-01', after: { on: '2026-12-20', reason: '' } },
    ]);
    const overrides = [{ check: 'CARE-04:SURG-01', reason: 'Seen on the day', secondName: null }];
    pathwayIn(await sign(test, await test.as('surgeon'), childId, 'SURG-01', { performedOn: '2026-11-28', overrides }));
    expect((await trailOf(test, childId)).slice(-2)).toEqual(['milestone-signed', 'booking-removed']);
    expect(await boardRow(test, childId, 'CARE-05:SURG-01')).toMatchObject({ earliest: '2026-12-03' });
    expect(await boardRow(test, childId, 'CARE-04:SURG-01')).toBeUndefined();
  });

  it('leaves an operation done elsewhere to be confirmed', async () => {
    const childId = await addChild(test, { bornOn: '2026-03-01' });
    await write(test, [done(childId, 'SURG-01', '2026-06-01', {}, true)]);
    const surgeon = await test.as('surgeon');
    const refused = await sign(test, surgeon, childId, 'SURG-01');
    expect(refused.body).toMatchObject({ type: '/problems/milestone-state-refuses', reason: 'imported' });
    const url = `/children/${childId}/milestones/SURG-01/confirmation`;
    expect(problemOf(await (await test.as('nurse')).post(url, { password: testPassword }))).toBe(
      '/problems/not-allowed',
    );
    expect((await surgeon.post(url, { password: testPassword })).status).toBe(200);
    expect(await boardRow(test, childId, 'SURG-01')).toMatchObject({ state: 'signed' });
    expect(problemOf(await surgeon.post(url, { password: testPassword }))).toBe('/problems/milestone-state-refuses');
    expect((await trailOf(test, childId)).at(-1)).toBe('import-confirmed');
  });
});
