/** Every act on a milestone, by the people who do it, each on a child of its own. */
import type { Pathway } from '@weftway/contract/pathway';
import type { Locator, Page } from '@playwright/test';
import { childrenWith, fieldsOf, fillRecord, type Found } from './child-pathways.ts';
import { demoPassphrase, expect, expectAccessible, openAs, readApi, signIn, test } from './fixtures.ts';
import { registerOwnChild, send, signPast, type OwnChild } from './own-child.ts';

const open = async (page: Page, { childId, key }: Found, title: RegExp | string): Promise<Locator> => {
  await page.goto(`/children/${childId}?m=${key}`);
  return page.getByRole('region', { name: title });
};

const press = (place: Locator | Page, name: string | RegExp): Promise<void> =>
  place.getByRole('button', { name, exact: true }).click();

const dialogOf = (page: Page, name: string): Locator => page.getByRole('dialog', { name });

/** A child of one's own; the nurse, who may state its cleft, registers it. */
const ownChild = async (page: Page, change: OwnChild): Promise<string> => {
  await signIn(page, 'nurse');
  return registerOwnChild(page, change);
};

const pathwayOf = (page: Page, childId: string): Promise<Pathway> =>
  readApi<Pathway>(page, `/children/${childId}/pathway`);

test('a surgeon puts a signed entry right; both entries stay readable', async ({ page }) => {
  const childId = await ownChild(page, { bornOn: '2026-09-20' });
  const visit = { childId, key: 'TEAM-04' };
  await signIn(page, 'surgeon');
  await signPast(page, visit, { on: '2026-10-10', values: { plan_summary: 'Lip at four months' } });
  const sheet = await open(page, visit, 'First visit with the cleft surgeon');
  await press(sheet, 'Amend');
  const dialog = dialogOf(page, 'Amend a signed entry');
  await dialog.getByLabel('The plan in short').fill('Lip at three months');
  await press(dialog, 'Sign the amendment as Obed Nkansah');
  await expect(dialog.getByText('Say why, in a few words.')).toBeVisible();
  await dialog.getByLabel('Why it is amended').fill('The month was mistyped.');
  await dialog.getByLabel('Your password').fill('not the password at all');
  await press(dialog, 'Sign the amendment as Obed Nkansah');
  await expect(dialog.getByLabel('Your password')).toHaveAccessibleDescription(/password/i);
  await expectAccessible(page, '[role=dialog]');
  await dialog.getByLabel('Your password').fill(demoPassphrase);
  await press(dialog, 'Sign the amendment as Obed Nkansah');
  await expect(dialog).toBeHidden();
  await expect(sheet.getByText('Amended: The month was mistyped.')).toBeVisible();
  await expect(sheet.getByText('Lip at three months')).toBeVisible();
  await sheet.getByText('Earlier entry, signed by Obed Nkansah').click();
  await expect(sheet.getByText('Lip at four months')).toBeVisible();
  expect((await pathwayOf(page, childId)).signatures).toHaveLength(2);
});

test('a trainee prepares, the supervisor reads it and signs, and both names stay', async ({ page, browser }) => {
  const childId = await ownChild(page, { bornOn: '2026-09-20' });
  await signIn(page, 'surgeon');
  await send(page, 'put', `/children/${childId}/trainees`, { memberIds: ['m-pavel-novak'] });
  const visit = { childId, key: 'TEAM-04' };
  await signIn(page, 'trainee');
  const sheet = await open(page, visit, 'First visit with the cleft surgeon');
  await press(sheet, 'Ready for a signature');
  await expect(sheet.getByText(/is empty\. Fill it in, or say why it is empty\./).first()).toBeVisible();
  await page.reload();
  await fillRecord(sheet, await fieldsOf(page, visit, 'milestone'), '20 Nov 2026');
  await press(sheet, 'Ready for a signature');
  await expect(sheet.getByText('Prepared by Pavel Novák, ready for a signature.')).toBeVisible();
  await expect(sheet.getByRole('button', { name: 'Sign off', exact: true })).toHaveAttribute('aria-disabled', 'true');

  const surgeon = await openAs(browser, 'surgeon');
  const theirs = await open(surgeon, visit, 'First visit with the cleft surgeon');
  await expect(theirs.getByText('Prepared by Pavel Novák, ready for a signature.')).toBeVisible();
  await press(theirs, 'Sign off');
  const dialog = dialogOf(surgeon, 'Sign off');
  await dialog.getByLabel('Your password').fill(demoPassphrase);
  await press(dialog, 'Sign as Obed Nkansah');
  await expect(dialog).toBeHidden();
  await expect(theirs.getByText('Signed by Obed Nkansah, 20 Nov 2026, prepared by Pavel Novák')).toBeVisible();
  await surgeon.context().close();
  await expect(sheet.getByText('Signed by Obed Nkansah, 20 Nov 2026, prepared by Pavel Novák')).toBeVisible({
    timeout: 15_000,
  });
});

