/** Whether a milestone may be paused. A hold needs a reason and a day on which it is looked at again; it moves no date. */
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { MilestoneRule } from './protocol.ts';
import { isBlank } from './sign-off-evidence.ts';
import { mayDecide, stateFaults, stateRefusals } from './sign-off-person.ts';
import type { Person, PlannedState, Refusal } from './sign-off-person.ts';

export const holdRefusals = [...stateRefusals, 'not-your-discipline', 'reason-missing', 'review-not-ahead'] as const;
export type HoldRefusalCode = (typeof holdRefusals)[number];

export interface Holding {
  readonly rule: MilestoneRule;
  readonly planned: PlannedState;
  readonly person: Person;
  readonly reason: string;
  readonly reviewOn: PlainDate;
  readonly today: PlainDate;
}

/** Every reason for which the hold is refused. The review day must lie after today. */
export function holdFaults({ rule, planned, person, reason, reviewOn, today }: Holding): Refusal<HoldRefusalCode>[] {
  const faults: Refusal<HoldRefusalCode>[] = [...stateFaults(planned)];
  if (!mayDecide(person, rule)) {
    faults.push({ code: 'not-your-discipline', message: 'Pausing this is for a clinician who could sign it.' });
  }
  if (isBlank(reason)) faults.push({ code: 'reason-missing', message: 'Say why it is paused.' });
  if (reviewOn <= today) faults.push({ code: 'review-not-ahead', message: 'The day of review must lie ahead.' });
  return faults;
}
