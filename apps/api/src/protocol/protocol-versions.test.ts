import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { defaultProtocol } from '@weftway/pathway/default-protocol';
import type { MilestoneRule, Protocol } from '@weftway/pathway/protocol';
import { childFields } from '../testing/child-fields.ts';
import { createTestApp, testPassword } from '../testing/test-app.ts';
import type { TestApp, TestBrowser } from '../testing/test-app.ts';

const changed = (id: string, change: (rule: MilestoneRule) => unknown): unknown => ({
  ...defaultProtocol,
  milestones: defaultProtocol.milestones.map((rule) => (rule.id === id ? change(rule) : rule)),
});

const laterLip = changed('SURG-01', (rule) => ({ ...rule, window: { earliest: '4m', target: '5m', latest: '8m' } }));

const activation = {
  password: testPassword,
  agreedBy: 'Test surgeon',
  reason: 'Agreed at the yearly meeting',
  moveOpenChildren: false,
};

let app: TestApp;
let administrator: TestBrowser;
let surgeon: TestBrowser;
let coordinator: TestBrowser;

beforeAll(async () => {
  app = await createTestApp();
  [administrator, surgeon, coordinator] = await Promise.all([
    app.as('administrator'),
    app.as('surgeon'),
    app.as('coordinator'),
  ]);
});
afterAll(async () => app.close());

const register = async (recordNumber: string): Promise<string> => {
  const answer = await coordinator.post('/children', {
    fields: childFields({
      recordNumber,
      familyName: `Sandling ${recordNumber}`,
      bornOn: '2026-11-01',
      referredOn: '2026-11-02',
      teamStartOn: '2026-11-02',
    }),
    isDistinct: true,
  });
  expect(answer.status).toBe(201);
  return String((answer.body as { id: string }).id); // contract of registerChild
};

const lipRow = async (childId: string): Promise<{ earliest: string }> => {
  const row: { earliest: string } | undefined = await app
    .db('board_rows')
    .where({ child_id: childId, milestone: 'SURG-01' })
    .first('earliest');
  if (row === undefined) throw new Error('The lip repair is not on the path');
  return row;
};

