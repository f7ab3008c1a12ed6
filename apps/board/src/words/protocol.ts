/** Words of the protocol: versions, rules, differences, proposals, activation. */
import type { z } from 'zod';
import type { Condition } from '@weftway/pathway/condition';
import type { clockSchema, Signer, windowRuleSchema } from '@weftway/pathway/protocol';
import { disciplineNames } from '@weftway/team/disciplines';
import { findingWords } from './findings.ts';
import { spanInWords } from './reasons.ts';

type Clock = z.infer<typeof clockSchema>;
type WindowRule = z.infer<typeof windowRuleSchema>;
/** Title of a milestone by its id. */
export type TitleOf = (id: string) => string;

/** Names of people keep their capital. */
const lower = (text: string): string =>
  /^([A-Z][A-Z0-9]|Robin|Stickler)/.test(text) ? text : text.charAt(0).toLowerCase() + text.slice(1);

const joined = (parts: readonly string[], word: string): string =>
  parts.length < 2 ? (parts[0] ?? '') : `${parts.slice(0, -1).join(', ')} ${word} ${parts.at(-1) ?? ''}`;

/** Facts about a child that are no finding. */
const facts: Readonly<Record<string, string>> = {
  lip: 'cleft of the lip',
  gum: 'cleft of the gum',
  palate: 'cleft of the palate',
  lip_complete: 'complete cleft of the lip',
  gum_notched: 'notched gum',
  sex_male: 'boy',
  molding_team: 'the team offers molding',
  graft_done: 'bone graft done',
  speech_surgery_done: 'speech surgery done',
  root_at_quarter: 'canine root at a quarter',
};

const factWords = (name: string, titleOf: TitleOf): string =>
  name.startsWith('signed:') ? `“${titleOf(name.slice(7))}” is signed` : (facts[name] ?? lower(findingWords(name)));

/** "cleft of the lip and not (breathing problem or syndrome found)" */
export const conditionWords = (condition: Condition, titleOf: TitleOf, isInner = false): string => {
  if (typeof condition === 'string') return factWords(condition, titleOf);
  if ('not' in condition) return `not ${conditionWords(condition.not, titleOf, true)}`;
  const [list, word] = 'all' in condition ? [condition.all, 'and'] : [condition.any, 'or'];
  const text = joined(
    list.map((one) => conditionWords(one, titleOf, true)),
    word,
  );
  return isInner && list.length > 1 ? `(${text})` : text;
};

export const clockWords = (clock: Clock, titleOf: TitleOf): string => {
  switch (clock.from) {
    case 'birth':
      return 'birth';
    case 'corrected':
      return 'birth, corrected for an early birth';
    case 'referral':
      return 'the referral';
    case 'prenatal-referral':
      return 'the referral before birth';
    case 'event':
      return `the day “${titleOf(clock.milestone)}” is done`;
    case 'booking':
      return `the day booked for “${titleOf(clock.milestone)}”`;
    case 'finding':
      return `the day this is found: ${lower(findingWords(clock.finding))}`;
    case 'operation-booked':
      return 'the day booked for each operation';
    case 'operation-done':
      return 'the day of each operation';
  }
};

/** "9 months", "30 days before" */
export const spanWords = (span: string): string =>
  span.startsWith('-') ? `${spanInWords(span)} before` : spanInWords(span);

export const windowWords = (window: WindowRule): string =>
  `opens ${spanWords(window.earliest)}, aim ${spanWords(window.target)}, closes ${spanWords(window.latest)}`;

export const signerWords = (signer: Signer): string =>
  signer === 'lead-clinician' ? 'Lead clinician' : disciplineNames[signer];

export const signersWords = (signers: readonly Signer[]): string => joined(signers.map(signerWords), 'or');

const counted = (count: number, unit: string, units = `${unit}s`): string =>
  `${String(count)} ${count === 1 ? unit : units}`;

