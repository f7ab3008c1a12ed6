/** What the browser has to carry: script, largest paint, answers to keys and presses on a slowed processor, nodes. */
import fs from 'node:fs';
import zlib from 'node:zlib';
import { chromium } from '@playwright/test';
import type { Browser, BrowserContext, Page } from '@playwright/test';
import { childrenOnBoard, openBenchTeam, rowsEach } from './bench-team.ts';
import type { BenchTeam } from './bench-team.ts';
import { head, inTurns, line, median, ratioLine } from './measure.ts';
import { openReferencePage } from './reference-page-server.ts';
import { signInAs } from './visits.ts';

const rounds = 5;
const slowedBy = 4;

const contextFor = async (browser: Browser, address: string, cookie: string | null): Promise<BrowserContext> => {
  const context = await browser.newContext({ viewport: { width: 1440, height: 900 } });
  const [name = '', value = ''] = (cookie ?? '').split('=', 2);
  if (name !== '') await context.addCookies([{ name, value: cookie?.slice(name.length + 1) ?? value, url: address }]);
  return context;
};

interface Load {
  /** Script and style as they would travel, compressed. */
  readonly scriptBytes: number;
  readonly styleBytes: number;
  readonly largestPaint: number;
}

const load = async (browser: Browser, address: string, path: string, cookie: string | null): Promise<Load> => {
  const context = await contextFor(browser, address, cookie);
  const page = await context.newPage();
  const bodies: Promise<readonly [string, Buffer]>[] = [];
  page.on('response', (response) => {
    const kind = response.request().resourceType();
    if (kind === 'script' || kind === 'stylesheet') bodies.push(response.body().then((body) => [kind, body] as const));
  });
  await page.goto(address + path, { waitUntil: 'networkidle' });
  const largestPaint = await page.evaluate(
    () =>
      new Promise<number>((resolve) =>
        new PerformanceObserver((list) => resolve(list.getEntries().at(-1)?.startTime ?? 0)).observe({
          type: 'largest-contentful-paint',
          buffered: true,
        }),
      ),
  );
  const sizes = (await Promise.all(bodies)).map(
    ([kind, body]) => [kind, zlib.gzipSync(body, { level: 9 }).length] as const,
  );
  await context.close();
  const sum = (kind: string) => sizes.filter(([one]) => one === kind).reduce((total, [, size]) => total + size, 0);
  return { scriptBytes: sum('script'), styleBytes: sum('stylesheet'), largestPaint };
};

/** The longest event from the press to the next paint, milliseconds; what is under 16 counts as 16. */
const answered = async (page: Page, act: () => Promise<void>): Promise<number> => {
  await page.evaluate(() => {
    const kept: number[] = [];
    Object.assign(window, { keptEvents: kept });
    new PerformanceObserver((list) => kept.push(...list.getEntries().map((entry) => entry.duration))).observe({
      type: 'event',
      durationThreshold: 16,
    } as PerformanceObserverInit); // newer than the type
  });
  await act();
  await page.waitForTimeout(700);
  const kept = await page.evaluate(() => (window as unknown as { keptEvents: number[] }).keptEvents); // put there just above
  return Math.max(16, ...kept);
};

const openBoard = async (browser: Browser, team: BenchTeam, cookie: string, slowed: number): Promise<Page> => {
  const context = await contextFor(browser, team.address, cookie);
  const page = await context.newPage();
  await page.goto(`${team.address}/board?open=speech`, { waitUntil: 'load' });
  await page.getByRole('treegrid').waitFor();
  await page.waitForTimeout(1500);
  if (slowed > 1) await (await context.newCDPSession(page)).send('Emulation.setCPUThrottlingRate', { rate: slowed });
  return page;
};

const nodesOf = (page: Page): Promise<number> => page.evaluate(() => document.querySelectorAll('*').length);

const benchInteractions = async (browser: Browser, team: BenchTeam): Promise<void> => {
  head(
    `Board of ${String(childrenOnBoard)} × ${String(rowsEach)} in the browser, processor slowed ${String(slowedBy)} times, press to paint`,
  );
  const cookie = await signInAs(team.address, 'speech-therapist');
  const taken: Record<'filter' | 'claim' | 'open', number[]> = { filter: [], claim: [], open: [] };
  for (let round = 0; round < rounds; round += 1) {
    const page = await openBoard(browser, team, cookie, slowedBy);
    taken.filter.push(await answered(page, () => page.getByRole('radio', { name: /^Unowned/ }).click()));
    const row = page.getByRole('gridcell', { name: /no one$/ }).first();
    await row.focus();
    taken.claim.push(await answered(page, () => page.keyboard.press('c')));
    await page.getByRole('gridcell', { name: /,/ }).first().focus();
    taken.open.push(await answered(page, () => page.keyboard.press('Enter')));
    if (round === 0)
      line('nodes of the board', String(await nodesOf(await openBoard(browser, team, cookie, 1))), 'aim ≤ 2,500', null);
    await page.context().close();
  }
  for (const [what, values] of Object.entries(taken))
    line(what, `${String(Math.round(median(values)))} ms`, 'aim ≤ 100 ms', median(values) <= 100);
};

export const benchScreens = async (team: BenchTeam): Promise<void> => {
  if (!fs.existsSync(team.services.env.staticFolder))
    return head('The screens are not built: run npm run bench, which builds them.');
  const reference = await openReferencePage();
  const browser = await chromium.launch({ executablePath: process.env['CHROMIUM_PATH'] ?? '/usr/bin/chromium' });
  const cookie = await signInAs(team.address, 'coordinator');
  head('First screen against a bare page of the same libraries');
  const [floor, work, board] = [
    await load(browser, reference.address, '/', null),
    await load(browser, team.address, '/my-work', cookie),
    await load(browser, team.address, '/board', cookie),
  ];
  line('reference: script of the bare page, compressed', `${(floor.scriptBytes / 1000).toFixed(1)} kB`, '', null);
  ratioLine(
    'script of My work, the first screen, compressed',
    work.scriptBytes / 1000,
    floor.scriptBytes / 1000,
    1.7,
    'kB',
  );
  ratioLine('script of the board, compressed', board.scriptBytes / 1000, floor.scriptBytes / 1000, 2.2, 'kB');
  line('style, compressed', `${(work.styleBytes / 1000).toFixed(1)} kB`, 'aim ≤ 25 kB', work.styleBytes <= 25_000);
  const paint = await inTurns(rounds, {
    reference: async () => (await load(browser, reference.address, '/', null)).largestPaint,
    work: async () => (await load(browser, team.address, '/my-work', cookie)).largestPaint,
    board: async () => (await load(browser, team.address, '/board', cookie)).largestPaint,
  });
  line('reference: largest paint of the bare page', `${paint.reference.toFixed(0)} ms`, '', null);
  ratioLine('largest paint of My work', paint.work, paint.reference, 1.6, 'ms');
  ratioLine('largest paint of the board', paint.board, paint.reference, 1.6, 'ms');
  await benchInteractions(browser, team);
  const large = await openBenchTeam(5_000, 5_000);
  const page = await openBoard(browser, large, await signInAs(large.address, 'speech-therapist'), 1);
  const nodes = await nodesOf(page);
  line('nodes with 5,000 children and 150,000 milestones on the board', String(nodes), 'aim ≤ 2,500', nodes <= 2500);
  await browser.close();
  await large.close();
  reference.close();
};
