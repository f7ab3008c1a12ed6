import { describe, expect, it } from 'vitest';
import { defaultProtocol } from './default-protocol.ts';
import type { PathwayFacts } from './pathway-facts.ts';
import { nextChange, planPathway } from './plan-pathway.ts';
import { childFacts, day, done } from './testing/child-facts.ts';

function planned(key: string, on: string, more: Partial<PathwayFacts> = {}) {
  const plan = planPathway(defaultProtocol, childFacts(more), day(on));
  return plan.milestones.find((one) => one.key === key);
}

describe('what a screen is told about a milestone', () => {
  it('an item whose event has not come is ahead, after its event', () => {
    const review = planned('SURG-02', '2026-03-01');
    expect([review?.state, review?.clinical, review?.window, review?.remark]).toEqual([
      'ahead',
      'blocked',
      null,
      'after:SURG-01',
    ]);
  });

  it('a check before an operation that nobody booked is ahead without dates', () => {
    const baseline = planned('GROW-02', '2026-03-01', { flags: ['jaw_surgery_planned'] });
    expect([baseline?.state, baseline?.clinical, baseline?.window]).toEqual(['ahead', 'not_started', null]);
  });

  it('an item off the path says why', () => {
    const { offPath } = planPathway(defaultProtocol, childFacts({ cleft: '••HSH••' }), day('2026-03-01'));
    expect(offPath.find(({ key }) => key === 'SURG-01')).toEqual({
      key: 'SURG-01',
      id: 'SURG-01',
      clinical: 'not_applicable',
      reason: 'phenotype',
    });
    expect(offPath.find(({ key }) => key === 'CARE-04')?.clinical).toBe('not_started');
  });

  it('a waiting item names what it waits for and what has been met', () => {
    const lip = planned('SURG-01', '2026-04-20', {
      completions: done({ 'MOLD-03': ['2026-02-09'], 'GEN-01': ['2026-03-01'] }),
    });
    expect(lip?.state).toBe('waiting');
    expect(lip?.waitsFor.map(({ milestone, type, cause }) => [milestone, type, cause])).toEqual([
      ['MOLD-06', 'gate', 'not-signed'],
      ['CARE-04:SURG-01', 'check', 'not-signed'],
      ['GEN-01', 'soft', 'met'],
    ]);
  });

  it('a gate that is done too recently is too soon until its gap has passed', () => {
    const review = planned('SURG-02', '2026-05-20', { completions: done({ 'SURG-01': ['2026-05-12'] }) });
    expect(review?.waitsFor[0]).toMatchObject({ milestone: 'SURG-01', cause: 'too-soon', until: '2026-06-09' });
  });

  it('two weekly visits missed are one late item, and the earlier visits stay on the list', () => {
    const visits = planned('MOLD-04', '2026-03-01', {
      flags: ['plate_chosen'],
      completions: done({ 'MOLD-03': ['2026-02-02'], 'MOLD-04': ['2026-02-09', '2026-02-16'] }),
    });
    expect([visits?.state, visits?.occurrence, visits?.daysLate]).toEqual(['late', 3, 3]);
    expect(visits?.past.map(({ on, kind }) => [on, kind])).toEqual([
      ['2026-02-09', 'signed'],
      ['2026-02-16', 'signed'],
    ]);
    expect(visits?.rhythm.slice(0, 2)).toEqual(['2026-03-02', '2026-03-09']);
  });

  it('a first visit in the second band closes the first as missed', () => {
    const screens = planned('PSY-02', '2024-06-01', {
      birth: day('2015-01-15'),
      completions: done({ 'PSY-02': ['2024-02-01'] }),
    });
    expect(screens?.past.map(({ occurrence, kind }) => [occurrence, kind])).toEqual([
      [1, 'missed'],
      [2, 'signed'],
    ]);
    expect(screens?.rhythm).toEqual(['2030-01-15']);
  });

  it('days past the latest date stand beside a hold and a half signature', () => {
    const hold = { milestone: 'EAR-02', on: day('2026-04-10'), reviewOn: day('2026-05-10'), reason: 'ill' };
    const held = planned('EAR-02', '2026-04-20', { holds: [hold] });
    expect([held?.state, held?.daysLate, held?.changesOn]).toEqual(['held', 5, '2026-05-11']);
    const part = { milestone: 'EAR-02', part: 'milestone', on: day('2026-04-10'), kind: 'drafted' } as const;
    const drafted = planned('EAR-02', '2026-04-20', { parts: [part] });
    expect([drafted?.state, drafted?.daysLate]).toEqual(['partly-signed', 5]);
  });

  it('an item past its lapse day carries the mark until it is answered', () => {
    expect(planned('MOLD-01', '2026-03-12')?.isLapsed).toBe(false);
    expect(planned('MOLD-01', '2026-03-13')?.isLapsed).toBe(true);
    const answer = {
      milestone: 'MOLD-01',
      on: day('2026-03-14'),
      reason: 'too late',
      kind: 'not-recoverable',
    } as const;
    const answered = planned('MOLD-01', '2026-03-15', { waivers: [answer] });
    expect([answered?.state, answered?.isLapsed, answered?.remark]).toEqual(['waived', false, 'too late']);
  });
});

