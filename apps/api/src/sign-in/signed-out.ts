/** What the trail says when sessions end otherwise than by silence. */
import type { Knex } from 'knex';
import type { EventOf, EventPayloads, TrailEvent } from '../trail/trail-event.ts';
import { sessionsOfMember } from './session-view.ts';

type Because = EventPayloads['signed-out']['because'];

export const signedOut = (memberId: string, because: Because, sessions: number): EventOf<'signed-out'> => ({
  kind: 'signed-out',
  memberId,
  after: { because, sessions },
});

/** For an act that is about to end every session of a member, but for the one to keep; nothing when none is open. */
export const endingSessions = async (
  db: Knex,
  memberId: string,
  because: Because,
  keptStoredId: string | null = null,
): Promise<readonly TrailEvent[]> => {
  const open = (await sessionsOfMember(db, memberId)).filter(({ id }) => id !== keptStoredId);
  return open.length === 0 ? [] : [signedOut(memberId, because, open.length)];
};
