import { describe, expect, it } from 'vitest';
import { askOne, askPath } from './testing/ask-path.ts';

const palate = { dob: '2010-03-10', ga: [40, 0], sex: 'F', code: '••HSH••' };
const ears = (...dates: string[]) => ({ ...palate, done: { 'EAR-06': dates } });

describe('the interval at an age border is that of the last signed visit (ruling 16)', () => {
  it('hearing goes from half-yearly to yearly at the fifth birthday', () => {
    expect(askOne('EAR-06', '2015-04-01', ears('2015-03-09'))).toEqual([
      'upcoming',
      '2015-08-09',
      '2015-09-09',
      '2015-11-09',
    ]);
    expect(askOne('EAR-06', '2015-04-01', ears('2015-03-10'))).toEqual([
      'upcoming',
      '2016-01-10',
      '2016-03-10',
      '2016-05-10',
    ]);
  });

  it('beyond ten years the next age point follows, a visit inside an age window counts for it', () => {
    expect(askOne('EAR-06', '2020-04-01', ears('2020-03-10'))).toEqual([
      'upcoming',
      '2021-01-10',
      '2021-03-10',
      '2021-05-10',
    ]);
    expect(askOne('EAR-06', '2020-04-01', ears('2020-03-11'))).toEqual([
      'upcoming',
      '2021-12-10',
      '2022-03-10',
      '2023-03-10',
    ]);
    expect(askOne('EAR-06', '2022-05-01', ears('2022-04-10'))).toEqual([
      'upcoming',
      '2024-12-10',
      '2025-03-10',
      '2026-03-10',
    ]);
    expect(askOne('EAR-06', '2025-05-01', ears('2025-01-10'))?.[0]).toBe('signed_off');
  });

  it('weights go from weekly to four-weekly at eight weeks', () => {
    const weights = (on: string) => ({ dob: '2026-01-15', code: '••HSH••', done: { 'CARE-02': [on] } });
    expect(askOne('CARE-02', '2026-03-12', weights('2026-03-11'))).toEqual([
      'upcoming',
      '2026-03-16',
      '2026-03-18',
      '2026-03-21',
    ]);
    expect(askOne('CARE-02', '2026-03-12', weights('2026-03-12'))).toEqual([
      'upcoming',
      '2026-04-02',
      '2026-04-09',
      '2026-04-16',
    ]);
  });
});

describe('a visit counts for the latest band whose opening it has reached (ruling 17)', () => {
  const minds = (...dates: string[]) => ({ ...palate, done: { 'PSY-02': dates } });

  it('a first visit in the second band leaves the third to do', () => {
    expect(askOne('PSY-02', '2019-01-01', minds('2018-03-10'))).toEqual([
      'upcoming',
      '2020-09-10',
      '2021-09-10',
      '2023-03-10',
    ]);
    expect(askOne('PSY-02', '2019-01-01', minds('2018-03-09'))).toEqual([
      'window_open',
      '2018-03-10',
      '2019-03-10',
      '2020-09-10',
    ]);
  });

  it('a used-up list of bands is signed off', () => {
    expect(askOne('PSY-02', '2025-01-01', minds('2024-09-10'))?.[0]).toBe('signed_off');
  });

  it('the second offer keeps its own ages though the first was late', () => {
    const lip = { ...palate, code: 'L••••••', done: { 'SURG-05': ['2017-03-10'] } };
    expect(askOne('SURG-05', '2018-01-01', lip)).toEqual(['upcoming', '2019-03-10', '2019-09-10', '2021-03-10']);
  });
});

describe('when the end of a repeat is reached (ruling 18)', () => {
  const old = { dob: '2000-01-15', ga: [40, 0], code: 'LAHS•••' };

  it('it is signed off if it was ever signed, else off the path, also when it was overdue that day', () => {
    const handedOver = { ...old, done: { 'ADLT-03': ['2020-06-01'], 'TEAM-05': ['2015-01-01'] } };
    const got = askPath({ asOf: '2020-07-01', child: handedOver, ask: ['TEAM-05', 'DENT-02', 'ADLT-02'] });
    expect(got['TEAM-05']?.[0]).toBe('signed_off');
    expect([got['DENT-02'], got['ADLT-02']]).toEqual([['not_applicable'], ['not_applicable']]);
  });

  it('molding ends when the lip is repaired', () => {
    const done = {
      'MOLD-02': ['2000-02-01'],
      'MOLD-03': ['2000-02-08'],
      'MOLD-04': ['2000-02-15'],
      'SURG-01': ['2000-05-01'],
    };
    const got = askPath({ asOf: '2000-06-20', child: { ...old, done }, ask: ['MOLD-04', 'MOLD-05', 'MOLD-06'] });
    expect([got['MOLD-04']?.[0], got['MOLD-05']?.[0], got['MOLD-06']?.[0]]).toEqual([
      'signed_off',
      'not_applicable',
      'not_applicable',
    ]);
  });

  it('weights end with the palate repair, with the lip repair when the palate is whole', () => {
    const done = { 'CARE-02': ['2000-04-20'], 'SURG-01': ['2000-05-01'] };
    expect(askOne('CARE-02', '2000-06-20', { ...old, done })?.[0]).toBe('overdue');
    expect(askOne('CARE-02', '2000-06-20', { ...old, code: 'LA•••••', done })?.[0]).toBe('signed_off');
  });
});

