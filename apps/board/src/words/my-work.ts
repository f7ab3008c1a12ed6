/** Words of My work. */
import type { WorkGroup } from '@weftway/contract/board';

const groups: Readonly<Record<WorkGroup, string>> = {
  cameBack: 'Came back to you',
  doNow: 'Do now',
  toSign: 'Ready for your signature',
  drafted: 'Drafted by you',
  waiting: 'Waiting for others',
  covers: 'Work you cover',
  late: 'Late with others',
  looseEnds: 'Loose ends in your lanes',
};

/** Said where a group that is always shown has nothing in it. */
const empty: Readonly<Partial<Record<WorkGroup, string>>> = {
  doNow: 'Nothing of yours is open. What opens next is on the board.',
  toSign: 'Nothing waits for your signature.',
  waiting: 'Nothing of yours waits for others.',
  looseEnds: 'Every milestone in your lanes has an owner.',
};

const counted = (count: number, one: string, many: string): string =>
  `${count === 0 ? 'none' : String(count)} ${count === 1 ? one : many}`;

export const myWorkWords = {
  loading: 'Loading your work',
  groups,
  empty,
  handOver: 'Hand over my work',
  timeLeft: 'time left',
  inTheWay: 'what stands in the way',
  noTime: 'no dates',
  today: 'today',
  daysLate: (span: string) => `${span} late`,
  part: (title: string, part: string) => `${title}: ${part}`,
  expected: 'expected',
  sum: (late: number, closing: number, toSign: number): string => {
    if (late + closing + toSign === 0) return 'Nothing of yours is late or closing.';
    const parts = [
      counted(late, 'is late', 'are late'),
      counted(closing, 'is closing', 'are closing'),
      counted(toSign, 'waits for your signature', 'wait for your signature'),
    ];
    const said = parts.filter((part) => !part.startsWith('none'));
    const text =
      said.length > 1 ? `${said.slice(0, -1).join(', ')} and ${said[said.length - 1] ?? ''}` : (said[0] ?? '');
    return `Of your milestones ${text}.`;
  },
  showAll: (count: number) => `Show all ${String(count)}`,
  more: (count: number) => `and ${String(count)} more on the board`,
  buttons: {
    evidence: 'Enter evidence',
    sign: 'Read and sign',
    draft: 'Go on with the draft',
    look: 'See the pathway',
    claim: 'Claim',
  },
  buttonFor: (button: string, title: string, child: string) => `${button}: ${title}, ${child}`,
  claimed: (title: string, child: string) => `Claimed: ${title}, ${child}`,
  undone: (title: string, child: string) => `Let go again: ${title}, ${child}`,
  undoReason: 'Undone at once',
  refused: (why: string) => `Not claimed. ${why}`,
} as const;
