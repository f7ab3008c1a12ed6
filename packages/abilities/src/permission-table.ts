/**
 * Who may do what: the one table. CASL abilities, the API's checks, the screens' buttons and the generated role × route
 * test are all made from it; nothing about access is written a second time.
 *
 * The reach of a cell:
 * - `team`: every child of the team;
 * - `assigned`: children that the person is assigned to;
 * - `own-lane`: milestones that one of the person's disciplines may claim or sign;
 * - `own-lane-assigned`: both at once;
 * - `own`: what the person did or holds themselves;
 * - left out: not at all.
 */
import type { Discipline } from '@weftway/team/disciplines';

/** A discipline, any clinical discipline together, or a standing other than member. */
export type Role =
  Discipline | 'clinician' | 'trainee' | 'administrator' | 'auditor' | 'guardian' | 'young-person' | 'referrer';
export type Reach = 'team' | 'assigned' | 'own-lane' | 'own-lane-assigned' | 'own';

export const subjects = [
  'Child',
  'Milestone',
  'Board',
  'MyWork',
  'Team',
  'Protocol',
  'Trail',
  'Import',
  'ApiReference',
] as const;
export type SubjectName = (typeof subjects)[number];

export interface PermissionRow {
  readonly action: string;
  readonly subject: SubjectName;
  /** For the printed page. */
  readonly meaning: string;
  readonly who: Readonly<Partial<Record<Role, Reach>>>;
}

const everyClinician = { clinician: 'own-lane' } as const;

export const permissionTable = [
  {
    action: 'read',
    subject: 'Child',
    meaning: "open a child's record and pathway",
    who: { coordinator: 'team', clinician: 'team', trainee: 'assigned' },
  },
  {
    action: 'register',
    subject: 'Child',
    meaning: 'add a child or an expected child',
    who: { coordinator: 'team', nurse: 'team' },
  },
  {
    action: 'edit',
    subject: 'Child',
    meaning: 'change identity, contacts and alerts',
    who: { coordinator: 'team', nurse: 'team' },
  },
  {
    action: 'edit-cleft',
    subject: 'Child',
    meaning: 'change the cleft code and the diagnosis flags',
    who: { surgeon: 'team', paediatrician: 'team', nurse: 'team', geneticist: 'team' },
  },
  {
    action: 'transfer',
    subject: 'Child',
    meaning: 'record that care moves to another team, or returns',
    who: { coordinator: 'team' },
  },
  {
    action: 'end-care',
    subject: 'Child',
    meaning: 'stop every reminder and list entry at once',
    who: { coordinator: 'team', surgeon: 'team', nurse: 'team' },
  },
  {
    action: 'assign',
    subject: 'Child',
    meaning: 'choose which trainees work with a child',
    who: { coordinator: 'team', clinician: 'team' },
  },
  {
    action: 'move-protocol',
    subject: 'Child',
    meaning: 'move a child to another protocol version',
    who: { coordinator: 'team', surgeon: 'team' },
  },
  {
    action: 'record-finding',
    subject: 'Child',
    meaning: 'record a finding that starts or ends a milestone',
    who: { clinician: 'team' },
  },
  {
    action: 'add-milestone',
    subject: 'Child',
    meaning: 'add a milestone from outside the protocol',
    who: { clinician: 'team' },
  },

  {
    action: 'claim',
    subject: 'Milestone',
    meaning: 'take a milestone on',
    who: { coordinator: 'own-lane', ...everyClinician, trainee: 'own-lane-assigned' },
  },
  {
    action: 'release',
    subject: 'Milestone',
    meaning: 'let a milestone go that one holds',
    who: { coordinator: 'own', clinician: 'own', trainee: 'own' },
  },
  {
    action: 'hand-over',
    subject: 'Milestone',
    meaning: 'give a milestone to a colleague who may hold it',
    who: { coordinator: 'team', clinician: 'own' },
  },
  {
    action: 'draft',
    subject: 'Milestone',
    meaning: 'enter evidence as a draft',
    who: { coordinator: 'own-lane', ...everyClinician, trainee: 'own-lane-assigned' },
  },
  {
    action: 'sign',
    subject: 'Milestone',
    meaning: 'sign a milestone or its half off',
    who: { coordinator: 'own-lane', ...everyClinician },
  },
  {
    action: 'amend',
    subject: 'Milestone',
    meaning: 'amend a signed entry by a further one',
    who: { coordinator: 'own-lane', ...everyClinician },
  },
  { action: 'hold', subject: 'Milestone', meaning: 'pause with a reason and a review date', who: everyClinician },
  { action: 'waive', subject: 'Milestone', meaning: 'record that it will not be done', who: everyClinician },
  {
    action: 'book',
    subject: 'Milestone',
    meaning: 'book, move or take back a date',
    who: { coordinator: 'team', ...everyClinician },
  },
  {
    action: 'confirm',
    subject: 'Milestone',
    meaning: 'confirm an operation done elsewhere',
    who: { surgeon: 'own-lane', 'jaw-surgeon': 'own-lane' },
  },

  {
    action: 'read',
    subject: 'Board',
    meaning: 'see the board of the caseload',
    who: { coordinator: 'team', clinician: 'team', trainee: 'assigned' },
  },
  {
    action: 'read',
    subject: 'MyWork',
    meaning: 'see their own work',
    who: { coordinator: 'team', clinician: 'team', trainee: 'assigned' },
  },
  {
    action: 'read',
    subject: 'Team',
    meaning: 'see who is on the team',
    who: { coordinator: 'team', clinician: 'team', trainee: 'team', administrator: 'team', auditor: 'team' },
  },
  { action: 'manage', subject: 'Team', meaning: 'invite, change and close accounts', who: { administrator: 'team' } },
  {
    action: 'hand-over',
    subject: 'Team',
    meaning: "hand a colleague's open work on",
    who: { coordinator: 'team', administrator: 'team', clinician: 'own', trainee: 'own' },
  },
  {
    action: 'cover',
    subject: 'Team',
    meaning: 'set who covers while somebody is away',
    who: { coordinator: 'team', administrator: 'team', clinician: 'own' },
  },
  {
    action: 'read',
    subject: 'Protocol',
    meaning: 'read the protocol',
    who: { coordinator: 'team', clinician: 'team', trainee: 'team', administrator: 'team', auditor: 'team' },
  },
  {
    action: 'propose',
    subject: 'Protocol',
    meaning: 'keep a new protocol version as a draft',
    who: { clinician: 'team', administrator: 'team' },
  },
  {
    action: 'activate',
    subject: 'Protocol',
    meaning: 'make a protocol version the active one',
    who: { administrator: 'team' },
  },
  {
    action: 'read',
    subject: 'Trail',
    meaning: 'read the audit trail',
    who: { coordinator: 'team', clinician: 'own', administrator: 'team', auditor: 'team' },
  },
  {
    action: 'read-content',
    subject: 'Trail',
    meaning: 'see names and contents in the audit trail',
    who: { coordinator: 'team', clinician: 'own' },
  },
  {
    action: 'verify',
    subject: 'Trail',
    meaning: 'prove the chain of the audit trail',
    who: { coordinator: 'team', administrator: 'team', auditor: 'team' },
  },
  { action: 'run', subject: 'Import', meaning: 'bring a caseload in from a file', who: { coordinator: 'team' } },
  { action: 'read', subject: 'ApiReference', meaning: 'read the reference of the API', who: { administrator: 'team' } },
] as const satisfies readonly PermissionRow[];

export type Action = (typeof permissionTable)[number]['action'];
