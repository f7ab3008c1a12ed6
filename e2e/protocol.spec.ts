import { demoPassphrase, expect, expectAccessible, signIn, test } from './fixtures.ts';

test('a surgeon proposes a change, a crossing window is named at its field, an administrator makes it active', async ({
  page,
}) => {
  await signIn(page, 'surgeon');
  await page.goto('/protocol/1');
  await page.getByRole('link', { name: 'Change this version' }).click();
  await page.getByRole('combobox', { name: 'Milestone to change' }).fill('SURG-02');
  await page.getByRole('option', { name: /SURG-02/ }).click();

  const aim = page.getByRole('group', { name: 'Window', exact: true }).getByLabel('Aim');
  await aim.fill('2w');
  await expect(aim).toHaveAccessibleDescription(/The target 2w comes before the earliest day 4w/);
  await expect(page.getByRole('button', { name: 'Keep as a draft' })).toHaveAttribute('aria-disabled', 'true');
  await expectAccessible(page);

  await aim.fill('7w');
  await expect(page.getByText('6 weeks')).toBeVisible();
  await page.getByRole('button', { name: 'Check for faults' }).click();
  await expect(page.getByText('No faults found.')).toBeVisible();
  await page.getByLabel('What changes, in a sentence').fill('Lip review a week later');
  await page.getByRole('button', { name: 'Keep as a draft' }).click();
  await expect(page.getByRole('heading', { level: 1, name: /^Version \d+$/ })).toBeVisible();
  await expect(page.getByRole('button', { name: 'Make this version active' })).toHaveAccessibleDescription(
    /An administrator makes a version active/,
  );
  const address = new URL(page.url()).pathname;

  await signIn(page, 'administrator');
  await page.goto(address);
  await page.getByRole('button', { name: 'Make this version active' }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Clinical lead who agreed').fill('Obed Nkansah');
  await dialog.getByLabel('Why').fill('Agreed at the yearly meeting');
  await dialog.getByLabel('Your password').fill('not the right one at all');
  await dialog.getByRole('button', { name: /^Make version \d+ active$/ }).click();
  await expect(dialog.getByText('That is not your password')).toBeVisible();
  await dialog.getByLabel('Your password').fill(demoPassphrase);
  await dialog.getByRole('button', { name: /^Make version \d+ active$/ }).click();
  await expect(dialog).toBeHidden();
  await page.goto(`/protocol?from=1&to=${address.replace('/protocol/', '')}`);
  await expect(page.getByRole('row', { name: /Lip review a week later/ }).first()).toContainText('Active');
  await expect(page.getByText('7 weeks').first()).toBeVisible();
  await expectAccessible(page);
});

test('a rule is found by its address, by its words and with the keyboard', async ({ page }) => {
  await signIn(page, 'auditor');
  await page.goto('/protocol/1#SURG-03');
  const rule = page.getByRole('button', { name: /^Palate repair/ });
  await expect(rule).toBeFocused();
  await expect(rule).toBeInViewport();
  await expect(page.getByText('Aim 42 days after joining the team, at the latest 90 days')).toBeVisible();
  await expectAccessible(page);
  await page.keyboard.press('Enter');
  await expect(rule).toHaveAttribute('aria-expanded', 'false');
  await page.getByRole('searchbox', { name: 'Search the rules' }).fill('stickler');
  await expect(page.getByText(/^\d+ of 66 milestones$/)).toBeVisible();
  await expect(page).toHaveURL(/q=stickler/);
  await expect(page.getByRole('button', { name: 'Change this version' })).toHaveCount(0);
});
