import { describe, expect, it } from 'vitest';
import { chosen, giveAll, itemsOf, titlesOf, type OpenClaim } from './hand-over-choices.ts';

const claim = (childId: string, title: string, mayHold: string[]): OpenClaim => ({
  childId,
  childName: childId,
  milestone: 'SURG-01',
  part: 'milestone',
  title,
  state: 'open',
  latest: null,
  mayHold,
  mayHoldAsLead: [],
});
const lip = claim('amara', 'Lip repair', ['obed']);
const palate = claim('tomasz', 'Palate repair', ['obed', 'mireille']);

describe('putting a hand-over together', () => {
  it('gives a colleague only what they may hold', () => {
    const { choices, given } = giveAll(new Map(), [lip, palate], 'mireille');
    expect(given).toBe(1);
    expect(itemsOf(choices, [lip, palate])).toEqual([
      { childId: 'tomasz', milestone: 'SURG-01', part: 'milestone', to: 'mireille' },
    ]);
  });

  it('letting go is a choice; taking the choice back leaves the milestone where it is', () => {
    const letGo = chosen(new Map(), lip, null);
    expect(itemsOf(letGo, [lip])).toMatchObject([{ to: null }]);
    expect(itemsOf(chosen(letGo, lip, undefined), [lip])).toEqual([]);
  });

  it('what is not held any more is not sent', () => {
    expect(itemsOf(chosen(new Map(), lip, 'obed'), [palate])).toEqual([]);
  });

  it('titles are counted, the most frequent first', () => {
    expect(titlesOf([palate, lip, { ...lip, childId: 'noor' }])).toEqual([
      { title: 'Lip repair', count: 2 },
      { title: 'Palate repair', count: 1 },
    ]);
  });
});
