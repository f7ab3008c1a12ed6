import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestApp } from '../testing/test-app.ts';
import type { TestApp } from '../testing/test-app.ts';
import {
  addChild,
  boardRow,
  done,
  pathwayIn,
  pointersOf,
  problemOf,
  ruleOf,
  sign,
  trailOf,
  write,
} from '../testing/pathway-builders.ts';

describe('holding a milestone', () => {
  let test: TestApp;
  beforeAll(async () => {
    test = await createTestApp();
  });
  afterAll(() => test.close());
  const claim = async (who: Parameters<TestApp['as']>[0], childId: string, milestone: string, part = 'milestone') =>
    (await test.as(who)).post(`/children/${childId}/milestones/${milestone}/claim`, { part });

  it('is taken on by somebody of its discipline and shown on the board and in the trail', async () => {
    const childId = await addChild(test);
    const pathway = pathwayIn(await claim('surgeon', childId, 'SURG-01'));
    expect(pathway.claims).toEqual([
      { milestone: 'SURG-01', part: 'milestone', memberId: 'surgeon', since: '2026-12-01T09:00:00.000Z' },
    ]);
    expect(pathway.history[0]).toMatchObject({
      kind: 'milestone-claimed',
      milestone: 'SURG-01',
      detail: 'Taken on by Test surgeon',
      byName: 'Test surgeon',
    });
    expect(await boardRow(test, childId, 'SURG-01')).toMatchObject({ owners: '[["milestone","surgeon"]]' });
    expect(await trailOf(test, childId)).toEqual(['child-registered', 'milestone-claimed']);
  });

  it('is refused with the name of the holder and the claim as it stands', async () => {
    const childId = await addChild(test);
    await claim('surgeon', childId, 'SURG-01');
    const refused = await claim('surgeon-2', childId, 'SURG-01');
    expect(refused.status).toBe(409);
    expect(refused.body).toMatchObject({
      type: '/problems/milestone-already-claimed',
      detail: 'Test surgeon holds this already.',
      current: { memberId: 'surgeon', part: 'milestone' },
    });
  });

  it('says nothing new when the holder takes it on again', async () => {
    const childId = await addChild(test);
    await claim('surgeon', childId, 'SURG-01');
    expect((await claim('surgeon', childId, 'SURG-01')).status).toBe(200);
    expect(await trailOf(test, childId)).toEqual(['child-registered', 'milestone-claimed']);
  });

  it('is refused to another discipline, for an unknown child and for an unknown part', async () => {
    const childId = await addChild(test);
    expect(problemOf(await claim('audiologist', childId, 'SURG-01'))).toBe('/problems/not-allowed');
    expect(problemOf(await claim('surgeon', 'nobody', 'SURG-01'))).toBe('/problems/not-found');
    expect(problemOf(await claim('surgeon', childId, 'SURG-99'))).toBe('/problems/not-found');
    expect(pointersOf(await claim('surgeon', childId, 'SURG-01', 'half'))).toEqual(['/part']);
  });

  it('gives each half of two signatures its own owner', async () => {
    const childId = await addChild(test);
    await write(test, [done(childId, 'MOLD-02', '2026-09-10'), done(childId, 'MOLD-03', '2026-09-20')]);
    const parts = ['molding-dentist', 'surgeon'] as const;
    const rule = ruleOf('MOLD-06');
    for (const [index, who] of parts.entries())
      expect((await claim(who, childId, 'MOLD-06', rule.signatures[index]?.part)).status).toBe(200);
    expect(problemOf(await claim('surgeon-2', childId, 'MOLD-06', rule.signatures[0]?.part))).toBe(
      '/problems/not-allowed',
    );
  });

  it('is refused for what is finished, not on the path or with another team', async () => {
    const childId = await addChild(test, { bornOn: '2026-03-01' });
    await write(test, [done(childId, 'SURG-01', '2026-06-01')]);
    expect(problemOf(await claim('surgeon', childId, 'SURG-01'))).toBe('/problems/milestone-state-refuses');
    expect(problemOf(await claim('surgeon', childId, 'SURG-06'))).toBe('/problems/milestone-state-refuses');
    await write(test, [
      { kind: 'child-transferred', childId, after: { on: '2026-11-01', to: 'Northern team', reason: 'Moved house' } },
    ]);
    expect(problemOf(await claim('surgeon', childId, 'SURG-03'))).toBe('/problems/milestone-state-refuses');
  });

  it('is for a trainee only with an assigned child', async () => {
    const childId = await addChild(test);
    const refused = await claim('trainee', childId, 'SURG-01');
    expect([refused.status, String((refused.body as { detail?: string }).detail)]).toEqual([
      403,
      expect.stringContaining('Ask Test surgeon (lead clinician)'),
    ]);
    await write(test, [{ kind: 'trainees-assigned', childId, after: { memberIds: ['trainee'] } }]);
    expect((await claim('trainee', childId, 'SURG-01')).status).toBe(200);
  });

  it('stays with its holder over repeating occurrences', async () => {
    const childId = await addChild(test, { bornOn: '2026-11-10' });
    await claim('nurse', childId, 'CARE-02');
    const signed = await sign(test, await test.as('nurse'), childId, 'CARE-02', { values: { weight_g: '3600' } });
    expect(signed.status, JSON.stringify(signed.body)).toBe(200);
    expect(await boardRow(test, childId, 'CARE-02')).toMatchObject({
      occurrence: 2,
      owners: '[["milestone","nurse"]]',
    });
  });

  it('ends when the holder lets it go, and nobody else can', async () => {
    const childId = await addChild(test);
    await claim('surgeon', childId, 'SURG-01');
    const release = async (who: Parameters<TestApp['as']>[0]) =>
      (await test.as(who)).post(`/children/${childId}/milestones/SURG-01/release`, {
        part: 'milestone',
        reason: 'On leave',
      });
    expect(problemOf(await release('surgeon-2'))).toBe('/problems/milestone-not-yours');
    expect(pathwayIn(await release('surgeon')).claims).toEqual([]);
    expect(problemOf(await release('surgeon'))).toBe('/problems/milestone-not-yours');
    expect(await trailOf(test, childId)).toEqual(['child-registered', 'milestone-claimed', 'milestone-released']);
  });

  it('is handed over by its holder or the coordinator, to somebody who may hold it, from who holds it now', async () => {
    const childId = await addChild(test);
    await claim('surgeon', childId, 'SURG-01');
    const handOver = async (who: Parameters<TestApp['as']>[0], to: string, from: string | null) =>
      (await test.as(who)).post(`/children/${childId}/milestones/SURG-01/hand-over`, { part: 'milestone', to, from });
    expect(problemOf(await handOver('surgeon-2', 'surgeon-2', 'surgeon'))).toBe('/problems/milestone-not-yours');
    expect(pointersOf(await handOver('surgeon', 'audiologist', 'surgeon'))).toEqual(['/to']);
    expect(pointersOf(await handOver('coordinator', 'nobody', 'surgeon'))).toEqual(['/to']);
    expect(pathwayIn(await handOver('surgeon', 'surgeon-2', 'surgeon')).claims).toMatchObject([
      { memberId: 'surgeon-2' },
    ]);
    const stale = await handOver('coordinator', 'surgeon', 'surgeon');
    expect(stale.body).toMatchObject({
      type: '/problems/milestone-already-claimed',
      current: { memberId: 'surgeon-2' },
    });
    expect(pathwayIn(await handOver('coordinator', 'surgeon', 'surgeon-2')).claims).toMatchObject([
      { memberId: 'surgeon' },
    ]);
    await test.db('members').where({ id: 'surgeon-2' }).update({ status: 'left' });
    expect(pointersOf(await handOver('coordinator', 'surgeon-2', 'surgeon'))).toEqual(['/to']);
    await test.db('members').where({ id: 'surgeon-2' }).update({ status: 'active' });
  });
});
