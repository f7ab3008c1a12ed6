import { describe, expect, it } from 'vitest';
import { askOne, askPath } from './testing/ask-path.ts';

const oneSided = { dob: '2026-01-15', ga: [39, 2], sex: 'F', code: '•••SHAL' };
const robin = { dob: '2025-05-20', ga: [38, 4], sex: 'F', code: '••hSh••', flags: ['robin'] };

describe('waived gates (ruling 1)', () => {
  const molded = { ...oneSided, done: { 'MOLD-02': ['2026-02-02'], 'MOLD-03': ['2026-02-09'] } };

  it('a waived gate without freshness or result counts as met and does not move the opening', () => {
    const child = { ...molded, waived: { 'MOLD-06': 'stopped early' } };
    expect(askOne('SURG-01', '2026-04-20', child)).toEqual(['due', '2026-03-26', '2026-04-15', '2026-07-15']);
    expect(askOne('SURG-01', '2026-04-20', molded)?.[0]).toBe('blocked');
  });

  it('a waived gate that carries a freshness or a result is never met', () => {
    const child = { ...robin, waived: { 'CARE-03': 'declined' } };
    expect(askOne('SURG-03', '2026-07-01', child)?.[0]).toBe('blocked');
  });

  it('what counts from the event of a waived milestone follows it off the path', () => {
    const noLip = askPath({ asOf: '2026-06-01', child: { ...oneSided, waived: { 'SURG-01': 'left alone' } } });
    expect(noLip['SURG-02']).toEqual(['not_applicable']);
    const ids = ['MOLD-03', 'MOLD-04', 'MOLD-05'];
    const stentOnly = { ...oneSided, trig: { gap_le_5mm: '2026-03-01' }, waived: { 'MOLD-02': 'unsafe' } };
    expect(askOne('MOLD-05', '2026-03-20', { ...stentOnly, flags: ['stent_chosen'] })).toEqual(['not_applicable']);
    const noPlate = askPath({ asOf: '2026-03-01', child: { ...oneSided, waived: { 'MOLD-02': 'unsafe' } }, ask: ids });
    expect(ids.map((id) => noPlate[id])).toEqual([['not_applicable'], ['not_applicable'], ['not_applicable']]);
    const later = ['SPCH-06', 'SPCH-07', 'SPCH-08'];
    const child = { ...oneSided, trig: { vpi_suspected: '2030-01-01' }, waived: { 'SPCH-05': 'declined' } };
    const noWorkUp = askPath({ asOf: '2030-06-01', child, ask: later });
    expect(later.map((id) => noWorkUp[id])).toEqual([['not_applicable'], ['not_applicable'], ['not_applicable']]);
  });

  it('a gate that is not applicable counts as met', () => {
    const child = { ...oneSided, code: '••HSH••' };
    expect(askOne('SURG-03', '2026-11-15', child)?.[0]).toBe('due');
  });

  it('a waiver of a repeating item covers one occurrence and the next counts from its target', () => {
    const child = {
      dob: '2016-05-02',
      ga: [40, 0],
      code: 'L••••••',
      done: { 'TEAM-05': ['2024-06-10'] },
      waived: { 'TEAM-05': 'shared care' },
    };
    expect(askOne('TEAM-05', '2025-07-01', child)).toEqual(['upcoming', '2026-04-10', '2026-06-10', '2026-08-10']);
  });

  it('before its event has come a waived repeating item has no target to count from', () => {
    const child = { ...oneSided, waived: { 'SPCH-07': 'muscle repair only' } };
    for (const day of ['2030-01-01', '2031-01-01']) expect(askOne('SPCH-07', day, child)).toEqual(['waived']);
  });
});

it('closing wins although the window has not opened (ruling 2)', () => {
  const child = { ...oneSided, done: { 'SURG-01': ['2026-12-01'] } };
  expect(askOne('SURG-03', '2027-01-10', child)).toEqual(['closing', '2027-02-23', '2027-02-23', '2027-02-15']);
  expect(askOne('SURG-03', '2026-12-31', child)?.[0]).toBe('upcoming');
});

