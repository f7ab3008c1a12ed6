/** What each row of My work says and offers. */
import { shortAgeText } from '@weftway/calendar/age';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { MyWork, WorkGroup, WorkItem } from '@weftway/contract/board';
import type { MilestoneState } from '@weftway/pathway/milestone-state';
import { formatSpan } from '../../words/dates.ts';
import { myWorkWords } from '../../words/my-work.ts';

/** In the order of the page. */
const pageOrder: readonly WorkGroup[] = [
  'cameBack',
  'doNow',
  'toSign',
  'drafted',
  'waiting',
  'covers',
  'looseEnds',
  'late',
];

export interface ShownGroup {
  readonly group: WorkGroup;
  readonly items: readonly WorkItem[];
  /** How many more there are than are listed. */
  readonly more: number;
}

/** Groups with something in them, and those whose emptiness is worth a sentence. */
export const shownGroups = (work: MyWork): readonly ShownGroup[] =>
  pageOrder
    .map((group) => ({ group, items: work[group], more: Math.max(0, work.totals[group] - work[group].length) }))
    .filter(({ group, items }) => items.length > 0 || myWorkWords.empty[group] !== undefined);

/** "12" and "days late", "9" and "weeks" */
export const timeLeft = (
  item: WorkItem,
): { readonly number: string; readonly unit: string; readonly isLate: boolean } => {
  if (item.daysLeft === null) return { number: '', unit: myWorkWords.noTime, isLate: false };
  if (item.daysLeft === 0) return { number: '', unit: myWorkWords.today, isLate: false };
  const [number = '', unit = ''] = formatSpan(item.daysLeft).split(' ');
  const isLate = item.daysLeft < 0;
  return { number, unit: isLate ? myWorkWords.daysLate(unit) : unit, isLate };
};

export const ageOf = (item: WorkItem, today: string): string =>
  item.bornOn === null || item.bornOn > today
    ? myWorkWords.expected
    : shortAgeText(item.bornOn as PlainDate, today as PlainDate); // dates of the contract

export const stateOf = (item: WorkItem): MilestoneState => item.state as MilestoneState; // guarded by the column's check

export const addressOf = (item: WorkItem): string =>
  `/children/${encodeURIComponent(item.childId)}?m=${encodeURIComponent(item.milestone)}`;

/** The one button of a row; `claim` acts at once, the others lead to the child. */
export const buttonOf = (group: WorkGroup, item: WorkItem): keyof typeof myWorkWords.buttons => {
  if (group === 'toSign') return 'sign';
  if (group === 'drafted') return 'draft';
  if (group === 'looseEnds' || (group === 'cameBack' && item.isUnowned)) return 'claim';
  return group === 'doNow' || group === 'cameBack' ? 'evidence' : 'look';
};

export const sumOf = (work: MyWork): string => {
  const mine = [...work.doNow, ...work.toSign, ...work.cameBack];
  return myWorkWords.sum(
    mine.filter((item) => item.state === 'late').length,
    mine.filter((item) => item.state === 'closing').length,
    work.totals.toSign,
  );
};

/** What stands in the way, with the reason why the row is in its group before it. */
export const wayOf = (item: WorkItem): string =>
  [item.note, item.standsInTheWay].filter((text) => text !== '').join('. ');
