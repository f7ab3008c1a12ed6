import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { registerChild } from '../testing/held-work.ts';
import { createTestApp } from '../testing/test-app.ts';
import type { TestApp } from '../testing/test-app.ts';

let test: TestApp;
beforeAll(async () => {
  test = await createTestApp();
  await registerChild(test, 'child-1', 'TE-0001');
});
afterAll(() => test.close());

const settings = { name: 'Tern Estuary Cleft Team', zone: 'Europe/Warsaw', sites: ['Tern Quay', 'Saltmarsh'] };
const save = async (change: object, version: number) =>
  (await test.as('administrator'))
    .put('/team-settings', { ...settings, ...change })
    .set('if-match', `"${String(version)}"`);

describe('the settings of the team', () => {
  it('show every limit by its name, and how the server runs', async () => {
    const { body } = await (await test.as('administrator')).get('/team-settings');
    expect(body).toMatchObject({ name: settings.name, zone: 'UTC', version: 1, mode: 'demo', mail: 'kept-here' });
    expect(body.limits).toContainEqual({ name: 'idle.administrator', value: 600 });
    expect(body.limits).toContainEqual({ name: 'jsonBytes', value: 262_144 });
  });

  it('are for an administrator', async () => {
    expect((await (await test.as('coordinator')).get('/team-settings')).status).toBe(403);
  });

  it('change by the version that was read, and the trail says from what to what', async () => {
    const answer = await save({ sites: ['Tern Quay', 'Saltmarsh', 'Heron Lock'] }, 1);
    expect(answer.body).toMatchObject({ version: 2, zone: 'Europe/Warsaw' });
    expect(answer.headers['etag']).toBe('"2"');
    const stale = await save({ name: 'Another name' }, 1);
    expect(stale.status).toBe(412);
    expect(stale.body.current).toMatchObject({ version: 2 });
    const session = await (await test.as('nurse')).get('/session');
    expect(session.body.team).toEqual({ name: settings.name, zone: 'Europe/Warsaw' });
  });

  it.each([
    ['a zone that is none', { zone: 'Tern/Estuary' }, '/zone'],
    ['a zone by its distance', { zone: '+02:00' }, '/zone'],
    ['no name', { name: ' ' }, '/name'],
    ['no site', { sites: [] }, '/sites'],
    ['one site twice', { sites: ['Tern Quay', 'tern quay'] }, '/sites'],
    ['a site gone where children are seen', { sites: ['Saltmarsh'] }, '/sites'],
  ])('with %s are pointed at', async (_what, change, pointer) => {
    const answer = await save(change, 2);
    expect(answer.status).toBe(400);
    expect(answer.body.errors[0].pointer).toBe(pointer);
  });
});
