import { expect, expectAccessible, signIn, test } from './fixtures.ts';

test('an administrator reads the reference of the API and who may do what', async ({ page }) => {
  await signIn(page, 'administrator');
  await page.goto('/api-reference');
  await page.getByRole('searchbox', { name: 'Search the operations' }).fill('sign-off');
  await page.getByRole('button', { name: /POST .*sign-off/ }).click();
  await expect(page.getByText('Any clinician (milestones of their own discipline)')).toBeVisible();
  await expect(page.getByText('overrides[].reason', { exact: true })).toBeVisible();
  await expect(page.getByRole('link', { name: 'milestone-not-ready' })).toBeVisible();
  await expectAccessible(page);
  await page.getByText('Who may do what').click();
  await expect(page.getByRole('row', { name: /prove the chain of the audit trail/ })).toContainText('Auditor');
  await expectAccessible(page);
});

test('the reference is closed to everybody else, in words', async ({ page }) => {
  await signIn(page, 'surgeon');
  await page.goto('/api-reference');
  await expect(page.getByText('The reference is for administrators. Ask one of them for a copy.')).toBeVisible();
});
