import { describe, expect, it } from 'vitest';
import { defaultProtocol } from './default-protocol.ts';
import { unknownMilestones } from './path-answer.ts';
import { readPathCase } from './path-case.ts';
import { askOne, askPath } from './testing/ask-path.ts';

const robin = { dob: '2025-05-20', ga: [38, 4], sex: 'F', code: '••hSh••', flags: ['robin'] };
const screened = { ...robin, done: { 'CARE-03': ['2026-05-01', '2026-06-15'] } };
const palate = (result: unknown) => askOne('SURG-03', '2026-07-01', { ...screened, result })?.[0];

describe('how a result may be stated', () => {
  it.each<[string, unknown, string]>([
    ['nothing stated is good', {}, 'due'],
    ['a bare no is about the latest screen', { 'CARE-03': 'no' }, 'blocked'],
    ['with plan is good', { 'CARE-03': 'with plan' }, 'due'],
    ['yes is good', { 'CARE-03': 'yes' }, 'due'],
    ['an unknown word is not', { 'CARE-03': 'perhaps' }, 'blocked'],
    ['one word for each screen, the last counts', { 'CARE-03': ['no', 'yes'] }, 'due'],
    ['one word for each screen, the last is bad', { 'CARE-03': ['yes', 'no'] }, 'blocked'],
    ['by day', { 'CARE-03': { '2026-06-15': 'no' } }, 'blocked'],
    ['by the name of the field', { 'CARE-03': { safe_for_anaesthesia: 'no' } }, 'blocked'],
    ['by id and field', { 'CARE-03.safe_for_anaesthesia': 'no' }, 'blocked'],
    ['about the plate says nothing about anaesthesia', { 'CARE-03': { safe_for_plate: 'no' } }, 'due'],
  ])('%s', (_title, result, word) => {
    expect(palate(result)).toBe(word);
  });

  it('untreated decay keeps readiness shut', () => {
    const child = {
      dob: '2016-05-02',
      code: 'LAHS•••',
      roots: [['2026-03-02', '1/2']],
      done: { 'ORTH-02': ['2026-03-02'], 'DENT-02': ['2026-03-02'] },
    };
    expect(askOne('ORTH-04', '2026-03-16', child)?.[0]).toBe('window_open');
    expect(askOne('ORTH-04', '2026-03-16', { ...child, result: { 'DENT-02': 'decay' } })?.[0]).toBe('blocked');
  });
});

describe('how a case may be written', () => {
  it('a waiver and a hold may carry their own day, which counts only once it has come', () => {
    const child = {
      ...robin,
      waived: { 'GEN-02': { reason: 'excluded', on: '2026-08-01' } },
      held: { 'SURG-03': { review: '2026-09-01', on: '2026-07-10' } },
    };
    const before = askPath({ asOf: '2026-07-01', child });
    const after = askPath({ asOf: '2026-08-01', child });
    expect([before['GEN-02']?.[0], after['GEN-02']?.[0]]).toEqual(['overdue', 'waived']);
    expect([before['SURG-03']?.[0], after['SURG-03']?.[0]]).toEqual(['blocked', 'held']);
  });

  it('an id is answered as it was asked: in full for the only side, plainly for the side still open', () => {
    const one = { dob: '2016-05-02', code: 'LAHS•••' };
    expect(askPath({ asOf: '2025-01-01', child: one, ask: ['ORTH-05:R'] })['ORTH-05:R']?.[1]).toBe('2024-05-02');
    const both = { ...one, code: 'LAHSHAL', done: { 'ORTH-05:R': ['2024-12-01'] } };
    expect(askPath({ asOf: '2025-01-01', child: both, ask: ['ORTH-05'] })['ORTH-05']?.[0]).toBe('blocked');
  });

  it('keys of what is expected are asked when nothing else is', () => {
    const line = { as_of: '2026-03-01', child: { dob: '2026-01-15', code: 'LAHS•••' }, expect: { 'ORTH-08': [] } };
    const reading = readPathCase(JSON.stringify(line));
    expect(reading.kind === 'case' ? unknownMilestones(defaultProtocol, reading.case) : reading.message).toEqual([]);
  });

  it('gates before an asked milestone are waited for although their own condition is not stated', () => {
    const girl = { dob: '2009-09-12', ga: [40, 0], sex: 'F', code: '•••SHAL', flags: ['jaw_surgery_planned'] };
    expect(askOne('GROW-04', '2026-03-01', girl)?.[0]).toBe('blocked');
    expect(askOne('GROW-06', '2027-03-01', { ...girl, flags: [] })?.[0]).toBe('blocked');
  });

  it.each([
    ['a day that does not exist', { as_of: '2026-02-30', child: { dob: '2026-01-15', code: 'LAHS•••' } }, 'as_of'],
    ['no birth and no expected date', { as_of: '2026-02-03', child: { code: 'LAHS•••' } }, 'Give the date of birth'],
    ['a code of six places', { as_of: '2026-02-03', child: { dob: '2026-01-15', code: 'LAHSAL' } }, 'child.code'],
    [
      'a root stage in decimals',
      { as_of: '2026-02-03', child: { dob: '2026-01-15', code: 'LAHS•••', roots: [['2026-02-01', '0.5']] } },
      'roots',
    ],
    [
      'an id that is none',
      { as_of: '2026-02-03', child: { dob: '2026-01-15', code: 'LAHS•••', done: { lip: ['2026-02-01'] } } },
      'done',
    ],
  ])('%s is refused', (_title, line, place) => {
    const reading = readPathCase(JSON.stringify(line));
    expect(reading.kind === 'fault' ? reading.message : '').toContain(place);
  });

  it('null says no more than leaving it out', () => {
    const bare = { dob: '2026-01-15', code: 'LAHS•••' };
    const nulls = { ...bare, ga: null, sex: null, team_start: null, plan: { op: null }, result: null };
    expect(askPath({ asOf: '2026-03-01', child: nulls })).toEqual(askPath({ asOf: '2026-03-01', child: bare }));
  });

  it('what is not JSON is refused', () => {
    expect(readPathCase('{').kind).toBe('fault');
  });
});
