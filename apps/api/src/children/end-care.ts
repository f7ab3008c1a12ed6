/** One act stops everything: reminders, bookings, what anybody holds, every list entry. The trail keeps the record. */
import { endCare } from '@weftway/contract/child';
import { endpoint } from '../http/endpoint.ts';
import { done, fieldRefused, refused } from '../http/outcome.ts';
import type { TrailEvent } from '../trail/trail-event.ts';
import { reachChild } from './child-reach.ts';
import { viewChild } from './child-view.ts';
import { bookedDaysOf, heldPartsOf } from './open-work-view.ts';

const why = 'Care has ended';

export const endCareEndpoint = endpoint<typeof endCare>({
  operation: endCare,
  can: { action: 'end-care', subject: 'Child' },
  version: (child) => child.version,
  handle: async (ask) => {
    const { trx, body, today } = ask;
    const reached = await reachChild(ask, ask.params.childId, ['end-care']);
    if (reached.kind === 'refused') return reached;
    const { row } = reached;
    if (row.care_ended_on !== null) return refused('already-done', { detail: 'Care has ended already.' });
    if (body.on > today) return fieldRefused('/on', 'This day is still to come.');
    if (row.born_on !== null && body.on < row.born_on) return fieldRefused('/on', 'This day is before the birth.');
    const childId = row.id;
    const held = await heldPartsOf(trx, childId);
    const booked = await bookedDaysOf(trx, childId);
    const events: TrailEvent[] = [
      { kind: 'care-ended', childId, before: { on: null }, after: { on: body.on, reason: body.reason } },
      ...held.map(({ milestone, part, member_id: memberId }): TrailEvent => ({
        kind: 'milestone-released',
        childId,
        memberId,
        milestone,
        after: { part, memberId, reason: why },
      })),
      ...booked.map(({ milestone, booked_on: on }): TrailEvent => ({
        kind: 'booking-removed',
        childId,
        milestone,
        before: { on },
        after: { reason: why },
      })),
    ];
    return done(events, () => viewChild(trx, childId));
  },
});
