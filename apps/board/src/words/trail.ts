/** Words of the audit trail: filters, lines, what stood before and after, the proof. */
import { eventKindNames, eventKinds } from '@weftway/contract/trail';

/** What is read of a child, by the name of the operation. */
const readNames: Readonly<Record<string, string>> = {
  readChild: 'Record read',
  readPathway: 'Pathway read',
  listChildChanges: 'History of the record read',
  readTrail: 'Audit trail of the child read',
  readSigningSheet: 'Signing sheet read',
  askWhatIf: 'What-if asked',
};

const refusedSuffix = ' refused';

/** `signMilestone` as words, for operations that are met only when they are refused. */
const spelled = (operation: string): string => operation.replace(/([a-z])([A-Z])/g, '$1 $2').toLowerCase();

export const kindOptions = (log: 'changes' | 'reads'): { readonly value: string; readonly label: string }[] =>
  (log === 'changes'
    ? eventKinds.map((kind) => ({ value: kind as string, label: eventKindNames[kind] }))
    : [...Object.entries(readNames), ['refused', 'Anything refused'] as const].map(([value, label]) => ({
        value,
        label,
      }))
  ).sort((a, b) => a.label.localeCompare(b.label));

export const readWords = (operation: string): string | undefined => {
  if (!operation.endsWith(refusedSuffix)) return readNames[operation];
  const asked = operation.slice(0, -refusedSuffix.length);
  return `Refused: ${(readNames[asked] ?? spelled(asked)).toLowerCase()}`;
};

/** Names of what a line holds, where taking the code's name apart is not enough. */
const fieldNames: Readonly<Record<string, string>> = {
  agreedBy: 'Clinical lead who agreed',
  bornOn: 'Born on',
  dueOn: 'Expected on',
  isBirthEstimated: 'Birth date is an estimate',
  isCleftProvisional: 'Cleft code is provisional',
  cleft: 'Cleft (LAHSHAL)',
  leadClinicianId: 'Lead clinician',
  supervisorId: 'Supervisor',
  memberId: 'Member',
  memberIds: 'Trainees',
  byId: 'Covered by',
  draftedById: 'Drafted by',
  draftedByName: 'Drafted by',
  signerName: 'Signed by',
  signerRole: 'As',
  performedOn: 'Done on',
  isReady: 'Ready to be signed',
  isUnverified: 'Not confirmed yet',
  secondName: 'Decided with',
  offerAgainOn: 'Offered again on',
  protocolVersion: 'Protocol version',
  occurrence: 'Number',
  because: 'Because',
  sessions: 'Sessions',
  part: 'Part',
  on: 'On',
  from: 'From',
  to: 'To',
  until: 'Until',
  zone: 'Time zone',
  moved: 'Windows moved',
  milestones: 'Milestones in it',
  overrides: 'Checks passed over',
  amends: 'Amends the entry',
  emptyBecause: 'left empty because',
};

/** Values that are words of the code. */
export const valueNames: Readonly<Record<string, string>> = {
  'signed-out': 'signed out',
  'ended-elsewhere': 'ended from another browser',
  'too-many': 'the oldest of too many sessions',
  password: 'a new password',
  'account-changed': 'an administrator changed the account',
  left: 'left the team',
};

/** `isBirthEstimated`, `gap_mm`, `family-name` as words. */
export const fieldWords = (name: string): string => {
  const known = fieldNames[name];
  if (known !== undefined) return known;
  if (/^\d+$/.test(name)) return String(Number(name) + 1);
  const text = name
    .replace(/Id$/, '')
    .replace(/[-_]/g, ' ')
    .replace(/([a-z])([A-Z])/g, '$1 $2')
    .toLowerCase();
  return text.charAt(0).toUpperCase() + text.slice(1);
};

const counted = (count: number, unit: string): string =>
  `${count.toLocaleString('en-GB')} ${unit}${count === 1 ? '' : 's'}`;

export const trailWords = {
  title: 'Audit trail',
  sentence: 'Every change, and everyone who looked, in chains that cannot be altered unseen.',
  ownOnly: 'You see what you did yourself.',
  noContents: 'You see who did what and when, without names of children and without contents.',
  loading: 'Loading the audit trail',
  log: 'Which log',
  changes: 'Changes',
  reads: 'Reads and refusals',
  filters: 'Narrow the trail',
  child: 'Child',
  childHint: 'A name or a record number',
  member: 'Member',
  memberAll: 'Everyone',
  kind: 'What happened',
  kindRead: 'What was read',
  kindAll: 'Everything',
  from: 'From',
  to: 'Until',
  clear: 'Show everything',
  onlyChild: (name: string) => `Only lines about ${name}`,
  thisChild: 'this child',
  onlyThisChild: 'Only this child',
  columns: { when: 'When', what: 'What', child: 'Child', who: 'Who', line: 'Line' },
  aChild: 'A child',
  nobody: 'Nobody signed in',
  show: (what: string, line: number) => `Show line ${String(line)}: ${what}`,
  older: 'Show older lines',
  shown: (count: number) => `${counted(count, 'line')} shown`,
  end: 'This is the beginning of the trail.',
  empty: 'No line fits.',
  emptyReads: 'Nobody has looked at a record yet, and nothing was refused.',
  before: 'Before',
  after: 'After',
  nothing: 'nothing',
  yes: 'yes',
  no: 'no',
  contentsHidden: 'The contents are for the coordinator and for those who did it.',
  noContent: 'This line holds nothing more.',
  nothingChanged: 'Nothing is different from before.',
  reference: (request: string) => `Request ${request}`,
  hash: (hash: string) => `Hash ${hash.slice(0, 16)}…`,
  verify: 'Verify the chain',
  verifying: 'Proving every line',
  holds: 'The chain holds',
  holdsText: (changes: number, reads: number) =>
    `${counted(changes, 'line')} of changes and ${counted(reads, 'line')} of reads were proved: none is missing, altered or out of place.`,
  broken: 'The chain is broken',
  brokenLog: (log: 'changes' | 'reads', line: number) =>
    line === 0 ? `In the log of ${log}:` : `In the log of ${log}, at line ${String(line)}:`,
  brokenText: 'Tell your administrator at once. Do not restore or repair anything before the files are copied.',
  verifyNotYours: 'The coordinator, an administrator or an auditor can verify it.',
} as const;
