/** Words of a child's page: head, ruler, list, what moved, what-if, history, findings, print. */
import { daysBetween, type PlainDate } from '@weftway/calendar/plain-date';
import { milestoneStateNames } from '@weftway/pathway/milestone-state';
import type { PlannedMilestone } from '@weftway/pathway/pathway-plan';
import { formatSpan } from './dates.ts';
import { findingWords } from './findings.ts';
import { shiftInWords, type Which } from './reasons.ts';

const relations: Readonly<Record<string, string>> = {
  mother: 'mother',
  father: 'father',
  parent: 'parent',
  'foster-carer': 'foster carer',
  guardian: 'guardian',
  other: 'contact',
};

/** "opened 19 days ago, 18 months left" */
export const windowLine = (planned: PlannedMilestone, today: PlainDate): string => {
  const { window, daysLate, squeezedByDays } = planned;
  if (window === null) return remarkText(planned.remark);
  if (squeezedByDays !== null) return `squeezed: opens ${formatSpan(squeezedByDays)} after its latest date`;
  if (daysLate > 0) return `${formatSpan(daysLate)} late`;
  const opens = daysBetween(today, window.earliest);
  if (opens > 0) return `opens in ${formatSpan(opens)}`;
  const left = daysBetween(today, window.latest);
  const opened = opens === 0 ? 'opened today' : `opened ${formatSpan(opens)} ago`;
  if (left < 0) return `closed ${formatSpan(left)} ago`;
  return left === 0 ? `${opened}, last day today` : `${opened}, ${formatSpan(left)} left`;
};

/** Why there are no dates yet. */
export const remarkText = (remark: string | null, titleOf: (key: string) => string = (key) => key): string => {
  if (remark === null) return 'no dates yet';
  if (!remark.startsWith('after:')) return remark;
  const name = remark.slice('after:'.length);
  if (/^[A-Z]{3,5}-\d/.test(name)) return `dates come after ${titleOf(name).toLowerCase()}`;
  return `dates come once this is recorded: ${findingWords(name).toLowerCase()}`;
};

/** After what its dates come, in a tight place. */
export const undatedText = (remark: string | null, titleOf: (key: string) => string): string => {
  const name = remark?.startsWith('after:') === true ? remark.slice('after:'.length) : null;
  if (name === null) return '';
  return `after ${/^[A-Z]{3,5}-\d/.test(name) ? titleOf(name).toLowerCase() : findingWords(name).toLowerCase()}`;
};

/** The state as a word, with "due" where its day has come. */
export const stateWord = (planned: Pick<PlannedMilestone, 'state' | 'isDue' | 'daysLate' | 'isLapsed'>): string => {
  const name = milestoneStateNames[planned.state];
  if (planned.isLapsed) return `${name}, chance ended`;
  if (planned.state === 'open' && planned.isDue) return `${name}, due`;
  if (planned.state === 'held' && planned.daysLate > 0) return `${name}, ${formatSpan(planned.daysLate)} late`;
  return name;
};

const moveVerbs: Readonly<Record<Which, string>> = { earliest: 'opens', target: 'aim', latest: 'closes' };

