/**
 * Who gets through which route, driven from the permission table and the list of endpoints alone: a new endpoint or a
 * new row joins by itself. A cell that is left out must answer 401 or 403; a cell that is there must not.
 */
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { permissionTable } from '@weftway/abilities/permission-table';
import type { PermissionRow, Reach, Role } from '@weftway/abilities/permission-table';
import { defaultProtocol } from '@weftway/pathway/default-protocol';
import { disciplines } from '@weftway/team/disciplines';
import { endpoints } from '../apps/api/src/endpoints.ts';
import type { AnyEndpoint } from '../apps/api/src/http/endpoint.ts';
import { serveEndpoint } from '../apps/api/src/http/serve-endpoint.ts';
import { addChild, problemOf, write } from '../apps/api/src/testing/pathway-builders.ts';
import { createTestApp, openBrowser } from '../apps/api/src/testing/test-app.ts';
import type { TestApp, TestBrowser, TestPerson } from '../apps/api/src/testing/test-app.ts';

const people = [...disciplines, 'trainee', 'administrator', 'auditor'] as const satisfies readonly TestPerson[];
type Who = (typeof people)[number] | 'nobody';

/** The columns of the table that a person stands in, written apart from the code under test. */
const columnsOf = (who: Who): readonly Role[] => {
  if (who === 'nobody') return [];
  if (who === 'coordinator' || who === 'trainee' || who === 'administrator' || who === 'auditor') return [who];
  return [who, 'clinician'];
};

const rowOf = (can: { readonly action: string; readonly subject: string }): PermissionRow | undefined =>
  (permissionTable as readonly PermissionRow[]).find((row) => row.action === can.action && row.subject === can.subject);

const reachesOf = (who: Who, row: PermissionRow): Reach[] => columnsOf(who).flatMap((role) => row.who[role] ?? []);

type Verdict = 'through' | 401 | 403;
const expected = (who: Who, { can }: AnyEndpoint): Verdict => {
  if (can === 'anyone') return 'through';
  if (who === 'nobody') return 401;
  if (can === 'signed-in') return 'through';
  const row = rowOf(can);
  return row !== undefined && reachesOf(who, row).length > 0 ? 'through' : 403;
};

const actual = (status: number): Verdict => (status === 401 ? 401 : status === 403 ? 403 : 'through');

const sampleParams = (who: Who, childId: string): Readonly<Record<string, string>> => ({
  childId,
  milestone: 'SURG-01',
  memberId: who,
  version: '1',
});

const pathOf = (endpoint: AnyEndpoint, who: Who, childId: string): string =>
  endpoint.operation.path.replace(
    /:(\w+)/g,
    (_all, name: string) => sampleParams(who, childId)[name] ?? 'none-of-these',
  );

const send = (browser: TestBrowser, { operation }: AnyEndpoint, path: string) => {
  switch (operation.method) {
    case 'GET':
      return browser.get(path);
    case 'POST':
      return browser.post(path);
    case 'PUT':
      return browser.put(path);
    case 'PATCH':
      return browser.patch(path);
    case 'DELETE':
      return browser.delete(path);
  }
};

describe('every route', () => {
  let test: TestApp;
  let childId: string;
  const browsers = new Map<Who, TestBrowser>();
  beforeAll(async () => {
    test = await createTestApp();
    childId = await addChild(test);
    await write(test, [{ kind: 'trainees-assigned', childId, after: { memberIds: ['trainee'] } }]);
    for (const who of people) browsers.set(who, await test.as(who));
    browsers.set('nobody', await openBrowser(test.app, null));
  }, 60_000);
  afterAll(() => test.close());
  const browserOf = (who: Who): TestBrowser => {
    const browser = browsers.get(who);
    if (browser === undefined) throw new Error(`No browser of ${who}`);
    return browser;
  };

  // Signing out ends the session that the others need; it comes last.
  const inOrder = [...endpoints].sort(
    (left, right) => Number(left.operation.name === 'signOut') - Number(right.operation.name === 'signOut'),
  );
  it.each(inOrder.map((endpoint) => [endpoint.operation.name, endpoint] as const))(
    '%s lets through exactly whom the table lets through',
    async (name, endpoint) => {
      for (const who of [...people, 'nobody'] as const) {
        const answer = await send(browserOf(who), endpoint, pathOf(endpoint, who, childId));
        expect(
          actual(answer.status),
          `${who} on ${name}: ${String(answer.status)} ${JSON.stringify(answer.body)}`,
        ).toBe(expected(who, endpoint));
      }
    },
    60_000,
  );

  it('refuses to be served without saying who may call it', () => {
    const [first] = endpoints;
    if (first === undefined) throw new Error('Nothing is served');
    const { can: _can, ...silent } = first;
    expect(() => serveEndpoint(silent as AnyEndpoint, test.services)).toThrow('does not say who may call it');
    expect(() =>
      serveEndpoint({ ...first, can: { action: 'juggle', subject: 'Child' } } as unknown as AnyEndpoint, test.services),
    ).toThrow('does not say who may call it');
  });

  it('of a child is closed to a trainee who is not assigned, and absent children are not found', async () => {
    const other = await addChild(test);
    const [trainee, surgeon] = [await test.as('trainee'), await test.as('surgeon')];
    for (const endpoint of endpoints.filter(
      ({ operation, can }) =>
        operation.method === 'GET' &&
        operation.path.startsWith('/children/:childId') &&
        typeof can === 'object' &&
        can.subject === 'Child',
    )) {
      const path = (id: string) => pathOf(endpoint, 'trainee', id);
      expect((await trainee.get(path(childId))).status, endpoint.operation.name).toBeLessThan(300);
      expect((await trainee.get(path(other))).status, endpoint.operation.name).toBe(403);
      expect((await surgeon.get(path('no-such-child'))).status, endpoint.operation.name).toBe(404);
    }
  });
});

