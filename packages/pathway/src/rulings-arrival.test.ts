import { describe, expect, it } from 'vitest';
import { askOne, askPath } from './testing/ask-path.ts';

const child = { dob: '2020-03-10', ga: [40, 0], sex: 'M', code: 'LAHSHAL' };

it('with lip and palate both open on arrival the palate gets the days of the lip plus 84 (ruling 12)', () => {
  const open = askPath({ asOf: '2023-01-10', child: { ...child, team_start: '2023-01-01' } });
  expect(open['SURG-01']).toEqual(['window_open', '2023-01-01', '2023-03-02', '2023-05-01']);
  expect(open['SURG-03']).toEqual(['blocked', '2023-01-01', '2023-05-25', '2023-07-24']);
  const later = { ...child, team_start: '2023-01-01', done: { 'SURG-01': ['2023-02-01'] } };
  expect(askOne('SURG-03', '2023-02-10', later)).toEqual(['upcoming', '2023-04-26', '2023-05-25', '2023-07-24']);
});

describe('catch-up of items that have lost their sense (ruling 13)', () => {
  const arrived = { ...child, team_start: '2027-03-20' };

  it('a hearing test before a palate repair that is done is not asked for', () => {
    const repaired = { ...arrived, done: { 'SURG-01': ['2020-07-01'], 'SURG-03': ['2021-02-01'] } };
    expect(askOne('EAR-03', '2027-04-01', repaired)).toEqual(['not_applicable']);
    expect(askOne('EAR-03', '2027-04-01', arrived)?.[0]).toBe('window_open');
  });

  it('speech at 18 months is not asked for once the review at three lies before the arrival too', () => {
    expect(askOne('SPCH-02', '2027-04-01', arrived)).toEqual(['not_applicable']);
    expect(askOne('SPCH-02', '2023-01-10', { ...child, team_start: '2023-01-01' })?.[0]).toBe('window_open');
  });

  it('feeding and family adjustment are not asked for at seven years unless a concern is recorded', () => {
    expect(askOne('CARE-01', '2027-04-01', arrived)).toEqual(['not_applicable']);
    expect(askOne('PSY-01', '2027-04-01', arrived)).toEqual(['not_applicable']);
    expect(askOne('PSY-01', '2027-04-01', { ...arrived, flags: ['concern'] })?.[0]).toBe('window_open');
  });

  it('the tracking x-ray is asked for only while a graft is open', () => {
    const late = { ...child, team_start: '2034-01-01' };
    expect(askOne('ORTH-02', '2034-01-10', late)?.slice(1)).toEqual(['2034-01-01', '2034-01-31', '2034-03-02']);
    expect(askOne('ORTH-02', '2034-01-10', { ...late, done: { 'ORTH-05': ['2029-01-01'] } })).toEqual([
      'not_applicable',
    ]);
  });
});

it('a repeating item that cannot be made up joins its rhythm on arrival (ruling 14)', () => {
  const late = { ...child, team_start: '2020-04-21' };
  expect(askOne('CARE-02', '2020-04-22', late)).toEqual(['window_open', '2020-04-21', '2020-04-28', '2020-05-01']);
  const older = { ...child, team_start: '2020-06-20' };
  expect(askOne('CARE-02', '2020-06-21', older)).toEqual(['window_open', '2020-06-20', '2020-07-18', '2020-07-25']);
});

it('a late finding starts only the milestones that it switches on (ruling 15)', () => {
  const found = { dob: '2020-03-10', ga: [40, 0], sex: 'F', code: '•••••••', found: { smcp: '2025-05-01' } };
  const got = askPath({ asOf: '2025-05-10', child: found });
  expect(got['EAR-04']).toEqual(['window_open', '2025-05-01', '2025-05-31', '2025-07-30']);
  expect(got['SPCH-01']).toEqual(['not_applicable']);
  expect(got['SPCH-04']).toEqual(['window_open', '2025-05-01', '2025-06-10', '2026-03-10']);
  expect(got['GEN-01']?.[0]).toBe('overdue');
  expect(askOne('EAR-04', '2025-04-30', found)).toEqual(['not_applicable']);
  const joined = { ...found, team_start: '2025-06-01' };
  expect(askOne('EAR-04', '2025-06-10', joined)).toEqual(['window_open', '2025-06-01', '2025-07-01', '2025-08-30']);
});

describe('a late finding moves only what it switched on, and nothing signed before (rulings 15 and 31)', () => {
  it('an asked item whose own condition nobody stated keeps the birth clock', () => {
    const found = { dob: '2020-03-10', code: 'L••••••', found: { vpi_suspected: '2024-05-01' } };
    expect(askOne('EAR-02', '2024-06-01', found)).toEqual(['overdue', '2020-04-07', '2020-05-19', '2020-06-10']);
  });

  it('of two findings the first that switches an item on counts', () => {
    const found = { dob: '2020-03-10', code: '•••••••', found: { smcp: '2024-05-01', robin: '2025-02-01' } };
    expect(askOne('CARE-03', '2025-03-01', found)?.slice(1)).toEqual(['2024-05-01', '2024-05-22', '2024-06-12']);
    expect(askOne('GEN-02', '2025-03-01', found)?.[1]).toBe('2025-02-01');
  });

  it('what was signed before keeps its window and its variant', () => {
    const signed = { ...child, found: { robin: '2021-06-01' }, done: { 'SURG-03': ['2021-02-10'] } };
    expect(askOne('SURG-03', '2022-01-01', signed)).toEqual(['signed_off', '2020-12-10', '2021-02-10', '2021-04-10']);
  });

  it('the last weight check taken over from another team keeps its window after the rhythm has ended', () => {
    const done = { 'CARE-02': ['2020-03-17', '2020-03-24'], 'SURG-03': ['2021-02-10'] };
    expect(askOne('CARE-02', '2023-01-10', { ...child, team_start: '2023-01-01', done })).toEqual([
      'signed_off',
      '2020-03-22',
      '2020-03-24',
      '2020-03-27',
    ]);
  });
});