describe('versions of the protocol', () => {
  test('a member reads every version and the whole of one', async () => {
    const list = await surgeon.get('/protocols');
    expect(list.status).toBe(200);
    expect(list.body.protocols).toMatchObject([{ version: 1, status: 'active', createdBy: 'Founding of the team' }]);
    const one = await surgeon.get('/protocols/1');
    expect((one.body as { protocol: Protocol }).protocol.milestones).toHaveLength(66);
    expect((await surgeon.get('/protocols/99')).status).toBe(404);
    expect((await surgeon.get('/protocols/one')).status).toBe(404);
  });

  test('a check names each fault and its place, and writes nothing', async () => {
    const crossing = changed('SURG-03', (rule) => ({
      ...rule,
      window: { earliest: '9m', target: '6m', latest: '13m' },
    }));
    const answer = await surgeon.post('/protocol-checks', { protocol: crossing });
    expect(answer.status).toBe(200);
    expect(answer.body.faults).toContainEqual({
      pointer: expect.stringMatching(/^\/milestones\/\d+\/window$/),
      milestone: 'SURG-03',
      message: 'The target 6m comes before the earliest day 9m.',
    });
    expect((await surgeon.get('/protocols')).body.protocols).toHaveLength(1);
  });

  test('a circle is named whole', async () => {
    const circle = changed('SURG-01', (rule) => ({
      ...rule,
      prerequisites: [...rule.prerequisites, { milestone: 'SURG-04', type: 'gate' }],
    }));
    const { body } = await surgeon.post('/protocol-checks', { protocol: circle });
    expect(JSON.stringify(body)).toContain('SURG-01 → SURG-04 → SURG-03 → SURG-01');
  });

  test('a protocol with faults is refused with all of them', async () => {
    const answer = await surgeon.post('/protocols', { protocol: { name: 'Half a protocol' }, changes: 'Nothing good' });
    expect(answer.status).toBe(422);
    expect(answer.body.type).toBe('/problems/protocol-has-faults');
    expect(answer.body.faults.length).toBeGreaterThan(1);
    expect(answer.body.errors[0].pointer).toMatch(/^\/protocol\//);
  });

  test('a huge protocol is refused before it is walked', async () => {
    const many = { ...defaultProtocol, milestones: Array.from({ length: 301 }, () => defaultProtocol.milestones[0]) };
    const { body } = await surgeon.post('/protocol-checks', { protocol: many });
    expect(body.faults).toEqual([
      { pointer: '/milestones', message: 'A protocol holds at most 300 milestones; this one has 301.' },
    ]);
  });

  test('a good one is kept as a draft under the next number, with its line in the trail', async () => {
    const answer = await surgeon.post('/protocols', { protocol: laterLip, changes: 'Lip repair at five months' });
    expect(answer.status).toBe(201);
    expect(answer.body).toMatchObject({
      version: 2,
      status: 'draft',
      changes: 'Lip repair at five months',
      createdBy: 'Test surgeon',
      children: 0,
    });
    expect((await surgeon.get('/protocols/2')).body.protocol).toMatchObject({
      version: 2,
      changes: 'Lip repair at five months',
    });
    expect(
      await app.db('trail_lines').where({ kind: 'protocol-added', actor_id: 'surgeon' }).first('seq'),
    ).toBeDefined();
  });
});

describe('activation', () => {
  test('belongs to the administrator, with the password', async () => {
    expect((await surgeon.post('/protocols/2/activation', activation)).status).toBe(403);
    const wrong = await administrator.post('/protocols/2/activation', {
      ...activation,
      password: 'not my password at all',
    });
    expect(wrong.body.type).toBe('/problems/wrong-password');
    const nameless = await administrator.post('/protocols/2/activation', { ...activation, agreedBy: ' ' });
    expect(nameless.body.errors).toContainEqual({ pointer: '/agreedBy', detail: 'Name the clinical lead who agreed.' });
    expect((await administrator.post('/protocols/9/activation', activation)).status).toBe(404);
  });

  test('children on the path stay with their version; new ones follow the new one', async () => {
    const before = await register('TE-5001');
    const opens = (await lipRow(before)).earliest;
    const answer = await administrator.post('/protocols/2/activation', activation);
    expect(answer.status).toBe(200);
    expect(answer.body).toMatchObject({
      version: 2,
      status: 'active',
      activatedBy: 'Test administrator',
      agreedBy: 'Test surgeon',
    });
    expect((await lipRow(before)).earliest).toBe(opens);
    const after = await register('TE-5002');
    expect([opens, (await lipRow(after)).earliest]).toEqual(['2027-01-10', '2027-03-01']);
    expect(
      (await administrator.get('/protocols')).body.protocols.map((head: { status: string; children: number }) => [
        head.status,
        head.children,
      ]),
    ).toEqual([
      ['active', 1],
      ['retired', 1],
    ]);
    expect((await administrator.post('/protocols/2/activation', activation)).body.type).toBe('/problems/already-done');
  });

  test('moving the open children replans them, and the trail says which windows moved', async () => {
    const pinned = await register('TE-5003');
    await surgeon.post('/protocols', { protocol: defaultProtocol, changes: 'Back to three months' });
    const moved = await administrator.post('/protocols/3/activation', { ...activation, moveOpenChildren: true });
    expect(moved.status).toBe(200);
    expect(moved.body.children).toBe(3);
    expect((await lipRow(pinned)).earliest).toBe('2027-01-10');
    const line: { after: string } | undefined = await app
      .db('trail_lines')
      .join('trail_payloads', 'trail_payloads.seq', 'trail_lines.seq')
      .where({ kind: 'child-moved-to-protocol', child_id: pinned })
      .first('after');
    const payload = JSON.parse(line?.after ?? '{}') as {
      version: number;
      reason: string;
      moved: { milestone: string }[];
    };
    expect(payload).toMatchObject({
      version: 3,
      reason: 'Protocol 3 became the active one: Agreed at the yearly meeting',
    });
    expect(payload.moved.map(({ milestone }) => milestone)).toContain('SURG-01');
  });

  test('a version without a milestone that a child holds can be moved to', async () => {
    const held = await register('TE-5004');
    const claimed = await (
      await app.as('nurse')
    ).post(`/children/${held}/milestones/TEAM-02/claim`, { part: 'milestone' });
    expect([200, 404]).toContain(claimed.status);
    const without = {
      ...defaultProtocol,
      milestones: defaultProtocol.milestones
        .filter((rule) => rule.id !== 'ADLT-02')
        .map((rule) => ({
          ...rule,
          moves: rule.moves.filter((id) => id !== 'ADLT-02'),
          prerequisites: rule.prerequisites.filter((one) => one.milestone !== 'ADLT-02'),
        })),
    };
    const added = await surgeon.post('/protocols', { protocol: without, changes: 'No dental home' });
    if (added.status !== 201) expect(added.body.faults).toEqual([]);
    expect(
      (
        await administrator.post(`/protocols/${String(added.body.version)}/activation`, {
          ...activation,
          moveOpenChildren: true,
        })
      ).status,
    ).toBe(200);
    expect(await app.db('board_rows').where({ child_id: held, milestone: 'ADLT-02' }).first('state')).toBeUndefined();
  });
});