interface Cell {
  readonly action: string;
  readonly method: 'post' | 'put';
  readonly path: string;
  readonly body: (part: string) => object;
  /** Whether a discipline of the lane is one that may sign, or one that may hold. */
  readonly lane: 'sign' | 'hold' | 'whole';
}

const cells: readonly Cell[] = [
  { action: 'claim', method: 'post', path: 'claim', body: (part) => ({ part }), lane: 'hold' },
  {
    action: 'draft',
    method: 'put',
    path: 'draft',
    body: (part) => ({ part, values: {}, performedOn: null, isReady: false }),
    lane: 'hold',
  },
  {
    action: 'draft',
    method: 'post',
    path: 'signing-sheet',
    body: (part) => ({ part, values: {}, performedOn: '2026-11-30' }),
    lane: 'hold',
  },
  {
    action: 'hold',
    method: 'put',
    path: 'hold',
    body: () => ({ hold: { reason: 'A cold', reviewOn: '2026-12-20' } }),
    lane: 'whole',
  },
];

/** Who stands in the lane of a part, said once more in the plainest way. */
const isInLane = (who: string, id: string, part: string, lane: Cell['lane']): boolean => {
  const rule = defaultProtocol.milestones.find((one) => one.id === id);
  if (rule === undefined) return false;
  const signers = (of: string): readonly string[] => rule.signatures.find((one) => one.part === of)?.disciplines ?? [];
  const all = [
    ...rule.signatures.flatMap((one) => one.disciplines),
    ...(rule.waiverNeeds ?? []).flat(),
  ] as readonly string[];
  if (lane === 'whole') return all.includes(who);
  if (lane === 'sign') return signers(part).includes(who);
  const others = rule.signatures
    .filter((one) => one.part !== part)
    .flatMap((one) => one.disciplines) as readonly string[];
  return signers(part).includes(who) || ((rule.mayClaim as readonly string[]).includes(who) && !others.includes(who));
};

describe('every lane', () => {
  let test: TestApp;
  let childId: string;
  beforeAll(async () => {
    test = await createTestApp();
    // Nobody leads this child, so that "lead clinician" opens no lane.
    childId = await addChild(test, { leadClinicianId: null });
  }, 60_000);
  afterAll(() => test.close());

  it.each(disciplines)(
    'is open to %s exactly where the protocol says so',
    async (who) => {
      const browser = await test.as(who);
      for (const { id, signatures } of defaultProtocol.milestones) {
        for (const { part } of signatures) {
          for (const cell of cells) {
            const row = rowOf({ action: cell.action, subject: 'Milestone' });
            const mayAtAll = row !== undefined && reachesOf(who, row).length > 0;
            const request = browser[cell.method](`/children/${childId}/milestones/${id}/${cell.path}`, cell.body(part));
            const answer = await (cell.path === 'draft' ? request.set('if-match', '"999"') : request);
            const isOpen = mayAtAll && isInLane(who, id, part, cell.lane);
            expect(
              problemOf(answer) === '/problems/not-allowed',
              `${who} ${cell.path} ${id} ${part}: ${problemOf(answer)}`,
            ).toBe(!isOpen);
          }
        }
      }
    },
    60_000,
  );
});
