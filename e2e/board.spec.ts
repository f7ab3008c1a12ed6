/** The board: looked at from an address, worked on by drag, by key and by menu, shared by several people at once. */
import type { Locator, Page } from '@playwright/test';
import { expect, expectAccessible, openAs, signIn, test } from './fixtures.ts';

const unowned = (lane: string): string => `/board?hands=unowned&open=${lane}`;

/** The first row of the unrolled lane that nobody holds. */
const firstLoose = async (
  page: Page,
): Promise<{ readonly row: Locator; readonly name: string; readonly child: string }> => {
  const row = page.getByRole('gridcell', { name: /, no one$/ }).first();
  const name = (await row.getAttribute('aria-label')) ?? '';
  return {
    row: page.getByRole('gridcell', { name: name.replace(/, no one$/, '') }),
    name,
    child: name.split(',')[0] ?? '',
  };
};

const toast = (page: Page, text: RegExp): Locator => page.getByRole('region', { name: 'Messages' }).getByText(text);

const undo = async (page: Page): Promise<void> => {
  await page.getByRole('region', { name: 'Messages' }).getByRole('button', { name: 'Undo' }).click();
  await expect(toast(page, /^Taken back/)).toBeVisible();
};

const dragTo = async (page: Page, from: Locator, place: string): Promise<void> => {
  const start = await from.boundingBox();
  if (start === null) throw new Error('Nothing to drag');
  await page.mouse.move(start.x + 30, start.y + 12);
  await page.mouse.down();
  await page.mouse.move(start.x + 60, start.y + 20, { steps: 4 });
  const target = await page.locator(`[data-drop-place="${place}"]`).boundingBox();
  if (target === null) throw new Error('Nowhere to drop');
  await page.mouse.move(target.x + target.width / 2, target.y + target.height / 2, { steps: 12 });
};

test('filters live in the address and come back with it', async ({ page }) => {
  await signIn(page, 'coordinator');
  await page.goto('/board');
  await page.getByRole('radio', { name: /^Unowned/ }).check();
  await page.getByLabel('Lanes of').selectOption('speech-therapist');
  await page.getByLabel('Child or milestone').fill('speech');
  await page.getByRole('checkbox', { name: /^Ahead/ }).uncheck();
  await expect(page).toHaveURL(/discipline=speech-therapist/);
  await expect(page).toHaveURL(/hands=unowned/);
  await expect(page).toHaveURL(/q=speech/);
  await expect(page).toHaveURL(/states=/);
  const sum = await page.getByText(/milestones? for \d+ child/).textContent();
  await page.reload();
  await expect(page.getByText(sum ?? '')).toBeVisible();
  await expect(page.getByRole('radio', { name: /^Unowned/ })).toBeChecked();
  await expect(page.getByRole('rowheader', { name: /^Teeth/ })).toHaveCount(0);
});

test('a row dragged onto my hands is claimed, and undo lets it go again', async ({ page }) => {
  await signIn(page, 'surgeon');
  await page.goto(unowned('palate'));
  const { row, child } = await firstLoose(page);
  await dragTo(page, row, 'my-hands');
  await expect(page.getByText(/^You take .+ on\.$/).first()).toBeVisible();
  await page.mouse.up();
  await expect(toast(page, new RegExp(`^Claimed: .+${child}`))).toBeVisible();
  await undo(page);
  await expect(page.getByRole('gridcell', { name: new RegExp(`^${child}.+no one$`) }).first()).toBeVisible();
});

test('a row is carried to my hands with the keyboard alone', async ({ page }) => {
  await signIn(page, 'surgeon');
  await page.goto(unowned('lip'));
  const { row, child } = await firstLoose(page);
  await page.getByRole('rowheader', { name: /^Lip and nose repair/ }).focus();
  await page.keyboard.press('ArrowRight');
  await expect(row).toBeFocused();
  await page.keyboard.press('m');
  const said = page.locator('[id^=DndLiveRegion]');
  await expect(said).toContainText('Picked up');
  await page.keyboard.press('ArrowDown');
  await expect(said).toContainText('Press Space to drop');
  await page.keyboard.press('Space');
  await expect(toast(page, new RegExp(`^Claimed: .+${child}`))).toBeVisible();
  await undo(page);
});

test('a row is claimed from its menu, and a colleague of another discipline is told why not', async ({
  page,
  browser,
}) => {
  await signIn(page, 'other-surgeon');
  await page.goto(unowned('surgery'));
  const { row, child } = await firstLoose(page);
  const dentist = await openAs(browser, 'dentist');
  await dentist.goto(unowned('surgery'));
  await dentist
    .getByRole('gridcell', { name: new RegExp(`^${child}`) })
    .first()
    .click();
  await expect(dentist.getByRole('dialog').getByRole('button', { name: 'Claim' })).toHaveAttribute(
    'aria-disabled',
    'true',
  );
  await expect(dentist.getByText(/^For .+ to claim\.$/)).toBeVisible();
  await dentist.context().close();
  await row.click();
  await page.getByRole('dialog').getByRole('button', { name: 'Claim' }).click();
  await expect(toast(page, new RegExp(`^Claimed: .+${child}`))).toBeVisible();
  await undo(page);
});

