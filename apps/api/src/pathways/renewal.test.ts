import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { addChild, boardRow, pathwayIn, problemOf, sign, trailOf } from '../testing/pathway-builders.ts';
import { createTestApp } from '../testing/test-app.ts';
import type { TestApp } from '../testing/test-app.ts';

/** Common practice: an airway screen before palate repair is not older than 56 days. */
describe('a record that another milestone needs fresh', () => {
  let test: TestApp;
  beforeAll(async () => {
    test = await createTestApp();
  });
  afterAll(() => test.close());

  it('is recorded once more, and what waited for it may go on', async () => {
    const childId = await addChild(test, { cleft: '••hSh••', flags: ['robin'], bornOn: '2025-12-10' });
    const paediatrician = await test.as('paediatrician');
    const results = { safe_for_anaesthesia: 'with plan', safe_for_plate: 'yes' };
    pathwayIn(await sign(test, paediatrician, childId, 'CARE-03', { performedOn: '2026-01-10', values: results }));
    expect((await boardRow(test, childId, 'SURG-03'))?.state).toBe('waiting');
    pathwayIn(await sign(test, paediatrician, childId, 'CARE-03', { performedOn: '2026-11-28', values: results }));
    expect((await boardRow(test, childId, 'SURG-03'))?.state).toBe('open');
    expect(await trailOf(test, childId)).toEqual(['child-registered', 'milestone-signed', 'milestone-signed']);
  });

  it('is not what nobody needs fresh: that is signed once', async () => {
    const childId = await addChild(test);
    pathwayIn(await sign(test, await test.as('surgeon'), childId, 'TEAM-04'));
    expect(problemOf(await sign(test, await test.as('surgeon'), childId, 'TEAM-04'))).toBe(
      '/problems/milestone-already-signed',
    );
  });
});
