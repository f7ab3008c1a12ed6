import http from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { addChild } from '../testing/pathway-builders.ts';
import { createTestApp, testPassword } from '../testing/test-app.ts';
import type { TestApp } from '../testing/test-app.ts';

let test: TestApp;
let server: http.Server;
let base = '';
beforeAll(async () => {
  test = await createTestApp();
  server = http.createServer(test.app).listen(0, '127.0.0.1');
  await new Promise((resolve) => server.once('listening', resolve));
  base = `http://127.0.0.1:${String((server.address() as AddressInfo).port)}/api/v1`; // listening on a port
});
afterAll(async () => {
  server.closeAllConnections();
  server.close();
  await test.close();
});

const cookiesOf = (answer: Response): string =>
  answer.headers
    .getSetCookie()
    .map((cookie) => cookie.split(';')[0])
    .join('; ');

const signIn = async (person: string): Promise<{ readonly cookie: string; readonly token: string }> => {
  const first = await fetch(`${base}/session`);
  const { csrfToken } = (await first.json()) as { csrfToken: string }; // contract of readSession
  const answer = await fetch(`${base}/session`, {
    method: 'POST',
    headers: { cookie: cookiesOf(first), 'x-csrf-token': csrfToken, 'content-type': 'application/json' },
    body: JSON.stringify({ email: `${person}@tern-estuary.example`, password: testPassword }),
  });
  return {
    cookie: cookiesOf(answer) || cookiesOf(first),
    token: ((await answer.json()) as { csrfToken: string }).csrfToken,
  }; // contract of signIn
};

it('says the new version to everybody who listens, and never any content', async () => {
  const { cookie } = await signIn('nurse');
  const stop = new AbortController();
  const stream = await fetch(`${base}/board/stream`, {
    headers: { cookie, accept: 'text/event-stream' },
    signal: stop.signal,
  });
  expect(stream.headers.get('content-type')).toBe('text/event-stream');
  const childId = await addChild(test);
  const surgeon = await signIn('surgeon');
  await fetch(`${base}/children/${childId}/milestones/SURG-01/claim`, {
    method: 'POST',
    headers: { cookie: surgeon.cookie, 'x-csrf-token': surgeon.token, 'content-type': 'application/json' },
    body: JSON.stringify({ part: 'milestone' }),
  });
  const reader = stream.body?.getReader();
  let heard = '';
  while (reader !== undefined && !heard.includes('data:'))
    heard += new TextDecoder().decode((await reader.read()).value);
  const counter: { version: number } | undefined = await test.db('board_counter').first('version');
  expect(heard).toContain(`event: board\ndata: ${String(counter?.version)}`);
  expect(heard).not.toContain(childId);
  stop.abort();
});

it('is closed to who may not see the board', async () => {
  const { cookie } = await signIn('administrator');
  expect((await fetch(`${base}/board/stream`, { headers: { cookie } })).status).toBe(403);
});
