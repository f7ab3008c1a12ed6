/** What is recorded about one milestone of the child: its hold, its booking, what was taken over from another team. */
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { Completion, Hold } from '@weftway/pathway/pathway-facts';
import type { ChildPlan } from './child-plan.ts';
import { isAbout, type MilestoneView } from './milestone-view.ts';

export interface Records {
  /** The hold that stands. */
  readonly hold: Hold | null;
  readonly booked: PlainDate | null;
  /** Done elsewhere and not confirmed yet. */
  readonly unconfirmed: Completion | null;
}

export const recordsOf = (of: ChildPlan, { planned }: MilestoneView): Records => {
  const { holds, bookings, completions } = of.pathway.facts;
  const hold = planned.state === 'held' ? holds.findLast((one) => isAbout(one.milestone, planned)) : undefined;
  return {
    hold: hold ?? null,
    booked: bookings.find((one) => isAbout(one.milestone, planned))?.on ?? null,
    unconfirmed: completions.find((one) => isAbout(one.milestone, planned) && one.isUnverified === true) ?? null,
  };
};
