/**
 * Which dates of a child can be, given today. The form says it on leaving a field, the API refuses, the import lists it.
 * What is only unlikely is a separate list: it warns and lets through.
 */
import { addDays, addMonths, daysBetween } from '@weftway/calendar/plain-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import { formatDate } from '@weftway/calendar/format-date';
import type { ChildFields } from './child.ts';

export type ChildDates = Pick<
  ChildFields,
  'bornOn' | 'dueOn' | 'referredOn' | 'prenatalReferralOn' | 'teamStartOn' | 'gestation'
>;
export interface DateFault {
  readonly field: keyof ChildDates;
  readonly detail: string;
}

const termDays = 280;
/** Nobody on a team's list was born before this. */
const earliestBirth = '1900-01-01' as PlainDate; // a literal date

const future = (field: keyof ChildDates, date: PlainDate | null, today: PlainDate, what: string): DateFault[] =>
  date !== null && date > today
    ? [{ field, detail: `${what} on ${formatDate(date)} is still to come. Check the year.` }]
    : [];

const birthFaults = ({ bornOn, dueOn, gestation }: ChildDates, today: PlainDate): DateFault[] => {
  if (bornOn === null) {
    return dueOn !== null && dueOn > addDays(today, 42 * 7)
      ? [
          {
            field: 'dueOn',
            detail: `The expected date ${formatDate(dueOn)} is more than 42 weeks away. Check the year.`,
          },
        ]
      : [];
  }
  const faults: DateFault[] = [];
  if (bornOn > today)
    faults.push({
      field: 'bornOn',
      detail: `A birth on ${formatDate(bornOn)} is still to come. For a child not yet born, write the expected date instead.`,
    });
  if (bornOn < earliestBirth)
    faults.push({ field: 'bornOn', detail: `A birth on ${formatDate(bornOn)} is too long ago. Check the year.` });
  if (dueOn !== null) {
    const days = termDays - daysBetween(bornOn, dueOn);
    if (days < 20 * 7 || days > 45 * 7 + 6)
      faults.push({
        field: 'dueOn',
        detail: `Born ${formatDate(bornOn)} and expected ${formatDate(dueOn)} do not fit together. Check both years.`,
      });
    else if (gestation !== null && Math.abs(days - gestation.weeks * 7 - gestation.days) > 21) {
      faults.push({
        field: 'gestation',
        detail: `The two dates make ${Math.floor(days / 7)} weeks, not ${gestation.weeks}. Correct one of the three.`,
      });
    }
  }
  return faults;
};

const referralFaults = (dates: ChildDates): DateFault[] => {
  const { bornOn, referredOn, prenatalReferralOn, teamStartOn } = dates;
  const faults: DateFault[] = [];
  if (referredOn !== null && bornOn === null)
    faults.push({
      field: 'referredOn',
      detail: 'This child is not born yet. Use the field for a referral before birth.',
    });
  if (bornOn === null) return faults;
  if (referredOn !== null && referredOn < bornOn)
    faults.push({
      field: 'referredOn',
      detail: `${formatDate(referredOn)} is before the birth. Use the field for a referral before birth.`,
    });
  if (prenatalReferralOn !== null && prenatalReferralOn > bornOn)
    faults.push({
      field: 'prenatalReferralOn',
      detail: `${formatDate(prenatalReferralOn)} is after the birth. Use the field for a referral after birth.`,
    });
  if (prenatalReferralOn !== null && prenatalReferralOn < addDays(bornOn, -termDays - 28))
    faults.push({
      field: 'prenatalReferralOn',
      detail: `${formatDate(prenatalReferralOn)} is before this pregnancy. Check the year.`,
    });
  if (teamStartOn !== null && teamStartOn < bornOn)
    faults.push({
      field: 'teamStartOn',
      detail: `${formatDate(teamStartOn)} is before the birth. First contact counts from birth on; a referral before birth has its own field.`,
    });
  return faults;
};

/** What cannot be. */
export const childDateFaults = (dates: ChildDates, today: PlainDate): DateFault[] => [
  ...birthFaults(dates, today),
  ...future('referredOn', dates.referredOn, today, 'A referral'),
  ...future('prenatalReferralOn', dates.prenatalReferralOn, today, 'A referral'),
  ...future('teamStartOn', dates.teamStartOn, today, 'A first contact'),
  ...referralFaults(dates),
];

/** What is unlikely: to be looked at again, and let through. */
export const childDateDoubts = (dates: ChildDates, today: PlainDate): DateFault[] => {
  const doubts: DateFault[] = [];
  const { gestation, bornOn, dueOn } = dates;
  if (gestation !== null && (gestation.weeks < 22 || gestation.weeks > 43)) {
    doubts.push({
      field: 'gestation',
      detail: `Born at ${gestation.weeks} weeks is very unusual (22 to 43 is expected).`,
    });
  }
  if (bornOn !== null && bornOn < addMonths(today, -30 * 12))
    doubts.push({ field: 'bornOn', detail: 'This makes the person more than 30 years old.' });
  if (bornOn === null && dueOn !== null && dueOn < addDays(today, -21)) {
    doubts.push({
      field: 'dueOn',
      detail: `${formatDate(dueOn)} is more than three weeks past. Has the child been born?`,
    });
  }
  return doubts;
};
