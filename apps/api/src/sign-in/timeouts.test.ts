import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { limits } from '../limits.ts';
import { createTestApp, openBrowser } from '../testing/test-app.ts';
import type { TestApp, TestBrowser } from '../testing/test-app.ts';

const start = Date.parse('2026-12-01T09:00:00.000Z');

let test: TestApp;
beforeEach(async () => {
  test = await createTestApp();
});
afterEach(() => test.close());

const at = (seconds: number): void => test.setNow(new Date(start + seconds * 1000).toISOString());
const isIn = async (browser: TestBrowser): Promise<boolean> => (await browser.get('/my-sessions')).status === 200;

describe.each([
  ['surgeon', limits.idle.member, limits.absolute.member],
  ['administrator', limits.idle.administrator, limits.absolute.administrator],
] as const)('the session of a %s', (person, idle, absolute) => {
  it('A03 lasts until one second before the idle limit', async () => {
    const browser = await test.as(person);
    at(idle - 1);
    expect(await isIn(browser)).toBe(true);
  });

  it('A03 is over one second after the idle limit', async () => {
    const browser = await test.as(person);
    at(idle + 1);
    expect(await isIn(browser)).toBe(false);
    at(idle - 1);
    expect(await isIn(browser)).toBe(false);
  });

  it('A03 polling does not help', async () => {
    const browser = await test.as(person);
    for (let seconds = 60; seconds < idle; seconds += 60) {
      at(seconds);
      expect((await browser.get('/my-sessions').set('x-background', '1')).status).toBe(200);
    }
    at(idle + 1);
    expect(await isIn(browser)).toBe(false);
  });

  it('tells how much is left as the server itself counts, whoever looks', async () => {
    const browser = await test.as(person);
    at(20);
    await browser.get('/my-sessions');
    at(100);
    const looked = await browser.get('/session').set('x-background', '1');
    // What happened within thirty seconds of the last note is not noted, and not promised either.
    expect(looked.body.idleSecondsLeft).toBe(idle - 100);
    at(110);
    await browser.get('/my-sessions');
    at(120);
    expect((await browser.get('/session').set('x-background', '1')).body.idleSecondsLeft).toBe(idle - 10);
  });

  it('a person who says they are there stays in', async () => {
    const browser = await test.as(person);
    at(idle - 10);
    const answer = await browser.post('/session/activity');
    expect(answer.body.me.id).toBe(person);
    expect(answer.body.idleSeconds).toBe(idle);
    at(2 * idle - 11);
    expect(await isIn(browser)).toBe(true);
  });

  it('A04 ends at the absolute limit although active', async () => {
    const browser = await test.as(person);
    for (let seconds = 300; seconds < absolute; seconds += 300) {
      at(seconds);
      await browser.post('/session/activity');
    }
    at(absolute - 1);
    expect(await isIn(browser)).toBe(true);
    at(absolute + 1);
    expect(await isIn(browser)).toBe(false);
  });
});

it('activity of nobody is refused', async () => {
  const browser = await openBrowser(test.app, null);
  expect((await browser.post('/session/activity')).body.type).toBe('/problems/not-signed-in');
});