test('a milestone is claimed, handed over to a colleague, and let go by her', async ({ page, browser }) => {
  const childId = await ownChild(page, { bornOn: '2026-09-20' });
  const lip = { childId, key: 'SURG-01' };
  await signIn(page, 'surgeon');
  const sheet = await open(page, lip, 'Lip repair');
  await press(sheet, 'Claim');
  await press(sheet, 'Hand over');
  const dialog = dialogOf(page, 'Hand over to a colleague');
  await press(dialog, 'Hand over');
  await expect(dialog.getByText('Choose a colleague.')).toBeVisible();
  await dialog.getByRole('radio', { name: /Mireille Aubert/ }).check();
  await expectAccessible(page, '[role=dialog]');
  await press(dialog, 'Hand over to Mireille Aubert');
  await expect(dialog).toBeHidden();
  await expect(sheet.getByText('Held by Mireille Aubert')).toBeVisible();
  await expect(sheet.getByRole('button', { name: 'Let go' })).toHaveCount(0);

  const colleague = await openAs(browser, 'other-surgeon');
  const theirs = await open(colleague, lip, 'Lip repair');
  await press(theirs, 'Let go');
  await press(dialogOf(colleague, 'Let this milestone go'), 'Let it go');
  await expect(theirs.getByRole('button', { name: 'Claim', exact: true })).toBeVisible();
  await colleague.context().close();
  await expect(sheet.getByText('Held by no one')).toBeVisible({ timeout: 15_000 });
});

test('a date is booked, moved and taken back', async ({ page }) => {
  const childId = await ownChild(page, { bornOn: '2026-09-20' });
  await signIn(page, 'surgeon');
  const sheet = await open(page, { childId, key: 'SURG-01' }, 'Lip repair');
  await press(sheet, 'Book a date');
  const dialog = dialogOf(page, 'Book a date');
  await dialog.getByLabel('Date').fill('3 Jun 2028');
  await expect(dialog.getByText(/^That is outside its window/)).toBeVisible();
  await dialog.getByLabel('Date').fill('12 Jan 2027');
  await expect(dialog.getByText(/^That is outside its window/)).toBeHidden();
  await press(dialog, 'Book it');
  await expect(sheet.getByText('Booked for 12 Jan 2027', { exact: true })).toBeVisible();
  await press(sheet, 'Move the date');
  const moving = dialogOf(page, 'Move the date');
  await moving.getByLabel('Date').fill('19 Jan 2027');
  await press(moving, 'Move it');
  await expect(sheet.getByText('Booked for 19 Jan 2027', { exact: true })).toBeVisible();
  await press(sheet, 'Move the date');
  await press(moving, 'Take the booking back');
  await expect(sheet.getByText(/^Booked for \d+ Jan 2027$/)).toHaveCount(0);
  await expect(sheet.getByRole('button', { name: 'Book a date' })).toBeFocused();
});

test('a milestone from outside the protocol joins the path of one child', async ({ page }) => {
  const childId = await ownChild(page, { bornOn: '2021-03-01', cleft: '••hSh••' });
  await signIn(page, 'ent');
  await page.goto(`/children/${childId}`);
  await press(page, 'Add');
  await page.getByRole('menuitem', { name: 'Add a milestone' }).click();
  const dialog = dialogOf(page, 'Add a milestone for this child');
  await press(dialog, 'Add it to the path');
  await expect(dialog.getByText('Choose a kind.')).toBeVisible();
  const kind = dialog.getByRole('combobox', { name: 'Kind' });
  await kind.click();
  await page.getByRole('option').first().click();
  const name = await dialog.getByLabel('What it is called').inputValue();
  expect(name).not.toBe('');
  await dialog.getByLabel('What it is called').fill('Sleep at home for a week');
  await dialog.getByLabel('Why it is added').fill('Snores since the summer.');
  await expectAccessible(page, '[role=dialog]');
  await press(dialog, 'Add it to the path');
  await expect(dialog).toBeHidden();
  await page.goto(`/children/${childId}?view=list`);
  await page.getByRole('link', { name: 'Sleep at home for a week' }).click();
  await expect(page.getByRole('region', { name: 'Sleep at home for a week' })).toBeVisible();
});

