/**
 * Whether a milestone may be waived (the child could have had it and will not) or closed as not recoverable (the chance
 * has ended). A waiver names one of the reasons of the protocol, or the family's choice, which is offered again later.
 */
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { Discipline } from '@weftway/team/disciplines';
import type { MilestoneRule } from './protocol.ts';
import { isBlank } from './sign-off-evidence.ts';
import { mayDecide, stateFaults, stateRefusals } from './sign-off-person.ts';
import type { Person, PlannedState, Refusal } from './sign-off-person.ts';

export const familyChoice = 'Family choice';

export const waiveRefusals = [
  ...stateRefusals,
  'not-your-discipline',
  'reason-missing',
  'reason-not-listed',
  'second-discipline-needed',
  'offer-again-needed',
  'offer-again-not-ahead',
  'not-lapsed',
] as const;
export type WaiveRefusalCode = (typeof waiveRefusals)[number];

export interface Waiving {
  readonly rule: MilestoneRule;
  readonly planned: PlannedState;
  readonly person: Person;
  /** Second clinician who decides too; null when there is none. */
  readonly second: { readonly id: string; readonly disciplines: readonly Discipline[] } | null;
  readonly kind: 'waived' | 'not-recoverable';
  readonly reason: string;
  readonly offerAgainOn: PlainDate | null;
  readonly today: PlainDate;
}

/** The reasons that may be given for this milestone. */
export const waiverReasons = (rule: MilestoneRule): readonly string[] => [...rule.waivedWhen, familyChoice];

/** Every reason for which the waiver is refused. */
export function waiveFaults(waiving: Waiving): Refusal<WaiveRefusalCode>[] {
  const faults: Refusal<WaiveRefusalCode>[] = [...stateFaults(waiving.planned)];
  if (!mayDecide(waiving.person, waiving.rule)) {
    faults.push({ code: 'not-your-discipline', message: 'Waiving this is for a clinician who could sign it.' });
  }
  return [...faults, ...(waiving.kind === 'waived' ? waiverFaults(waiving) : lapseFaults(waiving))];
}

function waiverFaults(waiving: Waiving): Refusal<WaiveRefusalCode>[] {
  const { rule, reason } = waiving;
  const faults: Refusal<WaiveRefusalCode>[] = [];
  if (isBlank(reason)) faults.push({ code: 'reason-missing', message: 'Say why.' });
  else if (!waiverReasons(rule).includes(reason)) {
    faults.push({
      code: 'reason-not-listed',
      message: `The protocol knows these reasons: ${waiverReasons(rule).join('; ')}.`,
    });
  }
  const lacking = lackingDisciplines(waiving);
  if (lacking.length > 0) {
    const message = `This takes a second decision, by: ${lacking.map((group) => group.join(' or ')).join('; ')}.`;
    faults.push({ code: 'second-discipline-needed', message });
  }
  return [...faults, ...offerFaults(waiving)];
}

/** Groups of which nobody decides, of two at most; one person cannot stand for both. */
function lackingDisciplines({ rule, person, second }: Waiving): string[][] {
  const groups = rule.waiverNeeds ?? [];
  const other = second && second.id !== person.id ? second : undefined;
  const holds = (
    group: readonly string[],
    decider: { readonly disciplines: readonly Discipline[] } | undefined,
  ): boolean => decider?.disciplines.some((discipline) => group.includes(discipline)) ?? false;
  const orders = [
    [person, other],
    [other, person],
  ];
  const lacking = orders.map((order) => groups.filter((group, place) => !holds(group, order[place])));
  return lacking.toSorted((left, right) => left.length - right.length)[0]?.map((group) => [...group]) ?? [];
}

function offerFaults({ rule, reason, offerAgainOn, today }: Waiving): Refusal<WaiveRefusalCode>[] {
  if (offerAgainOn !== null && offerAgainOn <= today) {
    return [{ code: 'offer-again-not-ahead', message: 'The day of the next offer must lie ahead.' }];
  }
  if (reason !== familyChoice || rule.kind === 'elective' || offerAgainOn !== null) return [];
  return [{ code: 'offer-again-needed', message: 'Say when it will be offered again.' }];
}

function lapseFaults({ planned, reason }: Waiving): Refusal<WaiveRefusalCode>[] {
  const faults: Refusal<WaiveRefusalCode>[] = [];
  if (isBlank(reason)) faults.push({ code: 'reason-missing', message: 'Say why.' });
  if (planned !== null && !planned.isLapsed) {
    faults.push({ code: 'not-lapsed', message: 'The chance has not ended yet; it can still be done or waived.' });
  }
  return faults;
}
