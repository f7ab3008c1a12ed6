import { expect, expectAccessible, openAs, signIn, test } from './fixtures.ts';

test('the coordinator narrows the trail, opens a line and proves the chain', async ({ page }) => {
  await signIn(page, 'coordinator');
  await page.goto('/trail');
  await page.getByLabel('What happened').selectOption({ label: 'Milestone signed' });
  await expect(page).toHaveURL(/kind=milestone-signed/);
  const line = page.getByRole('button', { name: /^Show line \d+: Milestone signed/ }).first();
  await line.click();
  await expect(line).toHaveAttribute('aria-expanded', 'true');
  await expect(page.getByText('Signed by', { exact: true }).first()).toBeVisible();
  await expectAccessible(page);
  await page.keyboard.press('ArrowDown');
  await expect(page.getByRole('button', { name: /^Show line \d+/ }).nth(1)).toBeFocused();

  await page.reload();
  await expect(page.getByLabel('What happened')).toHaveValue('milestone-signed');
  await page.getByRole('button', { name: 'Show older lines' }).click();
  await expect(page.getByText('100 lines shown')).toBeVisible();

  await page.getByRole('button', { name: 'Verify the chain' }).click();
  await expect(page.getByText('The chain holds')).toBeVisible({ timeout: 30_000 });
});

test('looking at a child is in the log of reads, without the name for the auditor', async ({ page }) => {
  await signIn(page, 'coordinator');
  await page.goto('/trail?kind=child-registered');
  const child = page.getByRole('table').getByRole('link').first();
  const name = (await child.textContent()) ?? '';
  await child.click();
  await expect(page.getByRole('heading', { level: 1 })).toContainText(name.split(' ')[0] ?? '');
  await page.goto('/trail?log=reads');
  await expect(
    page.getByRole('row').filter({ hasText: 'Pathway read' }).filter({ hasText: name }).first(),
  ).toBeVisible();

  await signIn(page, 'auditor');
  await page.goto('/trail?log=reads');
  await expect(page.getByRole('row', { name: /Pathway read/ }).first()).toBeVisible();
  await expect(page.getByText(name)).toHaveCount(0);
});

test('signing in, a refused try and what may not be done are in the trail', async ({ page, browser }) => {
  const auditor = await openAs(browser, 'auditor');
  expect((await auditor.request.get('/api/v1/children/c-001')).status()).toBe(403);
  await signIn(page, 'coordinator');
  await page.goto('/trail?kind=signed-in');
  await expect(page.getByRole('row', { name: /Signed in.*Basil Thorne/ }).first()).toBeVisible();
  await page.goto('/trail?log=reads&kind=refused');
  await expect(page.getByRole('row', { name: /Refused: record read.*Basil Thorne/ }).first()).toBeVisible();
});
