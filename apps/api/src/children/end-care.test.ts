import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { childFields } from '../testing/child-fields.ts';
import { createTestApp } from '../testing/test-app.ts';
import type { TestApp } from '../testing/test-app.ts';

let test: TestApp;
let childId: string;
beforeEach(async () => {
  test = await createTestApp();
  childId = (await (await test.as('coordinator')).post('/children', { fields: childFields(), isDistinct: false })).body
    .id;
});
afterEach(() => test.close());

const reason = 'The family asked for it';
const kindsOf = async (): Promise<string[]> =>
  (await test.db('trail_lines').where({ child_id: childId }).orderBy('seq').select('kind')).map(
    (line: { kind: string }) => line.kind,
  );

describe('the end of care', () => {
  it('takes the child off every list at once and keeps the record', async () => {
    const surgeon = await test.as('surgeon');
    await surgeon.put(`/children/${childId}/care-end`, { on: '2026-11-30', reason });
    expect(await test.db('board_rows').where({ child_id: childId, is_on_board: 1 })).toEqual([]);
    expect((await surgeon.get('/children')).body).toMatchObject({ items: [], total: 0 });
    expect((await surgeon.get('/children?q=TE-0001')).body.items).toMatchObject([{ careEndedOn: '2026-11-30' }]);
    expect((await surgeon.get(`/children/${childId}`)).body.careEnded).toEqual({ on: '2026-11-30', reason });
    expect((await surgeon.put(`/children/${childId}/care-end`, { on: '2026-11-30', reason })).status).toBe(409);
  });

  it('lets go of what was held and booked', async () => {
    await test.db('claims').insert({
      child_id: childId,
      milestone: 'TEAM-01',
      part: 'whole',
      member_id: 'nurse',
      since: '2026-11-01T00:00:00.000Z',
    });
    await test.db('bookings').insert({ child_id: childId, milestone: 'SURG-01', booked_on: '2027-01-05' });
    await (await test.as('coordinator')).put(`/children/${childId}/care-end`, { on: '2026-12-01', reason });
    expect(await kindsOf()).toEqual(['child-registered', 'care-ended', 'milestone-released', 'booking-removed']);
    expect(await test.db('claims')).toEqual([]);
  });

  it('is not for the dentist, needs a reason and a day that was', async () => {
    expect(
      (await (await test.as('dentist')).put(`/children/${childId}/care-end`, { on: '2026-12-01', reason })).status,
    ).toBe(403);
    const nurse = await test.as('nurse');
    expect(
      (await nurse.put(`/children/${childId}/care-end`, { on: '2026-12-02', reason })).body.errors[0].pointer,
    ).toBe('/on');
    expect(
      (await nurse.put(`/children/${childId}/care-end`, { on: '2026-12-01', reason: '' })).body.errors[0].pointer,
    ).toBe('/reason');
    expect((await nurse.put('/children/nobody/care-end', { on: '2026-12-01', reason })).status).toBe(404);
  });
});

describe('a move to another team', () => {
  it('freezes the path and comes back', async () => {
    const coordinator = await test.as('coordinator');
    const moved = await coordinator.put(`/children/${childId}/transfer`, {
      on: '2026-11-30',
      to: 'Northern team',
      reason,
    });
    expect(moved.body).toMatchObject({ transferredOn: '2026-11-30', transferredTo: 'Northern team' });
    expect(await test.db('board_rows').where({ child_id: childId, is_on_board: 1 })).toEqual([]);
    const back = await coordinator.put(`/children/${childId}/transfer`, { on: null, to: '', reason });
    expect(back.body.transferredOn).toBeNull();
    expect(await kindsOf()).toEqual(['child-registered', 'child-transferred', 'child-returned']);
  });

  it('names the team and a day that was, and is for the coordinator', async () => {
    const coordinator = await test.as('coordinator');
    expect(
      (await coordinator.put(`/children/${childId}/transfer`, { on: '2026-11-30', to: '', reason })).body.errors[0]
        .pointer,
    ).toBe('/to');
    expect(
      (await coordinator.put(`/children/${childId}/transfer`, { on: '2027-01-01', to: 'X', reason })).body.errors[0]
        .pointer,
    ).toBe('/on');
    expect(
      (await coordinator.put(`/children/${childId}/transfer`, { on: null, to: '', reason })).body.errors[0].pointer,
    ).toBe('/on');
    expect(
      (await (await test.as('surgeon')).put(`/children/${childId}/transfer`, { on: '2026-11-30', to: 'X', reason }))
        .status,
    ).toBe(403);
  });
});
