import { describe, expect, it } from 'vitest';
import { disciplineNames, disciplines } from './disciplines.ts';
import { laneNames, lanes } from './lanes.ts';
import { standingNames, standings } from './standings.ts';

describe('the closed lists of the team', () => {
  it.each([
    ['disciplines', disciplines, disciplineNames, 15],
    ['lanes', lanes, laneNames, 13],
    ['standings', standings, standingNames, 7],
  ] as const)('%s: each word once, each with a name of its own', (_name, words, names, count) => {
    expect(new Set<string>(words).size).toBe(count);
    expect(Object.keys(names)).toEqual([...words]);
    expect(new Set(Object.values(names)).size).toBe(count);
  });
});
