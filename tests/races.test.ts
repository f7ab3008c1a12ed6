/** Many people at once: exactly one wins, everybody else is told who did, and nothing happens twice. */
import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { hashPassword } from '../apps/api/src/sign-in/password-hash.ts';
import { addChild, pathwayIn, problemOf, signBody, trailOf, write } from '../apps/api/src/testing/pathway-builders.ts';
import { createTestApp, openBrowser, testPassword } from '../apps/api/src/testing/test-app.ts';
import type { TestApp, TestBrowser } from '../apps/api/src/testing/test-app.ts';

const people = 50;

describe('at the same moment', () => {
  let test: TestApp;
  const surgeons: TestBrowser[] = [];
  beforeAll(async () => {
    test = await createTestApp();
    const passwordHash = await hashPassword(testPassword);
    const ids = Array.from({ length: people }, (_, index) => `racer-${String(index + 1)}`);
    await write(
      test,
      ids.flatMap((id) => [
        {
          kind: 'member-invited' as const,
          memberId: id,
          after: {
            fields: {
              name: `Dr ${id}`,
              email: `${id}@tern-estuary.example`,
              standing: 'member' as const,
              disciplines: ['surgeon' as const],
              supervisorId: null,
            },
            invitedAt: '2026-12-01T08:00:00.000Z',
          },
        },
        { kind: 'member-joined' as const, memberId: id, after: {} },
      ]),
    );
    for (const id of ids) {
      await test
        .db('credentials')
        .insert({ member_id: id, password_hash: passwordHash, changed_at: '2026-12-01T08:00:00.000Z' });
      surgeons.push(await openBrowser(test.app, `${id}@tern-estuary.example`));
    }
  }, 60_000);
  afterAll(() => test.close());

  it('fifty people claim one milestone: one holds it, the others learn who', async () => {
    const childId = await addChild(test);
    const answers = await Promise.all(
      surgeons.map((browser) => browser.post(`/children/${childId}/milestones/SURG-01/claim`, { part: 'milestone' })),
    );
    const winners = answers.filter((answer) => answer.status === 200);
    expect(winners).toHaveLength(1);
    const [winner] = winners;
    const holder = winner === undefined ? undefined : pathwayIn(winner).claims[0]?.memberId;
    for (const answer of answers.filter((one) => one.status !== 200)) {
      expect(answer.body).toMatchObject({
        type: '/problems/milestone-already-claimed',
        current: { memberId: holder },
        holder: `Dr ${String(holder)}`,
      });
    }
    expect(await trailOf(test, childId)).toEqual(['child-registered', 'milestone-claimed']);
  });

  it.each([
    ['TEAM-04', 'surgeon', 'surgeon-2'],
    ['CARE-02', 'nurse', 'nurse-2'],
  ] as const)(
    'two people sign %s: one signature stands, the other person learns whose',
    async (milestone, one, other) => {
      const [first, second] = [await test.as(one), await test.as(other)];
      for (let round = 0; round < 10; round += 1) {
        const childId = await addChild(test, { bornOn: '2026-11-10' });
        const body = signBody(milestone, { values: milestone === 'CARE-02' ? { weight_g: '3600' } : {} }, '2026-12-01');
        const url = `/children/${childId}/milestones/${milestone}`;
        const sheet = await first.post(`${url}/signing-sheet`, body);
        const whole = {
          ...body,
          digest: (sheet.body as { digest: string }).digest,
          overrides: [],
          password: testPassword,
        };
        const answers = await Promise.all([first, second].map((browser) => browser.post(`${url}/sign-off`, whole)));
        expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
        const loser = answers.find((answer) => answer.status === 409);
        expect(loser?.body).toMatchObject({
          type: '/problems/milestone-already-signed',
          detail: expect.stringMatching(/^Test (surgeon|nurse)(-2)? has signed this already\.$/),
        });
        expect(await trailOf(test, childId)).toEqual(['child-registered', 'milestone-signed']);
      }
    },
  );

  it('one person sends the same signature five times with one key: one effect, one answer', async () => {
    const surgeon = await test.as('surgeon');
    const childId = await addChild(test);
    const body = signBody('TEAM-04', {}, '2026-12-01');
    const sheet = await surgeon.post(`/children/${childId}/milestones/TEAM-04/signing-sheet`, body);
    const whole = { ...body, digest: (sheet.body as { digest: string }).digest, overrides: [], password: testPassword };
    const answers = await Promise.all(
      Array.from({ length: 5 }, () =>
        surgeon
          .post(`/children/${childId}/milestones/TEAM-04/sign-off`, whole)
          .set('idempotency-key', `retry-of-${childId}`),
      ),
    );
    expect(answers.map((answer) => answer.status)).toEqual([200, 200, 200, 200, 200]);
    expect(new Set(answers.map((answer) => JSON.stringify(answer.body))).size).toBe(1);
    expect(await trailOf(test, childId)).toEqual(['child-registered', 'milestone-signed']);
  });

  it('ten people save the first draft: one is kept, the others are shown it', async () => {
    const childId = await addChild(test);
    const answers = await Promise.all(
      surgeons.slice(0, 10).map((browser, index) =>
        browser
          .put(`/children/${childId}/milestones/SURG-01/draft`, {
            part: 'milestone',
            values: { technique: { value: `Way ${String(index)}` } },
            performedOn: null,
            isReady: false,
          })
          .set('if-match', '"0"'),
      ),
    );
    expect(answers.filter((answer) => answer.status === 200)).toHaveLength(1);
    const kept = answers.find((answer) => answer.status === 200);
    const draft = kept === undefined ? undefined : pathwayIn(kept).drafts[0];
    for (const answer of answers.filter((one) => one.status !== 200))
      expect(answer.body).toMatchObject({ type: '/problems/changed-meanwhile', current: draft });
  });

  it('whatever three people and the coordinator do, the holder is the one that a plain model says', async () => {
    const [coordinator, trio] = [await test.as('coordinator'), surgeons.slice(0, 3)];
    const person = fc.integer({ min: 0, max: 2 });
    const command = fc.oneof(
      fc.record({ kind: fc.constant('claim' as const), by: person }),
      fc.record({ kind: fc.constant('release' as const), by: person }),
      fc.record({ kind: fc.constant('hand-over' as const), to: person, from: fc.option(person) }),
    );
    const idOf = (index: number | null): string | null => (index === null ? null : `racer-${String(index + 1)}`);
    await fc.assert(
      fc.asyncProperty(fc.array(command, { minLength: 1, maxLength: 10 }), async (commands) => {
        const url = `/children/${await addChild(test)}/milestones/SURG-01`;
        let holder: number | null = null;
        for (const one of commands) {
          if (one.kind === 'claim') {
            const answer = await trio[one.by]?.post(`${url}/claim`, { part: 'milestone' });
            const isFree = holder === null || holder === one.by;
            expect(answer === undefined ? '' : isFree ? answer.status : problemOf(answer)).toBe(
              isFree ? 200 : '/problems/milestone-already-claimed',
            );
            if (isFree) holder = one.by;
          } else if (one.kind === 'release') {
            const answer = await trio[one.by]?.post(`${url}/release`, { part: 'milestone', reason: '' });
            expect(answer?.status).toBe(holder === one.by ? 200 : 409);
            if (holder === one.by) holder = null;
          } else {
            const answer = await coordinator.post(`${url}/hand-over`, {
              part: 'milestone',
              to: idOf(one.to),
              from: idOf(one.from),
            });
            expect(answer.status).toBe(holder === one.from ? 200 : 409);
            if (holder === one.from) holder = one.to;
          }
          const stored: { member_id: string }[] = await test
            .db('claims')
            .where({ child_id: url.split('/')[2], milestone: 'SURG-01' })
            .select('member_id');
          expect(stored.map((row) => row.member_id)).toEqual(holder === null ? [] : [idOf(holder)]);
        }
      }),
      { numRuns: 25 },
    );
  }, 60_000);
});