test('the coordinator hands a milestone to a colleague who may hold it', async ({ page }) => {
  await signIn(page, 'coordinator');
  await page.goto(unowned('speech'));
  const { row, child } = await firstLoose(page);
  await dragTo(page, row, 'member m-hana-dvorak');
  await expect(page.getByText(/^Hana Dvořák takes .+, which no one holds\.$/).first()).toBeVisible();
  await expect(page.locator('[data-drop-place="member m-noor-castellan"]')).toHaveCount(0);
  await page.mouse.up();
  await expect(toast(page, new RegExp(`^Handed to Hana Dvořák: .+${child}`))).toBeVisible();
});

test('of two who claim the same milestone one wins, and the other is told politely by whom', async ({
  page,
  browser,
}) => {
  await signIn(page, 'surgeon');
  const other = await openAs(browser, 'other-surgeon');
  // The other screen hears nothing of what happens meanwhile.
  await other.route('**/api/v1/board/stream', (route) => route.abort());
  await other.route('**/api/v1/board/changes**', (route) => route.abort());
  await page.goto(unowned('palate'));
  await other.goto(unowned('palate'));
  const { row, name } = await firstLoose(page);
  const stale = other.getByRole('gridcell', { name, exact: true });
  await expect(stale).toBeVisible();
  await row.click();
  await page.getByRole('dialog').getByRole('button', { name: 'Claim' }).click();
  await expect(toast(page, /^Claimed/)).toBeVisible();
  await stale.click();
  await other.getByRole('dialog').getByRole('button', { name: 'Claim' }).click();
  await expect(toast(other, /Obed Nkansah took this \d+ seconds? ago/)).toBeVisible();
  await expect(stale).toBeVisible();
  await other.context().close();
});

test('what a colleague does appears on my board within seconds', async ({ page, browser }) => {
  await signIn(page, 'coordinator');
  await page.goto('/board?open=teeth');
  const dentist = await openAs(browser, 'dentist');
  await dentist.goto(unowned('teeth'));
  const { row, name } = await firstLoose(dentist);
  const before = page.getByRole('gridcell', { name, exact: true }).first();
  await expect(before).toBeVisible();
  await row.click();
  await dentist.getByRole('dialog').getByRole('button', { name: 'Claim' }).click();
  await expect(
    page.getByRole('gridcell', { name: name.replace(/no one$/, 'Noor Castellan'), exact: true }).first(),
  ).toBeVisible({ timeout: 5000 });
  await dentist.context().close();
});

test('the keys lead from lane to lane, unroll them and open a child', async ({ page }) => {
  await signIn(page, 'speech-therapist');
  await page.goto('/board?open=speech');
  await page.getByRole('rowheader', { name: /^Speech review/ }).focus();
  await page.keyboard.press('ArrowDown');
  await expect(page.getByRole('rowheader', { name: /^Palate function/ })).toBeFocused();
  await page.keyboard.press('Space');
  await expect(page).toHaveURL(/palate-function/);
  await page.keyboard.press('?');
  await expect(page.getByRole('dialog', { name: 'Keys on the board' })).toBeVisible();
  await page.keyboard.press('Escape');
  await expect(page.getByRole('rowheader', { name: /^Palate function/ })).toBeFocused();
  await page.keyboard.press('ArrowUp');
  await expect(page.getByRole('rowheader', { name: /^Speech review/ })).toBeFocused();
  await page.keyboard.press('ArrowRight');
  await page.keyboard.press('Enter');
  await expect(page).toHaveURL(/\/children\/.+[?&]m=SPCH/);
});

for (const [screen, width] of [
  ['a desk', 1440],
  ['a tablet', 900],
  ['a phone', 390],
] as const) {
  test(`the board on ${screen} is accessible and never scrolls sideways`, async ({ page }) => {
    await page.setViewportSize({ width, height: 900 });
    await signIn(page, 'coordinator');
    await page.goto('/board?open=speech');
    await expect(page.getByText(/milestones for \d+ children/)).toBeVisible();
    await expectAccessible(page);
    expect(await page.evaluate(() => document.documentElement.scrollWidth <= window.innerWidth)).toBe(true);
    expect(await page.evaluate(() => document.querySelectorAll('*').length)).toBeLessThan(2500);
  });
}