it('an item past its lapse day stays overdue until answered (ruling 3)', () => {
  const preterm = { ...oneSided, ga: [32, 0] };
  expect(askOne('MOLD-01', '2026-03-12', preterm)?.[0]).toBe('overdue');
  expect(askOne('MOLD-01', '2026-03-13', preterm)?.[0]).toBe('overdue');
  const overtaken = { ...oneSided, trig: { prenatal_referral: '2026-01-10' }, flags: ['prenatal_referral'] };
  expect(askOne('TEAM-01', '2026-01-16', overtaken)?.[0]).toBe('overdue');
});

it('a transferred child keeps its dates and is late nowhere (ruling 4)', () => {
  const child = {
    ...oneSided,
    transferred: '2026-06-01',
    done: { 'TEAM-03': ['2026-01-16'] },
    waived: { 'GEN-01': 'declined' },
  };
  const got = askPath({ asOf: '2026-06-01', child });
  expect(got['EAR-02']).toEqual(['transferred', '2026-02-12', '2026-03-26', '2026-04-15']);
  expect([got['TEAM-03']?.[0], got['GEN-01']?.[0], got['GROW-01']?.[0]]).toEqual([
    'signed_off',
    'waived',
    'not_applicable',
  ]);
  expect(askOne('EAR-02', '2026-05-31', child)?.[0]).toBe('overdue');
});

it('an imported unconfirmed operation awaits sign-off and its clock items compute and wait (ruling 5)', () => {
  const child = { ...oneSided, done: { 'SURG-03': ['2027-01-10'] } };
  const waiting = askPath({ asOf: '2027-04-20', child: { ...child, unverified: ['SURG-03'] } });
  expect(waiting['SURG-03']?.[0]).toBe('awaiting_sign_off');
  expect(waiting['SURG-04']).toEqual(['blocked', '2027-03-07', '2027-04-10', '2027-07-10']);
  expect(waiting['EAR-05']?.[0]).toBe('overdue');
  expect(askPath({ asOf: '2027-04-20', child })['SURG-04']).toEqual(['due', '2027-03-07', '2027-04-10', '2027-07-10']);
});

it('an item whose condition is not recorded is off the path; without its event it is blocked without dates (ruling 19)', () => {
  const nothing = askPath({ asOf: '2027-03-01', child: oneSided });
  expect(['MOLD-02', 'ORTH-03', 'SPCH-06', 'CARE-05'].map((id) => nothing[id])).toEqual(
    Array(4).fill(['not_applicable']),
  );
  expect(askOne('SPCH-06', '2031-03-01', oneSided)).toEqual(['blocked']);
  expect(askOne('GROW-02', '2043-03-01', { ...oneSided, flags: ['jaw_surgery_planned'] })).toEqual(['not_started']);
});

it('freshness reaches forwards from the test: good to 28 August, stale on the 31st (ruling 20)', () => {
  const child = {
    dob: '2016-05-02',
    code: 'LAHS•••',
    roots: [['2026-02-01', '1/2']],
    done: { 'ORTH-02': ['2026-02-01'], 'DENT-02': ['2026-06-01'], 'ORTH-04': ['2026-02-28'] },
  };
  expect(askOne('ORTH-05', '2026-08-28', child)?.[0]).toBe('due');
  expect(askOne('ORTH-05', '2026-08-31', child)?.[0]).toBe('blocked');
});

