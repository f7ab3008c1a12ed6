/**
 * What a person is on the team, beside the discipline: clinicians and the coordinator alike are members; what each
 * may sign comes from the discipline.
 */
export const standings = [
  'member',
  'trainee',
  'administrator',
  'auditor',
  'guardian',
  'young-person',
  'referrer',
] as const;

export type Standing = (typeof standings)[number];

export const standingNames: Readonly<Record<Standing, string>> = {
  member: 'Member',
  trainee: 'Trainee',
  administrator: 'Administrator',
  auditor: 'Auditor',
  guardian: 'Parent or guardian',
  'young-person': 'Young person',
  referrer: 'Outside clinician',
};
