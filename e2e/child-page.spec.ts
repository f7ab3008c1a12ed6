import { childrenWith, firstWith } from './child-pathways.ts';
import { demoPassphrase, expect, expectAccessible, signIn, test } from './fixtures.ts';

test('the twenty years of a child: ruler by keyboard, the sheet with its reasons, what if', async ({ page }) => {
  await signIn(page, 'surgeon');
  const { childId } = await firstWith(page, /^SURG-03$/, ['ahead', 'open', 'waiting']);
  await page.goto(`/children/${childId}`);
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
  const ruler = page.getByRole('grid', { name: /on the age ruler/ });
  const palate = ruler.getByRole('gridcell', { name: /^Palate repair,/ }).first();
  await palate.focus();
  await page.keyboard.press('Enter');
  const sheet = page.getByRole('region', { name: 'Palate repair' });
  await expect(sheet.getByRole('heading', { level: 2, name: 'Palate repair' })).toBeFocused();
  await expect(page).toHaveURL(/[?&]m=SURG-03/);

  const reckoning = sheet.getByRole('table', { name: /Why these dates/ });
  await expect(reckoning).toContainText('Opens');
  await expect(reckoning.getByRole('link', { name: /^Protocol \d+, SURG-03$/ }).first()).toHaveAttribute(
    'href',
    /\/protocol\/\d+#SURG-03/,
  );
  await sheet.getByText('Latest', { exact: true }).first().click();
  await expect(reckoning).toContainText('Latest');

  await sheet.getByLabel('Weeks of delay').fill('30');
  await sheet.getByRole('button', { name: 'Show what would move' }).click();
  await expect(sheet.getByText(/Nothing is written. A calculation, not advice./)).toBeVisible();
  await expectAccessible(page);

  await page.keyboard.press('Escape');
  await expect(sheet).toBeHidden();
  await expect(page).not.toHaveURL(/m=/);
  await expect(palate).toBeFocused();
});

test('the list says the same as the ruler, sorts, opens a milestone, and is accessible', async ({ page }) => {
  await signIn(page, 'coordinator');
  const { childId } = await firstWith(page, /^TEAM-05$/, ['open', 'closing', 'late']);
  await page.goto(`/children/${childId}?view=list`);
  const now = page.getByRole('table', { name: /^Now/ });
  await expect(now).toBeVisible();
  await now.getByRole('button', { name: /^Latest/ }).click();
  await expect(now.getByRole('columnheader', { name: /^Latest/ })).toHaveAttribute('aria-sort', 'ascending');
  await expectAccessible(page);
  await now.getByRole('link', { name: 'Full team review' }).click();
  await expect(page.getByRole('region', { name: 'Full team review' })).toBeVisible();
  await expect(page).toHaveURL(/view=list.*m=TEAM-05/);
});

test('on a phone the list comes first and the sheet fills the screen', async ({ page }) => {
  await page.setViewportSize({ width: 390, height: 844 });
  await signIn(page, 'orthodontist');
  const { childId } = await firstWith(page, /^ORTH-02$/, ['open', 'closing', 'late']);
  await page.goto(`/children/${childId}`);
  await expect(page.getByRole('table', { name: /^Now/ })).toBeVisible();
  await page.getByRole('link', { name: 'X-ray of the canine' }).click();
  const sheet = page.getByRole('region', { name: 'X-ray of the canine' });
  await expect(sheet.getByRole('button', { name: 'Close' })).toBeInViewport();
  await sheet.getByRole('button', { name: 'Close' }).click();
  await expect(sheet).toBeHidden();
});

test('a clinician pauses a milestone with a reason and a review date, and lets it go on', async ({ page }) => {
  await signIn(page, 'surgeon');
  const found = await firstWith(page, /^SURG-03$/, ['open', 'waiting']);
  await page.goto(`/children/${found.childId}?m=${found.key}`);
  const sheet = page.getByRole('region', { name: 'Palate repair' });
  await sheet.getByRole('button', { name: 'Hold', exact: true }).click();
  const dialog = page.getByRole('dialog', { name: 'Hold this milestone' });
  await dialog.getByRole('button', { name: 'Hold it' }).click();
  await expect(dialog.getByText('Say why, in a few words.')).toBeVisible();
  await dialog.getByLabel('Why it is paused').fill('A cold; the family asks to wait.');
  await dialog.getByLabel('Look at it again on').fill('15 Jan 2027');
  await dialog.getByRole('button', { name: 'Hold it' }).click();
  await expect(sheet.getByText('Held until 15 Jan 2027: A cold; the family asks to wait.').first()).toBeVisible();
  await sheet.getByRole('button', { name: 'Change or end the hold' }).click();
  await page.getByRole('dialog').getByRole('button', { name: 'End the hold' }).click();
  await expect(sheet.getByText(/^Held until/)).toBeHidden();
});

test('a waiver names its reason, asks for the password, and shows what left the path', async ({ page }) => {
  await signIn(page, 'ent');
  const found = await firstWith(page, /^EAR-04$/, ['open', 'closing', 'late', 'waiting']);
  await page.goto(`/children/${found.childId}?m=${found.key}`);
  const sheet = page.getByRole('region', { name: /Ear, nose and throat/ });
  await sheet.getByRole('button', { name: 'Waive', exact: true }).click();
  const dialog = page.getByRole('dialog', { name: 'Waive this milestone' });
  await dialog.getByRole('radio', { name: 'Family choice' }).check();
  await expect(dialog.getByLabel('Offer it again on')).not.toHaveValue('');
  await dialog.getByLabel('Your password').fill('not the password at all');
  await dialog.getByRole('button', { name: /^Waive as/ }).click();
  await expect(dialog.getByLabel('Your password')).toHaveAccessibleDescription(/password/i);
  await dialog.getByLabel('Your password').fill(demoPassphrase);
  await dialog.getByRole('button', { name: /^Waive as/ }).click();
  await expect(dialog).toBeHidden();
  await expect(sheet.getByText('Will not be done: Family choice')).toBeVisible();
});

test('a child that is closed to somebody says who can open it; a mistyped address says so', async ({ page }) => {
  await signIn(page, 'other-trainee');
  await page.goto('/children/c-001');
  await expect(page.getByText('You do not look after this child')).toBeVisible();
  await expect(page.getByRole('link', { name: 'Write to Ruth Alder' })).toHaveAttribute('href', /^mailto:/);
  await signIn(page, 'surgeon');
  await page.goto('/children/c-nobody');
  await expect(page.getByText('There is no such child here')).toBeVisible();
});

test('claiming shows at once, and somebody else is told who holds it', async ({ page }) => {
  await signIn(page, 'speech-therapist');
  const candidates = await childrenWith(page, /^SPCH-/, ['open', 'closing', 'late']);
  for (const found of candidates) {
    await page.goto(`/children/${found.childId}?m=${found.key}`);
    await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
    const claim = page.getByRole('button', { name: 'Claim', exact: true });
    const isFree = await claim.waitFor({ timeout: 2500 }).then(
      () => true,
      () => false,
    );
    if (!isFree || (await claim.getAttribute('aria-disabled')) === 'true') continue;
    await claim.click();
    await expect(page.getByText('Held by Shirin Vaziri')).toBeVisible();
    await expect(claim).toBeHidden();
    return;
  }
  throw new Error('The demo has no speech milestone that is free');
});