it('only an operation waits to be confirmed, a test taken over from another team stands (published shifts, late arrival)', () => {
  const done = { 'SURG-01': ['2020-07-01'], 'EAR-03': ['2020-12-10'] };
  const got = askPath({ asOf: '2021-01-10', child: { ...child, done, unverified: ['SURG-01', 'EAR-03'] } });
  expect([got['SURG-01']?.[0], got['EAR-03']?.[0]]).toEqual(['awaiting_sign_off', 'signed_off']);
});

it('graft dates that lie wholly before the arrival are made up in 60 and 180 days (ruling 27)', () => {
  const imported = { ...child, code: 'LAHS•••', team_start: '2030-06-01', roots: [['2028-06-01', '1/2']] };
  expect(askOne('ORTH-05', '2030-06-10', imported)?.slice(1)).toEqual(['2030-06-01', '2030-07-31', '2030-11-28']);
});

it('a signed item of a late arrival keeps the window of the day of signing, a waived one its last (ruling 31)', () => {
  const arrived = { ...child, team_start: '2023-01-01' };
  const signed = { ...arrived, done: { 'TEAM-04': ['2023-01-12'] } };
  expect(askOne('TEAM-04', '2023-06-01', signed)).toEqual(['signed_off', '2023-01-01', '2023-01-15', '2023-01-31']);
  const waived = { ...arrived, waived: { 'GEN-01': 'declined' } };
  expect(askOne('GEN-01', '2023-06-01', waived)).toEqual(['waived', '2023-01-01', '2023-03-02', '2023-05-01']);
});

it('an arrival on the latest date moves nothing, one day later it does', () => {
  expect(askOne('EAR-02', '2020-06-10', { ...child, team_start: '2020-06-10' })?.[3]).toBe('2020-06-10');
  expect(askOne('EAR-02', '2020-06-11', { ...child, team_start: '2020-06-11' })).toEqual(['not_applicable']);
});

it('before birth the expected date is the base and everything is ahead (ruling 33)', () => {
  const unborn = { due: '2026-12-20', code: 'LAHS•••', trig: { prenatal_referral: '2026-11-20' } };
  const got = askPath({ asOf: '2026-12-01', child: unborn });
  expect(got['SURG-01']).toEqual(['upcoming', '2027-02-28', '2027-03-20', '2027-06-20']);
  expect(got['TEAM-01']).toEqual(['due', '2026-11-20', '2026-11-27', '2026-12-11']);
  const words = Object.entries(got).filter(([id]) => id !== 'TEAM-01');
  expect(words.filter(([, [word]]) => !['upcoming', 'not_applicable', 'not_started'].includes(word))).toEqual([]);
});

it('unknown gestation is not corrected, unknown sex opens early and closes late (ruling 34)', () => {
  const plain = { dob: '2020-03-10', code: 'LAHS•••' };
  expect(askOne('SURG-01', '2020-05-01', plain)?.[1]).toBe('2020-05-19');
  const growth = askOne('GROW-01', '2030-01-01', { ...plain, flags: ['jaw_mismatch'] });
  expect([growth?.[1], growth?.[3]]).toEqual(['2034-03-10', '2039-03-10']);
});

it('a work-up put off to three and a half years is re-dated, not waived (ruling 35)', () => {
  const young = { ...child, trig: { vpi_suspected: '2022-09-01' }, waived: { 'SPCH-05': 're-date to 3.5 y' } };
  expect(askOne('SPCH-05', '2023-01-01', young)).toEqual(['upcoming', '2023-09-10', '2023-12-10', '2024-03-10']);
});

it('the molding lane keeps the birth clock unless the team chooses the corrected one (ruling 37)', () => {
  const preterm = { dob: '2026-01-15', ga: [33, 2], code: 'LAHS•••' };
  expect(askOne('MOLD-06', '2026-03-01', preterm)?.[3]).toBe('2026-06-04');
  expect(askOne('MOLD-06', '2026-03-01', preterm, { moldingClock: 'corrected' })?.[3]).toBe('2026-07-21');
});

it('an operation known to the month counts from its 15th, to the year from 1 July (ruling 32)', () => {
  const open = (on: string) => ({ ...child, code: 'L••S•••', done: { 'SURG-01': [on] } });
  expect(askOne('SURG-03', '2021-12-01', open('2021-06'))?.[1]).toBe('2021-09-07');
  expect(askOne('SURG-03', '2021-12-01', open('2021'))?.[1]).toBe('2021-09-23');
});
