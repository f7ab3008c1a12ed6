import { describe, expect, it } from 'vitest';
import { defaultProtocol } from './default-protocol.ts';
import type { MilestoneState } from './milestone-state.ts';
import type { MilestoneRule } from './protocol.ts';
import { claimFaults } from './sign-off-claim.ts';
import type { Claiming } from './sign-off-claim.ts';
import type { Person } from './sign-off-person.ts';

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
const codes = (id: string, who: Person, change: Partial<Claiming> = {}) =>
  claimFaults({
    rule: rule(id),
    part: 'milestone',
    person: who,
    planned: { key: id, state: 'open', waitsFor: [], isLapsed: false },
    holderId: null,
    isPartSigned: false,
    ...change,
  }).map((refusal) => refusal.code);

describe('taking a milestone on', () => {
  it('is open to those who sign it and to those who may claim it', () => {
    expect(codes('TEAM-03', person('nurse'))).toEqual([]);
    expect(codes('TEAM-03', person('surgeon'))).toEqual([]);
    expect(codes('TEAM-03', person('dentist'))).toEqual(['not-your-discipline']);
  });

  it('keeps each half of two signatures with its own discipline', () => {
    expect(codes('ORTH-05', person('orthodontist'), { part: 'readiness' })).toEqual([]);
    expect(codes('ORTH-05', person('surgeon'), { part: 'readiness' })).toEqual(['not-your-discipline']);
    expect(codes('ORTH-05', person('jaw-surgeon'), { part: 'operation' })).toEqual([]);
    expect(codes('ORTH-05', person('orthodontist'), { part: 'operation' })).toEqual(['not-your-discipline']);
    expect(codes('GROW-05', person('dentist'), { part: 'restoration' })).toEqual([]);
  });

  it('is open to a trainee of the discipline, not to other standings', () => {
    expect(codes('SURG-01', { ...person('surgeon'), standing: 'trainee' })).toEqual([]);
    expect(codes('SURG-01', { ...person('surgeon'), standing: 'auditor' })).toEqual(['not-your-discipline']);
  });

  it('is refused while somebody else holds it, not to who holds it already', () => {
    expect(codes('SURG-01', person('surgeon'), { holderId: 'you' })).toEqual(['already-claimed']);
    expect(codes('SURG-01', person('surgeon'), { holderId: 'me' })).toEqual([]);
  });

  it.each([
    ['signed', 'already-signed'],
    ['waived', 'waived'],
    ['transferred', 'transferred'],
  ] as const)('is refused when %s', (state: MilestoneState, code) => {
    expect(
      codes('SURG-01', person('surgeon'), { planned: { key: 'SURG-01', state, waitsFor: [], isLapsed: false } }),
    ).toEqual([code]);
  });

  it('is refused off the path, for a signed part and for a part that does not exist', () => {
    expect(codes('SURG-01', person('surgeon'), { planned: null })).toEqual(['not-on-path']);
    expect(codes('SURG-01', person('surgeon'), { isPartSigned: true })).toEqual(['already-signed']);
    expect(codes('SURG-01', person('surgeon'), { part: 'half' })).toEqual(['unknown-part']);
  });
});
