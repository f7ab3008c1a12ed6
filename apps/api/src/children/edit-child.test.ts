import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { childFields } from '../testing/child-fields.ts';
import { createTestApp } from '../testing/test-app.ts';
import type { TestApp, TestPerson } from '../testing/test-app.ts';

let test: TestApp;
let childId: string;
beforeEach(async () => {
  test = await createTestApp();
  const answer = await (await test.as('coordinator')).post('/children', { fields: childFields(), isDistinct: false });
  childId = answer.body.id;
});
afterEach(() => test.close());

const edit = async (person: TestPerson, fields: object, version = 1) =>
  (await test.as(person)).patch(`/children/${childId}`, fields).set('if-match', `"${version}"`);

describe("changing a child's record", () => {
  it('moves the version and keeps before and after in the trail', async () => {
    const answer = await edit('coordinator', childFields({ familyName: 'Okonjo-Bell' }));
    expect(answer.status).toBe(200);
    expect(answer.body.version).toBe(2);
    const changes = await (await test.as('surgeon')).get(`/children/${childId}/changes`);
    expect(changes.body.items[0]).toMatchObject({
      kind: 'child-edited',
      actorName: 'Test coordinator',
      changes: [{ field: 'familyName', before: 'Okonjo', after: 'Okonjo-Bell' }],
    });
    expect(changes.body.items[1]).toMatchObject({ kind: 'child-registered', changes: [] });
  });

  it('refuses to overwrite what somebody else saved, and shows it', async () => {
    await edit('coordinator', childFields({ notes: 'Prefers mornings' }));
    const answer = await edit('nurse', childFields({ firstName: 'Amarachi' }));
    expect(answer.status).toBe(412);
    expect(answer.body).toMatchObject({
      current: { version: 2, fields: { notes: 'Prefers mornings' } },
      versions: { yours: 1, current: 2 },
    });
  });

  it('asks for the version', async () => {
    const answer = await (await test.as('coordinator')).patch(`/children/${childId}`, childFields());
    expect(answer.status).toBe(428);
  });

  it('keeps the cleft from the coordinator and identity from the surgeon', async () => {
    const byCoordinator = await edit('coordinator', childFields({ cleft: 'LAHS•••', flags: ['robin'] }));
    expect(byCoordinator.body.errors.map((error: { pointer: string }) => error.pointer)).toEqual(['/cleft', '/flags']);
    const bySurgeon = await edit('surgeon', childFields({ cleft: 'LAHS•••', familyName: 'Bell' }));
    expect(bySurgeon.body.errors).toEqual([
      { pointer: '/familyName', detail: 'The coordinator or a nurse changes this.' },
    ]);
    expect((await edit('surgeon', childFields({ cleft: 'LAHS•••', isCleftProvisional: false }))).status).toBe(200);
  });

  it.each(['dentist', 'trainee', 'auditor'] as const)('is not for the %s', async (person) => {
    expect((await edit(person, childFields({ notes: 'x' }))).status).toBe(403);
  });

  it('does not find a child that is not there', async () => {
    const answer = await (await test.as('coordinator')).patch('/children/nobody', childFields()).set('if-match', '"1"');
    expect(answer.status).toBe(404);
  });

  it('writes nothing when nothing changed', async () => {
    expect((await edit('coordinator', childFields())).body.version).toBe(1);
  });

  it('makes an expected child a born one, and plans again when a birth date moves', async () => {
    const browser = await test.as('coordinator');
    const expected = childFields({
      recordNumber: 'TE-0009',
      firstName: 'Baby',
      bornOn: null,
      dueOn: '2026-11-28',
      gestation: null,
      referredOn: null,
      teamStartOn: null,
    });
    const { body } = await browser.post('/children', { fields: expected, isDistinct: false });
    const born = await browser
      .patch(`/children/${body.id}`, { ...expected, bornOn: '2026-11-25' })
      .set('if-match', '"1"');
    expect(born.status).toBe(200);
    const windowOf = async () =>
      test.db('board_rows').where({ child_id: body.id, milestone: 'SURG-01' }).first('target');
    const before = await windowOf();
    await browser.patch(`/children/${body.id}`, { ...expected, bornOn: '2026-11-20' }).set('if-match', '"2"');
    expect(await windowOf()).not.toEqual(before);
  });
});

describe('opening a record', () => {
  it('is kept in the log of reads and carries the version', async () => {
    const browser = await test.as('dentist');
    const answer = await browser.get(`/children/${childId}`);
    expect(answer.headers['etag']).toBe('"1"');
    expect(test.services.accessLog.read({ child: childId, limit: 5 })).toMatchObject([
      { actorId: 'dentist', operation: 'readChild' },
    ]);
    expect((await browser.get(`/children/${childId}`).set('if-none-match', '"1"')).status).toBe(304);
  });

  it('says who can open it for a trainee who is not assigned, until assigned', async () => {
    const trainee = await test.as('trainee');
    const closed = await trainee.get(`/children/${childId}`);
    expect(closed.status).toBe(403);
    expect(closed.body.detail).toContain('Test coordinator (coordinator)');
    expect(closed.text).not.toContain('Okonjo');
    expect(
      (await (await test.as('surgeon')).put(`/children/${childId}/trainees`, { memberIds: ['trainee'] })).body,
    ).toEqual({ memberIds: ['trainee'] });
    expect((await trainee.get(`/children/${childId}`)).status).toBe(200);
    expect((await trainee.get('/children/nobody')).status).toBe(404);
  });

  it('is closed to administrators and strangers', async () => {
    expect((await (await test.as('administrator')).get(`/children/${childId}`)).status).toBe(403);
  });

  it('assigns trainees only', async () => {
    const answer = await (
      await test.as('surgeon')
    ).put(`/children/${childId}/trainees`, { memberIds: ['trainee', 'dentist'] });
    expect(answer.body.errors).toEqual([
      { pointer: '/memberIds/1', detail: 'This person is not a trainee on the team today.' },
    ]);
  });
});
