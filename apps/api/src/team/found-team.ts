/** The first acts of a team: its name, its protocol, its members. Used by the seed, by the console and by tests. */
import type { Knex } from 'knex';
import type { MemberFields } from '@weftway/contract/member';
import type { Protocol } from '@weftway/pathway/protocol';
import { appendEvents } from '../trail/append-events.ts';
import type { Author } from '../trail/append-events.ts';
import type { TrailEvent } from '../trail/trail-event.ts';

export interface FoundedMember {
  readonly id: string;
  readonly fields: MemberFields;
  /** Null: invited, has not joined yet. */
  readonly passwordHash: string | null;
}

export interface Founding {
  readonly name: string;
  readonly zone: string;
  readonly sites: readonly string[];
  readonly protocol: Protocol;
  readonly members: readonly FoundedMember[];
  /** UTC instant of the founding. */
  readonly at: string;
}

const joined = (memberId: string): TrailEvent[] => [
  { kind: 'member-joined', memberId, after: {} },
  { kind: 'password-set', memberId, after: {} },
];

/** Supervisors must stand before their trainees in `members`. */
export const foundTeam = async (trx: Knex, founding: Founding): Promise<void> => {
  const author: Author = {
    at: founding.at,
    actorId: null,
    actorName: 'Founding',
    actorRole: '',
    requestId: 'founding',
  };
  const { version } = founding.protocol;
  const events: TrailEvent[] = [
    { kind: 'team-founded', after: { name: founding.name, zone: founding.zone, sites: founding.sites } },
    ...founding.members.flatMap((member): TrailEvent[] => [
      { kind: 'member-invited', memberId: member.id, after: { fields: member.fields, invitedAt: founding.at } },
      ...(member.passwordHash === null ? [] : joined(member.id)),
    ]),
    { kind: 'protocol-added', after: { version, document: founding.protocol, changes: founding.protocol.changes } },
    { kind: 'protocol-activated', after: { version, agreedBy: 'Founding of the team', reason: 'First protocol' } },
  ];
  await appendEvents(trx, events, author);
  for (const member of founding.members) {
    if (member.passwordHash === null) continue;
    await trx('credentials').insert({
      member_id: member.id,
      password_hash: member.passwordHash,
      changed_at: founding.at,
    });
  }
};
