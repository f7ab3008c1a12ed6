import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';

const css = readFileSync(`${import.meta.dirname}/tokens.css`, 'utf8');

function tokensOf(selector: string): ReadonlyMap<string, string> {
  const start = css.indexOf(selector);
  const block = css.slice(start, css.indexOf('}', start));
  return new Map([...block.matchAll(/--([\w-]+):\s*(#[0-9a-f]{6})/g)].map((found) => [found[1] ?? '', found[2] ?? '']));
}

/** Relative luminance and contrast ratio of WCAG 2.2. */
function luminance(hex: string): number {
  const [red = 0, green = 0, blue = 0] = [1, 3, 5].map((at) => {
    const value = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

function contrast(left: string, right: string): number {
  const [dark = 0, light = 0] = [luminance(left), luminance(right)].toSorted((a, b) => a - b);
  return (light + 0.05) / (dark + 0.05);
}

const grounds = ['linen', 'paper', 'bleached'];
const dyes = ['woad', 'madder', 'weld', 'walnut'];
const washes = ['indigo-wash', 'woad-wash', 'madder-wash', 'weld-wash', 'walnut-wash'];

const textPairs = [
  ...['ink', 'ink-2', 'ink-3', 'indigo'].flatMap((text) => [...grounds, 'sunk'].map((ground) => [text, ground])),
  ...dyes.flatMap((text) => grounds.map((ground) => [text, ground])),
  ...['ink', 'ink-2'].flatMap((text) => washes.map((ground) => [text, ground])),
  ...['indigo', ...dyes].map((dye) => [dye, `${dye}-wash`]),
  ['on-indigo', 'indigo'],
  ['on-madder', 'madder'],
  ['paper', 'ink'],
] as [string, string][];

const markPairs = [...dyes, 'thread-2'].flatMap((mark) =>
  [...grounds, 'sunk'].map((ground): [string, string] => [mark, ground]),
);

describe.each([
  ['light', ':root,'],
  ['dark', "[data-theme='dark'] {"],
  ['print', '[data-print] {'],
])('in the %s theme', (_name, selector) => {
  const tokens = tokensOf(selector);
  const ratio = (left: string, right: string) =>
    contrast(tokens.get(left) ?? '#000000', tokens.get(right) ?? '#000000');

  test.each(textPairs)('%s is readable as text on %s', (text, ground) => {
    expect(ratio(text, ground)).toBeGreaterThanOrEqual(4.5);
  });

  test.each(markPairs)('%s is visible as a mark on %s', (mark, ground) => {
    expect(ratio(mark, ground)).toBeGreaterThanOrEqual(3);
  });
});

test('the device theme and the chosen dark theme have the same colours', () => {
  expect(tokensOf(':root:not([data-theme])')).toEqual(tokensOf("[data-theme='dark'] {"));
});

test('print on paper and print preview have the same colours', () => {
  expect(tokensOf('@media print')).toEqual(tokensOf('[data-print] {'));
});

test.each([
  ['ink', 'paper', 15.0],
  ['weld', 'linen', 5.1],
  ['thread-2', 'sunk', 3.4],
])('the light ratio of %s on %s is the published %d', (left, right, published) => {
  const tokens = tokensOf(':root,');
  expect(contrast(tokens.get(left) ?? '', tokens.get(right) ?? '')).toBeCloseTo(published, 1);
});
