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
  problemOf,
  sign,
  signBody,
  trailOf,
  write,
} from '../testing/pathway-builders.ts';

const override = (check: string) => [{ check, reason: 'Seen by the anaesthetist on the day', secondName: null }];

describe('from a lip repair to a graft', () => {
  let test: TestApp;
  beforeAll(async () => {
    test = await createTestApp();
  });
  afterAll(() => test.close());

  it('moves the window of the palate repair when the lip repair is signed, and says why', async () => {
    const childId = await addChild(test, { bornOn: '2026-03-01' });
    await write(test, [done(childId, 'CARE-03', '2026-03-10', { safe_for_anaesthesia: 'yes' })]);
    const before = await boardRow(test, childId, 'SURG-03');
    expect(before).toMatchObject({ earliest: '2026-12-01', target: '2027-02-01', latest: '2027-04-01' });

    const surgeon = await test.as('surgeon');
    const answer = await sign(test, surgeon, childId, 'SURG-01', {
      performedOn: '2026-11-20',
      values: { technique: 'Rotation and advancement', weight_g: '6100' },
      overrides: override('CARE-04:SURG-01'),
    });
    expect(answer.status, JSON.stringify(answer.body)).toBe(200);
    const pathway = pathwayIn(answer);
    expect(pathway.signatures).toMatchObject([
      {
        milestone: 'SURG-01',
        signerName: 'Test surgeon',
        signerRole: 'Cleft surgeon',
        meaning: 'performed',
        occurrence: 1,
        amends: null,
        draftedByName: null,
      },
    ]);

    expect(await boardRow(test, childId, 'SURG-01')).toMatchObject({ state: 'signed' });
    expect(await boardRow(test, childId, 'SURG-03')).toMatchObject({
      earliest: '2027-02-12',
      target: '2027-02-12',
      latest: '2027-04-01',
    });
    const planned = planPathway(defaultProtocol, pathway.facts, plainDate('2026-12-01')).milestones.find(
      (one) => one.key === 'SURG-03',
    );
    expect(planned?.reasons.earliest.map((step) => step.rule)).toContain('gate-moved');
    expect(await trailOf(test, childId)).toEqual(['child-registered', 'history-imported', 'milestone-signed']);
  });

  it('asks orthodontist and surgeon for their own half of a graft, on each side', async () => {
    const childId = await addChild(test, { bornOn: '2017-10-01', cleft: 'LAHSHAL' });
    await write(test, [
      done(childId, 'ORTH-02', '2026-10-01', { root_stage_right: '1/2', root_stage_left: '1/2' }),
      done(childId, 'ORTH-01', '2025-10-01'),
      done(childId, 'DENT-02', '2026-10-05', { untreated_decay: 'no' }),
      done(childId, 'ORTH-04:R', '2026-10-10'),
      done(childId, 'ORTH-04:L', '2026-10-10'),
    ]);
    const orthodontist = await test.as('orthodontist');
    const surgeon = await test.as('surgeon');
    for (const side of ['R', 'L']) {
      const key = `ORTH-05:${side}`;
      expect(problemOf(await sign(test, orthodontist, childId, key, { part: 'operation' }))).toBe(
        '/problems/not-allowed',
      );
      const first = await sign(test, orthodontist, childId, key, {
        part: 'readiness',
        values: { root_stage_at_graft: '1/2' },
      });
      expect(first.status, JSON.stringify(first.body)).toBe(200);
      expect(await boardRow(test, childId, key)).toMatchObject({
        state: 'partly-signed',
        owners: '[["operation",null]]',
      });
      const second = await sign(test, surgeon, childId, key, {
        part: 'operation',
        overrides: override(`CARE-04:${key}`),
      });
      expect(second.status, JSON.stringify(second.body)).toBe(200);
      expect(await boardRow(test, childId, key)).toMatchObject({ state: 'signed' });
    }
    const pathway = pathwayIn(await surgeon.get(`/children/${childId}/pathway`));
    expect(pathway.signatures.map(({ milestone, part, signerId }) => [milestone, part, signerId])).toEqual([
      ['ORTH-05:R', 'readiness', 'orthodontist'],
      ['ORTH-05:R', 'operation', 'surgeon'],
      ['ORTH-05:L', 'readiness', 'orthodontist'],
      ['ORTH-05:L', 'operation', 'surgeon'],
    ]);
    const stored: { digest: string; previous_digest: string }[] = await test
      .db('signatures')
      .where({ child_id: childId })
      .orderBy('rowid')
      .select('digest', 'previous_digest');
    expect(stored.slice(1).map((row) => row.previous_digest)).toEqual(stored.slice(0, -1).map((row) => row.digest));
  });

  it('does not let a therapist sign surgery', async () => {
    const childId = await addChild(test);
    expect(problemOf(await sign(test, await test.as('speech-therapist'), childId, 'SURG-01'))).toBe(
      '/problems/not-allowed',
    );
    expect(await trailOf(test, childId)).toEqual(['child-registered']);
  });

  it('shows a trainee’s finished draft as partly signed and keeps both names when the supervisor signs', async () => {
    const childId = await addChild(test);
    await write(test, [{ kind: 'trainees-assigned', childId, after: { memberIds: ['trainee'] } }]);
    const trainee = await test.as('trainee');
    const body = signBody('TEAM-04', {}, '2026-12-01');
    const saved = await trainee
      .put(`/children/${childId}/milestones/TEAM-04/draft`, { ...body, isReady: true })
      .set('if-match', '"0"');
    expect(saved.status, JSON.stringify(saved.body)).toBe(200);
    expect(await boardRow(test, childId, 'TEAM-04')).toMatchObject({ state: 'partly-signed' });
    expect(problemOf(await sign(test, trainee, childId, 'TEAM-04'))).toBe('/problems/not-allowed');
    const signed = pathwayIn(await sign(test, await test.as('surgeon'), childId, 'TEAM-04'));
    expect(signed.signatures).toMatchObject([{ signerName: 'Test surgeon', draftedByName: 'Test trainee' }]);
    expect(signed.drafts).toEqual([]);
  });
});
