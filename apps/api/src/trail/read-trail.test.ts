import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { TrailLine } from '@weftway/contract/trail';
import { addChild, evidence, write } from '../testing/pathway-builders.ts';
import { createTestApp } from '../testing/test-app.ts';
import type { TestApp, TestPerson } from '../testing/test-app.ts';
import { dayBegins } from './read-days.ts';

let app: TestApp;
let wren: string;
let lark: string;

beforeAll(async () => {
  app = await createTestApp();
  wren = await addChild(app, { firstName: 'Wren', familyName: 'Sandling', bornOn: '2026-09-01' });
  lark = await addChild(app, { firstName: 'Lark', familyName: 'Merrow', bornOn: '2026-09-02' });
});
afterAll(async () => app.close());

const linesFor = async (person: TestPerson, query = ''): Promise<TrailLine[]> => {
  const answer = await (await app.as(person)).get(`/trail?limit=200${query}`);
  expect(answer.status).toBe(200);
  return (answer.body as { items: TrailLine[] }).items; // contract of readTrail
};

describe('changes', () => {
  test('stand newest first, with names and contents for the coordinator', async () => {
    const lines = await linesFor('coordinator');
    expect(lines.map(({ seq }) => seq)).toEqual([...lines.map(({ seq }) => seq)].sort((a, b) => b - a));
    expect(lines.find((line) => line.childId === wren)).toMatchObject({
      kind: 'child-registered',
      childName: 'Wren Sandling',
      summary: 'Child registered',
      after: { fields: { familyName: 'Sandling' } },
      log: 'changes',
    });
  });

  test.each(['administrator', 'auditor'] as const)('come without names and contents for the %s', async (person) => {
    const lines = await linesFor(person);
    expect(lines.find((line) => line.childId === wren)).toMatchObject({
      kind: 'child-registered',
      childName: null,
      before: null,
      after: null,
    });
    expect(JSON.stringify(lines)).not.toMatch(/Wren|Sandling|Merrow/);
  });

  test('a clinician reads their own acts and no others', async () => {
    const nurse = await app.as('nurse');
    const claimed = await nurse.post(`/children/${wren}/milestones/CARE-01/claim`, { part: 'milestone' });
    expect(claimed.status).toBe(200);
    const lines = await linesFor('nurse');
    expect(lines.map(({ actorId, kind }) => [actorId, kind])).toEqual([
      ['nurse', 'signed-in'],
      ['nurse', 'milestone-claimed'],
      ['nurse', 'signed-in'],
    ]);
    expect(lines[1]?.childName).toBe('Wren Sandling');
    expect(await linesFor('nurse', '&member=coordinator')).toEqual([]);
    expect((await linesFor('surgeon')).map(({ kind }) => kind)).toEqual(['signed-in']);
  });

  test('are not for a trainee, nor for somebody signed out', async () => {
    expect((await (await app.as('trainee')).get('/trail')).status).toBe(403);
  });

  test('can be narrowed to a child, a member, a kind and days', async () => {
    expect((await linesFor('coordinator', `&child=${lark}`)).map(({ childId }) => childId)).toEqual([lark]);
    expect(
      (await linesFor('coordinator', '&member=nurse')).every(
        (line) => line.actorId === 'nurse' || line.memberId === 'nurse',
      ),
    ).toBe(true);
    expect((await linesFor('coordinator', '&kind=protocol-activated')).map(({ kind }) => kind)).toEqual([
      'protocol-activated',
    ]);
    expect(await linesFor('coordinator', '&to=2026-11-30')).toEqual([]);
    expect(await linesFor('coordinator', '&from=2026-12-02')).toEqual([]);
    expect((await linesFor('coordinator', '&from=2026-12-01&to=2026-12-01')).length).toBeGreaterThan(10);
  });

  test('page on with a cursor, and refuse one that was made up', async () => {
    const coordinator = await app.as('coordinator');
    const first = await coordinator.get('/trail?limit=3');
    const second = await coordinator.get(`/trail?limit=3&cursor=${String(first.body.next)}`);
    expect(second.body.items[0].seq).toBe(first.body.items[2].seq - 1);
    expect((await coordinator.get('/trail?cursor=1%20or%201')).body.errors[0].pointer).toBe('/cursor');
    expect((await coordinator.get('/trail?from=2026-12-02&to=2026-12-01')).body.errors[0].pointer).toBe('/to');
  });

  test('a protocol version is told in short, not as a whole document', async () => {
    const [line] = await linesFor('coordinator', '&kind=protocol-added');
    expect(line?.after).toMatchObject({ version: 1, milestones: 66 });
    expect(JSON.stringify(line).length).toBeLessThan(1500);
  });

  test('private evidence stays private in the trail too', async () => {
    const values = evidence('PSY-01', 'milestone', { support_offered: 'canary-of-the-mother' });
    await write(app, [
      {
        kind: 'draft-saved',
        childId: wren,
        milestone: 'PSY-01',
        after: { part: 'milestone', occurrence: 1, values, performedOn: null, isReady: false },
      },
    ]);
    const [line] = await linesFor('coordinator', '&kind=draft-saved');
    expect(line?.after).toMatchObject({ values: { support_offered: 'Kept private' } });
    expect(JSON.stringify(await linesFor('coordinator'))).not.toContain('canary-of-the-mother');
  });
});