export const pathwayWords = {
  loading: 'Loading the pathway',
  loadingName: 'Loading',
  tabs: 'Parts of the record',
  tabPathway: 'Pathway',
  tabRecord: 'Record',
  print: 'Print',
  moreActs: 'Add',
  notBorn: 'not born yet',
  expected: (on: string) => `expected ${on}`,
  kriens: (code: string) => `(LAHSHAL ${code})`,
  noCleft: 'Cleft not coded yet',
  provisional: 'provisional',
  atHome: (languages: string) => `${languages} at home.`,
  comesWith: (name: string, relation: string) =>
    `Comes with ${name}${relations[relation] === undefined ? '' : ` (${relations[relation]})`}`,
  interpreter: 'who needs an interpreter',
  noContact: 'No contact person is written down.',
  lead: (name: string) => `Lead clinician ${name}`,
  noLead: 'No lead clinician yet',
  site: (site: string) => `site ${site}`,
  number: (number: string) => `Number ${number}`,
  bornOn: (on: string) => ` Born ${on}`,
  transferred: (on: string, to: string) => `Care moved to ${to === '' ? 'another team' : to} on ${on}`,
  transferredText: 'The path is frozen. Everything stays readable; nothing can be signed.',
  careEnded: (on: string) => `Care ended on ${on}`,
  careEndedText: 'No reminders, letters or list entries are made for this child.',
  expectedText: 'Not born yet. Dates are counted from the expected date and move with the birth.',
  alarms: {
    'lost-to-follow-up': 'Not seen at a team review for two years.',
    'review-overdue': 'The yearly team review is overdue.',
    'graft-blind': 'The canine root has not been looked at for too long: the graft window cannot be told.',
    squeezed: 'Something opens only after its latest date.',
  },
  view: 'How to show the pathway',
  ruler: 'Ruler',
  list: 'List',
  rulerOf: (name: string) => `Pathway of ${name} on the age ruler`,
  listOf: (name: string) => `Pathway of ${name} as a list`,
  undated: 'Dates come later',
  emptyTitle: 'Nothing on this path yet',
  emptyText: 'As soon as the cleft is coded, the milestones that apply to this child appear here.',
  you: (name: string) => `${name}, you`,
  noOne: 'no one',
  laneDone: 'done',
  laneAhead: 'later',
  groups: { now: 'Now', next: 'Next', later: 'Later', done: 'Done' },
  groupHints: {
    now: 'open, closing, late, waiting, held or half signed',
    next: 'opens within six months',
    later: 'opens later',
    done: 'signed or waived',
  },
  columns: {
    state: 'State',
    milestone: 'Milestone',
    lane: 'Lane',
    earliest: 'Earliest',
    target: 'Target',
    latest: 'Latest',
    closing: 'Closing from',
    owner: 'Owner',
    waits: 'Waits for',
  },
  groupCaption: (group: string, count: number) => `${group}: ${String(count)}`,
  nothingHere: 'Nothing here.',
  doneOn: (on: string) => `done ${on}`,
  moved: {
    summary: (count: number) => `The last change moved ${String(count)} ${count === 1 ? 'milestone' : 'milestones'}`,
    byWhat: (title: string, count: number) =>
      `${title} moved ${String(count)} ${count === 1 ? 'milestone' : 'milestones'}`,
    show: 'Show what moved',
    hide: 'Hide what moved',
    title: 'What moved',
    date: (which: Which, days: number) => `${moveVerbs[which]} ${shiftInWords(days)}`,
    state: (before: string, after: string) => `${before.toLowerCase()} became ${after.toLowerCase()}`,
    came: 'came onto the path',
    cameWith: (earliest: string, latest: string) => `came onto the path: ${earliest} to ${latest}`,
    cameDated: (earliest: string, latest: string) => `has dates now: ${earliest} to ${latest}`,
    left: 'is no longer on the path',
    nothing: 'Nothing else moved.',
    because: 'because',
  },
  sheet: {
    whoSigns: (parts: readonly string[]) => {
      const text = parts.join(', and ');
      return `${text.charAt(0).toUpperCase()}${text.slice(1)} ${parts.length > 1 ? 'sign' : 'signs'}.`;
    },
    onThings: (count: number) => `on ${String(count)} ${count === 1 ? 'thing' : 'things'}`,
    target: (on: string) => `aimed at ${on}`,
    window: 'Window',
    heldUntil: (on: string, reason: string) => `Held until ${on}: ${reason}`,
    waivedBecause: (reason: string) => `Will not be done: ${reason}`,
    lapsed: 'The chance has ended. Somebody must say so, with a reason: use “Waive”.',
    squeezed: 'What comes before it was late, so it now opens after its latest date.',
    prepared: (name: string) => `${name === '' ? 'Prepared' : `Prepared by ${name}`}, ready for a signature.`,
    whenDone: 'Done',
    occurrence: (count: number) => `No. ${String(count)}`,
    plain: 'In plain words',
    owner: 'Held by',
    signedBy: (name: string, on: string) => `Signed by ${name}, ${on}`,
    recordTitle: 'What was signed',
    closing: (on: string) => `closing from ${on}`,
    ifLate: 'If it is late',
  },
  history: {
    title: 'History',
    empty: 'Nothing has happened yet.',
    by: (name: string) => `by ${name}`,
    earlierCount: (count: number) => `${String(count)} earlier ${count === 1 ? 'time' : 'times'}`,
    missed: (on: string) => `${on}: missed`,
    signed: (on: string) => `${on}: done`,
    waived: (on: string) => `${on}: left out`,
    kinds: {
      'milestone-claimed': 'Claimed',
      'milestone-released': 'Let go',
      'milestone-handed-over': 'Handed over',
      'draft-saved': 'Draft kept',
      'milestone-signed': 'Signed',
      'signature-amended': 'Amended',
      'import-confirmed': 'Confirmed',
      'milestone-held': 'Held',
      'hold-lifted': 'Hold ended',
      'milestone-waived': 'Waived',
      'booking-set': 'Booked',
      'booking-removed': 'Booking taken back',
      'finding-recorded': 'Finding recorded',
      'finding-withdrawn': 'Finding withdrawn',
      'own-milestone-added': 'Added for this child',
      'history-imported': 'Taken over from an import',
    } as Readonly<Record<string, string>>,
  },
  whatIf: {
    title: 'What if',
    slips: 'it slips by',
    weeks: 'weeks',
    weeksLabel: 'Weeks of delay',
    waived: 'it is waived',
    kind: 'What if',
    ask: 'Show what would move',
    error: 'Write a number of weeks from 1 to 104.',
    nothing: 'Nothing else would move.',
    would: (count: number) => `${String(count)} ${count === 1 ? 'milestone' : 'milestones'} would move`,
    squeezed: (days: number) => `squeezed by ${String(days)} days`,
    notWritten: 'Nothing is written. A calculation, not advice.',
  },
  finding: {
    open: 'Record a finding',
    title: 'Record a finding',
    text: 'Findings start or end milestones; the path replans itself at once.',
    which: 'Finding',
    on: 'Found on',
    present: 'What was found',
    yes: 'It is there',
    no: 'It is not, or no longer, there',
    note: 'Note (if you wish)',
    save: 'Record it',
    done: (name: string) => `Recorded: ${name.toLowerCase()}`,
    nameError: 'Choose a finding.',
    dateError: 'Write the date, today or before.',
    recorded: (on: string) => `recorded ${on}`,
  },
  own: {
    open: 'Add a milestone',
    title: 'Add a milestone for this child',
    text: 'For what the protocol does not know. You set the days.',
    which: 'Kind',
    name: 'What it is called',
    earliest: 'Earliest',
    target: 'Target',
    latest: 'Latest',
    reason: 'Why it is added',
    save: 'Add it to the path',
    done: (title: string) => `Added: ${title}`,
    whichError: 'Choose a kind.',
    nameError: 'Give it a name.',
    dateError: 'Write a date.',
    orderError: 'Earliest, target and latest must follow one another.',
    reasonError: 'Say why, in a few words.',
  },
  states: {
    notAllowedTitle: 'You do not look after this child',
    notAllowedText:
      'The coordinator, the clinicians of the team and the trainees assigned to a child can open the pathway. Ask the coordinator to assign you.',
    askWho: (name: string) => `Write to ${name}`,
    notFoundTitle: 'There is no such child here',
    notFoundText: 'The address may be mistyped, or the record was never on this team.',
    toChildren: 'To the children of the team',
    failedTitle: 'The pathway did not come',
    failedText: 'We cannot reach the server. What you had saved is safe; the page tries again by itself.',
    notDone: 'We cannot reach the server. Nothing was changed; what you typed is still here. Try again in a moment.',
    offline: 'No answer from the server. You see the pathway as it was last fetched.',
    noMilestone: 'That milestone is not on this child’s path.',
  },
  printFoot: (team: string, name: string, at: string, who: string) =>
    `${team}. ${name}. Record as of ${at}, printed by ${who}. Shred after use.`,
  printMissing: 'Missing',
  recordsMissing: (count: number) => `${String(count)} ${count === 1 ? 'record' : 'records'}`,
  printDue: 'Due and missing',
} as const;