describe('facts that other milestones read', () => {
  it('a screen that was refused starts a new run: the gate counts from the first good one after it', () => {
    const screen = (on: string, safe: string) => ({
      milestone: 'CARE-03',
      on: day(on),
      results: { safe_for_plate: safe },
    });
    const screens = [
      screen('2026-01-20', 'yes'),
      screen('2026-01-25', 'no'),
      screen('2026-02-01', 'yes'),
      screen('2026-02-05', 'yes'),
    ];
    const scan = planned('MOLD-02', '2026-02-06', {
      flags: ['plate_chosen'],
      completions: [...done({ 'TEAM-03': ['2026-01-16'], 'MOLD-01': ['2026-01-17'] }), ...screens],
    });
    expect([scan?.window?.earliest, scan?.state]).toEqual(['2026-02-01', 'closing']);
  });

  it('a screen without a result does not count as good', () => {
    const scan = planned('MOLD-02', '2026-02-06', {
      flags: ['plate_chosen'],
      completions: done({ 'TEAM-03': ['2026-01-16'], 'MOLD-01': ['2026-01-17'], 'CARE-03': ['2026-01-20'] }),
    });
    expect(scan?.waitsFor.find(({ milestone }) => milestone === 'CARE-03')?.cause).toBe('result');
  });

  it('a notched gum leaves a question open beside the first orthodontic records', () => {
    expect(planned('ORTH-01', '2032-02-01', { cleft: '•••••*l' })?.remark).toBe('gum-question');
  });
});

describe('reasons', () => {
  it('say which gate moved the opening and by how many days', () => {
    const palate = planned('SURG-03', '2026-09-01', { completions: done({ 'SURG-01': ['2026-08-20'] }) });
    expect(palate?.reasons.earliest.map(({ rule, days, date }) => [rule, days, date])).toEqual([
      ['base-corrected', 0, '2026-01-15'],
      ['span', 273, '2026-10-15'],
      ['gate-moved', 28, '2026-11-12'],
    ]);
    expect(palate?.reasons.earliest[2]?.event).toEqual({ name: 'SURG-01', on: '2026-08-20' });
    expect(palate?.reasons.latest[0]?.source).toMatch(/^Protocol 1, SURG-03/);
  });

  it('say that a birth is estimated, without changing the word', () => {
    const estimated = planned('EAR-02', '2026-03-01', { isBirthEstimated: true });
    expect(estimated?.reasons.latest[1]).toMatchObject({
      rule: 'estimated-birth',
      days: 0,
      note: 'six-months-either-way',
    });
    expect(estimated?.clinical).toBe('window_open');
  });

  it('say that the gestation is unknown where it would correct', () => {
    const lip = planned('SURG-01', '2026-03-01', { gestation: null });
    expect(lip?.reasons.earliest[1]?.note).toBe('gestation-unknown');
  });

  it('are left out when nobody will read them', () => {
    const plan = planPathway(defaultProtocol, childFacts(), day('2026-03-01'), { reasons: false });
    expect(plan.milestones.every(({ reasons, past }) => reasons.earliest.length === 0 && past.length === 0)).toBe(true);
  });
});

describe('the plan as a whole', () => {
  it('knows the next day on which anything changes by itself', () => {
    const plan = planPathway(defaultProtocol, childFacts(), day('2026-01-15'));
    expect(nextChange(plan)).toBe('2026-01-16');
    const none = planPathway(defaultProtocol, childFacts({ transferredOn: day('2026-01-10') }), day('2026-01-15'));
    expect([nextChange(none), none.alarms]).toEqual([null, []]);
  });

  it('before birth counts from the expected date and says so', () => {
    const plan = planPathway(defaultProtocol, childFacts({ birth: null, due: day('2026-04-01') }), day('2026-03-01'));
    expect(plan.base).toEqual({ birth: '2026-04-01', corrected: '2026-04-01', isExpected: true });
    expect(() => planPathway(defaultProtocol, childFacts({ birth: null }), day('2026-03-01'))).toThrow(
      'Neither the date of birth',
    );
  });

  it('a squeezed window raises an alarm with the days that are missing', () => {
    const facts = childFacts({ completions: done({ 'SURG-01': ['2026-12-01'] }) });
    const plan = planPathway(defaultProtocol, facts, day('2026-12-02'));
    expect(plan.alarms.filter(({ name }) => name === 'squeezed').map(({ milestone }) => milestone)).toEqual([
      'SURG-03',
    ]);
    expect(plan.milestones.find(({ key }) => key === 'SURG-03')?.squeezedByDays).toBe(8);
  });
});
