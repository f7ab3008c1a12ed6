import type { Knex } from 'knex';
import { memberLeaves } from '@weftway/contract/member';
import type { Member } from '@weftway/contract/member';
import { endpoint } from '../http/endpoint.ts';
import { done, fieldRefused, refused } from '../http/outcome.ts';
import type { Refused } from '../http/outcome.ts';
import { voidLinks } from '../sign-in/mailed-link-store.ts';
import { endingSessions } from '../sign-in/signed-out.ts';
import { endSessionsOf } from '../sign-in/sessions-store.ts';
import type { TrailEvent } from '../trail/trail-event.ts';
import { handOverEvents } from './hand-over-events.ts';
import type { HandedOver } from './hand-over-events.ts';
import { childrenLedBy } from './led-children-view.ts';
import { canLead } from './may-hold.ts';
import { isLastAdministrator, traineesOf } from './member-rules.ts';
import { findMember, listMemberViews, memberView } from './member-view.ts';
import { restingClaimsOf } from './open-claims-view.ts';

const refusalFor = (member: Member, everyone: readonly Member[]): Refused | null => {
  if (member.status === 'left') return refused('not-found', { detail: `${member.name} has left already.` });
  if (isLastAdministrator(member, everyone)) {
    return refused('not-allowed', {
      detail: 'This is the last administrator. Make somebody else administrator first.',
    });
  }
  const trainees = traineesOf(member.id, everyone);
  if (trainees.length === 0) return null;
  const errors = trainees.map(({ name }) => ({
    pointer: '/trainees',
    detail: `First give ${name} another supervisor.`,
  }));
  return refused('bad-input', { detail: 'Trainees count on this member.', errors });
};

const leftUnowned = ({ unnamed }: HandedOver): Refused =>
  refused('work-left-unowned', {
    detail:
      unnamed.length === 1
        ? 'One open milestone is not in the list.'
        : `${unnamed.length} open milestones are not in the list.`,
    extra: { missing: unnamed.map(({ childId, milestone, part }) => ({ childId, milestone, part })) },
  });

/** The lead of children goes to one colleague, or to nobody on purpose; never by not being said. */
const leadRefusal = (
  count: number,
  leadTo: string | null | undefined,
  member: Member,
  everyone: readonly Member[],
): Refused | null => {
  if (count === 0 || leadTo === null) return null;
  const children = count === 1 ? 'one child' : `${count} children`;
  if (leadTo === undefined) {
    const detail = `${member.name} is lead clinician of ${children}. Say who leads from now on.`;
    return refused('work-left-unowned', { detail, errors: [{ pointer: '/leadTo', detail }], extra: { leads: count } });
  }
  const colleague = everyone.find(({ id }) => id === leadTo);
  if (colleague !== undefined && colleague.id !== member.id && canLead(colleague)) return null;
  return fieldRefused('/leadTo', 'Choose a clinician who is on the team today.');
};

const leadEvents = (led: readonly string[], member: Member, to: string | null, reason: string): TrailEvent[] =>
  led.map((childId) => ({
    kind: 'lead-handed-on',
    childId,
    memberId: to ?? member.id,
    before: { leadClinicianId: member.id },
    after: { leadClinicianId: to, reason },
  }));

/** What rests is let go without asking, so that nothing ever wakes in the hands of somebody who has left. */
const restingEvents = async (trx: Knex, member: Member): Promise<TrailEvent[]> =>
  (await restingClaimsOf(trx, member.id)).map(({ childId, milestone, part }) => ({
    kind: 'milestone-released',
    childId,
    memberId: member.id,
    milestone,
    before: { part, memberId: member.id },
    after: { part, memberId: member.id, reason: 'Left the team' },
  }));

const coverEvents = (member: Member, everyone: readonly Member[]): TrailEvent[] =>
  everyone
    .filter((one) => one.cover !== null && (one.cover.byId === member.id || one.id === member.id))
    .map((one) => ({ kind: 'cover-set', memberId: one.id, before: { cover: one.cover }, after: { cover: null } }));

/** One act: all work handed over, the account closed, every session ended. The name stays on what was signed. */
export const memberLeavesEndpoint = endpoint<typeof memberLeaves>({
  operation: memberLeaves,
  can: { action: 'manage', subject: 'Team' },
  handle: async ({ trx, params, body, today, now }) => {
    const member = await findMember(trx, params.memberId);
    if (member === null) return refused('not-found');
    const everyone = await listMemberViews(trx);
    const refusal = refusalFor(member, everyone);
    if (refusal !== null) return refusal;
    const led = await childrenLedBy(trx, member.id);
    const lead = leadRefusal(led.length, body.leadTo, member, everyone);
    if (lead !== null) return lead;
    const result = await handOverEvents(trx, member, body, body.leadTo ?? null);
    if (result.kind === 'refused') return result;
    if (result.unnamed.length > 0) return leftUnowned(result);
    const left: TrailEvent = {
      kind: 'member-left',
      memberId: member.id,
      before: { status: member.status },
      after: { leftOn: today, reason: body.reason },
    };
    return done(
      [
        ...leadEvents(led, member, body.leadTo ?? null, body.reason),
        ...result.events,
        ...(await restingEvents(trx, member)),
        ...coverEvents(member, everyone),
        left,
        ...(await endingSessions(trx, member.id, 'left')),
      ],
      async () => {
        await endSessionsOf(trx, member.id, null);
        await voidLinks(trx, member.id, now);
        return memberView(trx, member.id);
      },
    );
  },
});
