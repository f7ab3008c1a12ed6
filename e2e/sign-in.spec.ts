import { demoPassphrase, emailOf, expect, expectAccessible, people, signIn, test } from './fixtures.ts';
import type { PersonName } from './fixtures.ts';
import type { Page } from '@playwright/test';

const fillIn = async (page: Page, email: string, password: string): Promise<void> => {
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password', { exact: true }).fill(password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
};

const placesOf = (page: Page) => page.getByRole('navigation', { name: 'Places' }).getByRole('link');

const clinical = ['My work', 'Board', 'Children', 'Protocol', 'Team', 'Audit trail'];
const kinds: readonly (readonly [PersonName, string, readonly string[]])[] = [
  ['coordinator', '/my-work', clinical],
  ['orthodontist', '/my-work', clinical],
  ['trainee', '/my-work', clinical.slice(0, 5)],
  ['administrator', '/team', ['Protocol', 'Team', 'Audit trail']],
  ['auditor', '/trail', ['Protocol', 'Team', 'Audit trail']],
];

for (const [person, home, places] of kinds) {
  test(`${person} signs in and finds the places of their role`, async ({ page }) => {
    await page.goto('/');
    await expect(page.getByRole('heading', { name: 'Sign in', exact: true })).toBeVisible();
    await fillIn(page, emailOf(person), demoPassphrase);
    await expect(page).toHaveURL(home);
    await expect(placesOf(page)).toHaveText([...places]);
  });
}

test('a person of the demonstration is chosen from the list with the keyboard alone', async ({ page }) => {
  await page.goto('/sign-in');
  await expectAccessible(page);
  const choice = page.getByRole('button', { name: /^Ines Calder/ });
  await choice.focus();
  await page.keyboard.press('Enter');
  await expect(page.getByLabel('E-mail')).toHaveValue(emailOf('orthodontist'));
  await expect(page.getByRole('button', { name: 'Sign in', exact: true })).toBeFocused();
  await page.keyboard.press('Enter');
  await expect(page).toHaveURL('/my-work');
});

test('a wrong password is said beside the button and keeps what was typed', async ({ page }) => {
  await page.goto('/sign-in');
  await fillIn(page, emailOf('geneticist'), 'not the password at all');
  await expect(page.getByText('The e-mail or the password does not match')).toBeVisible();
  await expect(page.getByLabel('E-mail')).toHaveValue(emailOf('geneticist'));
  await expect(page.getByLabel('Password', { exact: true })).toBeFocused();
});

test('whoever opens a screen first signs in and then comes back to it', async ({ page }) => {
  await page.goto('/team');
  await expect(page).toHaveURL('/sign-in?next=%2Fteam');
  await fillIn(page, emailOf('nurse'), demoPassphrase);
  await expect(page).toHaveURL('/team');
});

for (const next of ['//evil.example', '/\\evil', 'https://evil.example', 'javascript:alert(1)']) {
  test(`X06 sign-in does not follow ${next}`, async ({ page }) => {
    await page.goto(`/sign-in?next=${encodeURIComponent(next)}`);
    await fillIn(page, emailOf('ent'), demoPassphrase);
    await expect(page).toHaveURL('/my-work');
  });
}

test('a forgotten password is set anew by the letter, once', async ({ page }) => {
  const email = emailOf('anaesthetist');
  await page.goto('/sign-in');
  await page.getByRole('link', { name: 'Forgot it?' }).click();
  await expect(page).toHaveURL('/forgotten-password');
  await page.getByLabel('E-mail').fill(email);
  await page.getByRole('button', { name: 'Send me the letter' }).click();
  await expect(page.getByText('Look into your mail')).toBeVisible();
  await page.getByRole('link', { name: 'Local inbox' }).click();
  const letter = page.getByRole('article', { name: 'Set a new Weftway password' }).filter({ hasText: email }).first();
  const link = letter.getByRole('link');
  const address = (await link.getAttribute('href')) ?? '';
  await link.click();
  await expect(page).toHaveURL('/new-password');
  await page.getByLabel('New password').fill('Tern Estuary 2026');
  await page.getByRole('button', { name: 'Set the password' }).click();
  await expect(page.getByText(/names that anybody on the team knows/)).toBeVisible();
  await page.getByLabel('New password').fill('seven herons wait by the lock');
  await page.getByRole('button', { name: 'Set the password' }).click();
  await expect(page.getByText('Your password is set')).toBeVisible();
  await page.getByRole('link', { name: 'Sign in' }).click();
  await fillIn(page, email, 'seven herons wait by the lock');
  await expect(page).toHaveURL('/my-work');
  await page.goto(address);
  await page.getByLabel('New password').fill('another sentence of my own');
  await page.getByRole('button', { name: 'Set the password' }).click();
  await expect(page.getByText('This link has been used or has run out')).toBeVisible();
});

test('a session that has ended locks the screen and keeps what was typed', async ({ page }) => {
  await signIn(page, 'paediatrician');
  await page.goto('/account');
  await page.getByLabel('New password').fill('a sentence that is half typed');
  await page.context().clearCookies();
  await page.getByRole('button', { name: 'Change the password' }).click();
  await expect(page.getByRole('heading', { name: 'The screen is locked' })).toBeVisible();
  await expect(page.getByText('My account')).toBeHidden();
  await page.getByRole('dialog').getByLabel('Password', { exact: true }).fill(demoPassphrase);
  await page.keyboard.press('Enter');
  await expect(page.getByRole('heading', { name: 'My account' })).toBeVisible();
  await expect(page.getByLabel('New password')).toHaveValue('a sentence that is half typed');
});

test('X15 after signing out, going back shows nothing', async ({ page }) => {
  await signIn(page, 'dentist');
  await page.goto('/account');
  await page.goto('/team');
  await expect(page.getByRole('heading', { name: 'Team', exact: true })).toBeVisible();
  await page.getByRole('button', { name: /Noor Castellan/ }).click();
  await page.getByRole('menuitem', { name: 'Sign out' }).click();
  await expect(page).toHaveURL('/sign-in');
  await page.goBack();
  await expect(page.getByRole('heading', { name: 'Sign in', exact: true })).toBeVisible();
  await expect(page.getByText('Noor Castellan', { exact: true }).and(page.locator('th'))).toHaveCount(0);
});

test('light or dark is chosen once and holds', async ({ page }) => {
  await page.goto('/sign-in');
  await page.getByText('Dark', { exact: true }).click();
  await page.reload();
  await expect(page.locator('html')).toHaveAttribute('data-theme', 'dark');
});

test('a slash goes to a child from anywhere', async ({ page }) => {
  await signIn(page, 'speech-therapist');
  await page.goto('/team');
  await expect(page.getByRole('heading', { name: 'Team', exact: true })).toBeVisible();
  await page.keyboard.press('/');
  await page.keyboard.type('bielak');
  await page.getByRole('option', { name: /Tomasz Bielak/ }).waitFor();
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('Enter');
  await expect(page).toHaveURL(/\/children\/[\w-]+$/);
});

test('every person of the demonstration is in the list', async ({ page }) => {
  await page.goto('/sign-in');
  const list = page.getByRole('region', { name: 'Sign in as …' }).getByRole('button');
  await expect(list.first()).toBeVisible();
  expect(await list.count()).toBeGreaterThanOrEqual(Object.keys(people).length - 2);
});
