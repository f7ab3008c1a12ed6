/** Rules of the house that no other tool checks: names, words, colours, folders. */
import { execFileSync } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { describe, expect, test } from 'vitest';

const left: readonly string[] = [
  'node_modules',
  'dist',
  '.data',
  '.git',
  'test-results',
  'playwright-report',
  'coverage',
];

/** Every file below a folder, for a copy that came without its history. */
const below = (folder: string): string[] =>
  fs.readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    const file = folder === '.' ? entry.name : `${folder}/${entry.name}`;
    if (!entry.isDirectory()) return [file];
    return left.includes(entry.name) ? [] : below(file);
  });

/** What is committed or about to be. */
const listed = (): string[] => {
  try {
    return execFileSync('git', ['ls-files', '--cached', '--others', '--exclude-standard', '-z'], {
      encoding: 'utf8',
      stdio: ['ignore', 'pipe', 'ignore'],
    }).split('\0');
  } catch {
    return below('.');
  }
};
const files = listed().filter((file) => file !== '' && fs.existsSync(file));
const isText = (file: string): boolean => !/\.(png|woff2?|xlsx|ico|sqlite)$/.test(file);
const readable = files.filter((file) => isText(file) && file !== 'package-lock.json');
const contentOf = (file: string): string => fs.readFileSync(file, 'utf8');
const ours = files.filter((file) => /^(apps|packages|tests|e2e)\//.test(file));

/** Files in which the pattern occurs, with the line. */
const placesOf = (pattern: RegExp, among: readonly string[]): string[] =>
  among.flatMap((file) =>
    contentOf(file)
      .split('\n')
      .flatMap((line, index) =>
        pattern.test(line) ? [`${file}:${String(index + 1)} ${line.trim().slice(0, 100)}`] : [],
      ),
  );

describe('names', () => {
  test('of files and folders are kebab-case', () => {
    const demanded = /^(README\.md|DEVELOPERS\.md|LICENSE)$/;
    const kebab = /^[a-z0-9]+(-[a-z0-9]+)*(\.[a-z0-9]+(-[a-z0-9]+)*)*$/;
    const odd = ours.filter((file) => file.split('/').some((part) => !kebab.test(part) && !demanded.test(part)));
    expect(odd).toEqual([]);
  });

  test('of migrations begin with fourteen digits, of seeds with two', () => {
    const odd = files.filter(
      (file) =>
        (file.startsWith('migrations/') && !/^migrations\/\d{14}_[a-z_]+(\.test)?\.ts$/.test(file)) ||
        (file.startsWith('seeds/') && !/^seeds\/\d{2}_[a-z_]+(\.test)?\.ts$/.test(file)),
    );
    expect(odd).toEqual([]);
  });

  test('say what a file does: no barrels, no dumping grounds', () => {
    const empty = [
      'index',
      'utils',
      'util',
      'helpers',
      'helper',
      'misc',
      'shared',
      'core',
      'common',
      'base',
      'manager',
      'service',
      'types',
      'data',
      'info',
      'constants',
    ];
    const named = ours.filter((file) =>
      file
        .split('/')
        .slice(1)
        .some((part) => empty.includes(part.replace(/\.(test\.)?(ts|tsx|mjs|cjs)$/, ''))),
    );
    expect(named).toEqual([]);
  });

  test('there are no default exports outside of configuration', () => {
    expect(
      placesOf(
        /^export default /,
        ours.filter((file) => /\.tsx?$/.test(file)),
      ),
    ).toEqual([]);
  });
});

describe('words', () => {
  // Put together here, so that this file does not hold them itself.
  const words = [
    ['tran', 'script'],
    ['seed ', 'document'],
    ['TO', 'DO'],
    ['FIX', 'ME'],
    ['XX', 'X:'],
  ].map((parts) => parts.join(''));
  test.each(words)('“%s” stands nowhere', (word) => {
    const pattern = word === word.toUpperCase() ? new RegExp(`\\b${word}(?![A-Za-z0-9])`) : new RegExp(word, 'i');
    expect(placesOf(pattern, readable)).toEqual([]);
  });

  test('no file of a folder above the repository is read or named', () => {
    const above = [['..', 'shared/'].join('/'), ['', 'work', ''].join('/'), ['', 'root', ''].join('/')];
    expect(
      above.flatMap((text) =>
        placesOf(
          new RegExp(text.replaceAll('.', '\\.')),
          readable.filter((file) => file !== '.ci/run'),
        ),
      ),
    ).toEqual([]);
    const depth = (file: string): number => file.split('/').length - 1;
    const climbing = ours
      .filter((file) => /\.(ts|tsx|mjs|cjs)$/.test(file))
      .flatMap((file) =>
        [...contentOf(file).matchAll(/from '((?:\.\.\/)+)/g)]
          .filter((match) => (match[1]?.length ?? 0) / 3 > depth(file))
          .map(() => file),
      );
    expect(climbing).toEqual([]);
  });

  test('families and children are spoken of kindly on screen', () => {
    const unkind = /'[^']*\b(did not attend|non-compliant|abnormal|defective)\b[^']*'/i;
    expect(
      placesOf(
        unkind,
        ours.filter((file) => file.startsWith('apps/board/src/words/')),
      ),
    ).toEqual([]);
  });

  test('code says nothing to the linter or the compiler to look away', () => {
    const looksAway = new RegExp(['@ts-', '(ignore|nocheck|expect-error)'].join(''));
    expect(
      placesOf(
        looksAway,
        ours.filter((file) => file !== 'tests/house-rules.test.ts'),
      ),
    ).toEqual([]);
  });
});

describe('colours', () => {
  test('stand in the token file alone', () => {
    const board = ours.filter(
      (file) =>
        file.startsWith('apps/board/') &&
        /\.(ts|tsx|css)$/.test(file) &&
        !/styles\/(tokens\.css|contrast\.test\.ts)$/.test(file),
    );
    const hex = /(?<![&\w/])#(?:[0-9a-f]{8}|[0-9a-f]{6}|[0-9a-f]{3,4})\b(?!-)/i;
    const call = /\b(rgba?|hsla?|oklch|lab|color-mix)\(/;
    expect(placesOf(hex, board)).toEqual([]);
    expect(placesOf(call, board)).toEqual([]);
  });
});

describe('folders', () => {
  test('at the top are those that DEVELOPERS.md maps', () => {
    const folders = new Set(files.filter((file) => file.includes('/')).map((file) => file.split('/')[0]));
    expect([...folders].sort()).toEqual(['.ci', 'apps', 'e2e', 'migrations', 'packages', 'seeds', 'tests']);
  });

  test('hold no data, no build and no keys', () => {
    expect(
      files.filter((file) =>
        /(^|\/)(dist|coverage|\.data|test-results)\/|\.(sqlite|sqlite-wal|pem|key)$|(^|\/)keys\.json$/.test(file),
      ),
    ).toEqual([]);
  });

  test('every package says its own name', () => {
    const manifests = files.filter((file) => /^(apps|packages)\/[^/]+\/package\.json$/.test(file));
    expect(manifests.length).toBeGreaterThan(6);
    for (const file of manifests)
      expect((JSON.parse(contentOf(file)) as { name: string }).name).toBe(
        `@weftway/${path.basename(path.dirname(file))}`,
      );
  });
});
