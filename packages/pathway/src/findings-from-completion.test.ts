import { expect, it } from 'vitest';
import { defaultProtocol } from './default-protocol.ts';
import { findingsFromCompletion } from './findings-from-completion.ts';
import { day } from './testing/child-facts.ts';

const offer = defaultProtocol.milestones.find(({ id }) => id === 'MOLD-01');
const signed = (results?: Readonly<Record<string, string>>) =>
  offer
    ? findingsFromCompletion(offer, { milestone: 'MOLD-01', on: day('2026-01-27'), ...(results ? { results } : {}) })
    : null;

it('the choice of a plate with a stent raises both, dated with the signature', () => {
  expect(signed({ option_chosen: 'plate with nose stent' })).toEqual([
    { name: 'plate_chosen', on: '2026-01-27' },
    { name: 'stent_chosen', on: '2026-01-27' },
  ]);
});

it('another choice, or none, raises nothing', () => {
  expect([signed({ option_chosen: 'none' }), signed({}), signed()]).toEqual([[], [], []]);
});
