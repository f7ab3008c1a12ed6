/** Builds the reference page and serves it, with its list of names. */
import fs from 'node:fs';
import http from 'node:http';
import type { AddressInfo } from 'node:net';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import express from 'express';
import { build } from 'vite';

export interface ReferencePage {
  readonly address: string;
  readonly close: () => void;
}

export const openReferencePage = async (): Promise<ReferencePage> => {
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'weftway-reference-'));
  await build({
    root: fileURLToPath(new URL('reference-page', import.meta.url)),
    configFile: false,
    logLevel: 'silent',
    build: { outDir: folder, emptyOutDir: true, modulePreload: { polyfill: false } },
  });
  const app = express();
  app.get(
    '/names',
    (_request, response) =>
      void response.json(Array.from({ length: 40 }, (_unused, id) => ({ id, name: `Child ${String(id)}` }))),
  );
  app.use(express.static(folder));
  const server = http.createServer(app).listen(0, '127.0.0.1');
  await new Promise((resolve) => server.once('listening', resolve));
  return {
    address: `http://127.0.0.1:${String((server.address() as AddressInfo).port)}`, // listening on a port
    close: () => {
      server.closeAllConnections();
      server.close();
      fs.rmSync(folder, { recursive: true, force: true });
    },
  };
};
