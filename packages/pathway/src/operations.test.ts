import { describe, expect, it } from 'vitest';
import { askPath } from './testing/ask-path.ts';

const baby = { dob: '2026-01-15', ga: [40, 0], code: 'LAHS•••' };
const fit = (child: Readonly<Record<string, unknown>>, on = '2026-05-01') =>
  Object.fromEntries(Object.entries(askPath({ asOf: on, child })).filter(([id]) => id.startsWith('CARE-04')));

describe('which operations ask for a fitness check', () => {
  it('a booking that names no operation has one of its own until a named one stands on its day', () => {
    expect(fit({ ...baby, plan: { op: '2026-05-12' } })).toEqual({
      'CARE-04': ['due', '2026-04-12', '2026-04-28', '2026-05-09'],
    });
    expect(Object.keys(fit({ ...baby, plan: { op: '2026-05-12', 'SURG-01': '2026-05-12' } }))).toEqual(['CARE-04']);
    expect(Object.keys(fit({ ...baby, plan: { op: '2026-05-12', 'SURG-01': '2026-05-20' } }))).toEqual([
      'CARE-04:SURG-01',
      'CARE-04',
    ]);
  });

  it('an operation that was done as booked asks no more', () => {
    const operated = { ...baby, plan: { op: '2026-05-12' }, done: { 'SURG-01': ['2026-05-12'] } };
    expect(fit(operated, '2026-05-20')).toEqual({ 'CARE-04': ['not_started'] });
    const checked = { ...operated, done: { 'SURG-01': ['2026-05-12'], 'CARE-04': ['2026-05-01'] } };
    expect(fit(checked, '2026-05-20')['CARE-04']?.[0]).toBe('signed_off');
  });

  it('ear tubes have one only when they are placed alone', () => {
    const tubes = { ...baby, plan: { 'SURG-03': '2026-12-10', 'EAR-07': '2026-12-10' } };
    expect(Object.keys(fit(tubes))).toEqual(['CARE-04']);
    expect(Object.keys(fit({ ...tubes, plan: { 'SURG-03': '2026-12-10', 'EAR-07': '2026-10-10' } }))).toHaveLength(2);
  });

  it('the offer of a last nose operation has none unless it is booked', () => {
    const grown = { ...baby, dob: '2005-01-15', done: { 'GROW-04': ['2022-03-01'] } };
    expect(Object.keys(askPath({ asOf: '2022-04-01', child: grown })).filter((id) => id.startsWith('CARE-05'))).toEqual(
      ['CARE-05'],
    );
    expect(askPath({ asOf: '2022-03-05', child: grown })['CARE-05']).toEqual(['not_applicable']);
    const booked = { ...grown, plan: { 'GROW-04': '2022-03-01' } };
    expect(askPath({ asOf: '2022-03-06', child: booked })['CARE-05']?.[0]).toBe('window_open');
  });
});

it('a wound check stays when the same operation is booked again', () => {
  const child = { ...baby, done: { 'SURG-01': ['2026-05-12'] }, plan: { 'SURG-01': '2027-03-01' } };
  const got = askPath({ asOf: '2026-05-20', child });
  expect(got['CARE-05']).toEqual(['window_open', '2026-05-17', '2026-05-22', '2026-06-02']);
  expect(got['CARE-04']?.slice(1)).toEqual(['2027-01-30', '2027-02-15', '2027-02-26']);
});

describe('records of one operation', () => {
  const two = { ...baby, plan: { 'SURG-01': '2026-05-12', 'SURG-03': '2026-12-10' } };

  it('a check, a waiver and a hold under a key belong to that operation', () => {
    const child = {
      ...two,
      done: { 'CARE-04:SURG-01': ['2026-04-30'] },
      held: { 'CARE-04:SURG-03': '2026-12-09' },
    };
    const got = fit(child, '2026-12-08');
    expect([got['CARE-04:SURG-01']?.[0], got['CARE-04:SURG-03']?.[0]]).toEqual(['signed_off', 'held']);
    const waived = fit({
      ...two,
      waived: { 'CARE-04:SURG-03': 'none needed' },
      partial: { 'CARE-04:SURG-01': 'draft' },
    });
    expect([waived['CARE-04:SURG-01']?.[0], waived['CARE-04:SURG-03']?.[0]]).toEqual(['awaiting_sign_off', 'waived']);
  });

  it('a plain wound check belongs to the operation before it', () => {
    const child = {
      ...baby,
      done: { 'SURG-01': ['2026-05-12'], 'SURG-03': ['2026-12-10'], 'CARE-05': ['2026-05-20'] },
    };
    const got = askPath({ asOf: '2026-12-20', child });
    expect([got['CARE-05:SURG-01']?.[0], got['CARE-05:SURG-03']?.[0]]).toEqual(['signed_off', 'window_open']);
  });

  it('a wound of an operation before the arrival is not asked for', () => {
    const child = { ...baby, team_start: '2027-06-01', done: { 'SURG-01': ['2026-05-12'] } };
    expect(askPath({ asOf: '2027-06-10', child })['CARE-05']).toEqual(['not_applicable']);
  });
});
