/** The small unit vectors of the pathway reference and the sentences beside its worked examples, number by number. */
import { describe, expect, it } from 'vitest';
import { correctedBase } from '@weftway/calendar/corrected-age';
import { addMonths, addWeeks, plainDate } from '@weftway/calendar/plain-date';
import { defaultProtocol } from '@weftway/pathway/default-protocol';
import type { PathwayFacts } from '@weftway/pathway/pathway-facts';
import { planPathway } from '@weftway/pathway/plan-pathway';
import { askOne, askPath } from '@weftway/pathway/testing/ask-path';

const day = plainDate;
const term = { dob: '2026-01-15', ga: [39, 2], sex: 'F', code: '•••SHAL' };
const boy = { dob: '2016-05-02', ga: [40, 0], sex: 'M', code: 'LAHS•••' };

describe('dates (vectors 1 to 6)', () => {
  it.each([
    ['1', addMonths(day('2025-08-31'), 6), '2026-02-28'],
    ['2', addMonths(day('2024-02-29'), 12), '2025-02-28'],
    ['3', addWeeks(day('2026-01-15'), 12), '2026-04-09'],
    ['4', correctedBase(day('2025-11-03'), { weeks: 32, days: 0 }), '2025-12-29'],
    ['5', correctedBase(day('2026-01-15'), { weeks: 36, days: 6 }), '2026-02-06'],
    ['6', correctedBase(day('2026-01-15'), { weeks: 37, days: 0 }), '2026-01-15'],
  ])('vector %s', (_number, got, expected) => {
    expect(got).toBe(expected);
  });
});

describe('states around the borders of a window (vectors 7 to 16)', () => {
  const gated = { ...term, done: { 'MOLD-03': ['2026-02-09'] } };
  it.each([
    ['7: on the latest date it is in time', 'EAR-02', '2026-04-15', term, 'closing'],
    ['8: one day later it is overdue', 'EAR-02', '2026-04-16', term, 'overdue'],
    ['9: on the earliest date it opens', 'EAR-02', '2026-02-12', term, 'window_open'],
    ['10: on the target it is due', 'EAR-02', '2026-03-26', term, 'due'],
    ['11: on the earliest date with a gate unmet it is blocked', 'SURG-01', '2026-03-26', gated, 'blocked'],
    ['12: the day before it is upcoming', 'SURG-01', '2026-03-25', gated, 'upcoming'],
    ['13: past the latest date it is overdue, gate or not', 'SURG-01', '2026-07-16', gated, 'overdue'],
    [
      '14: waived past the latest date',
      'EAR-02',
      '2026-05-01',
      { ...term, waived: { 'EAR-02': 'after tubes' } },
      'waived',
    ],
    [
      '15: half signed past the latest date',
      'MOLD-06',
      '2026-06-10',
      { ...gated, partial: { 'MOLD-06': 'one' } },
      'awaiting_sign_off',
    ],
    [
      '16: on its review date a hold holds',
      'SURG-01',
      '2026-08-10',
      { ...term, held: { 'SURG-01': '2026-08-10' } },
      'held',
    ],
    [
      '16: the day after it does not',
      'SURG-01',
      '2026-08-11',
      { ...term, held: { 'SURG-01': '2026-08-10' } },
      'overdue',
    ],
  ])('%s', (_title, id, on, child, state) => {
    expect(askOne(id, on, child)?.[0]).toBe(state);
  });
});

describe('windows (vectors 17 to 25)', () => {
  const weekly = { ...term, done: { 'MOLD-03': ['2026-02-09'], 'MOLD-04': ['2026-03-09'] } };
  const slow = { ...boy, dob: '2014-04-10', roots: [['2025-02-20', '1/4']], done: { 'ORTH-02': ['2025-02-20'] } };
  it.each([
    ['17', 'MOLD-04', '2026-03-10', weekly, ['2026-03-14', '2026-03-16', '2026-03-19']],
    [
      '18',
      'SURG-03',
      '2026-09-01',
      { ...term, done: { 'SURG-01': ['2026-08-20'] } },
      ['2026-11-12', '2026-12-15', '2027-02-15'],
    ],
    [
      '23',
      'ORTH-05',
      '2024-12-10',
      { ...boy, roots: [['2024-12-09', '1/2']] },
      ['2024-12-09', '2025-03-09', '2025-09-09'],
    ],
    [
      '24',
      'ORTH-05',
      '2026-03-16',
      { ...boy, roots: [['2026-03-02', '3/4']] },
      ['2026-03-02', '2026-06-02', '2026-06-02'],
    ],
    ['25', 'ORTH-05', '2025-05-01', slow, ['2022-04-10', '2025-08-20', '2025-10-20']],
  ])('vector %s', (_number, id, on, child, window) => {
    expect(askOne(id, on, child)?.slice(1)).toEqual(window);
  });

  it('vector 25: past the eleventh birthday, blocked and not late', () => {
    expect(askOne('ORTH-05', '2025-05-01', slow)?.[0]).toBe('blocked');
    expect(askOne('ORTH-02', '2025-05-01', slow)?.slice(1)).toEqual(['2025-07-20', '2025-08-20', '2025-10-20']);
  });

  it('vector 22: a screen is fresh enough for 14 September from 20 July on', () => {
    const screened = (on: string) => ({
      dob: '2025-05-20',
      code: '••hSh••',
      flags: ['airway'],
      done: { 'CARE-03': [on] },
    });
    expect(askOne('SURG-03', '2026-09-14', screened('2026-07-20'))?.[0]).toBe('due');
    expect(askOne('SURG-03', '2026-09-14', screened('2026-07-19'))?.[0]).toBe('blocked');
  });
});

