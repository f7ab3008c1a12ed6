import { plainDate } from '@weftway/calendar/plain-date';
import { describe, expect, it } from 'vitest';
import { defaultProtocol } from './default-protocol.ts';
import type { MilestoneRule } from './protocol.ts';
import { holdFaults } from './sign-off-hold.ts';
import type { Holding } from './sign-off-hold.ts';
import type { Person } from './sign-off-person.ts';
import { familyChoice, waiveFaults, waiverReasons } from './sign-off-waive.ts';
import type { Waiving } from './sign-off-waive.ts';

const today = plainDate('2026-12-01');
const rule = (id: string): MilestoneRule => {
  const found = defaultProtocol.milestones.find((candidate) => candidate.id === id);
  if (!found) throw new Error(`No milestone ${id}.`);
  return found;
};
const person = (...disciplines: Person['disciplines']): Person => ({
  id: 'me',
  name: 'Me',
  standing: 'member',
  disciplines,
  isLeadClinician: false,
});
const open = { key: 'x', state: 'open', waitsFor: [], isLapsed: false } as const;

const waive = (id: string, who: Person, change: Partial<Waiving> = {}) =>
  waiveFaults({
    rule: rule(id),
    planned: open,
    person: who,
    second: null,
    kind: 'waived',
    reason: rule(id).waivedWhen[0] ?? familyChoice,
    offerAgainOn: null,
    today,
    ...change,
  }).map((refusal) => refusal.code);

describe('waiving', () => {
  it('is for a clinician who could sign it, and takes a reason of the protocol', () => {
    expect(waive('ORTH-08', person('orthodontist'))).toEqual([]);
    expect(waive('ORTH-08', person('coordinator'))).toEqual(['not-your-discipline']);
    expect(waive('ORTH-08', { ...person('orthodontist'), standing: 'trainee' })).toEqual(['not-your-discipline']);
    expect(waive('ORTH-08', person('orthodontist'), { reason: 'No time' })).toEqual(['reason-not-listed']);
    expect(waive('ORTH-08', person('orthodontist'), { reason: '' })).toEqual(['reason-missing']);
  });

  it('is not for the coordinator even where the coordinator signs', () => {
    expect(waive('REC-01', person('coordinator'))).toEqual(['not-your-discipline']);
    expect(waive('REC-01', { ...person('dentist'), isLeadClinician: true })).toEqual([]);
  });

  it('by family choice is offered again, except what is elective', () => {
    expect(waive('ORTH-08', person('orthodontist'), { reason: familyChoice })).toEqual(['offer-again-needed']);
    expect(waive('ORTH-08', person('orthodontist'), { reason: familyChoice, offerAgainOn: today })).toEqual([
      'offer-again-not-ahead',
    ]);
    expect(
      waive('ORTH-08', person('orthodontist'), { reason: familyChoice, offerAgainOn: plainDate('2027-12-01') }),
    ).toEqual([]);
    expect(waive('GROW-04', person('surgeon'), { reason: familyChoice })).toEqual([]);
    expect(waiverReasons(rule('CARE-04'))).toEqual([familyChoice]);
  });

  it('of palate repair takes the surgeon and a paediatrician or ear-nose-throat doctor', () => {
    const needed = ['second-discipline-needed'];
    expect(waive('SURG-03', person('surgeon'))).toEqual(needed);
    expect(waive('SURG-03', person('surgeon'), { second: { id: 'you', disciplines: ['dentist'] } })).toEqual(needed);
    expect(waive('SURG-03', person('surgeon'), { second: { id: 'you', disciplines: ['ent'] } })).toEqual([]);
    expect(waive('SURG-03', person('paediatrician'), { second: { id: 'you', disciplines: ['surgeon'] } })).toEqual([]);
    expect(waive('SURG-03', person('surgeon', 'ent'))).toEqual(needed);
    expect(
      waive('SURG-03', person('surgeon', 'ent'), { second: { id: 'me', disciplines: ['surgeon', 'ent'] } }),
    ).toEqual(needed);
  });

  it('says which discipline is lacking', () => {
    const [refusal] = waiveFaults({
      rule: rule('SURG-03'),
      planned: open,
      person: person('paediatrician'),
      second: null,
      kind: 'waived',
      reason: 'Airway too unsafe',
      offerAgainOn: null,
      today,
    });
    expect(refusal?.message).toBe('This takes a second decision, by: surgeon.');
  });

  it('is refused when it is done or not on the path', () => {
    expect(waive('ORTH-08', person('orthodontist'), { planned: { ...open, state: 'signed' } })).toEqual([
      'already-signed',
    ]);
    expect(waive('ORTH-08', person('orthodontist'), { planned: null })).toEqual(['not-on-path']);
  });
});

describe('a chance that has ended', () => {
  it('is closed with a reason in own words, but only once it has ended', () => {
    const molder = person('molding-dentist');
    const late = { ...open, state: 'late', isLapsed: true } as const;
    expect(
      waive('MOLD-01', molder, { kind: 'not-recoverable', reason: 'First seen at ten weeks', planned: late }),
    ).toEqual([]);
    expect(waive('MOLD-01', molder, { kind: 'not-recoverable', reason: ' ', planned: late })).toEqual([
      'reason-missing',
    ]);
    expect(waive('MOLD-01', molder, { kind: 'not-recoverable', reason: 'Busy' })).toEqual(['not-lapsed']);
  });
});

describe('holding', () => {
  const hold = (who: Person, change: Partial<Holding> = {}) =>
    holdFaults({
      rule: rule('SURG-01'),
      planned: open,
      person: who,
      reason: 'Chest infection',
      reviewOn: plainDate('2026-12-15'),
      today,
      ...change,
    }).map((refusal) => refusal.code);

  it('takes a clinician of the milestone, a reason and a day of review that lies ahead', () => {
    expect(hold(person('surgeon'))).toEqual([]);
    expect(hold(person('nurse'))).toEqual(['not-your-discipline']);
    expect(hold(person('surgeon'), { reason: '' })).toEqual(['reason-missing']);
    expect(hold(person('surgeon'), { reviewOn: today })).toEqual(['review-not-ahead']);
    expect(hold(person('surgeon'), { planned: { ...open, state: 'waived' } })).toEqual(['waived']);
  });
});
