/**
 * Makes the first administrator of a live installation. Prints a link that works once, for seven days:
 * node --import tsx apps/api/scripts/first-administrator.ts --team "Our Cleft Team" --zone Europe/London
 *   --site "Main hospital" --name "Alma Quist" --email alma@example.org
 */
import { parseArgs } from 'node:util';
import { openDatabase } from '../src/db/connection.ts';
import { readEnv } from '../src/env.ts';
import { inviteFirstAdministrator } from '../src/sign-in/first-administrator.ts';

const text = { type: 'string' } as const;
const { values } = parseArgs({
  options: { team: text, zone: text, site: { ...text, multiple: true }, name: text, email: text },
});

const env = readEnv(process.env);
const db = openDatabase(env.databaseFile);
try {
  const { team, zone, site, name, email } = values;
  if (team === undefined || zone === undefined || site === undefined || name === undefined || email === undefined) {
    throw new Error('Name --team, --zone, --site, --name and --email.');
  }
  new Intl.DateTimeFormat('en', { timeZone: zone });
  await db.migrate.latest();
  const origin = env.origin ?? `http://${env.host}:${env.port}`;
  const link = await inviteFirstAdministrator(db, { team, zone, sites: site, name, email, origin, now: new Date() });
  process.stdout.write(`Open this once, within seven days, and choose a password:\n${link}\n`);
} catch (error) {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = 1;
} finally {
  await db.destroy();
}
