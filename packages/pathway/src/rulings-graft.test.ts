import { describe, expect, it } from 'vitest';
import { askOne, askPath } from './testing/ask-path.ts';

const one = { dob: '2016-05-02', ga: [40, 0], sex: 'M', code: 'LAHS•••' };
const both = { ...one, code: 'LAHSHAL' };

it('readiness, graft, result and watch are kept for each side (ruling 6)', () => {
  const roots = { R: [['2025-01-10', '1/2']], L: [['2025-06-10', '1/2']] };
  const done = { 'ORTH-05:R': ['2025-08-01'] };
  const got = askPath({ asOf: '2025-09-01', child: { ...both, roots, done } });
  expect(got['ORTH-05:R']?.[0]).toBe('signed_off');
  expect(got['ORTH-05:L']?.slice(1)).toEqual(['2025-06-10', '2025-09-10', '2026-03-10']);
  expect(got['ORTH-04:L']?.slice(1)).toEqual(['2025-06-10', '2025-08-09', '2025-10-10']);
  expect(got['ORTH-06:R']?.slice(1)).toEqual(['2025-11-01', '2026-02-01', '2026-05-01']);
  expect(got['ORTH-06:L']).toEqual(['not_applicable']);
  expect(got['ORTH-07:L']).toEqual(['blocked']);
  expect(got['ORTH-02']).toBeDefined();
});

it('the more mature side that still waits decides how often the root is filmed (ruling 7)', () => {
  const roots = { R: [['2024-06-10', '1/3']], L: [['2024-06-10', '1/6']] };
  const child = { ...both, roots, done: { 'ORTH-02': ['2024-06-10'] } };
  expect(askOne('ORTH-02', '2024-07-01', child)?.[2]).toBe('2024-12-10');
  const grafted = { ...child, done: { 'ORTH-02': ['2024-06-10'], 'ORTH-05:R': ['2024-06-20'] } };
  expect(askOne('ORTH-02', '2024-07-01', grafted)?.[2]).toBe('2025-06-10');
  const all = { ...child, done: { 'ORTH-02': ['2024-06-10'], 'ORTH-05': ['2024-06-20'] } };
  expect(askOne('ORTH-02', '2024-07-01', all)?.[0]).toBe('signed_off');
});

it('a graft keeps the window of its day, also when the other side is filmed again (ruling 31)', () => {
  const roots = { R: [['2024-10-19', '1/6']], L: [['2024-10-19', '1/6']] };
  const child = { ...both, roots, done: { 'ORTH-05:R': ['2025-03-21'] } };
  const filmed = { ...child, roots: { ...roots, L: [...roots.L, ['2027-01-10', '1/4']] } };
  for (const one of [child, filmed]) {
    expect(askPath({ asOf: '2027-03-01', child: one })['ORTH-05:R']).toEqual([
      'signed_off',
      '2024-05-02',
      '2025-10-19',
      '2027-05-02',
    ]);
  }
});

it('a reading of the whole side is no tracking x-ray of the cleft side (published date rules, 14)', () => {
  const child = { ...one, roots: { R: [['2024-06-10', '1/3']], L: [['2024-11-10', '1/2']] } };
  expect(askOne('ORTH-02', '2024-12-01', child)?.slice(1)).toEqual(['2024-11-10', '2024-12-10', '2025-02-10']);
});

it('a result recorded for one side puts nothing on the path of the other (rulings 6 and 19)', () => {
  const done = { 'ORTH-05:L': ['2025-08-01'], 'ORTH-06:L': ['2026-02-01'] };
  expect(askPath({ asOf: '2026-03-01', child: { ...both, done } })['ORTH-06:R']).toEqual(['not_applicable']);
});

describe('a root at the bound in a young child (ruling 8)', () => {
  it('the target is not before the opening and not after the latest date', () => {
    const child = { ...one, roots: [['2022-12-01', '1/2']] };
    expect(askOne('ORTH-05', '2023-01-01', child)?.slice(1)).toEqual(['2023-05-02', '2023-05-02', '2023-09-01']);
  });

  it('a latest date before the opening is squeezed from the first day', () => {
    const child = { ...one, roots: [['2022-06-01', '1/2']] };
    expect(askOne('ORTH-05', '2022-07-01', child)?.slice(1)).toEqual(['2023-05-02', '2023-03-01', '2023-03-01']);
  });
});

it('widening signed late moves the opening of readiness on top of the root rule (ruling 9)', () => {
  const roots = [['2025-01-10', '1/2']];
  const child = {
    ...one,
    roots,
    flags: ['expansion_needed', 'expansion_started'],
    done: { 'ORTH-03': ['2025-04-01'] },
  };
  expect(askOne('ORTH-04', '2025-02-01', child)?.[1]).toBe('2025-01-10');
  expect(askOne('ORTH-04', '2025-04-02', child)?.slice(1)).toEqual(['2025-04-01', '2025-04-01', '2025-05-10']);
});

it('the recorded start of widening ends its lateness, its signature opens the gate (ruling 10)', () => {
  const child = { ...one, flags: ['expansion_needed'], done: { 'ORTH-01': ['2023-09-12'] } };
  expect(askOne('ORTH-03', '2025-11-03', child)?.[0]).toBe('overdue');
  const started = { ...child, flags: ['expansion_needed', 'expansion_started'] };
  expect(askOne('ORTH-03', '2025-11-03', started)?.[0]).not.toBe('overdue');
});

it('the early-incisor track wins over readings and starts readiness on the day it was chosen (ruling 11)', () => {
  const child = { ...one, roots: [['2022-01-10', '1/2']], trig: { early_incisor_track: '2021-09-01' } };
  const got = askPath({ asOf: '2022-02-01', child });
  expect(got['ORTH-05']?.slice(1)).toEqual(['2021-05-02', '2022-05-02', '2023-05-02']);
  expect(got['ORTH-04']?.slice(1)).toEqual(['2021-09-01', '2021-10-31', '2022-01-01']);
});

it('a notched gum leaves its lane off until the first records answer (ruling 30)', () => {
  const notched = { ...one, code: 'l*•••••' };
  const open = askPath({ asOf: '2023-06-01', child: notched });
  expect([open['ORTH-01']?.[0], open['ORTH-05']]).toEqual(['due', ['not_applicable']]);
  const answered = askPath({ asOf: '2024-06-01', child: { ...notched, trig: { gum_lane_applies: '2023-06-01' } } });
  expect(answered['ORTH-05']?.slice(1)).toEqual(['2024-05-02', '2025-05-02', '2027-05-02']);
});

it('first orthodontic records are for gum or palate; a lip alone has no speech item (ruling 36)', () => {
  const got = askPath({ asOf: '2023-06-01', child: { ...one, code: 'L••••••' } });
  expect(Object.entries(got).filter(([id, [word]]) => /^(SPCH|ORTH)/.test(id) && word !== 'not_applicable')).toEqual(
    [],
  );
});

it('a reading of one third opens the window of a team with lower bounds', () => {
  const child = { ...one, roots: [['2024-06-10', '1/3']] };
  const settings = { graftRootLower: '1/3', graftRootUpper: '2/3' };
  expect(askOne('ORTH-05', '2026-02-15', child, settings)).toEqual([
    'overdue',
    '2024-06-10',
    '2024-09-10',
    '2025-03-10',
  ]);
});
