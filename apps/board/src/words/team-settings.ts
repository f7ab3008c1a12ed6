/** Words of the team's settings, and names of every limit of the service. */

const plural = (count: number, one: string, many: string): string => `${String(count)} ${count === 1 ? one : many}`;

const seconds = (value: number): string => {
  if (value % 86_400 === 0) return plural(value / 86_400, 'day', 'days');
  if (value % 3600 === 0) return plural(value / 3600, 'hour', 'hours');
  if (value % 60 === 0) return plural(value / 60, 'minute', 'minutes');
  return plural(value, 'second', 'seconds');
};
const bytes = (value: number): string =>
  value % 1_048_576 === 0 ? `${String(value / 1_048_576)} MB` : `${String(value / 1024)} kB`;
const count = (value: number): string => value.toLocaleString('en-GB');

interface LimitWords {
  readonly label: string;
  readonly say: (value: number) => string;
}

/** In the order in which they are shown. */
const limitWords: Readonly<Record<string, LimitWords>> = {
  'idle.member': { label: 'Screen locks after nothing has happened for', say: seconds },
  'idle.administrator': { label: 'The same for administrators', say: seconds },
  'absolute.member': { label: 'Longest session', say: seconds },
  'absolute.administrator': { label: 'Longest session of administrators', say: seconds },
  sessionsPerMember: { label: 'Sessions of one person at once', say: count },
  invitationValid: { label: 'An invitation is good for', say: seconds },
  resetValid: { label: 'A link to set a new password is good for', say: seconds },
  openResetsPerMember: { label: 'Such links of one person at once', say: count },
  'guessing.free': { label: 'Wrong passwords before waiting begins', say: count },
  'guessing.firstWait': { label: 'First wait; each further one is twice as long', say: seconds },
  'guessing.longestWait': { label: 'Longest wait', say: seconds },
  'guessing.stopAt': { label: 'Wrong passwords in a row after which only a reset helps', say: count },
  guessesPerAddressPerMinute: { label: 'Sign-ins from one network address a minute', say: count },
  readsPerMinute: { label: 'Reads of one person a minute', say: count },
  writesPerMinute: { label: 'Changes of one person a minute', say: count },
  streamsPerMember: { label: 'Live boards of one person at once', say: count },
  streamSeconds: { label: 'A live board asks for its permission again after', say: seconds },
  importBytes: { label: 'Largest file of a caseload', say: bytes },
  jsonBytes: { label: 'Largest other request', say: bytes },
  jsonDepth: { label: 'Deepest nesting of a request', say: count },
  jsonNodes: { label: 'Most values in a request', say: count },
  mailTriedFor: { label: 'A letter is tried for', say: seconds },
  mailLease: { label: 'One try to send may take', say: seconds },
  anonymousSession: { label: 'A browser that only looked at sign-in is forgotten after', say: seconds },
  idempotencyKept: { label: 'Answers are kept for repeated requests for', say: seconds },
  'hashing.atOnce': { label: 'Passwords checked at once', say: count },
  'hashing.queue': { label: 'Passwords that may wait to be checked', say: count },
};

interface Limit {
  readonly name: string;
  readonly value: number;
}

/** Limits in words; one that has none yet stands at the end under its own name. */
export const limitLines = (limits: readonly Limit[]): readonly { readonly label: string; readonly value: string }[] => {
  const order = Object.keys(limitWords);
  const place = ({ name }: Limit): number => (order.includes(name) ? order.indexOf(name) : order.length);
  return [...limits]
    .sort((a, b) => place(a) - place(b))
    .map(({ name, value }) => {
      const words = limitWords[name];
      return words === undefined
        ? { label: name, value: count(value) }
        : { label: words.label, value: words.say(value) };
    });
};

export const teamSettingsWords = {
  title: 'Settings and limits',
  sentence: 'What holds for the whole team, and how this server runs.',
  adminsOnly: 'Only an administrator opens the settings',
  adminsOnlyText: 'Ask an administrator of your team to look or to change something here.',
  backToTeam: 'Team',
  team: 'The team',
  name: 'Name of the team',
  zone: 'Time zone',
  zoneHint: 'Decides which day it is. Windows are counted by days, so the whole board follows.',
  sites: 'Sites',
  sitesHint: 'One a line. A site can go once no child is seen there.',
  save: 'Save the settings',
  saved: 'The settings are saved.',
  nothingChanged: 'Nothing is changed yet.',
  loading: 'Loading the settings',
  conflictTitle: 'Somebody changed the settings while you were working on them',
  conflictText: 'What you typed is still here. This stands there now:',
  saveMine: 'Save mine over it',
  takeTheirs: 'Take what stands there',
  server: 'This server',
  serverSentence: 'Set where the server is started, not here.',
  mode: 'Mode',
  modes: {
    demo: 'Demonstration: invented children, accounts listed at sign-in',
    live: 'Live',
  },
  today: 'Today',
  fixedDay: (day: string) => `${day}, fixed for a demonstration`,
  mail: 'Letters',
  mails: { sent: 'are sent by mail', 'kept-here': 'stay on this machine, in the local inbox' },
  limits: 'Limits',
  limitsSentence: 'The same for every team; they are tested as they stand here.',
  limit: 'Limit',
  value: 'Value',
} as const;
