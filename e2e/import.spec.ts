/** Bringing a caseload in: faults stop it, a good file is taken whole. */
import fs from 'node:fs';
import path from 'node:path';
import type { Page } from '@playwright/test';
import { expect, expectAccessible, signIn, test } from './fixtures.ts';

const files = path.resolve('packages/sample-team/files');

const choose = async (
  page: Page,
  file: string | { readonly name: string; readonly mimeType: string; readonly buffer: Buffer },
) => {
  await page.goto('/children/import');
  await page.getByLabel('CSV file').setInputFiles(file);
  await page.getByRole('button', { name: 'Check the file' }).click();
};

test('a file with faults shows each by row and column and cannot be taken in', async ({ page }) => {
  await signIn(page, 'coordinator');
  await choose(page, path.join(files, 'caseload-with-faults.csv'));
  await expect(page.getByText(/faults, \d+ warnings/)).toBeVisible();
  await expect(page.getByRole('row', { name: /21 cleft .*Place 2 is the right gum/ })).toBeVisible();
  await expect(page.getByRole('row', { name: /1 shoe_size/ })).toBeVisible();
  await expect(page.getByText('=HYPERLINK("http://evil.example")').first()).toBeVisible();
  await expectAccessible(page);
  await expect(page.getByRole('button', { name: /Take in/ })).toHaveAttribute('aria-disabled', 'true');
  await page.goto('/children?q=TE-9001');
  await expect(page.getByText('No child matches “TE-9001”')).toBeVisible();
});

test('a good file is taken in whole, and the same file again changes nothing', async ({ page }) => {
  await signIn(page, 'coordinator');
  const lines = fs.readFileSync(path.join(files, 'caseload-5000.csv'), 'utf8').split('\n');
  // Numbers of this run alone: a second try meets what the first has taken in.
  const mark = String(Date.now()).slice(-6);
  const rows = lines.slice(1, 60).map((line) => line.replace(/^TE-/, `TE-${mark}-`));
  const script = String(lines[60]).replace(/^[^,]+,[^,]+/, `TE-${mark}-X,<img src=x onerror=alert(1)>`);
  const small = {
    name: 'small.csv',
    mimeType: 'text/csv',
    buffer: Buffer.from([lines[0], ...rows, script, ''].join('\n')),
  };
  await choose(page, small);
  await expect(page.getByText(/^60 rows read\. No faults/)).toBeVisible();
  await page.getByRole('button', { name: 'Take in 60 children' }).click();
  await expect(page.getByText('Taken in: 60 added, 0 brought up to date.')).toBeVisible();
  await page.getByRole('link', { name: 'See the children' }).click();
  await page.goto(`/children?q=TE-${mark}-X`);
  await expect(page.getByText('<img src=x onerror=alert(1)>')).toBeVisible();
  await choose(page, small);
  await expect(page.getByText('0 to add, 0 to bring up to date, 60 unchanged.')).toBeVisible();
});

test('bringing in is closed to everyone but the coordinator', async ({ page }) => {
  await signIn(page, 'nurse');
  await page.goto('/children/import');
  await expect(page.getByText('Bringing in a caseload is for the coordinator.')).toBeVisible();
});
