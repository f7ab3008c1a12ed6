import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { myWorkSchema, workGroups } from '@weftway/contract/board';
import type { MyWork, WorkGroup } from '@weftway/contract/board';
import { addChild, evidence, write } from '../testing/pathway-builders.ts';
import { createTestApp } from '../testing/test-app.ts';
import type { TestApp, TestPerson } from '../testing/test-app.ts';

describe('my work', () => {
  let test: TestApp;
  beforeEach(async () => {
    test = await createTestApp();
  });
  afterEach(() => test.close());

  const workOf = async (who: TestPerson): Promise<MyWork> =>
    myWorkSchema.parse((await (await test.as(who)).get('/my-work')).body);
  const claim = async (who: TestPerson, childId: string, milestone: string, part = 'milestone') => {
    const answer = await (await test.as(who)).post(`/children/${childId}/milestones/${milestone}/claim`, { part });
    expect(answer.status).toBe(200);
  };
  const groupsOf = (work: MyWork, childId: string, milestone: string): WorkGroup[] =>
    workGroups.filter((group) => work[group].some((item) => item.childId === childId && item.milestone === milestone));
  const saveDraft = (childId: string, milestone: string, isReady: boolean, byId: string, values = {}) =>
    test.db.transaction(async (trx) => {
      const { appendEvents } = await import('../trail/append-events.ts');
      await appendEvents(
        trx,
        [
          {
            kind: 'draft-saved',
            childId,
            milestone,
            after: { part: 'milestone', occurrence: 1, values, performedOn: null, isReady },
          },
        ],
        {
          at: test.services.now().toISOString(),
          actorId: byId,
          actorName: `Test ${byId}`,
          actorRole: '',
          requestId: 'builder',
        },
      );
    });

  it('lists what I hold by urgency, with the days left and what stands in the way', async () => {
    const childId = await addChild(test);
    await claim('audiologist', childId, 'EAR-01');
    await claim('audiologist', childId, 'EAR-02');
    const work = await workOf('audiologist');
    expect(work.doNow.map((item) => item.milestone)).toEqual(['EAR-01', 'EAR-02']);
    expect(work.doNow[0]).toMatchObject({ state: 'late', childId, isUnowned: false, ownerName: 'Test audiologist' });
    expect(work.doNow[0]?.daysLeft).toBeLessThan(0);
    expect(work.doNow[0]?.standsInTheWay).toMatch(/to enter$/);
  });

  it('keeps what waits for others apart, and says for what', async () => {
    const childId = await addChild(test, { bornOn: '2026-07-01' });
    await claim('surgeon', childId, 'SURG-01');
    const work = await workOf('surgeon');
    const group = groupsOf(work, childId, 'SURG-01')[0] ?? 'late';
    expect(work[group].find((item) => item.milestone === 'SURG-01')?.standsInTheWay).toMatch(
      /Fit for surgery, which no one holds/,
    );
  });

  it('shows loose ends only in lanes that I may claim', async () => {
    const childId = await addChild(test);
    expect(groupsOf(await workOf('audiologist'), childId, 'EAR-01')).toEqual(['looseEnds']);
    expect(groupsOf(await workOf('geneticist'), childId, 'EAR-01')).toEqual([]);
  });

  it('shows a trainee loose ends of assigned children only', async () => {
    const [mine, other] = [await addChild(test), await addChild(test)];
    await write(test, [{ kind: 'trainees-assigned', childId: mine, after: { memberIds: ['trainee'] } }]);
    const work = await workOf('trainee');
    expect(new Set(work.looseEnds.map((item) => item.childId))).toEqual(new Set([mine]));
    expect(JSON.stringify(work)).not.toContain(other);
  });

  it('brings back to me what a colleague handed over, with the name', async () => {
    const childId = await addChild(test);
    await claim('audiologist-2', childId, 'EAR-02');
    await (
      await test.as('audiologist-2')
    ).post(`/children/${childId}/milestones/EAR-02/hand-over`, {
      part: 'milestone',
      from: 'audiologist-2',
      to: 'audiologist',
    });
    const work = await workOf('audiologist');
    expect(work.cameBack).toEqual([
      expect.objectContaining({ milestone: 'EAR-02', note: 'Handed to you by Test audiologist-2 on 1 Dec 2026' }),
    ]);
    expect(work.doNow).toEqual([]);
  });

  it('brings back what a colleague let go in my lanes, by name', async () => {
    const childId = await addChild(test);
    await claim('audiologist-2', childId, 'EAR-02');
    await (
      await test.as('audiologist-2')
    ).post(`/children/${childId}/milestones/EAR-02/release`, { part: 'milestone', reason: 'On leave' });
    const item = (await workOf('audiologist')).cameBack[0];
    expect(item).toMatchObject({
      milestone: 'EAR-02',
      isUnowned: true,
      note: 'Let go by Test audiologist-2 on 1 Dec 2026: On leave',
    });
  });

  it('shows a finished draft of a trainee to the supervisor, and to the trainee that it waits', async () => {
    const childId = await addChild(test);
    await write(test, [{ kind: 'trainees-assigned', childId, after: { memberIds: ['trainee'] } }]);
    await saveDraft(childId, 'TEAM-03', true, 'trainee');
    expect((await workOf('surgeon')).toSign).toEqual([
      expect.objectContaining({ milestone: 'TEAM-03', note: 'Drafted by Test trainee on 1 Dec 2026' }),
    ]);
    expect((await workOf('trainee')).drafted).toEqual([
      expect.objectContaining({ milestone: 'TEAM-03', note: 'Waits for a signature since 1 Dec 2026' }),
    ]);
    expect((await workOf('nurse')).toSign).toEqual([]);
  });

  it('moves mine to the signatures once its evidence is complete', async () => {
    const childId = await addChild(test);
    await claim('audiologist', childId, 'EAR-01');
    await saveDraft(childId, 'EAR-01', false, 'audiologist', evidence('EAR-01', 'milestone'));
    const work = await workOf('audiologist');
    expect(work.toSign).toEqual([
      expect.objectContaining({ milestone: 'EAR-01', standsInTheWay: 'Evidence complete' }),
    ]);
  });

  it('brings back what was held once its review date has come', async () => {
    const childId = await addChild(test);
    await claim('audiologist', childId, 'EAR-02');
    await (
      await test.as('audiologist')
    ).put(`/children/${childId}/milestones/EAR-02/hold`, { hold: { reason: 'Ear infection', reviewOn: '2026-12-10' } });
    expect((await workOf('audiologist')).waiting[0]).toMatchObject({
      milestone: 'EAR-02',
      standsInTheWay: 'Held: Ear infection. Review on 10 Dec 2026',
    });
    test.setNow('2026-12-10T09:00:00.000Z');
    expect((await workOf('audiologist')).cameBack[0]).toMatchObject({
      milestone: 'EAR-02',
      note: 'Held until its review on 10 Dec 2026',
    });
  });

  it('labels the work of a colleague whom I cover for, as long as I do', async () => {
    const childId = await addChild(test);
    await claim('audiologist', childId, 'EAR-02');
    await write(test, [
      {
        kind: 'cover-set',
        memberId: 'audiologist',
        after: { cover: { byId: 'audiologist-2', from: '2026-11-30', until: '2026-12-04' } },
      },
    ]);
    expect((await workOf('audiologist-2')).covers[0]).toMatchObject({
      milestone: 'EAR-02',
      ownerName: 'Test audiologist',
      note: 'Test audiologist’s work, which you cover until 4 Dec 2026',
    });
    test.setNow('2026-12-05T09:00:00.000Z');
    expect((await workOf('audiologist-2')).covers).toEqual([]);
  });

  it('shows what is late with others to the coordinator and the lead clinician', async () => {
    const childId = await addChild(test, { leadClinicianId: 'surgeon' });
    await claim('audiologist', childId, 'EAR-01');
    for (const person of ['coordinator', 'surgeon'] as const) {
      expect((await workOf(person)).late.find((item) => item.milestone === 'EAR-01')).toMatchObject({
        note: 'With Test audiologist',
      });
    }
    expect((await workOf('surgeon-2')).late).toEqual([]);
  });

  it('is closed to administrators and auditors', async () => {
    for (const person of ['administrator', 'auditor'] as const)
      expect((await (await test.as(person)).get('/my-work')).status).toBe(403);
  });
});
