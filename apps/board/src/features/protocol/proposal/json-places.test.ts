import fc from 'fast-check';
import { expect, test } from 'vitest';
import { brokenLine, jsonLines, lineOf } from './json-places.ts';

const text = `{
  "name": "A",
  "milestones": [
    { "id": "SURG-01",
      "window": { "earliest": "10w" } },
    { "a/b~c": [1, true, null, "x\\"]{"] }
  ]
}`;

test('each value has its line', () => {
  const lines = jsonLines(text);
  expect(lineOf(lines, '/name')).toBe(2);
  expect(lineOf(lines, '/milestones/0/window/earliest')).toBe(5);
  expect(lineOf(lines, '/milestones/1/a~1b~0c/3')).toBe(6);
});

test('a value that is missing stands where its parent does', () => {
  expect(lineOf(jsonLines(text), '/milestones/0/title')).toBe(4);
  expect(lineOf(jsonLines(text), '/sources')).toBe(1);
});

test('any JSON is walked to its end', () => {
  fc.assert(
    fc.property(fc.jsonValue(), (value) => {
      const shown = JSON.stringify(value, null, 2);
      const lines = jsonLines(shown);
      expect(Math.max(...lines.values())).toBeLessThanOrEqual(shown.split('\n').length);
      expect(lines.get('')).toBe(1);
    }),
    { numRuns: 200 },
  );
});

test('a text that is no JSON is stopped at its line', () => {
  const broken = '{\n  "a": 1,\n  "b" 2\n}';
  try {
    JSON.parse(broken);
  } catch (error) {
    expect(brokenLine(broken, error)).toBe(3);
  }
});
