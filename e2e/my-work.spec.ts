/** My work: what is mine, by urgency, for each kind of person. */
import type { MyWork } from '@weftway/contract/board';
import { expect, expectAccessible, readApi, signIn, test } from './fixtures.ts';
import type { PersonName } from './fixtures.ts';

const people: readonly PersonName[] = ['surgeon', 'speech-therapist', 'trainee', 'coordinator'];

for (const person of people) {
  test(`my work of a ${person} lists late before closing before open, each with what stands in the way`, async ({
    page,
  }) => {
    await signIn(page, person);
    const work = await readApi<MyWork>(page, '/my-work');
    await page.goto('/my-work');
    await expect(page.getByRole('heading', { level: 1, name: 'Tue 1 Dec 2026' })).toBeVisible();
    const doNow = page.getByRole('region', { name: 'Do now' });
    await expect(doNow).toBeVisible();
    const [first] = work.doNow;
    if (first === undefined) await expect(doNow.getByText(/^Nothing of yours is open/)).toBeVisible();
    else {
      const row = doNow.getByRole('listitem').first();
      await expect(row).toContainText(first.childName);
      await expect(row).toContainText(first.standsInTheWay);
      await expect(row.getByRole('link', { name: first.childName, exact: true })).toHaveAttribute(
        'href',
        `/children/${first.childId}?m=${encodeURIComponent(first.milestone)}`,
      );
    }
    const order = ['late', 'closing', 'open'];
    const places = work.doNow.map((item) => order.indexOf(item.state));
    expect(places).toEqual([...places].sort((a, b) => a - b));
    await expectAccessible(page);
  });
}

test('a trainee sees only milestones of assigned children', async ({ page }) => {
  await signIn(page, 'trainee');
  const work = await readApi<MyWork>(page, '/my-work');
  const board = await readApi<{ children: [string][] }>(page, '/board');
  const assigned = new Set(board.children.map(([id]) => id));
  for (const item of [...work.doNow, ...work.waiting, ...work.looseEnds]) expect(assigned.has(item.childId)).toBe(true);
});

test('a loose end is claimed from my work and moves among what is mine', async ({ page }) => {
  await signIn(page, 'audiologist');
  await page.goto('/my-work');
  const loose = page.getByRole('region', { name: 'Loose ends in your lanes' });
  const row = loose.getByRole('listitem').first();
  const child = (await row.getByRole('link').first().textContent()) ?? '';
  await row.getByRole('button', { name: /^Claim/ }).click();
  await expect(page.getByRole('region', { name: 'Messages' }).getByText(/^Claimed: /)).toBeVisible();
  await page.getByRole('region', { name: 'Messages' }).getByRole('button', { name: 'Undo' }).click();
  await expect(page.getByRole('region', { name: 'Messages' }).getByText(/^Let go again/)).toBeVisible();
  await expect(loose.getByText(child).first()).toBeVisible();
});

test('my work fits a phone and a tablet, and only one button is filled', async ({ page }) => {
  await signIn(page, 'surgeon');
  for (const width of [390, 900, 1440]) {
    await page.setViewportSize({ width, height: 844 });
    await page.goto('/my-work');
    await expect(page.getByRole('region', { name: 'Do now' })).toBeVisible();
    expect(await page.evaluate(() => document.documentElement.scrollWidth <= window.innerWidth)).toBe(true);
    await expect(page.locator('main .bg-indigo.border-indigo')).toHaveCount(1);
    await expectAccessible(page);
  }
});

test('handing over my work begins at my own page of the team', async ({ page }) => {
  await signIn(page, 'surgeon');
  await page.goto('/my-work');
  await page.getByRole('link', { name: 'Hand over my work' }).click();
  await expect(page).toHaveURL(/\/team\/m-obed-nkansah/);
});
