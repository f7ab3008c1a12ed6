/** Live mode starts with nobody: the console makes the team and one invitation, and prints its link once. */
import type { Knex } from 'knex';
import { v7 as newId } from 'uuid';
import { memberFieldsSchema } from '@weftway/contract/member';
import { defaultProtocol } from '@weftway/pathway/default-protocol';
import { limits } from '../limits.ts';
import { foundTeam } from '../team/found-team.ts';
import { appendEvents } from '../trail/append-events.ts';
import { makeLink, voidLinks } from './mailed-link-store.ts';

export interface FirstAdministrator {
  readonly team: string;
  readonly zone: string;
  readonly sites: readonly string[];
  readonly name: string;
  readonly email: string;
  readonly origin: string;
  readonly now: Date;
}

/** Answers the link; refuses with a sentence once an administrator has an account. A second run makes a new link. */
export const inviteFirstAdministrator = (
  db: Knex,
  { team, zone, sites, name, email, origin, now }: FirstAdministrator,
): Promise<string> =>
  db.transaction(async (trx) => {
    const at = now.toISOString();
    const fields = memberFieldsSchema.parse({
      name,
      email,
      standing: 'administrator',
      disciplines: [],
      supervisorId: null,
    });
    const known: { id: string; email: string; status: string }[] = await trx('members')
      .where({ standing: 'administrator' })
      .whereNot({ status: 'left' })
      .select('id', 'email', 'status');
    if (known.some(({ status }) => status === 'active'))
      throw new Error('An administrator has an account already; ask them for an invitation.');
    const founded: { id: number } | undefined = await trx('team').first('id');
    if (founded === undefined)
      await foundTeam(trx, { name: team, zone, sites, protocol: defaultProtocol, members: [], at });
    let memberId = known.find((one) => one.email === fields.email)?.id;
    if (memberId === undefined) {
      memberId = newId();
      const author = { at, actorId: null, actorName: 'Console', actorRole: '', requestId: 'console' };
      await appendEvents(trx, [{ kind: 'member-invited', memberId, after: { fields, invitedAt: at } }], author);
    }
    await voidLinks(trx, memberId, at, 'invitation');
    const token = await makeLink(trx, {
      purpose: 'invitation',
      memberId,
      madeById: null,
      now,
      validSeconds: limits.invitationValid,
    });
    return `${origin}/invitation#${token}`;
  });