describe('reads', () => {
  test('L05: each read of a child leaves one line', async () => {
    const surgeon = await app.as('surgeon');
    const before = (await linesFor('coordinator', '&log=reads')).length;
    for (let time = 0; time < 3; time += 1) expect((await surgeon.get(`/children/${lark}`)).status).toBe(200);
    expect((await surgeon.get('/children/nobody-at-all')).status).toBe(404);
    const lines = await linesFor('coordinator', '&log=reads');
    expect(lines.length).toBe(before + 4);
    expect(lines[0]).toMatchObject({ kind: 'readChild refused', actorId: 'surgeon', childId: 'nobody-at-all' });
    expect(lines[1]).toMatchObject({
      kind: 'readChild',
      actorId: 'surgeon',
      childId: lark,
      childName: 'Lark Merrow',
      log: 'reads',
    });
    expect((await linesFor('surgeon', '&log=reads')).length).toBe(4);
    expect((await linesFor('auditor', '&log=reads&kind=refused')).length).toBeGreaterThan(0);
    expect(await linesFor('surgeon', '&log=reads&member=nurse')).toEqual([]);
    expect(JSON.stringify(await linesFor('auditor', '&log=reads'))).not.toMatch(/Lark|Merrow/);
  });

  test('what somebody signed in may not do leaves a line as well, without a child where it names none', async () => {
    const auditor = await app.as('auditor');
    expect((await auditor.get(`/children/${lark}`)).status).toBe(403);
    expect((await auditor.post('/members', {})).status).toBe(403);
    const lines = await linesFor('coordinator', '&log=reads&kind=refused&member=auditor');
    expect(lines.map(({ kind, childId }) => [kind, childId])).toEqual([
      ['inviteMember refused', null],
      ['readChild refused', lark],
    ]);
  });

  test('reading the changes of one child is a read of that child', async () => {
    const before = (await linesFor('coordinator', `&log=reads&child=${wren}`)).length;
    await linesFor('coordinator', `&child=${wren}`);
    const lines = await linesFor('coordinator', `&log=reads&child=${wren}`);
    expect([lines.length - before, lines[0]?.kind]).toEqual([1, 'readTrail']);
  });
});

describe('a check of the chains', () => {
  test('proves changes and reads for those who may ask', async () => {
    const answer = await (await app.as('auditor')).post('/trail-checks');
    expect(answer.status).toBe(200);
    expect(answer.body).toMatchObject({ brokenAt: null, why: null, reads: { brokenAt: null } });
    expect(answer.body.lines).toBeGreaterThan(10);
    expect((await (await app.as('surgeon')).post('/trail-checks')).status).toBe(403);
  });

  test('names the first line that does not fit', async () => {
    await app.db.raw('drop trigger trail_lines_no_update');
    await app.db('trail_lines').where({ seq: 5 }).update({ actor_name: 'Nobody' });
    const answer = await (await app.as('coordinator')).post('/trail-checks');
    expect(answer.body).toMatchObject({
      lines: 4,
      brokenAt: 5,
      why: 'Line 5 itself was altered: its own hash does not fit.',
    });
  });
});

describe('days of the team', () => {
  test.each([
    ['2026-12-01', 'UTC', '2026-12-01T00:00:00.000Z'],
    ['2026-07-01', 'Europe/London', '2026-06-30T23:00:00.000Z'],
    ['2026-03-29', 'Europe/London', '2026-03-29T00:00:00.000Z'],
    ['2026-03-30', 'Europe/London', '2026-03-29T23:00:00.000Z'],
    ['2026-10-25', 'Europe/London', '2026-10-24T23:00:00.000Z'],
    ['2026-11-01', 'America/New_York', '2026-11-01T04:00:00.000Z'],
    ['2026-11-02', 'America/New_York', '2026-11-02T05:00:00.000Z'],
    ['2026-06-01', 'Australia/Lord_Howe', '2026-05-31T13:30:00.000Z'],
    ['2026-06-01', 'Asia/Kathmandu', '2026-05-31T18:15:00.000Z'],
  ])('%s begins in %s at %s', (date, zone, instant) => {
    expect(dayBegins(date, zone)).toBe(instant);
  });
});
