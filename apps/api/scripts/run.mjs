/**
 * The two commands, and the few others that need everything prepared: installs, migrates, seeds, builds, serves, tests.
 * Uses only what Node brings, since it runs before anything is installed.
 */
import { spawn, spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../../..');
process.chdir(root);
const startedAt = Date.now();

const say = (text) =>
  process.stdout.write(`[${String(Math.round((Date.now() - startedAt) / 1000)).padStart(4)} s] ${text}\n`);
const fail = (text) => {
  process.stderr.write(`${text}\n`);
  process.exit(1);
};

/** Runs a command to its end; a line every ten seconds shows that it is still at work. */
const run = (title, command, args, { env = {}, quiet = false, mayFail = false } = {}) =>
  new Promise((resolve) => {
    say(title);
    const child = spawn(command, args, {
      stdio: ['ignore', quiet ? 'pipe' : 'inherit', quiet ? 'pipe' : 'inherit'],
      env: { ...process.env, ...env },
    });
    const kept = [];
    for (const stream of [child.stdout, child.stderr]) stream?.on('data', (data) => kept.push(data));
    const tick = setInterval(() => say(`… ${title}`), 10_000);
    child.on('error', (error) => {
      clearInterval(tick);
      fail(`${title}: ${error.message}`);
    });
    child.on('close', (code) => {
      clearInterval(tick);
      if (code !== 0 && quiet) process.stderr.write(Buffer.concat(kept));
      if (code !== 0 && !mayFail) fail(`Stopped: "${title}" ended with ${code}.`);
      resolve(code ?? 1);
    });
  });

const has = (command) => spawnSync('sh', ['-c', `command -v ${command}`]).status === 0;
const isRoot = () => process.getuid?.() === 0;

const aptInstall = async (title, packages) => {
  const lock = ['-o', 'DPkg::Lock::Timeout=300', '-qq'];
  await run(`${title}: package lists`, 'apt-get', [...lock, 'update'], {
    quiet: true,
    env: { DEBIAN_FRONTEND: 'noninteractive' },
  });
  await run(title, 'apt-get', [...lock, 'install', '-y', '--no-install-recommends', ...packages], {
    quiet: true,
    env: { DEBIAN_FRONTEND: 'noninteractive' },
  });
};

const lockHash = () =>
  createHash('sha256').update(process.version).update(fs.readFileSync('package-lock.json')).digest('hex');

/** A finished build of the SQLite driver is kept per user, so that the next clone does not compile again. */
const prebuildFolder = path.join(process.env.XDG_CACHE_HOME ?? path.join(os.homedir(), '.cache'), 'weftway-prebuilds');

const keepPrebuild = () => {
  const folder = 'node_modules/better-sqlite3';
  const built = path.join(folder, 'build/Release/better_sqlite3.node');
  if (!fs.existsSync(built)) return;
  const { version } = JSON.parse(fs.readFileSync(path.join(folder, 'package.json'), 'utf8'));
  const file = path.join(
    prebuildFolder,
    `better-sqlite3-v${version}-node-v${process.versions.modules}-${process.platform}-${process.arch}.tar.gz`,
  );
  if (fs.existsSync(file)) return;
  try {
    fs.mkdirSync(prebuildFolder, { recursive: true });
    spawnSync('tar', ['czf', file, '-C', folder, 'build/Release/better_sqlite3.node']);
  } catch {
    // Only a saving of time next time.
  }
};

const install = async () => {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 11))
    fail(`Weftway needs Node 20.11 or newer; this is ${process.version}.`);
  const stampFile = 'node_modules/.cache/weftway-installed';
  const stamp = lockHash();
  if (fs.existsSync(stampFile) && fs.readFileSync(stampFile, 'utf8') === stamp) return;
  const missing = ['python3', 'make', 'g++'].filter((tool) => !has(tool));
  if (missing.length > 0) {
    if (isRoot() && has('apt-get'))
      await aptInstall('Installing the compiler for the database driver', ['python3', 'make', 'g++']);
    else
      fail(
        `The database driver is compiled here and needs ${missing.join(', ')}; install them (Debian: apt-get install python3 make g++) and run this again.`,
      );
  }
  const prefix = path.resolve(path.dirname(process.execPath), '..');
  const npm = process.env.npm_execpath;
  const [command, args] = npm === undefined ? ['npm', []] : [process.execPath, [npm]];
  await run(
    'Installing packages (the first time compiles the database driver: one to three minutes)',
    command,
    [...args, 'ci', '--no-audit', '--no-fund', '--prefer-offline', '--loglevel=error'],
    {
      env: {
        ...(fs.existsSync(path.join(prefix, 'include/node/node.h')) ? { npm_config_nodedir: prefix } : {}),
        npm_config_better_sqlite3_local_prebuilds: prebuildFolder,
        CFLAGS: '-O2',
        CXXFLAGS: '-O2',
        JOBS: 'max',
      },
    },
  );
  keepPrebuild();
  fs.mkdirSync(path.dirname(stampFile), { recursive: true });
  fs.writeFileSync(stampFile, stamp);
};

const filesUnder = (folder) =>
  fs.readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    if (entry.name === 'node_modules') return [];
    const full = path.join(folder, entry.name);
    return entry.isDirectory() ? filesUnder(full) : [full];
  });

const sourceHash = () => {
  const files = ['apps/board', 'packages']
    .flatMap(filesUnder)
    .concat(['index.html', 'vite.config.ts', 'tailwind.config.ts', 'package-lock.json'])
    .sort();
  const hash = createHash('sha256');
  for (const file of files) hash.update(file).update(fs.readFileSync(file));
  return hash.digest('hex');
};

