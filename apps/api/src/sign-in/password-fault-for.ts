/** Why a member may not choose this password: it is well known, or built from what anybody knows of the team. */
import type { Knex } from 'knex';
import { teamPlaces } from '../team/member-view.ts';
import { predictablePassword } from './predictable-password.ts';

export const passwordFaultFor = async (
  db: Knex,
  member: { readonly name: string; readonly email: string },
  password: string,
): Promise<string | null> => {
  const places = await teamPlaces(db);
  return predictablePassword(password, [...places, member.name, member.email]);
};
