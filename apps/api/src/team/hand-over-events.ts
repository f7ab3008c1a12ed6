/** Checks a list of open milestones that change hands and turns it into events. */
import type { Knex } from 'knex';
import type { z } from 'zod';
import type { handOverSchema, Member } from '@weftway/contract/member';
import type { FieldFault } from '@weftway/contract/problems';
import { refused } from '../http/outcome.ts';
import type { Refused } from '../http/outcome.ts';
import type { TrailEvent } from '../trail/trail-event.ts';
import { mayHold } from './may-hold.ts';
import { listMemberViews } from './member-view.ts';
import { openClaimsOf } from './open-claims-view.ts';
import type { OpenClaim } from './open-claims-view.ts';

type HandOver = z.output<typeof handOverSchema>;
type Item = HandOver['items'][number];

interface Place {
  readonly childId: string;
  readonly milestone: string;
  readonly part: string;
}

export const placeText = ({ childId, milestone, part }: Place): string => `${childId} ${milestone} ${part}`;

export interface HandedOver {
  readonly kind: 'handed-over';
  readonly events: readonly TrailEvent[];
  /** Open milestones of the member that the list does not name. */
  readonly unnamed: readonly OpenClaim[];
}

const eventOf = (item: Item, member: Member, reason: string): TrailEvent => {
  const { childId, milestone, part } = item;
  const place = { childId, memberId: item.to ?? member.id, milestone, before: { part, memberId: member.id } };
  return item.to === null
    ? { kind: 'milestone-released', ...place, after: { part, memberId: member.id, reason } }
    : { kind: 'milestone-handed-over', ...place, after: { part, from: member.id, to: item.to, reason } };
};

const faultsOf = (
  items: readonly Item[],
  claims: ReadonlyMap<string, OpenClaim>,
  everyone: readonly Member[],
  member: Member,
  leadTo: string | null,
): FieldFault[] => {
  const seen = new Set<string>();
  return items.flatMap((item, index): FieldFault[] => {
    const place = placeText(item);
    if (seen.has(place)) return [{ pointer: `/items/${index}`, detail: 'This stands in the list twice.' }];
    seen.add(place);
    const claim = claims.get(place);
    if (item.to === null || claim === undefined) return [];
    const colleague = everyone.find(({ id }) => id === item.to);
    // Whoever takes the lead over in the same act holds as the lead.
    const lead = claim.leadClinicianId === member.id ? (leadTo ?? claim.leadClinicianId) : claim.leadClinicianId;
    if (colleague !== undefined && colleague.id !== member.id && mayHold(claim, colleague, lead)) return [];
    return [
      { pointer: `/items/${index}/to`, detail: `${colleague?.name ?? 'This person'} may not hold “${claim.title}”.` },
    ];
  });
};

/** A place in the list that the member does not hold (any more) refuses the whole list. */
export const handOverEvents = async (
  trx: Knex,
  member: Member,
  { items, reason }: HandOver,
  leadTo: string | null = null,
): Promise<HandedOver | Refused> => {
  const open = await openClaimsOf(trx, member.id);
  const claims = new Map(open.map((claim) => [placeText(claim), claim]));
  const strange = items.filter((item) => !claims.has(placeText(item)));
  if (strange.length > 0) {
    const what = strange.map(({ milestone }) => milestone).join(', ');
    return refused('milestone-not-yours', {
      detail: `${member.name} does not hold ${what} any more. Nothing was changed; look at the list again.`,
    });
  }
  const errors = faultsOf(items, claims, await listMemberViews(trx), member, leadTo);
  if (errors.length > 0) return refused('bad-input', { errors });
  const named = new Set(items.map(placeText));
  return {
    kind: 'handed-over',
    events: items.map((item) => eventOf(item, member, reason)),
    unnamed: open.filter((claim) => !named.has(placeText(claim))),
  };
};