const build = async () => {
  const stampFile = 'node_modules/.cache/weftway-built';
  const stamp = sourceHash();
  if (
    fs.existsSync('dist/board/index.html') &&
    fs.existsSync(stampFile) &&
    fs.readFileSync(stampFile, 'utf8') === stamp
  )
    return;
  await run('Building the screens', process.execPath, ['node_modules/vite/bin/vite.js', 'build', '--logLevel', 'warn']);
  fs.writeFileSync(stampFile, stamp);
};

const tsx = (file, ...args) => ['--import', 'tsx', file, ...args];
const prepare = () => run('Preparing the database', process.execPath, tsx('apps/api/scripts/prepare.ts'));

const chromiumPaths = () =>
  [process.env.CHROMIUM_PATH, '/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome'].filter(
    (file) => file !== undefined,
  );

const findChromium = async () => {
  const found = chromiumPaths().find((file) => fs.existsSync(file));
  if (found !== undefined) return found;
  if (isRoot() && has('apt-get'))
    await aptInstall('Installing Chromium for the browser tests', ['chromium', 'fonts-liberation']);
  const installed = chromiumPaths().find((file) => fs.existsSync(file));
  if (installed === undefined)
    fail('The browser tests need Chromium: install it (Debian: apt-get install chromium) or name it in CHROMIUM_PATH.');
  return installed;
};

const serve = () => {
  const child = spawn(process.execPath, tsx('apps/api/src/main.ts'), {
    stdio: 'inherit',
    env: { WEFTWAY_LOG: 'silent', ...process.env },
  });
  for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => child.kill(signal));
  child.on('exit', (code) => process.exit(code ?? 0));
};

const start = async () => {
  await install();
  await build();
  await prepare();
  serve();
};

const dev = async () => {
  await install();
  await prepare();
  const children = [
    spawn(process.execPath, ['--watch', ...tsx('apps/api/src/main.ts')], { stdio: 'inherit' }),
    spawn(process.execPath, ['node_modules/vite/bin/vite.js'], { stdio: 'inherit' }),
  ];
  for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => children.forEach((child) => child.kill(signal)));
};

/** Counts of a JSON report, whichever runner wrote it; a missing report counts as one failure. */
const countsOf = (file, read) => {
  try {
    return read(JSON.parse(fs.readFileSync(file, 'utf8')));
  } catch {
    return { passed: 0, failed: 1 };
  }
};

const test = async () => {
  await install();
  const reports = 'node_modules/.cache/weftway-reports';
  fs.rmSync(reports, { recursive: true, force: true });
  fs.mkdirSync(reports, { recursive: true });
  const steps = [];
  const step = async (title, args) => {
    const code = await run(title, process.execPath, args, { mayFail: true });
    steps.push({ title, ok: code === 0 });
    return code;
  };
  await step('Types', ['node_modules/typescript-native/bin/tsc', '-p', 'tsconfig.json', '--noEmit']);
  await step('Lint', [
    'node_modules/eslint/bin/eslint.js',
    '.',
    '--max-warnings',
    '0',
    '--cache',
    '--cache-location',
    'node_modules/.cache/eslint/',
  ]);
  await step('Import directions', [
    'node_modules/dependency-cruiser/bin/dependency-cruise.mjs',
    'apps',
    'packages',
    '--config',
    '.dependency-cruiser.cjs',
  ]);
  await step('Format', ['node_modules/prettier/bin/prettier.cjs', '--check', '--log-level', 'warn', '--cache', '.']);
  await run(
    'Unit, property and service tests',
    process.execPath,
    [
      'node_modules/vitest/vitest.mjs',
      'run',
      '--reporter=default',
      '--reporter=json',
      `--outputFile.json=${reports}/vitest.json`,
    ],
    { mayFail: true, env: { FORCE_COLOR: '0' } },
  );
  await build();
  const chromium = await findChromium();
  await run(
    'Browser tests',
    process.execPath,
    ['node_modules/@playwright/test/cli.js', 'test', '--reporter=list,json'],
    {
      mayFail: true,
      env: {
        CHROMIUM_PATH: chromium,
        PLAYWRIGHT_JSON_OUTPUT_NAME: path.resolve(reports, 'playwright.json'),
        FORCE_COLOR: '0',
      },
    },
  );
  const unit = countsOf(`${reports}/vitest.json`, (report) => ({
    passed: report.numPassedTests,
    failed:
      report.numFailedTests +
      report.testResults.filter((file) => file.status === 'failed' && file.assertionResults.length === 0).length,
  }));
  const browser = countsOf(`${reports}/playwright.json`, (report) => ({
    passed: report.stats.expected + report.stats.flaky,
    failed: report.stats.unexpected + report.errors.length,
  }));
  const passed = steps.filter((one) => one.ok).length + unit.passed + browser.passed;
  const failed = steps.filter((one) => !one.ok).length + unit.failed + browser.failed;
  for (const one of steps.filter((candidate) => !candidate.ok)) say(`Failed: ${one.title}`);
  say(
    `Checks ${steps.filter((one) => one.ok).length} of ${steps.length}; unit ${unit.passed} passed, ${unit.failed} failed; browser ${browser.passed} passed, ${browser.failed} failed`,
  );
  process.stdout.write(`${passed} passed, ${failed} failed\n`);
  process.exit(failed === 0 ? 0 : 1);
};

const bench = async () => {
  await install();
  await build();
  const chromium = await findChromium();
  await run('Bench', process.execPath, tsx('apps/api/bench/run.ts'), { env: { CHROMIUM_PATH: chromium } });
};

const commands = { start, test, dev, bench };
const command = commands[process.argv[2]];
if (command === undefined) fail(`Say which: ${Object.keys(commands).join(', ')}.`);
await command();
