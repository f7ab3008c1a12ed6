/** Refusals of the sign-off rules, as problems of the contract. */
import type { Refusal } from '@weftway/pathway/sign-off-person';
import { stateFaults } from '@weftway/pathway/sign-off-person';
import { refused } from '../http/outcome.ts';
import type { Refused } from '../http/outcome.ts';
import type { OpenedMilestone } from './open-pathway.ts';

/** Refuses what nobody may do to a milestone that is off the path, finished or with another team. */
export const stateRefusal = ({ planned }: OpenedMilestone, act: 'record' | 'other' = 'other'): Refused | null => {
  const [fault] = stateFaults(planned, act);
  return fault === undefined
    ? null
    : refused('milestone-state-refuses', { detail: fault.message, extra: { reason: fault.code } });
};

/** Also refuses once care has ended: nothing new is begun. */
export const beginRefusal = (opened: OpenedMilestone, act: 'record' | 'other' = 'other'): Refused | null =>
  opened.record.child.care_ended_on === null
    ? stateRefusal(opened, act)
    : refused('milestone-state-refuses', {
        detail: 'Care of this child has ended; nothing new is begun.',
        extra: { reason: 'care-ended' },
      });

export const stateRefused = (fault: Refusal<string>): Refused =>
  refused('milestone-state-refuses', { detail: fault.message, extra: { reason: fault.code } });
