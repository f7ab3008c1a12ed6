import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import express from 'express';
import supertest from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { serveAssets, servePages } from './page-files.ts';

const script = `console.log(${JSON.stringify('thread '.repeat(400))});`;
let root = '';
let folder = '';

beforeAll(() => {
  root = fs.mkdtempSync(path.join(os.tmpdir(), 'weftway-pages-'));
  folder = path.join(root, 'board');
  fs.mkdirSync(path.join(folder, 'assets'), { recursive: true });
  fs.writeFileSync(path.join(root, 'secret.js'), 'secret');
  fs.writeFileSync(path.join(folder, 'index.html'), '<meta nonce="__CSP_NONCE__"><b>__CSP_NONCE__</b>');
  fs.writeFileSync(path.join(folder, 'assets/start-1.js'), script);
  fs.writeFileSync(path.join(folder, 'assets/letters-1.woff2'), 'letters');
});
afterAll(() => fs.rmSync(root, { recursive: true, force: true }));

const served = () => {
  const app = express();
  app.use((_request, response, next) => {
    response.locals['nonce'] = 'fresh';
    next();
  });
  serveAssets(app, folder);
  servePages(app, folder);
  return supertest(app);
};
describe('assets', () => {
  it('travel as brotli or gzip, whichever is smaller for the browser, and stay in its cache for ever', async () => {
    const answer = await served().get('/assets/start-1.js').set('Accept-Encoding', 'gzip, deflate, br');
    expect(answer.headers).toMatchObject({
      'content-encoding': 'br',
      vary: 'Accept-Encoding',
      'cache-control': 'public, max-age=31536000, immutable',
      'content-type': 'text/javascript; charset=utf-8',
    });
    expect(Number(answer.headers['content-length'])).toBeLessThan(script.length / 10);
    expect(answer.text).toBe(script);
    const older = await served().get('/assets/start-1.js').set('Accept-Encoding', 'gzip');
    expect(older.headers['content-encoding']).toBe('gzip');
    expect(older.text).toBe(script);
  });

  it('travel as they are for whoever reads neither, and still say that they vary', async () => {
    const answer = await served().get('/assets/start-1.js').set('Accept-Encoding', 'identity');
    expect(answer.headers['content-encoding']).toBeUndefined();
    expect(answer.headers).toMatchObject({
      vary: 'Accept-Encoding',
      'cache-control': 'public, max-age=31536000, immutable',
    });
    expect(answer.text).toBe(script);
  });

  it('that are compressed already travel as they are', async () => {
    const answer = await served().get('/assets/letters-1.woff2');
    expect(answer.status).toBe(200);
    expect(answer.headers['content-encoding']).toBeUndefined();
    expect(answer.headers['cache-control']).toBe('public, max-age=31536000, immutable');
  });

  it('that were not built are not there, whatever the path tries', async () => {
    for (const tried of [
      '/assets/start-2.js',
      '/assets/../../secret.js',
      '/assets/..%2f..%2fsecret.js',
      '/assets/%2e%2e/%2e%2e/secret.js',
      '/assets//start-1.js/',
      '/assets/',
      '/assets/__proto__.js',
      '/assets/start-1.js%00',
    ]) {
      const answer = await served().get(tried);
      const isOnlyThePage = answer.status === 200 && answer.text.startsWith('<meta');
      expect(isOnlyThePage || [400, 404].includes(answer.status), tried).toBe(true);
      expect(answer.text, tried).not.toContain('secret');
    }
  });

  it('a file that a later build adds is found without a new start', async () => {
    const agent = served();
    expect((await agent.get('/assets/later-1.js')).status).toBe(404);
    fs.writeFileSync(path.join(folder, 'assets/later-1.js'), script);
    expect((await agent.get('/assets/later-1.js')).headers['content-encoding']).toBe('gzip');
  });

  it('are only read', async () => {
    expect((await served().post('/assets/start-1.js')).status).toBe(404);
    const head = await served().head('/assets/start-1.js').set('Accept-Encoding', 'br');
    expect(head.headers['content-encoding']).toBe('br');
  });
});

it('the page is never kept and carries a fresh nonce, at every address of the screens', async () => {
  for (const address of ['/', '/my-work', '/children/42']) {
    const answer = await served().get(address);
    expect(answer.headers['cache-control']).toBe('no-store');
    expect(answer.text).toBe('<meta nonce="fresh"><b>fresh</b>');
  }
});
