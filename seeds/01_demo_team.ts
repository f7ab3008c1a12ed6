/** Fills an empty database with the Tern Estuary Cleft Team, as of the day in WEFTWAY_SEED_DAY. */
import type { Knex } from 'knex';
import { seedDemoTeam } from '../apps/api/src/demo/seed-demo-team.ts';

export const seed = async (db: Knex): Promise<void> => {
  const day = process.env['WEFTWAY_SEED_DAY'];
  if (day === undefined) throw new Error('WEFTWAY_SEED_DAY names the day of the demo, such as 2026-12-01');
  await seedDemoTeam(db, day);
};
