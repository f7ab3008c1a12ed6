/**
 * Who signs which milestone of the default protocol, discipline by discipline: common practice of cleft teams.
 * "Alone" includes milestones that either of two disciplines may sign; "with" takes a second discipline.
 */
import { disciplines } from '@weftway/team/disciplines';
import type { Discipline } from '@weftway/team/disciplines';
import { describe, expect, it } from 'vitest';
import { defaultProtocol } from '../../packages/pathway/src/default-protocol.ts';

const records = 'REC-01 REC-02 REC-03 REC-04 REC-05';

const signers: Readonly<Record<Discipline, readonly [alone: string, with_: string]>> = {
  coordinator: ['', `TEAM-05 ${records} ADLT-03`],
  surgeon: [
    'TEAM-01 TEAM-03 TEAM-04 CARE-05 SURG-01 SURG-02 SURG-03 SURG-04 SURG-05 SURG-06 GROW-04',
    'MOLD-06 SPCH-05 SPCH-06 ORTH-05 ORTH-06 GROW-01 GROW-03',
  ],
  'jaw-surgeon': ['', 'ORTH-05 ORTH-06 GROW-01 GROW-03'],
  orthodontist: ['ORTH-01 ORTH-02 ORTH-03 ORTH-04 ORTH-07 ORTH-08 ORTH-09', 'ORTH-05 ORTH-06 GROW-01 GROW-03 GROW-05'],
  'molding-dentist': ['MOLD-01 MOLD-02 MOLD-03 MOLD-04 MOLD-05', 'MOLD-06'],
  'speech-therapist': ['SPCH-01 SPCH-02 SPCH-03 SPCH-04 SPCH-08 GROW-02', 'SPCH-05 SPCH-06'],
  audiologist: ['EAR-01 EAR-02 EAR-03 EAR-05 EAR-06', ''],
  ent: ['CARE-03 EAR-04 EAR-07 SPCH-07', ''],
  paediatrician: ['CARE-03 CARE-04 GEN-02 SPCH-07', ''],
  nurse: ['TEAM-01 TEAM-02 CARE-01 CARE-02 ADLT-01 ADLT-02', ''],
  psychologist: ['PSY-01 PSY-02 ADLT-01 ADLT-02', ''],
  geneticist: ['GEN-01', ''],
  dentist: ['DENT-01 DENT-02', ''],
  prosthodontist: ['GROW-06', 'GROW-05'],
  anaesthetist: ['CARE-04', ''],
};

const signedBy = (discipline: Discipline, signatures: number): string[] =>
  defaultProtocol.milestones
    .filter((rule) => rule.signatures.length === signatures)
    .filter((rule) => rule.signatures.some((part) => part.disciplines.includes(discipline)))
    .map((rule) => rule.id);

const listed = (text: string): string[] => text.split(' ').filter((id) => id !== '');

describe('who signs which milestone', () => {
  it.each(disciplines)('the %s', (discipline) => {
    const [alone, together] = signers[discipline];
    expect(signedBy(discipline, 1).toSorted()).toEqual(listed(alone).toSorted());
    expect(signedBy(discipline, 2).toSorted()).toEqual(listed(together).toSorted());
  });

  it('never lets one discipline give both signatures', () => {
    for (const { id, signatures } of defaultProtocol.milestones) {
      const [first, second] = signatures;
      if (!first || !second) continue;
      expect(
        first.disciplines.filter((discipline) => second.disciplines.includes(discipline)),
        id,
      ).toEqual([]);
    }
  });
});