describe('one check for each operation (ruling 23)', () => {
  const lip = { dob: '2026-01-15', ga: [40, 0], code: 'LAHS•••' };

  it('a booked operation brings its fitness check, one done its wound check', () => {
    const planned = { ...lip, plan: { 'SURG-01': '2026-05-12' } };
    expect(askPath({ asOf: '2026-04-20', child: planned })['CARE-04']).toEqual([
      'window_open',
      '2026-04-12',
      '2026-04-28',
      '2026-05-09',
    ]);
    const operated = { ...lip, done: { 'SURG-01': ['2026-05-12'], 'SURG-03': ['2026-12-14'] } };
    const got = askPath({ asOf: '2026-12-20', child: operated });
    expect(got['CARE-05:SURG-01']).toEqual(['overdue', '2026-05-17', '2026-05-22', '2026-06-02']);
    expect(got['CARE-05:SURG-03']).toEqual(['window_open', '2026-12-19', '2026-12-28', '2027-01-13']);
  });

  it('a booking that moves keeps its signed check while that is still fresh', () => {
    const on = (day: string) => ({ ...lip, plan: { 'SURG-01': day }, done: { 'CARE-04': ['2026-04-20'] } });
    expect(askOne('CARE-04', '2026-04-25', on('2026-05-20'))?.[0]).toBe('signed_off');
    expect(askOne('CARE-04', '2026-04-25', on('2026-05-21'))).toEqual([
      'window_open',
      '2026-04-21',
      '2026-05-07',
      '2026-05-18',
    ]);
  });

  it('nothing booked is not started, nothing done is off the path', () => {
    const got = askPath({ asOf: '2026-04-20', child: lip });
    expect([got['CARE-04'], got['CARE-05']]).toEqual([['not_started'], ['not_applicable']]);
  });

  it('grafts of two sides have checks of their own', () => {
    const both = { ...lip, code: 'LAHSHAL', plan: { 'ORTH-05:R': '2034-06-01', 'ORTH-05:L': '2034-09-01' } };
    const got = askPath({ asOf: '2034-05-20', child: both });
    expect(got['CARE-04:ORTH-05:R']?.[3]).toBe('2034-05-29');
    expect(got['CARE-04:ORTH-05:L']?.[3]).toBe('2034-08-29');
  });
});

describe('added repeats (ruling 24)', () => {
  const grown = { dob: '2009-09-12', ga: [40, 0], sex: 'F', code: '•••SHAL', flags: ['jaw_surgery_planned'] };

  it('speech and sleep are checked again after jaw surgery', () => {
    const done = { 'GROW-02': ['2026-05-20'], 'GROW-03': ['2026-08-18'] };
    expect(askOne('GROW-02', '2026-09-01', { ...grown, done })).toEqual([
      'upcoming',
      '2026-11-18',
      '2027-02-18',
      '2027-08-18',
    ]);
    const again = { 'GROW-02': ['2026-05-20', '2027-02-01'], 'GROW-03': ['2026-08-18'] };
    expect(askOne('GROW-02', '2027-03-01', { ...grown, done: again })?.[0]).toBe('signed_off');
  });

  it('graft readiness is renewed after six months while the graft waits', () => {
    const child = {
      dob: '2016-05-02',
      code: 'LAHS•••',
      roots: [['2025-01-10', '1/2']],
      done: { 'ORTH-04': ['2025-02-01'] },
    };
    expect(askOne('ORTH-04', '2025-03-01', child)?.[3]).toBe('2025-08-01');
    const grafted = { ...child, done: { 'ORTH-04': ['2025-02-01'], 'ORTH-05': ['2025-04-01'] } };
    expect(askOne('ORTH-04', '2025-05-01', grafted)?.[0]).toBe('signed_off');
  });
});

it('the eye check comes back every year until Stickler syndrome is ruled out (published repeat)', () => {
  const robin = { dob: '2020-03-10', code: '••hSh••', flags: ['robin'], done: { 'GEN-02': ['2020-09-10'] } };
  expect(askOne('GEN-02', '2020-10-01', robin)).toEqual(['upcoming', '2021-07-10', '2021-09-10', '2021-11-10']);
  const ruledOut = { ...robin, found: { stickler_excluded: '2020-09-20' } };
  expect(askOne('GEN-02', '2020-10-01', ruledOut)).toEqual(['signed_off', '2020-06-10', '2020-09-10', '2021-03-10']);
});

it('jaw surgery planned after the hand-over still wants its check of speech and sleep (ruling 18 names what ends)', () => {
  const grown = {
    dob: '2000-01-15',
    code: 'LAHS•••',
    flags: ['jaw_surgery_planned'],
    done: { 'ADLT-03': ['2020-02-01'] },
  };
  expect(askOne('GROW-02', '2020-03-01', grown)).toEqual(['not_started']);
});

describe('ear tubes and the palate repair (ruling 28)', () => {
  const baby = { dob: '2026-01-15', ga: [40, 0], code: '••HSH••', trig: { tubes_decided: '2026-08-01' } };

  it('tubes chosen with the repair take its window', () => {
    expect(askOne('EAR-07', '2026-09-01', { ...baby, flags: ['tubes_with_palate'] })?.slice(1)).toEqual([
      '2026-07-15',
      '2026-11-15',
      '2027-02-15',
    ]);
    expect(askOne('EAR-07', '2026-09-01', baby)?.slice(1)).toEqual(['2026-08-01', '2026-09-12', '2026-11-01']);
  });

  it('without a palate repair the hearing test counts from the tubes', () => {
    const hidden = { ...baby, code: '•••••••', flags: ['smcp'], done: { 'EAR-07': ['2026-09-01'] } };
    expect(askOne('EAR-05', '2026-09-02', hidden)).toEqual(['upcoming', '2026-09-29', '2026-10-27', '2026-12-01']);
  });
});
