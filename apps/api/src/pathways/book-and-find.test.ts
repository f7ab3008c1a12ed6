import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { planPathway } from '@weftway/pathway/plan-pathway';
import { defaultProtocol } from '@weftway/pathway/default-protocol';
import { plainDate } from '@weftway/calendar/plain-date';
import { createTestApp } from '../testing/test-app.ts';
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

describe('bookings, findings, own milestones and questions', () => {
  let test: TestApp;
  beforeAll(async () => {
    test = await createTestApp();
  });
  afterAll(() => test.close());
  const book = async (who: Who, childId: string, milestone: string, on: string | null) =>
    (await test.as(who)).put(`/children/${childId}/milestones/${milestone}/booking`, { on, reason: '' });
  const find = async (who: Who, childId: string, change: object) =>
    (await test.as(who)).post(`/children/${childId}/findings`, {
      name: 'vpi_suspected',
      on: '2026-11-30',
      isPresent: true,
      note: '',
      ...change,
    });
  const add = async (who: Who, childId: string, change: object = {}) =>
    (await test.as(who)).post(`/children/${childId}/own-milestones`, {
      catalogueId: 'OWN-01',
      title: 'Close the hole behind the teeth',
      earliest: '2027-01-04',
      target: '2027-02-01',
      latest: '2027-03-15',
      reason: 'Food comes through',
      ...change,
    });

  it('books an operation, plans its fitness check from it, moves both and takes them back', async () => {
    const childId = await addChild(test);
    pathwayIn(await book('coordinator', childId, 'SURG-01', '2027-01-20'));
    expect(await boardRow(test, childId, 'CARE-04:SURG-01')).toMatchObject({
      earliest: '2026-12-21',
      target: '2027-01-06',
      latest: '2027-01-17',
    });
    pathwayIn(await book('surgeon', childId, 'SURG-01', '2027-01-27'));
    expect(await boardRow(test, childId, 'CARE-04:SURG-01')).toMatchObject({ latest: '2027-01-24' });
    pathwayIn(await book('coordinator', childId, 'SURG-01', null));
    expect(await boardRow(test, childId, 'CARE-04:SURG-01')).toBeUndefined();
    expect(await trailOf(test, childId)).toEqual(['child-registered', 'booking-set', 'booking-set', 'booking-removed']);
    expect(problemOf(await book('coordinator', childId, 'SURG-01', null))).toBe('/problems/milestone-state-refuses');
  });

  it('keeps the holder of a fitness check when a second operation is booked', async () => {
    const childId = await addChild(test);
    await book('coordinator', childId, 'SURG-01', '2027-01-20');
    pathwayIn(
      await (
        await test.as('anaesthetist')
      ).post(`/children/${childId}/milestones/CARE-04/claim`, { part: 'milestone' }),
    );
    await book('coordinator', childId, 'SURG-03', '2027-06-20');
    expect(await boardRow(test, childId, 'CARE-04:SURG-01')).toMatchObject({
      owners: '[["milestone","anaesthetist"]]',
    });
    expect(await boardRow(test, childId, 'CARE-04:SURG-03')).toMatchObject({ owners: '[["milestone",null]]' });
  });

  it('refuses days in the past, what cannot be booked, and other disciplines', async () => {
    const childId = await addChild(test);
    expect(pointersOf(await book('coordinator', childId, 'SURG-01', '2026-11-30'))).toEqual(['/on']);
    expect(problemOf(await book('coordinator', childId, 'PSY-01', '2026-12-30'))).toBe(
      '/problems/milestone-state-refuses',
    );
    expect(problemOf(await book('audiologist', childId, 'SURG-01', '2026-12-30'))).toBe('/problems/not-allowed');
    expect(problemOf(await book('coordinator', 'nobody', 'SURG-01', '2026-12-30'))).toBe('/problems/not-found');
  });

  it('puts a milestone on the path when its finding is recorded, and takes it off again', async () => {
    const childId = await addChild(test, { bornOn: '2022-01-01' });
    expect(await boardRow(test, childId, 'SPCH-05')).toBeUndefined();
    pathwayIn(await find('speech-therapist', childId, {}));
    expect(await boardRow(test, childId, 'SPCH-05')).toMatchObject({ earliest: '2026-11-30', latest: '2027-05-30' });
    pathwayIn(await find('speech-therapist', childId, { isPresent: false }));
    expect(await boardRow(test, childId, 'SPCH-05')).toBeUndefined();
    expect(await trailOf(test, childId)).toEqual(['child-registered', 'finding-recorded', 'finding-withdrawn']);
  });

  it('refuses findings that the protocol does not know, days that cannot be, and the coordinator', async () => {
    const childId = await addChild(test);
    expect(pointersOf(await find('surgeon', childId, { name: 'likes_music' }))).toEqual(['/name']);
    expect(pointersOf(await find('surgeon', childId, { name: 'palate' }))).toEqual(['/name']);
    expect(pointersOf(await find('surgeon', childId, { on: '2026-12-02' }))).toEqual(['/on']);
    expect(pointersOf(await find('surgeon', childId, { on: '2026-08-01' }))).toEqual(['/on']);
    expect(pointersOf(await find('surgeon', childId, { isPresent: false }))).toEqual(['/name']);
    expect(problemOf(await find('coordinator', childId, {}))).toBe('/problems/not-allowed');
    expect(problemOf(await find('surgeon', 'nobody', {}))).toBe('/problems/not-found');
  });

  it('adds a milestone of the catalogue with exactly the days that were given', async () => {
    const childId = await addChild(test);
    const answer = await add('surgeon', childId);
    expect(answer.status, JSON.stringify(answer.body)).toBe(201);
    expect(pathwayIn(answer).ownMilestones).toMatchObject([{ id: 'OWN-01', title: 'Close the hole behind the teeth' }]);
    expect(await boardRow(test, childId, 'OWN-01')).toMatchObject({
      state: 'ahead',
      earliest: '2027-01-04',
      target: '2027-02-01',
      latest: '2027-03-15',
    });
    await write(test, [
      {
        kind: 'child-edited',
        childId,
        after: { fields: { ...pathwayIn(answer).child.fields, bornOn: plainDate('2026-08-22') } },
      },
    ]);
    test.setNow('2027-01-05T09:00:00.000Z');
    pathwayIn(await add('surgeon', childId, { title: 'A second look', earliest: '2027-02-01' }));
    expect(await boardRow(test, childId, 'OWN-01')).toMatchObject({
      state: 'open',
      earliest: '2027-01-04',
      target: '2027-02-01',
      latest: '2027-03-15',
    });
    expect(await boardRow(test, childId, 'OWN-02')).toMatchObject({ earliest: '2027-02-01' });
    pathwayIn(
      await (await test.as('surgeon')).post(`/children/${childId}/milestones/OWN-01/claim`, { part: 'milestone' }),
    );
    test.setNow('2026-12-01T09:00:00.000Z');
  });

  it('refuses own milestones with days out of order, of no catalogue, and from the coordinator', async () => {
    const childId = await addChild(test);
    expect(pointersOf(await add('surgeon', childId, { target: '2027-01-01' }))).toEqual(['/target']);
    expect(
      pointersOf(await add('surgeon', childId, { earliest: '2026-09-01', target: '2026-09-02', latest: '2026-11-30' })),
    ).toEqual(['/latest']);
    expect(pointersOf(await add('surgeon', childId, { catalogueId: 'OWN-99' }))).toEqual(['/catalogueId']);
    expect(problemOf(await add('coordinator', childId))).toBe('/problems/not-allowed');
    expect(problemOf(await add('surgeon', 'nobody'))).toBe('/problems/not-found');
  });

  it('answers what would move without writing anything', async () => {
    const childId = await addChild(test, { bornOn: '2026-08-20' });
    const counted = async (): Promise<unknown> =>
      test.db.raw(
        'select (select version from board_counter) as board, (select count(*) from trail_lines) as lines, (select pathway_version from children where id = ?) as child',
        [childId],
      );
    const surgeon = await test.as('surgeon');
    const before = await counted();
    const answer = await surgeon.post(`/children/${childId}/what-if`, {
      milestone: 'SURG-01',
      change: { kind: 'slip', weeks: 40 },
    });
    expect(await counted()).toEqual(before);
    expect(answer.status).toBe(200);
    const { moved } = answer.body as { moved: { milestone: string; days: number }[] };
    expect(moved.find((one) => one.milestone === 'SURG-03')?.days).toBeGreaterThan(0);
    expect(
      pointersOf(
        await surgeon.post(`/children/${childId}/what-if`, { milestone: 'SURG-06', change: { kind: 'waive' } }),
      ),
    ).toEqual(['/milestone']);
    expect(
      problemOf(await surgeon.post(`/children/nobody/what-if`, { milestone: 'SURG-01', change: { kind: 'waive' } })),
    ).toBe('/problems/not-found');
  });

  it('moves a child to another version of the protocol and plans it again', async () => {
    const childId = await addChild(test);
    const milestones = defaultProtocol.milestones.map((rule) =>
      rule.id === 'SURG-01' ? { ...rule, window: { ...rule.window, latest: '7m' } } : rule,
    );
    await write(test, [
      {
        kind: 'protocol-added',
        after: { version: 2, document: { ...defaultProtocol, version: 2, milestones }, changes: 'Later lip' },
      },
    ]);
    const move = async (who: Who, version: number) =>
      (await test.as(who)).put(`/children/${childId}/protocol-version`, { version, reason: 'Team decision' });
    expect(pointersOf(await move('coordinator', 2))).toEqual(['/version']);
    expect(pointersOf(await move('coordinator', 3))).toEqual(['/version']);
    await write(test, [{ kind: 'protocol-activated', after: { version: 2, agreedBy: 'Dr Sol', reason: 'Agreed' } }]);
    expect(problemOf(await move('audiologist', 2))).toBe('/problems/not-allowed');
    expect(pathwayIn(await move('coordinator', 2)).protocolVersion).toBe(2);
    expect(await boardRow(test, childId, 'SURG-01')).toMatchObject({ latest: '2027-03-20' });
    expect((await trailOf(test, childId)).at(-1)).toBe('child-moved-to-protocol');
  });

  it('reads the pathway with its version as tag, logs looks and refusals, and answers 304 only to those who may look', async () => {
    const childId = await addChild(test, { bornOn: '2026-03-01' });
    await write(test, [done(childId, 'SURG-01', '2026-06-01')]);
    const surgeon = await test.as('surgeon');
    const first = await surgeon.get(`/children/${childId}/pathway`);
    const pathway = pathwayIn(first);
    expect(first.headers['etag']).toBe(`"${String(pathway.version)}"`);
    expect(
      (await surgeon.get(`/children/${childId}/pathway`).set('if-none-match', `"${String(pathway.version)}"`)).status,
    ).toBe(304);
    expect(
      (
        await (
          await test.as('trainee')
        )
          .get(`/children/${childId}/pathway`)
          .set('if-none-match', `"${String(pathway.version)}"`)
      ).status,
    ).toBe(403);
    expect((await (await test.as('administrator')).get(`/children/${childId}/pathway`)).status).toBe(403);
    expect(
      test.services.accessLog.read({ child: childId, limit: 10 }).map((line) => [line.actorId, line.operation]),
    ).toEqual([
      ['administrator', 'readPathway refused'],
      ['trainee', 'readPathway refused'],
      ['surgeon', 'readPathway'],
      ['surgeon', 'readPathway'],
    ]);
    const row = await boardRow(test, childId, 'SURG-03');
    const planned = planPathway(defaultProtocol, pathway.facts, plainDate('2026-12-01')).milestones.find(
      (one) => one.key === 'SURG-03',
    );
    expect([planned?.state, planned?.window?.earliest, planned?.window?.latest]).toEqual([
      row?.state,
      row?.earliest,
      row?.latest,
    ]);
    await sign(test, surgeon, childId, 'TEAM-04');
    expect(
      (await surgeon.get(`/children/${childId}/pathway`).set('if-none-match', `"${String(pathway.version)}"`)).status,
    ).toBe(200);
  });
});
