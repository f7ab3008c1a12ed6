import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestApp, testPassword } from '../testing/test-app.ts';
import type { TestApp } from '../testing/test-app.ts';
import {
  addChild,
  boardRow,
  done,
  pathwayIn,
  pointersOf,
  problemOf,
  sign,
  trailOf,
  write,
} from '../testing/pathway-builders.ts';

type Who = Parameters<TestApp['as']>[0];

describe('pausing and waiving', () => {
  let test: TestApp;
  beforeAll(async () => {
    test = await createTestApp();
  });
  afterAll(() => test.close());
  const hold = async (who: Who, childId: string, value: object | null) =>
    (await test.as(who)).put(`/children/${childId}/milestones/SURG-01/hold`, { hold: value });
  const waive = async (who: Who, childId: string, milestone: string, change: object = {}) =>
    (await test.as(who)).post(`/children/${childId}/milestones/${milestone}/waiver`, {
      kind: 'waived',
      reason: 'Family choice',
      note: '',
      secondName: null,
      offerAgainOn: '2027-12-01',
      password: testPassword,
      ...change,
    });

  it('holds with a reason and a day of review, and lifts the hold', async () => {
    const childId = await addChild(test);
    pathwayIn(await hold('surgeon', childId, { reason: 'A cold', reviewOn: '2026-12-15' }));
    expect(await boardRow(test, childId, 'SURG-01')).toMatchObject({ state: 'held' });
    pathwayIn(await hold('surgeon', childId, null));
    expect((await boardRow(test, childId, 'SURG-01'))?.state).not.toBe('held');
    expect(problemOf(await hold('surgeon', childId, null))).toBe('/problems/milestone-state-refuses');
    expect(await trailOf(test, childId)).toEqual(['child-registered', 'milestone-held', 'hold-lifted']);
  });

  it('refuses a hold without reason or with a review that does not lie ahead, to another discipline and to the coordinator', async () => {
    const childId = await addChild(test);
    expect(pointersOf(await hold('surgeon', childId, { reason: '', reviewOn: '2026-12-15' }))).toEqual([
      '/hold/reason',
    ]);
    expect(pointersOf(await hold('surgeon', childId, { reason: 'A cold', reviewOn: '2026-12-01' }))).toEqual([
      '/hold/reviewOn',
    ]);
    for (const who of ['audiologist', 'coordinator'] as const)
      expect(problemOf(await hold(who, childId, { reason: 'A cold', reviewOn: '2026-12-15' }))).toBe(
        '/problems/not-allowed',
      );
    expect(problemOf(await hold('surgeon', 'nobody', { reason: 'A cold', reviewOn: '2026-12-15' }))).toBe(
      '/problems/not-found',
    );
  });

  it('waives for a reason of the protocol, and what follows from it leaves the path', async () => {
    const childId = await addChild(test);
    const pathway = pathwayIn(
      await waive('surgeon', childId, 'SURG-01', { reason: 'Microform left alone by choice', offerAgainOn: null }),
    );
    expect(await boardRow(test, childId, 'SURG-01')).toMatchObject({ state: 'waived' });
    expect(await boardRow(test, childId, 'SURG-02')).toBeUndefined();
    expect(pathway.history[0]?.detail).toBe('Waived: Microform left alone by choice');
    expect(problemOf(await waive('surgeon', childId, 'SURG-01'))).toBe('/problems/milestone-state-refuses');
    expect(await trailOf(test, childId)).toEqual(['child-registered', 'milestone-waived']);
  });

  it('asks for a listed reason, and for the next offer when the family chose', async () => {
    const childId = await addChild(test);
    expect(pointersOf(await waive('surgeon', childId, 'SURG-01', { reason: 'We forgot about it' }))).toEqual([
      '/reason',
    ]);
    expect(pointersOf(await waive('surgeon', childId, 'SURG-01', { offerAgainOn: null }))).toEqual(['/offerAgainOn']);
    expect(pointersOf(await waive('surgeon', childId, 'SURG-01', { offerAgainOn: '2026-11-01' }))).toEqual([
      '/offerAgainOn',
    ]);
    for (const who of ['nurse', 'coordinator'] as const)
      expect(problemOf(await waive(who, childId, 'SURG-01'))).toBe('/problems/not-allowed');
  });

  it('takes a second decision of the right discipline where the protocol asks for one', async () => {
    const childId = await addChild(test);
    const reason = { reason: 'Airway too unsafe', offerAgainOn: null };
    expect(pointersOf(await waive('surgeon', childId, 'SURG-03', reason))).toEqual(['/secondName']);
    expect(
      pointersOf(await waive('surgeon', childId, 'SURG-03', { ...reason, secondName: 'Test audiologist' })),
    ).toEqual(['/secondName']);
    expect(pointersOf(await waive('surgeon', childId, 'SURG-03', { ...reason, secondName: 'Test surgeon' }))).toEqual([
      '/secondName',
    ]);
    expect(
      pathwayIn(await waive('surgeon', childId, 'SURG-03', { ...reason, secondName: 'test ent' })).history[0]?.detail,
    ).toContain('decided with Test ent');
  });

  it('closes as not recoverable only what has lapsed', async () => {
    const lapsed = await addChild(test, { bornOn: '2026-10-01' });
    await write(test, [done(lapsed, 'TEAM-03', '2026-10-05')]);
    const change = { kind: 'not-recoverable', reason: 'Found at nine weeks', offerAgainOn: null };
    expect(problemOf(await waive('surgeon', lapsed, 'SURG-01', change))).toBe('/problems/milestone-state-refuses');
    expect((await waive('molding-dentist', lapsed, 'MOLD-01', change)).status).toBe(200);
    expect(await boardRow(test, lapsed, 'MOLD-01')).toMatchObject({ state: 'waived' });
  });

  it('of a half-signed review lets the next one begin afresh', async () => {
    const childId = await addChild(test, { bornOn: '2026-03-01' });
    const first = pathwayIn(await sign(test, await test.as('coordinator'), childId, 'TEAM-05', { part: 'record' }));
    expect(first.signatures[0]?.occurrence).toBe(1);
    expect(await boardRow(test, childId, 'TEAM-05')).toMatchObject({
      state: 'partly-signed',
      owners: '[["lead",null]]',
    });
    expect((await waive('surgeon', childId, 'TEAM-05')).status).toBe(200);
    const next = await boardRow(test, childId, 'TEAM-05');
    expect([next?.state === 'partly-signed', next?.owners, next?.occurrence]).toEqual([
      false,
      '[["record",null],["lead",null]]',
      2,
    ]);
    const second = pathwayIn(await sign(test, await test.as('coordinator'), childId, 'TEAM-05', { part: 'record' }));
    expect(second.signatures.map(({ occurrence }) => occurrence)).toEqual([1, 2]);
  });

  it('covers one occurrence of what repeats', async () => {
    const childId = await addChild(test, { bornOn: '2026-11-10' });
    expect((await waive('nurse', childId, 'CARE-02')).status).toBe(200);
    expect(await boardRow(test, childId, 'CARE-02')).toMatchObject({ occurrence: 2 });
  });
});
