/** A fresh, seeded product on a fixed day, in a folder of its own that goes away with it. */
import { spawn, spawnSync } from 'node:child_process';
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';

const prefix = 'weftway-e2e-';
for (const left of fs.readdirSync(os.tmpdir()).filter((name) => name.startsWith(prefix)))
  fs.rmSync(path.join(os.tmpdir(), left), { recursive: true, force: true });
const folder = fs.mkdtempSync(path.join(os.tmpdir(), prefix));
const env = { ...process.env, WEFTWAY_DATA: folder };
const prepared = spawnSync(process.execPath, ['--import', 'tsx', 'apps/api/scripts/prepare.ts'], {
  stdio: 'inherit',
  env,
});
if (prepared.status !== 0) process.exit(1);
const server = spawn(process.execPath, ['--import', 'tsx', 'apps/api/src/main.ts'], { stdio: 'inherit', env });
const stop = (): void => {
  server.kill('SIGTERM');
  fs.rmSync(folder, { recursive: true, force: true });
};
process.on('SIGTERM', stop);
process.on('SIGINT', stop);
server.on('exit', (code) => process.exit(code ?? 0));
