import { emailOf, expect, expectAccessible, openAs, readApi, signIn, test } from './fixtures.ts';

interface Members {
  readonly members: readonly {
    readonly id: string;
    readonly name: string;
    readonly openClaims: number;
    readonly status: string;
  }[];
}

test('somebody is invited, joins by the letter and signs in', async ({ page }, { retry }) => {
  const email = `ann.pell-${String(retry)}@tern-estuary.example`;
  await signIn(page, 'administrator');
  await page.goto('/team');
  await page.getByRole('button', { name: 'Invite somebody' }).click();
  const dialog = page.getByRole('dialog', { name: 'Invite somebody' });
  await dialog.getByLabel('Name', { exact: true }).fill('Ann Pell');
  await dialog.getByLabel('E-mail').fill('ann at home');
  await dialog.getByRole('button', { name: 'Send the invitation' }).click();
  await expect(dialog.getByText('Write a whole e-mail address, such as name@example.org.')).toBeVisible();
  await dialog.getByLabel('E-mail').fill(email);
  await dialog.getByRole('checkbox', { name: 'Geneticist' }).check();
  await dialog.getByRole('button', { name: 'Send the invitation' }).click();
  await expect(dialog).toBeHidden();
  await expect(page.getByRole('row', { name: /Ann Pell/ }).first()).toContainText('invited 1 Dec 2026');

  const context = await page.context().browser()?.newContext();
  const hers = await context?.newPage();
  if (hers === undefined) throw new Error('No second window');
  await hers.goto('/inbox');
  await hers.getByRole('article').filter({ hasText: email }).getByRole('link').first().click();
  await expect(hers.getByText(`This invitation is for Ann Pell, ${email}.`)).toBeVisible();
  await expectAccessible(hers);
  await hers.getByLabel('New password').fill('seven herons wait by the lock');
  await hers.getByRole('button', { name: 'Join the team' }).click();
  await hers.getByRole('link', { name: 'Sign in' }).click();
  await hers.getByLabel('E-mail').fill(email);
  await hers.getByLabel('Password', { exact: true }).fill('seven herons wait by the lock');
  await hers.keyboard.press('Enter');
  await expect(hers).toHaveURL('/my-work');
});

test('a member who leaves hands every open milestone over in one act', async ({ page, browser }) => {
  const theirs = await openAs(browser, 'other-nurse');
  await signIn(page, 'administrator');
  await page.goto('/team/m-delyth-rowan');
  const before = (await readApi<Members>(page, '/members')).members;
  const held = before.find(({ id }) => id === 'm-delyth-rowan')?.openClaims ?? 0;
  expect(held).toBeGreaterThan(0);
  await page.getByRole('button', { name: 'Delyth Rowan leaves the team' }).click();
  const dialog = page.getByRole('alertdialog', { name: 'Delyth Rowan leaves the team' });
  const close = dialog.getByRole('button', { name: 'Close the account' });
  const lead = dialog.getByLabel(/^Lead clinician of/);
  if ((await lead.count()) > 0) await lead.selectOption({ label: 'Fergus Boyle' });
  await expect(close).toHaveAccessibleDescription(/still need/);
  await dialog.getByLabel('To', { exact: true }).selectOption({ label: 'Fergus Boyle' });
  await dialog.getByRole('button', { name: 'Give', exact: true }).click();
  // What only somebody else may hold is let go on purpose.
  for (const row of await dialog.getByRole('listitem').all()) {
    const choice = row.getByRole('combobox');
    if ((await choice.inputValue()) === '') await choice.selectOption({ label: 'Nobody: let it go' });
  }
  await dialog.getByLabel('Reason').fill('Moves to another town');
  await close.click();
  await expect(dialog).toBeHidden();
  await expect(page.getByText('Delyth Rowan has left the team.')).toBeVisible();

  const after = (await readApi<Members>(page, '/members')).members;
  expect(after.find(({ id }) => id === 'm-delyth-rowan')).toMatchObject({
    status: 'left',
    openClaims: 0,
    name: 'Delyth Rowan',
  });
  const fergus = (list: Members['members']) => list.find(({ id }) => id === 'm-fergus-boyle')?.openClaims ?? 0;
  expect(fergus(after)).toBeGreaterThan(fergus(before));
  await theirs.goto('/my-work');
  await expect(theirs.getByRole('heading', { name: 'Sign in', exact: true })).toBeVisible();
});

