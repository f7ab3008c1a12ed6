import { editMember } from '@weftway/contract/member';
import type { Member, MemberFields } from '@weftway/contract/member';
import type { FieldFault } from '@weftway/contract/problems';
import type { Knex } from 'knex';
import { endpoint } from '../http/endpoint.ts';
import { done, refused } from '../http/outcome.ts';
import { addressChangedLetter } from '../mail/mail-texts.ts';
import { queueMail } from '../mail/outbox-store.ts';
import { storedIdOf } from '../sign-in/session-store.ts';
import { endingSessions } from '../sign-in/signed-out.ts';
import { endSessionsOf } from '../sign-in/sessions-store.ts';
import { emailTaken } from './email-taken.ts';
import { mayHold } from './may-hold.ts';
import { memberFaults } from './member-rules.ts';
import { findMember, findMemberByEmail, listMemberViews, memberView, teamName } from './member-view.ts';
import { openClaimsOf } from './open-claims-view.ts';

const fieldsOf = ({ name, email, standing, disciplines, supervisorId }: Member): MemberFields => ({
  name,
  email,
  standing,
  disciplines,
  supervisorId,
});

/** Work that the person holds and could not hold after the change. */
const workFaults = async (trx: Knex, member: Member, fields: MemberFields): Promise<FieldFault[]> => {
  if (member.status !== 'active' || member.standing !== 'member') return [];
  const after: Member = { ...member, ...fields };
  const lost = (await openClaimsOf(trx, member.id)).filter((claim) => mayHold(claim, member) && !mayHold(claim, after));
  if (lost.length === 0) return [];
  const pointer = fields.standing === member.standing ? '/disciplines' : '/standing';
  const what = lost.length === 1 ? 'one open milestone' : `${lost.length} open milestones`;
  return [{ pointer, detail: `${member.name} holds ${what} that would then be out of their lane. Hand over first.` }];
};

export const editMemberEndpoint = endpoint<typeof editMember>({
  operation: editMember,
  can: { action: 'manage', subject: 'Team' },
  version: (member) => member.version,
  handle: async ({ trx, services, params, body, ifMatch, now, actor, request }) => {
    const member = await findMember(trx, params.memberId);
    if (member === null) return refused('not-found');
    if (member.version !== ifMatch)
      return refused('changed-meanwhile', {
        detail: `${member.name} was changed by somebody else.`,
        extra: { current: member },
      });
    if (member.status === 'left')
      return refused('not-allowed', { detail: `${member.name} has left; the record stays as it was.` });
    const errors = [
      ...memberFaults(body, member, await listMemberViews(trx)),
      ...(await workFaults(trx, member, body)),
    ];
    if (errors.length > 0) return refused('bad-input', { errors });
    const known = await findMemberByEmail(trx, body.email);
    if (known !== null && known.id !== member.id) return emailTaken(known);
    const endsSessions = body.standing !== member.standing || body.email !== member.email;
    const kept = actor.id === member.id ? storedIdOf(request.sessionID) : null;
    return done(
      [
        { kind: 'member-edited', memberId: member.id, before: { fields: fieldsOf(member) }, after: { fields: body } },
        ...(endsSessions ? await endingSessions(trx, member.id, 'account-changed', kept) : []),
      ],
      async () => {
        if (endsSessions) await endSessionsOf(trx, member.id, kept);
        if (body.email !== member.email && member.status === 'active') {
          await queueMail(trx, {
            ...addressChangedLetter(await teamName(trx)),
            id: services.newId(),
            to: member.email,
            at: now,
          });
        }
        return memberView(trx, member.id);
      },
    );
  },
});