test('a finding starts a milestone and its withdrawal takes it off again', async ({ page }) => {
  const childId = await ownChild(page, { bornOn: '2020-03-01', cleft: '••hSh••' });
  await signIn(page, 'speech-therapist');
  await page.goto(`/children/${childId}?view=list`);
  const workUp = page.getByRole('link', { name: 'Work-up of nasal speech' });
  await expect(page.getByRole('table').first()).toBeVisible();
  await expect(workUp).toHaveCount(0);
  const record = async (presence: string) => {
    await press(page, 'Add');
    await page.getByRole('menuitem', { name: 'Record a finding' }).click();
    const dialog = dialogOf(page, 'Record a finding');
    const which = dialog.getByRole('combobox', { name: 'Finding' });
    await which.fill('nose');
    await page
      .getByRole('option', { name: /^Air escapes through the nose/ })
      .first()
      .click();
    await dialog.getByRole('radio', { name: presence }).check();
    await press(dialog, 'Record it');
    await expect(dialog).toBeHidden();
  };
  await record('It is there');
  await expect(workUp.first()).toBeVisible();
  await record('It is not, or no longer, there');
  await expect(workUp).toHaveCount(0);
});

test('a surgeon stands by an operation that was done elsewhere', async ({ page }) => {
  await signIn(page, 'surgeon');
  const candidates = await childrenWith(page, /^SURG-01$/, ['partly-signed']);
  const found = candidates[0];
  if (found === undefined) throw new Error('The demo has no operation from elsewhere that waits');
  const sheet = await open(page, found, 'Lip repair');
  await press(sheet, 'Confirm it');
  const dialog = dialogOf(page, 'Confirm what was done elsewhere');
  await press(dialog, 'Confirm as Obed Nkansah');
  await expect(dialog.getByText('Write your password.')).toBeVisible();
  await dialog.getByLabel('Your password').fill(demoPassphrase);
  await press(dialog, 'Confirm as Obed Nkansah');
  await expect(dialog).toBeHidden();
  await expect(sheet.getByText('Signed', { exact: true }).first()).toBeVisible();
  await expect(sheet.getByText(/^Done elsewhere and taken over/)).toHaveCount(0);
});

test('an airway screen that has gone stale is recorded again and lets the palate go on', async ({ page }) => {
  const childId = await ownChild(page, { bornOn: '2025-12-10', cleft: '••hSh••', flags: ['robin'] });
  const screen = { childId, key: 'CARE-03' };
  const results = { safe_for_anaesthesia: 'with plan', safe_for_plate: 'yes' };
  await signIn(page, 'paediatrician');
  await signPast(page, screen, { on: '2026-01-10', values: results });
  await page.goto(`/children/${childId}?m=SURG-03`);
  await expect(
    page
      .getByRole('region', { name: 'Palate repair' })
      .getByText(/^Waiting/)
      .first(),
  ).toBeVisible();
  const sheet = await open(page, screen, 'Screen of airway and breathing in sleep');
  await press(sheet, 'Record it again');
  await fillRecord(sheet, await fieldsOf(page, screen, 'milestone'), '28 Nov 2026');
  await sheet.getByRole('group', { name: 'Safe for anaesthesia' }).getByRole('radio', { name: 'Yes' }).check();
  await expect(sheet.getByText(/^Draft kept/).first()).toBeVisible();
  await press(sheet, 'Sign off');
  const dialog = dialogOf(page, 'Sign off');
  await dialog.getByLabel('Your password').fill(demoPassphrase);
  await press(dialog, 'Sign as Wen Zhao');
  await expect(dialog).toBeHidden();
  await expect(sheet.getByText('Signed by Wen Zhao, 28 Nov 2026')).toBeVisible();
  await page.goto(`/children/${childId}?m=SURG-03`);
  const palate = page.getByRole('region', { name: 'Palate repair' });
  await expect(palate.getByText(/^Open/).first()).toBeVisible();
});