it('a dated gate counts from the first good result of the present run, a clock from the latest event (ruling 21)', () => {
  const screens = {
    'TEAM-03': ['2026-01-16'],
    'MOLD-01': ['2026-01-17'],
    'CARE-03': ['2026-01-20', '2026-01-25', '2026-02-01'],
  };
  const child = { ...oneSided, done: screens, flags: ['plate_chosen'] };
  expect(askOne('MOLD-02', '2026-02-02', child)?.[1]).toBe('2026-01-20');
  const refused = { ...child, result: { 'CARE-03': { '2026-01-20': 'no' }, safe_for_plate: 'yes' } };
  expect(askOne('MOLD-02', '2026-02-02', refused)?.[1]).toBe('2026-01-20');
  const twice = { ...oneSided, done: { 'MOLD-02': ['2026-02-02', '2026-03-01'] } };
  expect(askOne('MOLD-03', '2026-03-02', twice)).toEqual(['upcoming', '2026-03-03', '2026-03-08', '2026-03-15']);
  const fitted = { ...oneSided, done: { 'MOLD-02': ['2026-02-02', '2026-03-01'], 'MOLD-03': ['2026-02-09'] } };
  expect(askOne('MOLD-03', '2026-03-02', fitted)).toEqual(['signed_off', '2026-02-04', '2026-02-09', '2026-02-16']);
});

it('of a gate with gap and freshness the gap moves the opening and the freshness blocks (ruling 22)', () => {
  const child = { ...oneSided, trig: { vpi_suspected: '2030-01-01' }, done: { 'SPCH-05': ['2030-02-01'] } };
  expect(askOne('SPCH-06', '2030-03-01', child)).toEqual(['window_open', '2030-03-01', '2030-05-01', '2030-08-01']);
  expect(askOne('SPCH-06', '2030-02-15', child)?.[0]).toBe('upcoming');
});

it('a bare refusal of the airway screen means anaesthesia, the plate asks for its own (ruling 26)', () => {
  const done = { 'TEAM-03': ['2026-01-16'], 'MOLD-01': ['2026-01-17'], 'CARE-03': ['2026-01-20'] };
  const child = { ...oneSided, done };
  expect(askOne('MOLD-02', '2026-02-02', { ...child, result: { 'CARE-03': 'no' } })?.[0]).toBe('due');
  expect(askOne('MOLD-02', '2026-02-02', { ...child, result: { safe_for_plate: 'no' } })?.[0]).toBe('blocked');
});

it('an airway problem alone brings the airway screen and its gate before the plate (ruling 25)', () => {
  const child = { dob: '2026-01-15', ga: [39, 0], code: 'LA•••••', flags: ['airway'] };
  expect(askPath({ asOf: '2026-01-20', child })['CARE-03']).toEqual([
    'closing',
    '2026-01-15',
    '2026-01-17',
    '2026-01-22',
  ]);
  const chosen = { ...child, done: { 'TEAM-03': ['2026-01-16'], 'MOLD-01': ['2026-01-17'] } };
  expect(askOne('MOLD-02', '2026-01-30', chosen)?.[0]).toBe('blocked');
});

it('molding counts as started from the plate, not from the impression (ruling 29)', () => {
  const scanned = { ...oneSided, done: { 'MOLD-02': ['2026-02-02'] } };
  const fitted = { ...oneSided, done: { ...scanned.done, 'MOLD-03': ['2026-02-09'] } };
  expect(askPath({ asOf: '2026-04-20', child: fitted })['MOLD-06']?.[0]).toBe('window_open');
  expect(askPath({ asOf: '2026-04-20', child: fitted })['SURG-01']?.[0]).toBe('blocked');
  expect(askPath({ asOf: '2026-04-20', child: scanned })['MOLD-06']).toEqual(['not_applicable']);
  expect(askPath({ asOf: '2026-04-20', child: scanned })['SURG-01']?.[0]).toBe('due');
});

it('a hold shows also while nothing is booked', () => {
  const child = { ...oneSided, flags: ['jaw_surgery_planned'], held: { 'GROW-02': '2043-03-10' } };
  expect(askOne('GROW-02', '2043-03-10', child)).toEqual(['held']);
  expect(askOne('GROW-02', '2043-03-11', child)).toEqual(['not_started']);
});

it('days past the latest date stand beside a hold, which holds through its review date (ruling 38)', () => {
  const child = { ...oneSided, held: { 'EAR-02': '2026-05-10' } };
  expect(askOne('EAR-02', '2026-05-10', child)?.[0]).toBe('held');
  expect(askOne('EAR-02', '2026-05-11', child)?.[0]).toBe('overdue');
});
