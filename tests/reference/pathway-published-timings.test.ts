/**
 * Published timings against the default protocol: a step done at the published age finds its window open.
 * Each row names the publication that the pathway reference quotes; the default must be compatible with all of them.
 */
import { describe, expect, it } from 'vitest';
import { askOne } from '@weftway/pathway/testing/ask-path';

const born = '2024-03-10';
const oneSided = { dob: born, ga: [40, 0], sex: 'F', code: 'LAHS•••' };
const palateOnly = { ...oneSided, code: '••HSH••' };
const open: readonly string[] = ['window_open', 'due', 'closing'];

interface Timing {
  readonly source: string;
  readonly says: string;
  readonly id: string;
  readonly on: readonly string[];
  readonly child?: Readonly<Record<string, unknown>>;
}

const lipDone = { ...oneSided, done: { 'SURG-01': ['2024-06-20'] } };

const timings: readonly Timing[] = [
  {
    source: 'UK regional service pathway page',
    says: 'lip at 3 to 4 months',
    id: 'SURG-01',
    on: ['2024-06-10', '2024-07-10'],
  },
  {
    source: 'US cleft centres (UC Davis timeline page)',
    says: 'lip at 3 to 5 months',
    id: 'SURG-01',
    on: ['2024-06-10', '2024-08-10'],
  },
  {
    source: 'American Academy of Pediatrics and several services',
    says: 'lip at 3 to 6 months',
    id: 'SURG-01',
    on: ['2024-06-10', '2024-09-10'],
  },
  {
    source: 'US cleft centres (UC Davis timeline page)',
    says: 'palate at 10 to 14 months, to 13 here',
    id: 'SURG-03',
    on: ['2025-01-10', '2025-04-10'],
    child: lipDone,
  },
  {
    source: 'TOPS trial, N Engl J Med 2023;389:795-807',
    says: 'palate only at 6 or 12 months',
    id: 'SURG-03',
    on: ['2024-09-10', '2025-03-10'],
    child: palateOnly,
  },
  {
    source: 'Garfinkle and Grayson, technique text',
    says: 'molding begins at 2 to 4 weeks',
    id: 'MOLD-02',
    on: ['2024-03-24', '2024-04-07'],
  },
  {
    source: 'British Columbia hearing protocol, 2012',
    says: 'brainstem test before 3 months',
    id: 'EAR-02',
    on: ['2024-04-20', '2024-06-10'],
  },
  {
    source: 'Painter, Arch Dis Child 2011;96(Suppl 1):A32',
    says: 'hearing at 6 to 9 months, from 7 here',
    id: 'EAR-03',
    on: ['2024-10-10', '2024-12-10'],
  },
  {
    source: 'US cleft centres (UC Davis timeline page)',
    says: 'dentist at 12 to 18 months, to 15 here',
    id: 'DENT-01',
    on: ['2025-03-10', '2025-06-10'],
  },
  {
    source: 'Dutch cleft centres, timeline pages',
    says: 'review at 6 to 9 months',
    id: 'TEAM-05',
    on: ['2024-09-10', '2024-12-10'],
  },
  { source: 'UK speech audit ages (Harding-Bell)', says: 'speech at 3 years', id: 'SPCH-03', on: ['2027-03-10'] },
  { source: 'Cleft Care UK study', says: 'five-year records', id: 'REC-01', on: ['2029-03-10', '2029-06-10'] },
  {
    source: 'US cleft centres (Illinois treatment page)',
    says: 'orthodontics at 7 to 9 years, to 8 here',
    id: 'ORTH-01',
    on: ['2031-03-10', '2032-03-10'],
  },
  {
    source: 'US cleft centres: graft at 8 to 12 years',
    says: 'age window to 11 without readings',
    id: 'ORTH-05',
    on: ['2032-03-10', '2035-03-10'],
  },
  {
    source: 'Swedish, UK and Dutch end of care',
    says: 'at 19, 20 and 22 years',
    id: 'ADLT-03',
    on: ['2043-03-10', '2044-03-10', '2046-03-10'],
  },
];

const cases = timings.flatMap((timing) => timing.on.map((on) => ({ ...timing, on })));

describe('a step at its published age is in its window', () => {
  it.each(cases)('$source: $says ($id on $on)', ({ id, on, child = oneSided }) => {
    const answer = askOne(id, on, child);
    const [state, earliest, , latest] = answer ?? ['not_applicable'];
    expect(earliest !== undefined && earliest <= on && latest !== undefined && on <= latest).toBe(true);
    // A gate that is still waited for does not move the window.
    expect([...open, 'blocked']).toContain(state);
  });
});