test('waiving a palate repair takes a second clinician of the right discipline', async ({ page }) => {
  const childId = await ownChild(page, { bornOn: '2025-12-10', cleft: '••hSh••' });
  await signIn(page, 'surgeon');
  const sheet = await open(page, { childId, key: 'SURG-03' }, 'Palate repair');
  await sheet.getByRole('radio', { name: 'it is waived' }).check();
  await press(sheet, 'Show what would move');
  await expect(sheet.getByText(/^\d+ milestones? would move$/)).toBeVisible();
  await press(sheet, 'Waive');
  const dialog = dialogOf(page, 'Waive this milestone');
  await dialog.getByRole('radio', { name: 'Airway too unsafe' }).check();
  await dialog.getByLabel('Your password').fill(demoPassphrase);
  await press(dialog, 'Waive as Obed Nkansah');
  await expect(dialog.getByText('Choose the second clinician.')).toBeVisible();
  const second = dialog.getByRole('combobox', { name: /Second clinician/ });
  await second.fill('Hana');
  await expect(page.getByRole('option', { name: /Hana Dvořák/ })).toHaveCount(0);
  await second.fill('Wen');
  await page.getByRole('option', { name: /Wen Zhao/ }).click();
  await expectAccessible(page, '[role=dialog]');
  await press(dialog, 'Waive as Obed Nkansah');
  await expect(dialog).toBeHidden();
  await expect(sheet.getByText('Will not be done: Airway too unsafe')).toBeVisible();
  await expect(sheet.getByText(/decided with Wen Zhao/i).first()).toBeVisible();
});

test('a chance that has ended is closed with a sentence', async ({ page }) => {
  const childId = await ownChild(page, { bornOn: '2026-08-20' });
  await signIn(page, 'molding-dentist');
  const sheet = await open(page, { childId, key: 'MOLD-01' }, 'Molding offered and decided');
  await expect(sheet.getByText(/^The chance has ended\./)).toBeVisible();
  await press(sheet, 'Waive');
  const dialog = dialogOf(page, 'Waive this milestone');
  await dialog.getByLabel('Reason, in a few words').fill('Came to the team at three months.');
  await dialog.getByLabel('Your password').fill(demoPassphrase);
  await press(dialog, 'Waive as Yuki Sandoval');
  await expect(dialog).toBeHidden();
  await expect(sheet.getByText('Will not be done: Came to the team at three months.')).toBeVisible();
});

test('signing past a check takes a reason, and where the throat narrows a second name', async ({ page }) => {
  const childId = await ownChild(page, { bornOn: '2020-03-01', cleft: '••hSh••' });
  await signIn(page, 'speech-therapist');
  await send(page, 'post', `/children/${childId}/findings`, {
    name: 'vpi_suspected',
    on: '2026-05-01',
    isPresent: true,
    note: '',
  });
  const workUp = { childId, key: 'SPCH-05' };
  await signPast(page, workUp, { on: '2026-06-01', part: 'speech' });
  await signIn(page, 'surgeon');
  await signPast(page, workUp, { on: '2026-06-02', part: 'decision', values: { decision: 'surgery' } });
  const operation = { childId, key: 'SPCH-06' };
  const sheet = await open(page, operation, 'Speech surgery');
  await fillRecord(sheet, await fieldsOf(page, operation, 'operation'), '20 Nov 2026');
  await expect(sheet.getByText(/^Draft kept/).first()).toBeVisible();
  await press(sheet, 'Sign off: operation');
  const dialog = dialogOf(page, 'Sign off');
  const reasons = dialog.getByLabel('Why it was done without it');
  await expect(reasons.first()).toBeVisible();
  for (const reason of await reasons.all()) await reason.fill('Seen on the day, paper on file.');
  await dialog.getByLabel('Your password').fill(demoPassphrase);
  await press(dialog, 'Sign as Obed Nkansah');
  await expect(dialog.getByText('Choose the second clinician.')).toBeVisible();
  const second = dialog.getByRole('combobox', { name: /second clinician/i });
  await second.fill('Piet');
  await page.getByRole('option', { name: /Piet Hollander/ }).click();
  await expectAccessible(page, '[role=dialog]');
  await press(dialog, 'Sign as Obed Nkansah');
  await expect(dialog).toBeHidden();
  await expect(sheet.getByText('(Piet Hollander)').first()).toBeVisible();
});

test('the page prints as one sheet without the controls', async ({ page }) => {
  await signIn(page, 'coordinator');
  const [found] = await childrenWith(page, /^SURG-03$/, ['open', 'waiting', 'ahead']);
  await page.goto(`/children/${found?.childId ?? ''}`);
  await expect(page.getByRole('grid')).toBeVisible();
  await page.emulateMedia({ media: 'print' });
  await expect(page.getByRole('button', { name: 'Print' })).toBeHidden();
  await expect(page.getByText(/Shred after use/)).toBeVisible();
  await expect(page.getByText('Due and missing')).toBeVisible();
});
