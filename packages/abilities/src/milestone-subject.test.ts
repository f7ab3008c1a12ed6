import { describe, expect, it } from 'vitest';
import { holdersOfPart, partSubject, wholeSubject } from './milestone-subject.ts';

const graft = {
  mayClaim: ['surgeon', 'jaw-surgeon', 'nurse'],
  signatures: [
    { part: 'readiness', disciplines: ['orthodontist'] },
    { part: 'operation', disciplines: ['surgeon', 'jaw-surgeon'] },
  ],
  waiverNeeds: [['surgeon'], ['ent']],
};
const child = { leadClinicianId: 'lea', trainees: ['tom'] };

describe('the permission rules', () => {
  it('give each half to its own signers, and to those who may claim without signing the other half', () => {
    expect(holdersOfPart(graft, 'readiness')).toEqual(['orthodontist', 'nurse']);
    expect(holdersOfPart(graft, 'operation')).toEqual(['surgeon', 'jaw-surgeon', 'nurse']);
  });

  it('read of a part who may claim and sign it, who holds it, and who works with the child', () => {
    expect(partSubject(graft, 'readiness', child, 'ora')).toEqual({
      mayClaim: ['orthodontist', 'nurse'],
      maySign: ['orthodontist'],
      ownerId: 'ora',
      leadClinicianId: 'lea',
      trainees: ['tom'],
    });
    expect(partSubject(graft, 'no-such-part', child, null).maySign).toEqual([]);
  });

  it('read of the whole every signer and everybody who decides a waiver', () => {
    expect(wholeSubject(graft, child).maySign).toEqual(['orthodontist', 'surgeon', 'jaw-surgeon', 'ent']);
    expect(
      wholeSubject({ mayClaim: [], signatures: [{ part: 'milestone', disciplines: ['nurse'] }] }, child).maySign,
    ).toEqual(['nurse']);
  });
});
