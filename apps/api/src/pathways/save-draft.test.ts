import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestApp } from '../testing/test-app.ts';
import type { TestApp } from '../testing/test-app.ts';
import {
  addChild,
  boardRow,
  evidence,
  pathwayIn,
  pointersOf,
  problemOf,
  sign,
  trailOf,
  write,
} from '../testing/pathway-builders.ts';

describe('a draft', () => {
  let test: TestApp;
  beforeAll(async () => {
    test = await createTestApp();
  });
  afterAll(() => test.close());
  type Who = Parameters<TestApp['as']>[0];
  const save = async (who: Who, childId: string, milestone: string, version: number | null, change: object = {}) => {
    const request = (await test.as(who)).put(`/children/${childId}/milestones/${milestone}/draft`, {
      part: 'milestone',
      values: {},
      performedOn: null,
      isReady: false,
      ...change,
    });
    return version === null ? request : request.set('if-match', `"${String(version)}"`);
  };

  it('is kept with its version, and the trail says so without the values in the history', async () => {
    const childId = await addChild(test);
    const pathway = pathwayIn(
      await save('surgeon', childId, 'SURG-01', 0, { values: { technique: { value: 'Millard' } } }),
    );
    expect(pathway.drafts).toMatchObject([
      {
        milestone: 'SURG-01',
        version: pathway.version,
        byId: 'surgeon',
        values: { technique: { value: 'Millard' } },
        isReady: false,
      },
    ]);
    expect(pathway.history[0]).toMatchObject({ kind: 'draft-saved', detail: 'Draft kept' });
    expect(await trailOf(test, childId)).toEqual(['child-registered', 'draft-saved']);
  });

  it('asks for the version that was read, and shows the other draft when it is stale', async () => {
    const childId = await addChild(test);
    expect((await save('surgeon', childId, 'SURG-01', null)).status).toBe(428);
    const first = pathwayIn(
      await save('surgeon', childId, 'SURG-01', 0, { values: { technique: { value: 'Millard' } } }),
    );
    const stale = await save('surgeon-2', childId, 'SURG-01', 0, { values: { technique: { value: 'Fisher' } } });
    expect(stale.status).toBe(412);
    expect(stale.body).toMatchObject({
      type: '/problems/changed-meanwhile',
      current: { byId: 'surgeon', values: { technique: { value: 'Millard' } } },
    });
    expect((await save('surgeon-2', childId, 'SURG-01', first.version)).status).toBe(200);
  });

  it('points at values that cannot be, unlikely ones that nobody confirmed, unknown fields and impossible days', async () => {
    const childId = await addChild(test);
    const tried = (values: object, change: object = {}) =>
      save('surgeon', childId, 'SURG-01', 0, { values, ...change });
    expect(pointersOf(await tried({ weight_g: { value: 'heavy' } }))).toEqual(['/values/weight_g/value']);
    expect(pointersOf(await tried({ weight_g: { value: '18000' } }))).toEqual(['/values/weight_g/isConfirmed']);
    expect((await tried({ weight_g: { value: '18000', isConfirmed: true } })).status).toBe(200);
    expect(
      pointersOf(await save('surgeon-2', childId, 'SURG-02', 0, { values: { shoe_size: { value: '21' } } })),
    ).toEqual(['/values/shoe_size']);
    expect(pointersOf(await save('surgeon', childId, 'SURG-02', 0, { performedOn: '2026-12-02' }))).toEqual([
      '/performedOn',
    ]);
    expect(pointersOf(await save('surgeon', childId, 'SURG-02', 0, { performedOn: '2026-08-19' }))).toEqual([
      '/performedOn',
    ]);
  });

  it('is refused to another discipline and for a child that is not there', async () => {
    const childId = await addChild(test);
    expect(problemOf(await save('audiologist', childId, 'SURG-01', 0))).toBe('/problems/not-allowed');
    expect(problemOf(await save('surgeon', 'nobody', 'SURG-01', 0))).toBe('/problems/not-found');
  });

  it('can be ready only from somebody who may not sign it', async () => {
    const childId = await addChild(test);
    expect(pointersOf(await save('surgeon', childId, 'TEAM-04', 0, { isReady: true }))).toEqual(['/isReady']);
    expect((await save('nurse', childId, 'PSY-01', 0, { isReady: true })).status).toBe(200);
    expect(await boardRow(test, childId, 'PSY-01')).toMatchObject({ state: 'partly-signed' });
  });

  it('is gone once its part is signed', async () => {
    const childId = await addChild(test);
    await save('surgeon', childId, 'TEAM-04', 0);
    expect(pathwayIn(await sign(test, await test.as('surgeon'), childId, 'TEAM-04')).drafts).toEqual([]);
    expect(problemOf(await save('surgeon', childId, 'TEAM-04', 0))).toBe('/problems/milestone-state-refuses');
  });

  it('keeps private values from those who may not sign, and does not lose them when they save', async () => {
    const childId = await addChild(test);
    const secret = 'Mother cries at night';
    const values = {
      ...evidence('PSY-01', 'milestone', { practical_needs: 'Bus fare' }),
      who_screened: { value: secret },
    };
    const first = pathwayIn(await save('psychologist', childId, 'PSY-01', 0, { values }));
    expect(first.drafts[0]?.values['who_screened']?.value).toBe(secret);
    const seen = await (await test.as('surgeon')).get(`/children/${childId}/pathway`);
    expect(JSON.stringify(seen.body)).not.toContain(secret);
    const conflict = await save('nurse', childId, 'PSY-01', 0);
    expect([conflict.status, JSON.stringify(conflict.body).includes(secret)]).toEqual([412, false]);
    const blanked = pathwayIn(seen).drafts[0]?.values ?? {};
    expect(
      (
        await save('nurse', childId, 'PSY-01', first.version, {
          values: { ...blanked, practical_needs: { value: 'Bus fare and food' } },
        })
      ).status,
    ).toBe(200);
    const mine = pathwayIn(await (await test.as('psychologist')).get(`/children/${childId}/pathway`)).drafts[0]?.values;
    expect([mine?.['who_screened']?.value, mine?.['practical_needs']?.value]).toEqual([secret, 'Bus fare and food']);
    await sign(test, await test.as('psychologist'), childId, 'PSY-01', { values: { who_screened: secret } });
    const after = await (await test.as('nurse')).get(`/children/${childId}/pathway`);
    expect(pathwayIn(after).signatures).toHaveLength(1);
    expect(JSON.stringify(after.body)).not.toContain(secret);
  });

  it('counts as the start of arch widening when it says so', async () => {
    const childId = await addChild(test, { bornOn: '2018-09-01' });
    await write(test, [
      { kind: 'finding-recorded', childId, after: { name: 'expansion_needed', on: '2026-01-10', note: '' } },
    ]);
    await save('orthodontist', childId, 'ORTH-03', 0, {
      values: { started: { value: 'yes' } },
      performedOn: '2026-11-30',
    });
    const pathway = pathwayIn(await (await test.as('orthodontist')).get(`/children/${childId}/pathway`));
    expect(pathway.facts.findings).toContainEqual({ name: 'expansion_started', on: '2026-11-30' });
  });
});
