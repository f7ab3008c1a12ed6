/** Migrates the database and, when it is empty, fills it with the demo team. A second run keeps the data. */
import fs from 'node:fs';
import { openDatabase } from '../src/db/connection.ts';
import { readEnv } from '../src/env.ts';
import { demoPassword } from '../src/sign-in/demo-accounts.ts';
import { localDate } from '../src/team/team-date.ts';

const env = readEnv(process.env);
fs.mkdirSync(env.dataFolder, { recursive: true });
const db = openDatabase(env.databaseFile);
const say = (text: string): void => void process.stdout.write(`${text}\n`);

const [, applied] = (await db.migrate.latest()) as [number, string[]]; // what Knex answers
if (applied.length > 0) say(`Migrated: ${applied.join(', ')}`);
const team: { name: string } | undefined = await db('team').first('name');
if (team === undefined && env.isDemo) {
  process.env['WEFTWAY_SEED_DAY'] = env.today ?? localDate(new Date(), 'Europe/London');
  say('Seeding the Tern Estuary Cleft Team (about 160 invented children) …');
  await db.seed.run();
}
if (env.isDemo) {
  const accounts: { email: string; name: string; standing: string; disciplines: string }[] = await db('members')
    .where({ status: 'active' })
    .orderBy('email')
    .select('email', 'name', 'standing', 'disciplines');
  say(`\nDemo accounts (all with the passphrase: ${demoPassword})`);
  for (const account of accounts) {
    const held = (JSON.parse(account.disciplines) as string[]).join(', '); // written from the closed list
    say(
      `  ${account.email.padEnd(42)} ${account.name.padEnd(22)} ${[account.standing === 'member' ? '' : account.standing, held].filter((text) => text !== '').join(', ')}`,
    );
  }
  say('');
}
await db.destroy();
