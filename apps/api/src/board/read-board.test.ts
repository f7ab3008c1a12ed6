import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { boardSchema, boardChangesSchema, nobody } from '@weftway/contract/board';
import type { Board, BoardChanges } from '@weftway/contract/board';
import { addChild, childFields, write } from '../testing/pathway-builders.ts';
import { createTestApp } from '../testing/test-app.ts';
import type { TestApp, TestPerson } from '../testing/test-app.ts';
import { rollBoard } from './roll-board.ts';

describe('the board', () => {
  let test: TestApp;
  beforeAll(async () => {
    test = await createTestApp();
  });
  afterAll(() => test.close());

  const boardOf = async (who: TestPerson): Promise<Board> =>
    boardSchema.parse((await (await test.as(who)).get('/board')).body);
  const changesOf = async (who: TestPerson, since: number): Promise<BoardChanges> =>
    boardChangesSchema.parse((await (await test.as(who)).get(`/board/changes?since=${String(since)}`)).body);
  const rowOf = (board: Board, childId: string, milestone: string) => {
    const child = board.children.find(([id]) => id === childId);
    const at = child?.[7].findIndex((place) => board.milestones[place]?.[0] === milestone) ?? -1;
    return child === undefined || at < 0 ? null : { owner: child[12][at], state: child[8][at] };
  };

  it('holds the open milestones of every child, with who holds each', async () => {
    const childId = await addChild(test);
    await (await test.as('surgeon')).post(`/children/${childId}/milestones/SURG-01/claim`, { part: 'milestone' });
    const board = await boardOf('nurse');
    const held = rowOf(board, childId, 'SURG-01');
    expect(board.members[Number(held?.owner)]?.[1]).toBe('Test surgeon');
    expect(rowOf(board, childId, 'EAR-02')?.owner).toBe(nobody);
    expect(board.members.map(([id]) => id)).toContain('dentist-2');
  });

  it('is answered with 304 while nothing changed, and only after the permission', async () => {
    const browser = await test.as('coordinator');
    const first = await browser.get('/board');
    const etag = String(first.headers['etag']);
    const again = await browser.get('/board').set('if-none-match', etag);
    expect(again.status).toBe(304);
    expect(again.text).toBe('');
    const auditor = await (await test.as('auditor')).get('/board').set('if-none-match', etag);
    expect(auditor.status).toBe(403);
    await addChild(test);
    expect((await browser.get('/board').set('if-none-match', etag)).status).toBe(200);
  });

  it('is closed to administrators, auditors and strangers', async () => {
    for (const person of ['administrator', 'auditor'] as const)
      expect((await (await test.as(person)).get('/board')).status).toBe(403);
    const { default: supertest } = await import('supertest');
    for (const path of ['/board', '/board/changes?since=0', '/board/stream', '/my-work'])
      expect((await supertest(test.app).get(`/api/v1${path}`)).status).toBe(401);
  });

  it('shows a trainee the assigned children and nobody else', async () => {
    const [mine, other] = [await addChild(test), await addChild(test)];
    await write(test, [{ kind: 'trainees-assigned', childId: mine, after: { memberIds: ['trainee'] } }]);
    const board = await boardOf('trainee');
    expect(board.children.map(([id]) => id)).toEqual([mine]);
    expect(JSON.stringify(board)).not.toContain(other);
    await write(test, [{ kind: 'trainees-assigned', childId: mine, after: { memberIds: [] } }]);
    expect((await boardOf('trainee')).children).toEqual([]);
  });

  it('is sent uncompressed to a browser that asks for that', async () => {
    const answer = await (await test.as('nurse')).get('/board').set('accept-encoding', 'identity');
    expect(answer.headers['content-encoding']).toBeUndefined();
    expect(boardSchema.parse(answer.body).children.length).toBeGreaterThan(0);
  });

  describe('what changed since a version', () => {
    let version = 0;
    beforeEach(async () => {
      version = (await boardOf('nurse')).version;
    });

    it('is nothing while nothing changed', async () => {
      expect(await changesOf('nurse', version)).toMatchObject({ version, isWhole: false, children: [] });
    });

    it('is the children that changed and no others, in about a kilobyte each', async () => {
      const [one] = [await addChild(test), await addChild(test)];
      const between = (await boardOf('nurse')).version;
      await (await test.as('surgeon-2')).post(`/children/${one}/milestones/SURG-01/claim`, { part: 'milestone' });
      const changes = await changesOf('nurse', between);
      expect(changes.children.map(([id]) => id)).toEqual([one]);
      expect(changes.members.map(([id]) => id)).toContain('surgeon-2');
      expect(JSON.stringify(changes).length).toBeLessThan(3000);
      expect((await changesOf('nurse', version)).children).toHaveLength(2);
    });

    it('names a child that has left the board without rows', async () => {
      const childId = await addChild(test);
      const { version: before } = await boardOf('nurse');
      await write(test, [{ kind: 'care-ended', childId, after: { on: '2026-12-01', reason: 'Moved abroad' } }]);
      const [child] = (await changesOf('nurse', before)).children;
      expect(child?.[0]).toBe(childId);
      expect(child?.[7]).toEqual([]);
    });

    it('asks for the whole board when too much changed or the version is unknown', async () => {
      expect((await changesOf('nurse', version + 1000)).isWhole).toBe(true);
      await write(
        test,
        Array.from({ length: 101 }, (_unused, at) => ({
          kind: 'child-registered' as const,
          childId: `many-${String(at)}`,
          after: { fields: childFields(`MANY-${String(at)}`), protocolVersion: 1 },
        })),
      );
      expect(await changesOf('nurse', version)).toMatchObject({ isWhole: true, children: [] });
    });

    it('never names children of others to a trainee', async () => {
      const childId = await addChild(test);
      expect(await changesOf('trainee', version)).toMatchObject({ isWhole: true, children: [] });
      expect(JSON.stringify(await changesOf('trainee', version))).not.toContain(childId);
    });

    it('needs a version', async () => {
      expect((await (await test.as('nurse')).get('/board/changes')).status).toBe(400);
    });
  });

  it('rolls on by itself: what comes within six months appears, states move, and only those children are planned', async () => {
    const rolling = await createTestApp();
    try {
      await rollBoard(rolling.services);
      const childId = await addChild(rolling, { bornOn: '2026-11-20' });
      const before: { milestone: string; earliest: string } | undefined = await rolling
        .db('board_rows')
        .where({ child_id: childId, state: 'ahead', is_on_board: 0 })
        .whereNotNull('earliest')
        .orderBy('earliest')
        .first('milestone', 'earliest');
      if (before === undefined) throw new Error('Nothing lies further ahead');
      expect(await rollBoard(rolling.services)).toBe(0);
      rolling.setNow(`${before.earliest}T08:00:00.000Z`);
      expect(await rollBoard(rolling.services)).toBe(1);
      const after: { is_on_board: number } | undefined = await rolling
        .db('board_rows')
        .where({ child_id: childId, milestone: before.milestone })
        .first('is_on_board');
      expect(after?.is_on_board).toBe(1);
    } finally {
      await rolling.close();
    }
  });
});
