/** The registry: adding, duplicates, expected children, two people at one record. */
import type { Page } from '@playwright/test';
import { expect, expectAccessible, openAs, signIn, test } from './fixtures.ts';

/** Tells the children of this run from those of a try before. */
const mark = String(Date.now()).slice(-7);

const addName = async (
  page: Page,
  child: { readonly first: string; readonly family: string; readonly number: string; readonly born: string },
) => {
  await page.getByRole('textbox', { name: 'First name' }).fill(child.first);
  await page.getByRole('textbox', { name: 'Family name' }).fill(child.family);
  await page.getByRole('textbox', { name: 'Record number' }).fill(child.number);
  await page.getByRole('textbox', { name: 'Birth date' }).fill(child.born);
  await page.getByRole('combobox', { name: 'Site' }).selectOption('Saltmarsh');
};

test('the coordinator adds a child with the drawing, by keyboard, and finds it by birth date', async ({ page }) => {
  await signIn(page, 'coordinator');
  await page.goto('/children');
  await expect(page.getByRole('table', { name: 'Children' })).toBeVisible();
  await expectAccessible(page);
  await page.getByRole('link', { name: 'Add a child' }).click();
  await addName(page, { first: 'Łucja', family: `Żółtowski${mark}`, number: `E01-${mark}`, born: '6/11/2026' });
  for (const part of ['Left lip', 'Left gum', 'Left hard palate', 'Soft palate']) {
    await page.getByRole('slider', { name: part }).focus();
    await page.keyboard.press('End');
  }
  await page.getByRole('slider', { name: 'Left lip' }).focus();
  await page.keyboard.press('ArrowDown');
  await expect(page.getByRole('textbox', { name: 'Cleft code (LAHSHAL)' })).toHaveValue('•••SHAl');
  await expect(page.getByText('ICD-10 Q37.5')).toBeVisible();
  // A field half under the sticky bar counts as too small to press.
  await page.evaluate(() => window.scrollTo(0, 0));
  await expectAccessible(page);
  await page.getByRole('button', { name: 'Add to the list' }).click();
  await expect(page.getByText(`Łucja Żółtowski${mark} is on the list.`)).toBeVisible();
  await page.goto(`/children?q=zoltowski${mark}%206%20Nov%202026`);
  await expect(page.getByRole('link', { name: `Żółtowski${mark}, Łucja` })).toBeVisible();
  await expect(page.getByText('1 child', { exact: true })).toBeVisible();
});

test('a child that may be on the list is noticed, refused once and added when it is another child', async ({
  page,
}) => {
  await signIn(page, 'coordinator');
  await page.goto('/children/new');
  await addName(page, { first: `Twice${mark}`, family: 'Sameday', number: `E10-${mark}`, born: '1 Nov 2026' });
  await page.getByRole('button', { name: 'Add to the list' }).click();
  await expect(page).toHaveURL(/\/children\/(?!new)/);
  await page.goto('/children/new');
  await addName(page, { first: 'sameday', family: `TWICE${mark}`, number: `E11-${mark}`, born: '2026-11-01' });
  await expect(page.getByText('This child may be on the list already')).toBeVisible();
  await page.getByRole('button', { name: 'Add to the list' }).click();
  await page.getByRole('button', { name: 'Add as another child' }).click();
  await expect(page).toHaveURL(/\/children\/(?!new)/);
});

test('an expected child has an expected date and no birth date', async ({ page }) => {
  await signIn(page, 'nurse');
  await page.goto('/children/new?kind=expected');
  await expect(page.getByRole('textbox', { name: 'Birth date' })).toHaveCount(0);
  await page.getByRole('textbox', { name: 'First name' }).fill('Baby');
  await page.getByRole('textbox', { name: 'Family name' }).fill(`Expected${mark}`);
  await page.getByRole('textbox', { name: 'Record number' }).fill(`E20-${mark}`);
  await page.getByRole('combobox', { name: 'Site' }).selectOption('Saltmarsh');
  await page.getByRole('textbox', { name: 'Expected date' }).fill('1 Feb 2029');
  await page.getByRole('button', { name: 'Add to the list' }).click();
  await expect(page.getByRole('link', { name: /more than 42 weeks away/ })).toBeVisible();
  await page.getByRole('textbox', { name: 'Expected date' }).fill('1 Feb 2027');
  await page.getByRole('button', { name: 'Add to the list' }).click();
  await expect(page.getByText(`Baby Expected${mark} is on the list.`)).toBeVisible();
});

test('two people change one record: both are shown, nothing typed is lost', async ({ page, browser }) => {
  await signIn(page, 'coordinator');
  await page.goto('/children/new');
  await addName(page, { first: `Noa${mark}`, family: 'Brink', number: `E30-${mark}`, born: '2 Nov 2026' });
  await page.getByRole('button', { name: 'Add to the list' }).click();
  await expect(page).toHaveURL(/\/children\/(?!new)/);
  const record = new URL(page.url()).pathname;
  const nurse = await openAs(browser, 'nurse');
  await nurse.goto(`${record}/edit`);
  await page.goto(`${record}/edit`);
  await expect(nurse.getByRole('textbox', { name: 'Family name' })).toHaveValue('Brink');
  await page.getByRole('textbox', { name: 'Family name' }).fill('Brink-Ash');
  await page.getByRole('textbox', { name: /Notes/ }).fill('Comes by ferry');
  await page.getByRole('button', { name: 'Save the record' }).click();
  await expect(page).toHaveURL(/record$/);
  await nurse.getByRole('textbox', { name: 'Family name' }).fill('Brinke');
  await nurse.getByRole('textbox', { name: 'First name' }).fill(`Noah${mark}`);
  await nurse.getByRole('button', { name: 'Save the record' }).click();
  await expect(nurse.getByText('Somebody else saved this record while you were typing')).toBeVisible();
  await expect(nurse.getByRole('row', { name: /Family name/ }).getByRole('cell')).toHaveText([
    'Brinke',
    'Brink-Ash',
    'Brink',
  ]);
  await expectAccessible(nurse);
  await nurse.getByText('Theirs', { exact: true }).last().click();
  await nurse.getByRole('button', { name: 'Save with these choices' }).click();
  await expect(nurse.getByRole('heading', { level: 1 })).toHaveText(`Noah${mark} Brink-Ash`);
  await expect(nurse.getByText('Comes by ferry').first()).toBeVisible();
  await expectAccessible(nurse);
  await nurse.context().close();
});

test('a trainee who is not assigned is told who can open the record', async ({ page }) => {
  await signIn(page, 'coordinator');
  await page.goto('/children?q=TE-20417');
  const path = await page.getByRole('link', { name: 'Bielak, Tomasz' }).getAttribute('href');
  await signIn(page, 'trainee');
  await page.goto(`${String(path)}/record`);
  await expect(page.getByText('This record is not open to you')).toBeVisible();
  await expect(page.getByText(/Ruth Alder \(coordinator\)/)).toBeVisible();
});
