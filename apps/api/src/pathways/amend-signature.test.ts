import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestApp, testPassword } from '../testing/test-app.ts';
import type { TestApp } from '../testing/test-app.ts';
import {
  addChild,
  boardRow,
  done,
  evidence,
  pathwayIn,
  pointersOf,
  problemOf,
  sign,
  trailOf,
  write,
} from '../testing/pathway-builders.ts';

describe('amending a signed entry', () => {
  let test: TestApp;
  beforeAll(async () => {
    test = await createTestApp();
  });
  afterAll(() => test.close());
  const amend = async (who: Parameters<TestApp['as']>[0], childId: string, signatureId: string, change: object = {}) =>
    (await test.as(who)).post(`/children/${childId}/milestones/SURG-01/amendments`, {
      signatureId,
      performedOn: '2026-11-18',
      values: evidence('SURG-01', 'milestone', { technique: 'Fisher' }),
      reason: 'Wrong day',
      password: testPassword,
      ...change,
    });
  const repaired = async (): Promise<{ childId: string; signatureId: string }> => {
    const childId = await addChild(test, { bornOn: '2026-03-01' });
    const overrides = [{ check: 'CARE-04:SURG-01', reason: 'Seen on the day', secondName: null }];
    const pathway = pathwayIn(
      await sign(test, await test.as('surgeon'), childId, 'SURG-01', { performedOn: '2026-11-20', overrides }),
    );
    return { childId, signatureId: pathway.signatures[0]?.id ?? '' };
  };

  it('adds a further signed entry that the plan then follows, and keeps the old one', async () => {
    const { childId, signatureId } = await repaired();
    expect(await boardRow(test, childId, 'SURG-03')).toMatchObject({ earliest: '2027-02-12' });
    const pathway = pathwayIn(await amend('surgeon-2', childId, signatureId));
    expect(pathway.signatures).toMatchObject([
      { id: signatureId, performedOn: '2026-11-20', amends: null },
      {
        performedOn: '2026-11-18',
        amends: signatureId,
        amendReason: 'Wrong day',
        signerName: 'Test surgeon-2',
        occurrence: 1,
      },
    ]);
    expect(await boardRow(test, childId, 'SURG-03')).toMatchObject({ earliest: '2027-02-10' });
    expect(await trailOf(test, childId)).toEqual(['child-registered', 'milestone-signed', 'signature-amended']);
  });

  it('is done to the newest entry only', async () => {
    const { childId, signatureId } = await repaired();
    await amend('surgeon', childId, signatureId);
    expect(problemOf(await amend('surgeon', childId, signatureId))).toBe('/problems/milestone-state-refuses');
  });

  it('is refused to other disciplines, with impossible values, and for what is not there', async () => {
    const { childId, signatureId } = await repaired();
    expect(problemOf(await amend('nurse', childId, signatureId))).toBe('/problems/not-allowed');
    expect(problemOf(await amend('surgeon', 'nobody', signatureId))).toBe('/problems/not-found');
    expect(pointersOf(await amend('surgeon', childId, 'nothing'))).toEqual(['/signatureId']);
    expect(pointersOf(await amend('surgeon', childId, signatureId, { performedOn: '2027-01-01' }))).toEqual([
      '/performedOn',
    ]);
    expect(pointersOf(await amend('surgeon', childId, signatureId, { reason: '' }))).toEqual(['/reason']);
    const values = evidence('SURG-01', 'milestone', { weight_g: '1' });
    expect(pointersOf(await amend('surgeon', childId, signatureId, { values }))).toEqual(['/values/weight_g/value']);
    expect(problemOf(await amend('surgeon', childId, signatureId, { password: 'a guess at random' }))).toBe(
      '/problems/wrong-password',
    );
  });

  it('takes a finding back that the old entry had raised', async () => {
    const childId = await addChild(test, { bornOn: '2026-01-01' });
    await write(test, [done(childId, 'SURG-01', '2026-04-01'), done(childId, 'SURG-03', '2026-08-01')]);
    const surgeon = await test.as('surgeon');
    const first = pathwayIn(await sign(test, surgeon, childId, 'SURG-04', { values: { symptomatic: 'yes' } }));
    expect(first.facts.findings.map(({ name }) => name)).toContain('fistula_symptomatic');
    const body = {
      signatureId: first.signatures[0]?.id,
      performedOn: '2026-12-01',
      values: evidence('SURG-04', 'milestone', { symptomatic: 'no' }),
      reason: 'Wrong child',
      password: testPassword,
    };
    const second = pathwayIn(await surgeon.post(`/children/${childId}/milestones/SURG-04/amendments`, body));
    expect(second.facts.findings.map(({ name }) => name)).not.toContain('fistula_symptomatic');
  });

  it('cannot be undone: the database refuses to change or remove a signature', async () => {
    const { signatureId } = await repaired();
    await expect(
      test.db('signatures').where({ id: signatureId }).update({ performed_on: '2026-01-01' }),
    ).rejects.toThrow('a signature is final');
    await expect(test.db('signatures').where({ id: signatureId }).delete()).rejects.toThrow('a signature is final');
  });
});
