/** Words of the board. */
import type { MilestoneState } from '@weftway/pathway/milestone-state';

const bins: Readonly<Record<string, string>> = {
  '3-months-late': '3 months late',
  '1-to-3-months-late': '1 to 3 months late',
  'under-4-weeks-late': 'under 4 weeks late',
  '2-weeks-left': '2 weeks left',
  '2-to-6-weeks-left': '2 to 6 weeks left',
  '6-to-12-weeks': '6 to 12 weeks',
  '3-to-6-months': '3 to 6 months',
  longer: 'longer',
};

const counted = (count: number, one: string, many: string): string => `${String(count)} ${count === 1 ? one : many}`;

const keys: readonly (readonly [string, string])[] = [
  ['↑ ↓', 'the lane above, the lane below'],
  ['← →', 'the child before, the child after'],
  ['Home, End', 'first and last child of the lane'],
  ['Space', 'unroll a lane, or roll it up'],
  ['Enter', 'open the child'],
  ['C', 'claim'],
  ['H', 'hand over to a colleague'],
  ['M', 'pick up; then arrow keys to a place, Space to drop, Escape to leave it'],
  ['.', 'everything that can be done'],
  ['?', 'these keys'],
];

export const boardWords = {
  title: 'Board',
  sum: (milestones: number, children: number) =>
    `${counted(milestones, 'milestone', 'milestones')} for ${counted(children, 'child', 'children')}`,
  lanesOf: 'Lanes of',
  everyDiscipline: 'Lanes of every discipline',
  site: 'Site',
  everySite: 'Every site',
  find: 'Child or milestone',
  whose: 'Whose milestones',
  hands: { everyone: 'Everyone’s', mine: 'Mine', unowned: 'Unowned' },
  print: 'Print',
  filters: 'Filters',
  loading: 'Loading the board',
  grid: 'Lanes by the time left until each window closes',
  lane: 'Lane',
  bins,
  laneName: (name: string, count: number, loose: number) =>
    `${name}, ${counted(count, 'milestone', 'milestones')}${loose > 0 ? `, ${String(loose)} unowned` : ''}`,
  looseTitle: (loose: number) => `${String(loose)} unowned`,
  more: (count: number) => `+${String(count)}`,
  noOne: 'no one',
  you: 'you',
  binSum: (bin: string, parts: readonly string[]) => `${bin}: ${parts.length === 0 ? 'nothing' : parts.join(', ')}`,
  binPart: (count: number, state: string) => `${String(count)} ${state}`,
  late: (span: string) => `${span} late`,
  left: (span: string) => `${span} left`,
  closesToday: 'closes today',
  noWindow: 'no dates yet',
  window: (from: string, to: string) => `${from} to ${to}`,
  part: (label: string, who: string) => `${label}: ${who}`,
  heldBy: (name: string) => name,
  expected: 'expected',
  holder: (who: string) => `held by ${who}`,
  statesShown: 'States shown',
  looseEnd: 'A loose end is unowned',
  stateRow: (state: string, count: number) => `${state} ${String(count)}`,
  myHands: 'My hands',
  dropToClaim: 'Drop here to claim',
  keyHint: 'Press ? for all keys.',
  live: 'Shows changes as they happen.',
  polling: 'Asks for changes every 5 seconds.',
  onlyStates: (states: readonly string[]) => states.join(', '),

  // What dropping would do
  claims: (title: string) => `You take ${title} on.`,
  handsTo: (name: string, title: string, from: string | null) =>
    from === null ? `${name} takes ${title}, which no one holds.` : `${name} takes ${title} from ${from}.`,
  inHand: (count: number) => `${String(count)} in hand`,
  handOverTo: 'Hand over to',
  noCandidate: 'No colleague may hold this.',
  release: (title: string) => `${title} stays with you until you let it go.`,

  leadClinician: 'the lead clinician',
  a: (who: string) => `${/^[aeiou]/.test(who) ? 'an' : 'a'} ${who}`,
  or: ' or ',
  // Why not
  why: {
    yours: 'You hold this already.',
    held: (name: string) => `${name} holds this.`,
    other: (who: string) => `For ${who} to claim.`,
    notYoursToHand: (name: string) => `${name} or the coordinator can hand this on.`,
    nobodyToHand: 'No one holds this yet. Claim it first.',
    book: 'For the coordinator or the lane’s own clinicians to book.',
    notHeld: 'You do not hold this.',
  },

  // Acts and what is said after them
  actions: 'What can be done',
  open: 'Open the child',
  claim: 'Claim',
  letGo: 'Let go',
  handTo: 'Hand to…',
  back: 'Back',
  book: 'Book a date…',
  claimed: (title: string, child: string) => `Claimed: ${title}, ${child}`,
  released: (title: string, child: string) => `Let go: ${title}, ${child}`,
  handed: (title: string, child: string, name: string) => `Handed to ${name}: ${title}, ${child}`,
  undone: (title: string, child: string) => `Taken back: ${title}, ${child}`,
  undoReason: 'Undone at once',
  booked: (title: string, child: string, on: string) => `Booked: ${title}, ${child}, ${on}`,
  took: (name: string, ago: string) => `${name} took this ${ago}.`,
  secondsAgo: (seconds: number) => `${counted(seconds, 'second', 'seconds')} ago`,
  minutesAgo: (minutes: number) => `${counted(minutes, 'minute', 'minutes')} ago`,
  agoSpan: (span: string, isToday: boolean) => (isToday ? 'today' : `${span} ago`),
  refused: (why: string) => `Left where it was. ${why}`,

  bookTitle: (title: string, child: string) => `Book ${title} for ${child}`,
  bookDate: 'Date',
  bookDo: 'Book this date',
  noDate: 'Write the date first.',

  keysTitle: 'Keys on the board',
  keys,

  emptyTitle: 'Nothing here with these filters',
  empty: (hidden: number) => `${counted(hidden, 'other milestone is', 'other milestones are')} on the board.`,
  showAll: 'Show everything',
  nothingYet:
    'Nothing is open on the board. Milestones appear half a year before their window opens, as soon as a child is registered.',
  registerChild: 'Register a child',

  // Said while dragging
  pickedUp: (what: string) => `Picked up ${what}.`,
  over: (what: string) => `${what} Press Space to drop.`,
  overNothing: 'Not over a place to drop.',
  dropped: (what: string) => what,
  notDropped: 'Left where it was.',
  dragHow: 'Press M to pick up, the arrow keys to move between places, Space to drop, Escape to leave it.',

  stateNames: (state: MilestoneState, names: Readonly<Record<MilestoneState, string>>) => names[state].toLowerCase(),
  rowName: (parts: readonly string[]) => parts.join(', '),
  printed: (date: string) => `As of ${date}`,
  columns: {
    state: 'State',
    child: 'Child',
    milestone: 'Milestone',
    time: 'Time left',
    owner: 'Held by',
    lane: 'Lane',
  },
} as const;
