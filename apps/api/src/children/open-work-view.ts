/** What is still held or booked for a child. */
import type { Knex } from 'knex';

export interface HeldPart {
  readonly milestone: string;
  readonly part: string;
  readonly member_id: string;
}
export interface BookedDay {
  readonly milestone: string;
  readonly booked_on: string;
}

export const heldPartsOf = async (db: Knex, childId: string): Promise<HeldPart[]> =>
  db('claims').where({ child_id: childId }).orderBy(['milestone', 'part']).select('milestone', 'part', 'member_id');

export const bookedDaysOf = async (db: Knex, childId: string): Promise<BookedDay[]> =>
  db('bookings').where({ child_id: childId }).orderBy('milestone').select('milestone', 'booked_on');
