/**
 * The built screens: hashed assets for ever and compressed once, the page itself never cached and with a fresh nonce.
 * What may be asked for is the list of files that were built; no path is ever joined from a request.
 */
import fs from 'node:fs';
import path from 'node:path';
import { promisify } from 'node:util';
import zlib from 'node:zlib';
import express from 'express';
import type { Express, RequestHandler } from 'express';

const brotli = promisify(zlib.brotliCompress);
const gzip = promisify(zlib.gzip);
const worthCompressing = /\.(js|css|svg|json|map)$/;
/** High enough to come within two hundredths of the best, in a tenth of its time. */
const brotliQuality = 9;

const encoders = {
  br: (body: Buffer) => brotli(body, { params: { [zlib.constants.BROTLI_PARAM_QUALITY]: brotliQuality } }),
  gzip: (body: Buffer) => gzip(body, { level: 9 }),
} as const;
type Encoding = keyof typeof encoders;

/** Compressed when first asked for, and kept: the files of a build are few and never change. */
const keepCompressed = () => {
  const kept = new Map<string, Promise<Buffer>>();
  return (file: string, encoding: Encoding): Promise<Buffer> => {
    const key = `${encoding} ${file}`;
    const known = kept.get(key) ?? fs.promises.readFile(file).then((body) => encoders[encoding](body));
    kept.set(key, known);
    known.catch(() => kept.delete(key));
    return known;
  };
};

const assetsIn = (folder: string): ReadonlySet<string> =>
  new Set(fs.existsSync(folder) ? fs.readdirSync(folder).filter((name) => worthCompressing.test(name)) : []);

const sendCompressed = (folder: string): RequestHandler => {
  let names: ReadonlySet<string> = new Set();
  const compressed = keepCompressed();
  return (request, response, next) => {
    const name = request.path.slice(1);
    if (!worthCompressing.test(name) || !['GET', 'HEAD'].includes(request.method)) return next();
    if (!names.has(name)) names = assetsIn(folder);
    if (!names.has(name)) return next();
    response.vary('Accept-Encoding');
    // The smaller one, where a browser reads both equally well.
    const encoding = (['br', 'gzip'] as const).find((one) => request.acceptsEncodings(one) !== false);
    if (encoding === undefined) return next();
    compressed(path.join(folder, name), encoding).then((body) => {
      response.set({ 'Content-Encoding': encoding, 'Cache-Control': 'public, max-age=31536000, immutable' });
      response.type(path.extname(name)).send(body);
    }, next);
  };
};

/** Stands before the sessions: files that everybody may have ask for nobody. */
export const serveAssets = (app: Express, folder: string): void => {
  const assets = path.join(folder, 'assets');
  app.use('/assets', sendCompressed(assets));
  app.use('/assets', express.static(assets, { immutable: true, maxAge: '1y', index: false, redirect: false }));
  app.use('/assets', (_request, response) => void response.status(404).end());
};

export const servePages = (app: Express, folder: string): void => {
  app.use(express.static(folder, { index: false, redirect: false, maxAge: 0 }));
  let page: string | null = null;
  app.get('/{*path}', (_request, response) => {
    page ??= fs.existsSync(path.join(folder, 'index.html'))
      ? fs.readFileSync(path.join(folder, 'index.html'), 'utf8')
      : null;
    if (page === null) {
      response.status(503).type('text/plain').send('The screens are not built yet; run npm start.');
      return;
    }
    response.setHeader('Cache-Control', 'no-store');
    response.type('html').send(page.replaceAll('__CSP_NONCE__', String(response.locals['nonce'])));
  });
};
