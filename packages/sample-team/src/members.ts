/** The Tern Estuary Cleft Team: invented people. `since` and `until` are days before the day of the seed. */
import type { Discipline } from '@weftway/team/disciplines';

export interface SampleMember {
  readonly id: string;
  readonly name: string;
  readonly standing: 'member' | 'trainee' | 'administrator' | 'auditor';
  readonly disciplines: readonly Discipline[];
  readonly supervisorId: string | null;
  /** Days ago on which this person left; null: still here. */
  readonly leftDaysAgo: number | null;
  readonly isOnlyInvited?: boolean;
}

const member = (id: string, name: string, ...disciplines: Discipline[]): SampleMember => ({
  id,
  name,
  standing: 'member',
  disciplines,
  supervisorId: null,
  leftDaysAgo: null,
});

export const sampleMembers: readonly SampleMember[] = [
  { ...member('m-marguerite-thole', 'Marguerite Thole', 'surgeon'), leftDaysAgo: 2300 },
  { ...member('m-edmund-pryce', 'Edmund Pryce', 'speech-therapist'), leftDaysAgo: 1500 },
  { ...member('m-sunniva-lund', 'Sunniva Lund', 'dentist'), leftDaysAgo: 64 },
  member('m-ruth-alder', 'Ruth Alder', 'coordinator'),
  member('m-obed-nkansah', 'Obed Nkansah', 'surgeon'),
  member('m-mireille-aubert', 'Mireille Aubert', 'surgeon'),
  member('m-casimir-holt', 'Casimir Holt', 'jaw-surgeon'),
  member('m-ines-calder', 'Ines Calder', 'orthodontist', 'molding-dentist'),
  member('m-tobias-renn', 'Tobias Renn', 'orthodontist'),
  member('m-yuki-sandoval', 'Yuki Sandoval', 'molding-dentist'),
  member('m-shirin-vaziri', 'Shirin Vaziri', 'speech-therapist'),
  member('m-hana-dvorak', 'Hana Dvořák', 'speech-therapist'),
  member('m-amos-tettey', 'Amos Tettey', 'audiologist'),
  member('m-piet-hollander', 'Piet Hollander', 'ent'),
  member('m-wen-zhao', 'Wen Zhao', 'paediatrician'),
  member('m-fergus-boyle', 'Fergus Boyle', 'nurse'),
  member('m-delyth-rowan', 'Delyth Rowan', 'nurse'),
  member('m-joan-tarrow', 'Joan Tarrow', 'psychologist'),
  member('m-lakshmi-perera', 'Lakshmi Perera', 'geneticist'),
  member('m-noor-castellan', 'Noor Castellan', 'dentist'),
  member('m-ivar-brandt', 'Ivar Brandt', 'prosthodontist'),
  member('m-leila-farrow', 'Leila Farrow', 'anaesthetist'),
  { ...member('m-pavel-novak', 'Pavel Novák', 'surgeon'), standing: 'trainee', supervisorId: 'm-obed-nkansah' },
  { ...member('m-gwen-osei', 'Gwen Osei', 'speech-therapist'), standing: 'trainee', supervisorId: 'm-shirin-vaziri' },
  { ...member('m-alma-quist', 'Alma Quist'), standing: 'administrator' },
  { ...member('m-basil-thorne', 'Basil Thorne'), standing: 'auditor' },
  { ...member('m-rhys-callow', 'Rhys Callow', 'audiologist'), isOnlyInvited: true },
];

/** `obed.nkansah@tern-estuary.example` */
export const emailOf = (one: SampleMember): string => `${one.id.slice(2).replace('-', '.')}@tern-estuary.example`;

/** Members who could do it on a day, `daysAgo` before the seed; those who left do not count after they left. */
export const membersWith = (wanted: readonly string[], daysAgo: number): readonly SampleMember[] => {
  const able = sampleMembers.filter(
    (one) =>
      one.standing === 'member' && one.isOnlyInvited !== true && one.disciplines.some((held) => wanted.includes(held)),
  );
  const then = able.filter((one) => (one.leftDaysAgo === null ? true : daysAgo > one.leftDaysAgo));
  const former = then.filter((one) => one.leftDaysAgo !== null);
  return former.length > 0 ? former : then;
};
