import type { Pathway } from '@weftway/contract/pathway';
import { childrenWith, fieldsOf, fillRecord, firstWith, type Found } from './child-pathways.ts';
import { demoPassphrase, expect, expectAccessible, openAs, readApi, signIn, test } from './fixtures.ts';
import type { Page } from '@playwright/test';

const openMilestone = async (page: Page, { childId, key }: Found, title: RegExp) => {
  await page.goto(`/children/${childId}?m=${key}`);
  return page.getByRole('region', { name: title });
};

const signInDialog = async (page: Page, signer: string): Promise<void> => {
  const dialog = page.getByRole('dialog', { name: 'Sign off' });
  await expect(dialog.getByText(/^I (did|have reviewed)/)).toBeVisible();
  for (const reason of await dialog.getByLabel('Why it was done without it').all())
    await reason.fill('Done at the bedside, paper on file.');
  await expectAccessible(page, '[role=dialog]');
  await dialog.getByLabel('Your password').fill(demoPassphrase);
  await dialog.getByRole('button', { name: `Sign as ${signer}` }).click();
  await expect(dialog).toBeHidden();
};

test('a surgeon signs a lip repair with its evidence and sees the palate window move and why', async ({ page }) => {
  await signIn(page, 'surgeon');
  const [late] = await childrenWith(page, /^SURG-01$/, ['late', 'closing', 'open']);
  if (late === undefined) throw new Error('Nobody waits for a lip repair');
  const ready = await firstWith(page, /^SURG-01$/, ['late']).catch(() => late);
  const fields = await fieldsOf(page, ready, 'milestone');
  const sheet = await openMilestone(page, ready, /^Lip repair$/);
  await expect(sheet.getByText(/Not ready to sign: \d+ records are missing/).last()).toBeVisible();
  await fillRecord(sheet, fields, '30 Nov 2026');
  await expect(sheet.getByText(/^Draft kept \d\d:\d\d$/).first()).toBeVisible();
  await sheet.getByRole('button', { name: 'Sign off', exact: true }).click();
  await signInDialog(page, 'Obed Nkansah');
  await expect(sheet.getByText(/^Signed by Obed Nkansah, 30 Nov 2026/).first()).toBeVisible();
  await expect(sheet.getByRole('button', { name: 'Amend' })).toBeVisible();

  const moved = page.getByRole('region', { name: 'What moved' });
  await expect(moved).toBeVisible();
  await expect(moved.getByRole('listitem').filter({ hasText: 'Palate repair' }).first()).toContainText(
    /Lip repair on 30 Nov 2026|became/i,
  );
  await moved.getByRole('button', { name: 'Palate repair', exact: true }).click();
  const palate = page.getByRole('region', { name: 'Palate repair' });
  await expect(palate.getByRole('row', { name: /Lip repair on 30 Nov 2026, then 12 weeks/ })).toContainText(
    /days later|months later/,
  );
});

test('an orthodontist and a surgeon each sign their half of a bone graft', async ({ page, browser }) => {
  await signIn(page, 'orthodontist');
  const graft = await firstWith(page, /^ORTH-05:/, ['open', 'closing', 'late']);
  const sheet = await openMilestone(page, graft, /^Bone graft to the gum/);
  await fillRecord(sheet, await fieldsOf(page, graft, 'readiness'), '25 Nov 2026');
  await sheet.getByRole('button', { name: 'Sign off: readiness' }).click();
  await signInDialog(page, 'Ines Calder');
  await expect(sheet.getByText('Partly signed').first()).toBeVisible();
  await expect(sheet.getByText(/^Signed by Ines Calder/).first()).toBeVisible();

  const surgeon = await openAs(browser, 'surgeon');
  const other = await openMilestone(surgeon, graft, /^Bone graft to the gum/);
  await fillRecord(other, await fieldsOf(surgeon, graft, 'operation'), '27 Nov 2026');
  await other.getByRole('button', { name: 'Sign off: operation' }).click();
  await signInDialog(surgeon, 'Obed Nkansah');
  await expect(other.getByText(/^Signed by Obed Nkansah/).first()).toBeVisible();
  // The first screen hears of it by itself.
  await expect(sheet.getByText(/^Signed by Obed Nkansah/).first()).toBeVisible({ timeout: 15_000 });
  await surgeon.context().close();
});

test('a therapist cannot sign an operation and reads whose it is', async ({ page }) => {
  await signIn(page, 'speech-therapist');
  const found = await firstWith(page, /^SURG-01$/, ['open', 'closing', 'late', 'waiting']);
  const sheet = await openMilestone(page, found, /^Lip repair$/);
  const signOff = sheet.getByRole('button', { name: 'Sign off', exact: true });
  await expect(signOff).toHaveAttribute('aria-disabled', 'true');
  await expect(signOff).toHaveAccessibleDescription('For a cleft surgeon to do.');
  await expect(sheet.getByRole('button', { name: 'Fill in the record' })).toHaveCount(0);
});

test('what somebody else signs while it is open is shown beside what was typed', async ({ page, browser }) => {
  await signIn(page, 'speech-therapist');
  const candidates = await childrenWith(page, /^SPCH-0[234]$/, ['open', 'closing', 'late']);
  const found = candidates.at(-1);
  if (found === undefined) throw new Error('Nobody waits for a speech review');
  const fields = await fieldsOf(page, found, 'milestone');
  const sheet = await openMilestone(page, found, /speech/i);
  await fillRecord(sheet, fields, '24 Nov 2026');

  const colleague = await openAs(browser, 'other-speech-therapist');
  const theirs = await openMilestone(colleague, found, /speech/i);
  await theirs.getByRole('button', { name: 'Fill in the record' }).waitFor();
  await fillRecord(theirs, fields, '23 Nov 2026');
  await expect(theirs.getByText(/^Draft kept/).first()).toBeVisible();
  await theirs.getByRole('button', { name: 'Sign off', exact: true }).click();
  await signInDialog(colleague, 'Hana Dvořák');
  await colleague.context().close();

  const conflict = sheet.getByRole('alert').filter({ hasText: /Hana Dvořák signed this at \d\d:\d\d/ });
  await expect(conflict).toBeVisible({ timeout: 15_000 });
  await expect(conflict).toContainText('Nothing you typed is lost');
  const after = await readApi<Pathway>(page, `/children/${found.childId}/pathway`);
  expect(after.signatures.some((one) => one.milestone === found.key && one.signerName === 'Hana Dvořák')).toBe(true);
});
