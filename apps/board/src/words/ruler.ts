import type { MyWorkTick } from '../ruler/my-work-axis.ts';
import type { Period, SegmentName } from '../ruler/scale.ts';

const segments: Readonly<Record<SegmentName, { readonly name: string; readonly tick: string }>> = {
  'before-birth': { name: 'before birth', tick: 'a month' },
  'first-six-months': { name: 'first six months', tick: 'a week' },
  'to-eighteen-months': { name: 'to eighteen months', tick: 'a month' },
  'early-years': { name: 'early years', tick: '3 months' },
  school: { name: 'school years', tick: 'half a year' },
  'growing-up': { name: 'growing up', tick: 'a year' },
};

const periods: Readonly<Record<Period, string>> = {
  all: 'All twenty years',
  'first-18-months': 'First 18 months',
  'early-years': 'Early years',
  school: 'School',
  'growing-up': 'Growing up',
};

const myWorkTicks: Readonly<Record<MyWorkTick, string>> = {
  '4-weeks-ago': '4 wk ago',
  '2-weeks': '2 wk',
  '4-weeks': '4 wk',
  '6-weeks': '6 wk',
  '3-months': '3 months',
  '6-months': '6 months',
};

/** Words of the age ruler and of the other time axes. */
export const rulerWords = {
  ruler: 'Pathway on the age ruler',
  birth: 'birth',
  today: 'Today',
  noOne: 'no one',
  lane: (name: string, owner: string) => `${name}, ${owner}`,
  bandAge: (months: number) => {
    if (months === 0) return 'birth';
    if (months < 24) return `${String(months)} months`;
    return months === 252 ? '21' : `${String(months / 12)} years`;
  },
  months: (count: number) => `${String(count)} m`,
  years: (count: number) => `${String(count)} y`,
  segments,
  period: 'How close to look',
  periods,
  myWorkTicks,
  window: (earliest: string, latest: string) => `${earliest} to ${latest}`,
  doneOn: (date: string) => `on ${date}`,
  noWindow: 'no dates yet',
  keys: 'Arrow keys move along and between threads, T goes to today, D to what it waits for, Enter opens, plus and minus look closer and wider.',
} as const;
