/**
 * The closed list of disciplines on a cleft team.
 * A member may hold several (an orthodontist who also molds holds two).
 */
export const disciplines = [
  'coordinator',
  'surgeon',
  'jaw-surgeon',
  'orthodontist',
  'molding-dentist',
  'speech-therapist',
  'audiologist',
  'ent',
  'paediatrician',
  'nurse',
  'psychologist',
  'geneticist',
  'dentist',
  'prosthodontist',
  'anaesthetist',
] as const;

export type Discipline = (typeof disciplines)[number];

/** What each discipline is called on screen. */
export const disciplineNames: Readonly<Record<Discipline, string>> = {
  coordinator: 'Team coordinator',
  surgeon: 'Cleft surgeon',
  'jaw-surgeon': 'Jaw surgeon',
  orthodontist: 'Orthodontist',
  'molding-dentist': 'Molding dentist',
  'speech-therapist': 'Speech and language therapist',
  audiologist: 'Audiologist',
  ent: 'Ear, nose and throat doctor',
  paediatrician: 'Paediatrician',
  nurse: 'Cleft nurse',
  psychologist: 'Psychologist or social worker',
  geneticist: 'Geneticist',
  dentist: "Children's dentist",
  prosthodontist: 'Prosthodontist',
  anaesthetist: 'Anaesthetist',
};
