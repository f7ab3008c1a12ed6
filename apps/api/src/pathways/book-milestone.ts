import { canMilestone } from '@weftway/abilities/ability-for';
import { bookMilestone } from '@weftway/contract/pathway';
import { endpoint } from '../http/endpoint.ts';
import { done, fieldRefused, refused } from '../http/outcome.ts';
import { openMilestone, subjectOfWhole } from './open-pathway.ts';
import type { OpenedMilestone } from './open-pathway.ts';
import { viewPathway } from './pathway-view.ts';
import { beginRefusal } from './state-refusal.ts';

/** Operations, what counts from a booking, and what a booking of something else counts from. */
const isBookable = ({ rule, rules }: OpenedMilestone): boolean =>
  rule.isOperation ||
  rule.clock.from === 'booking' ||
  rule.clock.from === 'operation-booked' ||
  [...rules.values()].some((other) => other.clock.from === 'booking' && other.clock.milestone === rule.id);

export const bookMilestoneEndpoint = endpoint<typeof bookMilestone>({
  operation: bookMilestone,
  can: { action: 'book', subject: 'Milestone' },
  handle: async (ask) => {
    const { trx, actor, ability, body, params, today } = ask;
    const opened = await openMilestone(ask, params);
    if (opened.kind === 'refused') return opened;
    if (!canMilestone(ability, 'book', subjectOfWhole(opened)))
      return refused('not-allowed', { detail: 'This is for the coordinator or somebody of its discipline to book.' });
    const stored = opened.record.bookings.find((row) => row.milestone === opened.key) ?? null;
    const place = {
      childId: params.childId,
      milestone: opened.key,
      before: stored === null ? null : { on: stored.booked_on },
    };
    const view = () => viewPathway(trx, params.childId, actor);
    if (body.on === null) {
      return stored === null
        ? refused('milestone-state-refuses', { detail: 'Nothing is booked.', extra: { reason: 'not-booked' } })
        : done([{ kind: 'booking-removed', ...place, after: { reason: body.reason } }], view);
    }
    if (!isBookable(opened))
      return refused('milestone-state-refuses', {
        detail: 'Only operations, and what counts from their day, are booked here.',
        extra: { reason: 'not-bookable' },
      });
    const refusal = beginRefusal(opened);
    if (refusal !== null) return refusal;
    if (body.on < today) return fieldRefused('/on', 'The day lies in the past.');
    const { birth } = opened.facts;
    if (birth !== null && body.on < birth) return fieldRefused('/on', 'The day lies before the birth of the child.');
    return done(
      stored?.booked_on === body.on
        ? []
        : [{ kind: 'booking-set', ...place, after: { on: body.on, reason: body.reason } }],
      view,
    );
  },
});
