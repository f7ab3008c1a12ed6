/** Writes the letter of an invitation; earlier ones of the same person stop working. */
import type { Request } from 'express';
import type { Knex } from 'knex';
import type { Services } from '../http/services.ts';
import { limits } from '../limits.ts';
import { invitationLetter } from '../mail/mail-texts.ts';
import { originOf } from '../mail/origin.ts';
import { queueMail } from '../mail/outbox-store.ts';
import { makeLink, voidLinks } from '../sign-in/mailed-link-store.ts';
import { teamName } from './member-view.ts';

interface Invitation {
  readonly memberId: string;
  readonly email: string;
  readonly madeById: string;
  readonly request: Request;
  /** UTC instant. */
  readonly now: string;
}

/** Runs after the member's row was written. */
export const sendInvitation = async (
  trx: Knex,
  services: Services,
  { memberId, email, madeById, request, now }: Invitation,
): Promise<void> => {
  await voidLinks(trx, memberId, now, 'invitation');
  const token = await makeLink(trx, {
    purpose: 'invitation',
    memberId,
    madeById,
    now: new Date(now),
    validSeconds: limits.invitationValid,
  });
  const letter = invitationLetter(originOf(services.env, request), token, await teamName(trx));
  await queueMail(trx, { ...letter, id: services.newId(), to: email, at: now });
};
