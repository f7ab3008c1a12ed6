/** Facts about the team and its members. */
import type { Appliers } from '../trail/trail-event.ts';

type TeamEvents =
  | 'team-founded'
  | 'team-settings-changed'
  | 'member-invited'
  | 'member-invited-again'
  | 'member-joined'
  | 'member-edited'
  | 'member-left'
  | 'cover-set'
  | 'password-set'
  | 'password-changed'
  | 'signed-in'
  | 'sign-in-refused'
  | 'signed-out';

const nothing = async (): Promise<void> => undefined;
const idOf = (event: { readonly memberId?: string }): string => {
  if (event.memberId === undefined) throw new Error('A member event without a member');
  return event.memberId;
};

export const teamAppliers: Appliers<TeamEvents> = {
  'team-founded': async (trx, { after }) => {
    await trx('team').insert({
      id: 1,
      name: after.name,
      zone: after.zone,
      sites: JSON.stringify(after.sites),
      version: 1,
    });
  },
  'team-settings-changed': async (trx, { after }) => {
    await trx('team')
      .where({ id: 1 })
      .update({
        name: after.name,
        zone: after.zone,
        sites: JSON.stringify(after.sites),
        version: trx.raw('version + 1'),
      });
  },
  'member-invited': async (trx, event) => {
    const { fields, invitedAt } = event.after;
    await trx('members').insert({
      id: idOf(event),
      name: fields.name,
      email: fields.email,
      standing: fields.standing,
      disciplines: JSON.stringify(fields.disciplines),
      supervisor_id: fields.supervisorId,
      status: 'invited',
      version: 1,
      invited_at: invitedAt,
    });
  },
  'member-invited-again': async (trx, event) => {
    await trx('members')
      .where({ id: idOf(event) })
      .update({ invited_at: event.after.invitedAt, version: trx.raw('version + 1') });
  },
  'member-joined': async (trx, event) => {
    await trx('members')
      .where({ id: idOf(event) })
      .update({ status: 'active', version: trx.raw('version + 1') });
  },
  'member-edited': async (trx, event) => {
    const { fields } = event.after;
    await trx('members')
      .where({ id: idOf(event) })
      .update({
        name: fields.name,
        email: fields.email,
        standing: fields.standing,
        disciplines: JSON.stringify(fields.disciplines),
        supervisor_id: fields.supervisorId,
        version: trx.raw('version + 1'),
      });
  },
  'member-left': async (trx, event) => {
    await trx('members')
      .where({ id: idOf(event) })
      .update({ status: 'left', left_on: event.after.leftOn, version: trx.raw('version + 1') });
  },
  'cover-set': async (trx, event) => {
    const { cover } = event.after;
    await trx('members')
      .where({ id: idOf(event) })
      .update({
        cover_by_id: cover?.byId ?? null,
        cover_from: cover?.from ?? null,
        cover_until: cover?.until ?? null,
        version: trx.raw('version + 1'),
      });
  },
  'password-set': nothing,
  'password-changed': nothing,
  'signed-in': nothing,
  'sign-in-refused': nothing,
  'signed-out': nothing,
};
