import { afterEach, beforeEach, expect, it } from 'vitest';
import type { Knex } from 'knex';
import { openDatabase } from '../db/connection.ts';
import { createTestApp, openBrowser } from '../testing/test-app.ts';
import { inviteFirstAdministrator } from './first-administrator.ts';

const asked = {
  team: 'Our Cleft Team',
  zone: 'Europe/London',
  sites: ['Main'],
  name: 'Alma Quist',
  email: 'alma@example.org',
  origin: 'https://weftway.example',
  now: new Date('2026-12-01T09:00:00.000Z'),
};

let db: Knex;
beforeEach(async () => {
  db = openDatabase(':memory:');
  await db.migrate.latest();
});
afterEach(() => db.destroy());

it('A16 a fresh installation has no account; the console makes one invitation', async () => {
  expect(await db('members').select('id')).toEqual([]);
  const link = await inviteFirstAdministrator(db, asked);
  expect(link).toMatch(/^https:\/\/weftway\.example\/invitation#[\w-]{43}$/);
  expect(await db('members').select('name', 'standing', 'status')).toEqual([
    { name: 'Alma Quist', standing: 'administrator', status: 'invited' },
  ]);
  expect(await db('credentials').select('member_id')).toEqual([]);
});

it('a second run before it was used makes a new link and no second person', async () => {
  await inviteFirstAdministrator(db, asked);
  await inviteFirstAdministrator(db, asked);
  expect(await db('members').select('id')).toHaveLength(1);
  expect(await db('mailed_links').whereNull('used_at').select('purpose')).toEqual([{ purpose: 'invitation' }]);
});

it('once an administrator has joined, the console makes no other', async () => {
  const test = await createTestApp();
  await expect(inviteFirstAdministrator(test.db, asked)).rejects.toThrow('An administrator has an account already');
  await test.close();
});

it('the link lets the first administrator in', async () => {
  const test = await createTestApp();
  await test.db('members').where({ id: 'administrator' }).update({ status: 'left' });
  const link = await inviteFirstAdministrator(test.db, asked);
  const browser = await openBrowser(test.app, null);
  const token = link.split('#')[1];
  expect(
    (await browser.post('/invitation-acceptances', { token, password: 'seven herons wait by the lock' })).status,
  ).toBe(200);
  await openBrowser(test.app, asked.email, 'seven herons wait by the lock');
  await test.close();
});