function facts(more: Partial<PathwayFacts>): PathwayFacts {
  return {
    birth: day('2016-05-02'),
    due: null,
    isBirthEstimated: false,
    gestation: { weeks: 40, days: 0 },
    sex: 'male',
    cleft: 'LAHS•••',
    flags: [],
    teamStart: null,
    transferredOn: null,
    findings: [],
    completions: [],
    parts: [],
    waivers: [],
    holds: [],
    bookings: [],
    roots: [],
    ...more,
  };
}

describe('alarms (vector 19 and example 5)', () => {
  const left = facts({
    completions: [{ milestone: 'TEAM-05', on: day('2024-06-10') }],
    roots: [{ on: day('2024-06-10'), stage: '1/3', side: 'R' }],
  });
  const alarm = (name: string, on: string) =>
    planPathway(defaultProtocol, left, day(on)).alarms.find((one) => one.name === name)?.since;

  it('the review is overdue from 11 August and the family lost to follow-up from 10 June', () => {
    expect([alarm('review-overdue', '2025-08-10'), alarm('review-overdue', '2025-08-11')]).toEqual([
      undefined,
      '2025-08-11',
    ]);
    expect([alarm('lost-to-follow-up', '2026-06-09'), alarm('lost-to-follow-up', '2026-06-10')]).toEqual([
      undefined,
      '2026-06-10',
    ]);
  });

  it('the graft is blind from 11 February', () => {
    expect([alarm('graft-blind', '2025-02-10'), alarm('graft-blind', '2026-02-15')]).toEqual([undefined, '2025-02-11']);
  });
});

describe('example 1, after the lip operation', () => {
  it.each([
    ['2026-05-12', ['2026-10-15', '2026-12-15', '2027-02-15'], null],
    ['2026-08-20', ['2026-11-12', '2026-12-15', '2027-02-15'], null],
    ['2026-10-30', ['2027-01-22', '2027-01-22', '2027-02-15'], null],
    ['2026-12-01', ['2027-02-23', '2027-02-23', '2027-02-15'], 8],
  ])('lip done on %s', (on, window, squeezedByDays) => {
    const child = facts({
      birth: day('2026-01-15'),
      cleft: '•••SHAL',
      completions: [{ milestone: 'SURG-01', on: day(on) }],
    });
    const palate = planPathway(defaultProtocol, child, day('2026-12-05')).milestones.find(
      ({ key }) => key === 'SURG-03',
    );
    expect([palate?.window?.earliest, palate?.window?.target, palate?.window?.latest]).toEqual(window);
    expect(palate?.squeezedByDays).toBe(squeezedByDays);
  });

  it('brings the wound check and the six-week review', () => {
    const got = askPath({ asOf: '2026-05-13', child: { ...term, done: { 'SURG-01': ['2026-05-12'] } } });
    expect(got['CARE-05']?.slice(1)).toEqual(['2026-05-17', '2026-05-22', '2026-06-02']);
    expect(got['SURG-02']?.slice(1)).toEqual(['2026-06-09', '2026-06-23', '2026-07-21']);
  });
});

it('example 6: the nose waits for the jaw, six months after the operation', () => {
  const girl = { dob: '2009-09-12', ga: [40, 0], sex: 'F', code: '•••SHAL', flags: ['jaw_surgery_planned'] };
  const operated = { ...girl, done: { 'GROW-03': ['2026-08-18'] } };
  expect(askOne('GROW-04', '2026-09-01', operated)?.slice(1)).toEqual(['2027-02-18', '2027-02-18', '2030-09-12']);
});