test('a supervisor leaves only after the trainees have another', async ({ page }) => {
  await signIn(page, 'administrator');
  await page.goto('/team/m-shirin-vaziri');
  await page.getByRole('button', { name: 'Shirin Vaziri leaves the team' }).click();
  const dialog = page.getByRole('dialog', { name: 'Shirin Vaziri leaves the team' });
  await expect(
    dialog.getByText('Shirin Vaziri supervises trainees. First give them another supervisor:'),
  ).toBeVisible();
  await dialog.getByRole('link', { name: 'Gwen Osei' }).click();
  await expect(page).toHaveURL('/team/m-gwen-osei');
});

test('the coordinator sees who is on the team and changes no account', async ({ page }) => {
  await signIn(page, 'coordinator');
  await page.goto('/team');
  await expect(page.getByText('An administrator invites, changes and closes accounts.')).toBeVisible();
  await expect(page.getByRole('button', { name: 'Invite somebody' })).toHaveCount(0);
  await expectAccessible(page);
  await page.getByRole('link', { name: 'Wen Zhao' }).click();
  await expect(page.getByText(emailOf('paediatrician'))).toBeVisible();
  await expect(page.getByRole('button', { name: 'Change' })).toHaveCount(0);
});

test('somebody covers while a colleague is away', async ({ page }) => {
  await signIn(page, 'coordinator');
  await page.goto('/team/m-tobias-renn');
  await page.getByLabel('Covered by').selectOption({ label: 'Ines Calder, Orthodontist, Molding dentist' });
  await page.getByLabel('Until and including').fill('20 Nov 2026');
  await page.getByRole('button', { name: 'Set the cover' }).click();
  await expect(page.getByText('The last day lies before the first.')).toBeVisible();
  await page.getByLabel('Until and including').fill('20 Dec 2026');
  await page.getByRole('button', { name: 'Set the cover' }).click();
  await expect(page.getByText('covered by Ines Calder until 20 Dec 2026').first()).toBeVisible();
});

test('whoever leads children hands the lead on before the account closes', async ({ page }) => {
  await signIn(page, 'administrator');
  await page.goto('/team/m-mireille-aubert');
  await page.getByRole('button', { name: 'Mireille Aubert leaves the team' }).click();
  const dialog = page.getByRole('alertdialog', { name: 'Mireille Aubert leaves the team' });
  const close = dialog.getByRole('button', { name: 'Close the account' });
  await expect(close).toBeInViewport();
  await expect(close).toHaveAccessibleDescription('Choose who leads these children from now on.');
  await expectAccessible(page, '[role=alertdialog]');
  await dialog.getByLabel(/^Lead clinician of \d+ children/).selectOption({ label: 'Obed Nkansah' });
  await expect(close).toHaveAccessibleDescription(/still need/);
  await page.keyboard.press('Escape');
  await expect(dialog).toBeHidden();
});

test('an administrator changes a site of the team; somebody else is told who can', async ({ page, browser }, {
  retry,
}) => {
  const site = `Curlew Steps ${String(retry)}`;
  await signIn(page, 'administrator');
  await page.goto('/team');
  await page.getByRole('link', { name: 'Settings and limits' }).click();
  await expect(page.getByRole('row', { name: 'Screen locks after nothing has happened for 15 minutes' })).toBeVisible();
  await expectAccessible(page);
  const save = page.getByRole('button', { name: 'Save the settings' });
  await expect(save).toHaveAccessibleDescription('Nothing is changed yet.');
  const sites = page.getByLabel('Sites');
  const before = await sites.inputValue();
  await sites.fill(site);
  await save.click();
  await expect(sites).toBeFocused();
  await expect(sites).toHaveAccessibleDescription(/Children are seen at/);
  await expect(sites).toHaveValue(site);
  await sites.fill(`${before}\n${site}`);
  await save.click();
  await expect(page.getByText('The settings are saved.')).toBeVisible();
  const auditor = await openAs(browser, 'auditor');
  await auditor.goto('/team/settings');
  await expect(auditor.getByText('Only an administrator opens the settings')).toBeVisible();
  await auditor.goto('/board');
  await expect(auditor.getByText('Board is not among the places of your role')).toBeVisible();
});