export const protocolWords = {
  title: 'Protocol',
  sentence: 'Every rule of the pathway, as data. A version never changes; a change is a new version.',
  loading: 'Loading the protocol',
  failed: 'The protocol did not come',
  statuses: { draft: 'Draft', active: 'Active', retired: 'Retired' },
  versions: 'Versions',
  columns: {
    version: 'Version',
    status: 'Status',
    changes: 'What changed',
    made: 'Made',
    active: 'Active since',
    agreed: 'Agreed by',
    children: 'Children',
  },
  versionName: (version: number) => `Version ${String(version)}`,
  madeBy: (on: string, by: string) => `${on}, ${by}`,
  compare: 'What changed between two versions',
  compareFrom: 'From',
  compareTo: 'To',
  compareOption: (version: number, status: string) => `Version ${String(version)}, ${status.toLowerCase()}`,
  noDifference: 'These two versions have the same rules.',
  onlyOne: 'There is one version so far, so there is nothing to compare.',
  differences: (count: number) => counted(count, 'part differs', 'parts differ'),
  settingsPart: 'Settings of the team',
  sourcesPart: 'Sources',
  added: 'New in this version',
  removed: 'No longer there',
  was: 'was',
  is: 'now',
  toVersion: 'Read the version',
  propose: 'Propose a change',
  proposeFrom: 'Change this version',
  cannotPropose: 'Clinicians and administrators propose changes.',
  facts: (milestones: number, lanes: number) => `${counted(milestones, 'milestone')} in ${counted(lanes, 'lane')}`,
  followedBy: (count: number) => `${counted(count, 'child follows', 'children follow')} it`,
  search: 'Search the rules',
  searchHint: 'A name, an id such as SURG-03, a discipline, a record field',
  found: (count: number, all: number) =>
    count === all ? `${String(all)} milestones` : `${String(count)} of ${String(all)} milestones`,
  nothingFound: 'No rule holds these words.',
  clearSearch: 'Show all rules',
  openAll: 'Open all rules',
  closeAll: 'Close all rules',
  print: 'Print',
  settings: 'Settings of the team',
  offersMolding: (offers: boolean) => (offers ? 'The team offers molding.' : 'The team does not offer molding.'),
  moldingClock: (clock: string) =>
    `Molding is counted from birth${clock === 'corrected' ? ', corrected for an early birth' : ''}.`,
  graftBounds: (lower_: string, upper: string) =>
    `The bone graft is done while the canine root is between ${lower_} and ${upper} of its length.`,
  sources: 'Sources',
  commonPractice: 'Common practice',
  commonPracticeNote:
    'Where no source is named, and for every closing, catch-up and freshness time, the number is common practice: agree it in the team.',
  notAdvice: 'Local protocols and licensed clinicians decide.',
  kinds: { core: 'core', conditional: 'conditional', elective: 'offer' },
  signedBy: (who: string) => `signed by ${who}`,
  countedFrom: (what: string) => `counted from ${what}`,
  permalink: (title: string) => `Link to ${title}`,
  rule: {
    name: 'Name',
    plain: 'In plain words',
    lane: 'Lane',
    kind: 'Kind',
    counted: 'Counted from',
    opens: 'Opens',
    aim: 'Aim',
    closes: 'Closes',
    closing: 'Closing',
    forWhom: 'For whom',
    variants: 'Other windows',
    gates: 'Must be done first',
    checks: 'Asked for at signing',
    soft: 'Would be good to have',
    repeats: 'Comes again',
    catchUp: 'For a late arrival',
    lapse: 'The chance ends',
    claims: 'Who may hold it',
    signs: 'Who signs',
    evidence: 'Record before signing',
    raises: 'Findings it raises',
    waived: 'Waived when',
    late: 'If it is late',
    moves: 'Moves',
    details: 'Also',
    sources: 'Sources',
  },
  everyChild: 'Every child.',
  lastDays: (days: number) => (days === 0 ? 'No closing part' : `The last ${counted(days, 'day')}`),
  variant: (when: string, window: string, note: string) => `For ${when}: ${window}. ${note}`,
  gap: (span: string) => `then ${spanInWords(span)} to pass`,
  fresh: (span: string) => `not older than ${spanInWords(span)}`,
  demand: (field: string, values: readonly string[]) => `with “${field}”: ${joined(values, 'or')}`,
  onPath: (when: string) => `On the path with ${when}.`,
  onlyWhen: (when: string) => `only with ${when}`,
  secondName: 'passed over only with the name of a second clinician',
  repeatAgain: (window: string) => `each time ${window} after the last`,
  repeatAge: (window: string) => `by age: ${window}`,
  repeatClock: (window: string, clock: string) => `${window}, counted from ${clock}`,
  agesBetween: (from: string | null, to: string | null) =>
    from === null && to === null
      ? ''
      : from === null
        ? `until ${spanInWords(to ?? '')} of age`
        : to === null
          ? `from ${spanInWords(from)} of age`
          : `from ${spanInWords(from)} to ${spanInWords(to)} of age`,
  until: (what: readonly string[]) => `until ${joined(what, 'or')}`,
  catchUp: (target: number, latest: number) =>
    `Aim ${counted(target, 'day')} after joining the team, at the latest ${counted(latest, 'day')}`,
  noCatchUp: 'Cannot be made up',
  lapses: (after: string) => (after === 'birth' ? 'With the birth' : `${spanInWords(after)} after its latest date`),
  signature: (label: string, meaning: string, who: string) => `${label}: ${who}, “${meaning}”`,
  field: (label: string, detail: string) => (detail === '' ? label : `${label} (${detail})`),
  fieldKinds: {
    text: '',
    'long-text': '',
    number: 'number',
    'yes-no': 'yes or no',
    choice: '',
    date: 'date',
    grade: '0 to 3',
    'root-stage': 'root stage',
  } as Readonly<Record<string, string>>,
  likely: (low: number, high: number) => `likely ${String(low)} to ${String(high)}`,
  privateField: 'for the signing disciplines only',
  raise: (finding: string, field: string, values: readonly string[]) =>
    `${findingWords(finding)}, when “${field}” is ${joined(values, 'or')}`,
  waiverNeeds: (groups: readonly string[]) => `A waiver needs ${joined(groups, 'and')}`,
  familyChoice: 'Family choice',
  details: {
    perSide: 'Once for each cleft side',
    isOperation: 'Is an operation',
    followsRoot: 'Follows the canine root',
  },
  activate: {
    open: 'Make this version active',
    title: (version: number) => `Make version ${String(version)} active`,
    text: 'New children follow it from now on. Children on the path stay with their version unless you move them.',
    agreedBy: 'Clinical lead who agreed',
    reason: 'Why',
    move: (count: number) => `Move the children in care who follow another version (up to ${String(count)})`,
    moveHint:
      'Their open windows are worked out anew and say that this version moved them. What is signed stays as it was signed.',
    noMove: 'Every child in care follows this version already.',
    password: 'Your password',
    save: (version: number) => `Make version ${String(version)} active`,
    done: (version: number) => `Version ${String(version)} is the active one`,
    onlyAdministrator: 'An administrator makes a version active, once a clinical lead has agreed.',
    agreedMissing: 'Name the clinical lead who agreed.',
    reasonMissing: 'Say why, in a few words.',
    passwordMissing: 'Write your password.',
  },
  proposal: {
    title: 'Propose a change',
    sentence: (version: number) =>
      `Starts from version ${String(version)}. Nothing changes for any child until an administrator makes the new version active.`,
    how: 'How to change it',
    form: 'Common numbers',
    file: 'Whole file',
    name: 'Name of the protocol',
    settings: 'Settings of the team',
    offersMolding: 'The team offers molding',
    rootLower: 'Graft from this root length',
    rootUpper: 'Graft until this root length',
    oneMilestone: 'Numbers of one milestone',
    milestone: 'Milestone to change',
    milestoneHint: 'Type a name or an id',
    chooseFirst: 'Choose a milestone, and its numbers stand here.',
    window: 'Window',
    earliest: 'Opens',
    target: 'Aim',
    latest: 'Closes',
    closing: 'Closing days',
    variant: (when: string) => `Window for ${when}`,
    repeat: (count: number) => `Comes again, rule ${String(count)}`,
    gaps: 'What comes first',
    gapAfter: (title: string) => `Gap after ${title}`,
    freshness: (title: string) => `How long ${title} stays good`,
    catchUp: 'For a late arrival',
    catchTarget: 'Aim, days after joining',
    catchLatest: 'Latest, days after joining',
    days: 'days',
    noSpan: 'none',
    spanHint: 'Such as 10w, 3m, 2y6m or -30d',
    spanError: (typed: string) => `“${typed}” is not a span. Write it like 10w, 3m, 2y6m or -30d.`,
    changesTitle: 'Your changes so far',
    noChanges: 'Nothing changed yet.',
    takeBack: 'Take back',
    takeBackOf: (title: string) => `Take back the changes to ${title}`,
    text: 'The protocol as a file (JSON)',
    textHint: 'Everything can be changed here: rules, records, signatures, sources.',
    upload: 'Load a file',
    download: 'Save as a file',
    notJson: (line: number) => `This is not readable JSON; it stops at line ${String(line)}.`,
    formNeedsFile: 'The file has faults; put them right first.',
    check: 'Check for faults',
    checked: 'No faults found.',
    faults: (count: number) => counted(count, 'fault to put right', 'faults to put right'),
    atLine: (line: number) => `line ${String(line)}`,
    whole: 'The whole protocol',
    why: 'What changes, in a sentence',
    whyHint: 'Stands in the list of versions.',
    whyMissing: 'Say what changed.',
    save: 'Keep as a draft',
    saved: (version: number) => `Version ${String(version)} is kept as a draft`,
    notYetChanges: 'Nothing is changed yet.',
    notYetFaults: 'Put the faults right first.',
    forWhom: 'Clinicians and administrators propose changes to the protocol.',
  },
} as const;
