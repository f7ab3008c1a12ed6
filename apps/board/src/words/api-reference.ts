/** Words of the reference of the API and of the printed table of who may do what. */
import type { PermissionRow, Reach, Role } from '@weftway/abilities/permission-table';
import { disciplineNames } from '@weftway/team/disciplines';
import { standingNames } from '@weftway/team/standings';

const names: Readonly<Record<string, string>> = {
  ...disciplineNames,
  ...standingNames,
  clinician: 'Any clinician',
  trainee: 'Trainee',
  administrator: 'Administrator',
  auditor: 'Auditor',
};

export const roleWords = (role: Role): string => names[role] ?? role;

const reaches: Readonly<Record<Reach, string>> = {
  team: '',
  assigned: 'children assigned to them',
  'own-lane': 'milestones of their own discipline',
  'own-lane-assigned': 'milestones of their own discipline, of children assigned to them',
  own: 'what is their own',
};

/** "Team coordinator; Any clinician (milestones of their own discipline)" */
export const whoWords = (row: PermissionRow): string[] =>
  Object.entries(row.who).map(([role, reach]) => {
    const word = reaches[reach];
    return word === '' ? roleWords(role as Role) : `${roleWords(role as Role)} (${word})`; // keys of the row's own type
  });

export const apiReferenceWords = {
  title: 'API reference',
  sentence: 'Everything that can be asked of the API, made from the contract that the server and these screens share.',
  loading: 'Loading the reference',
  search: 'Search the operations',
  searchHint: 'A name, a path, a word',
  found: (count: number) => `${String(count)} ${count === 1 ? 'operation' : 'operations'}`,
  nothingFound: 'No operation holds these words.',
  clear: 'Show every operation',
  download: 'Save as OpenAPI 3.1',
  print: 'Print',
  tabs: 'Parts of the reference',
  operations: 'Operations',
  permissions: 'Who may do what',
  whoMay: 'Who may',
  anyone: 'Anyone, also without signing in',
  signedIn: 'Everyone who is signed in',
  row: (action: string, subject: string) => `${action} ${subject}`,
  parameters: 'Parameters',
  body: 'Body',
  answer: (status: string) => `Answer ${status}`,
  problems: 'Problems',
  noBody: 'No body.',
  columns: { name: 'Name', where: 'Where', type: 'What', meaning: 'Meaning', action: 'May', subject: 'On', who: 'Who' },
  required: 'required',
  optional: 'may be left out',
  anything: 'anything',
  text: 'text',
  upTo: (most: number) => `up to ${String(most)} characters`,
  atLeast: (least: number) => `at least ${String(least)}`,
  atMost: (most: number) => `at most ${String(most)}`,
  oneOf: (values: readonly string[]) => `one of ${values.join(', ')}`,
  exactly: (value: string) => `exactly ${value}`,
  listOf: (what: string) => `list of ${what}`,
  either: (parts: readonly string[]) => parts.join(', or '),
  object: 'object',
  formats: { date: 'date, 2026-10-06', 'date-time': 'instant in UTC', email: 'e-mail address' } as Readonly<
    Record<string, string>
  >,
  types: {
    string: 'text',
    integer: 'whole number',
    number: 'number',
    boolean: 'true or false',
    null: 'null',
    object: 'object',
    array: 'list',
  } as Readonly<Record<string, string>>,
  permissionsText:
    'Printed from the one table that the server, the screens and the tests are made from. What is not listed is not allowed.',
  forWhom: 'The reference is for administrators. Ask one of them for a copy.',
  where: { path: 'path', query: 'query', header: 'header' },
} as const;
