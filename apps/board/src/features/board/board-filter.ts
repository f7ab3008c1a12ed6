/** What of the board is looked at. All of it lives in the address, so that a view can be kept and sent. */
import type { MilestoneState } from '@weftway/pathway/milestone-state';
import { disciplines, type Discipline } from '@weftway/team/disciplines';
import { plainText, type BoardModel, type BoardRow, type MilestoneHead } from '../../queries/board-model.ts';

export const handsChoices = ['everyone', 'mine', 'unowned'] as const;
export type Hands = (typeof handsChoices)[number];

/** States that the board can show, in the order in which they are drawn in a bin. */
export const boardStates = [
  'late',
  'closing',
  'open',
  'waiting',
  'held',
  'partly-signed',
  'ahead',
] as const satisfies readonly MilestoneState[];

export interface BoardFilter {
  readonly discipline: Discipline | null;
  readonly hands: Hands;
  readonly states: ReadonlySet<MilestoneState>;
  readonly site: string | null;
  readonly text: string;
  /** Keys of unrolled lanes; null until the person has rolled or unrolled one. */
  readonly unrolled: readonly string[] | null;
}

const allStates: ReadonlySet<MilestoneState> = new Set(boardStates);

const listOf = (text: string | null): readonly string[] | null =>
  text === null ? null : text.split('.').filter((one) => one !== '');

export const filterOf = (query: URLSearchParams): BoardFilter => {
  const states = listOf(query.get('states'));
  return {
    discipline: disciplines.find((one) => one === query.get('discipline')) ?? null,
    hands: handsChoices.find((one) => one === query.get('hands')) ?? 'everyone',
    states: states === null ? allStates : new Set(boardStates.filter((state) => states.includes(state))),
    site: query.get('site'),
    text: query.get('q') ?? '',
    unrolled: listOf(query.get('open')),
  };
};

export const queryOf = (filter: BoardFilter): URLSearchParams => {
  const query = new URLSearchParams();
  if (filter.discipline !== null) query.set('discipline', filter.discipline);
  if (filter.hands !== 'everyone') query.set('hands', filter.hands);
  if (filter.states.size !== boardStates.length)
    query.set('states', boardStates.filter((state) => filter.states.has(state)).join('.'));
  if (filter.site !== null) query.set('site', filter.site);
  if (filter.text !== '') query.set('q', filter.text);
  if (filter.unrolled !== null) query.set('open', filter.unrolled.join('.'));
  return query;
};

/** Everything, with the same lanes unrolled. */
export const widened = (filter: BoardFilter): BoardFilter => ({
  discipline: null,
  hands: 'everyone',
  states: allStates,
  site: null,
  text: '',
  unrolled: filter.unrolled,
});

const isOf = (head: MilestoneHead, discipline: Discipline): boolean =>
  head.parts.some((part) => part.mayClaim.includes(discipline) || part.maySign.includes(discipline));

export interface FilteredBoard {
  readonly rows: readonly BoardRow[];
  readonly children: number;
  readonly hands: Readonly<Record<Hands, number>>;
  readonly states: ReadonlyMap<MilestoneState, number>;
  readonly sites: readonly string[];
}

const titleTexts = new WeakMap<MilestoneHead, string>();

const hasWords = (row: BoardRow, words: readonly string[]): boolean => {
  const title = titleTexts.get(row.milestone) ?? plainText(row.milestone.title);
  titleTexts.set(row.milestone, title);
  return words.every((word) => row.child.searchText.includes(word) || title.includes(word));
};

/** Whether site, discipline and text let a row through. */
const wantedBy = ({ site, discipline, text }: BoardFilter): ((row: BoardRow) => boolean) => {
  const words = plainText(text)
    .split(/[\s,]+/)
    .filter((word) => word !== '');
  const known = new Map<MilestoneHead, boolean>();
  const isOfDiscipline = (head: MilestoneHead): boolean => {
    const answer = known.get(head) ?? (discipline === null || isOf(head, discipline));
    known.set(head, answer);
    return answer;
  };
  return (row) =>
    (site === null || row.child.site === site) &&
    isOfDiscipline(row.milestone) &&
    (words.length === 0 || hasWords(row, words));
};

const isInHands = (hands: Hands, isMine: boolean, isUnowned: boolean): boolean =>
  hands === 'everyone' || (hands === 'mine' ? isMine : isUnowned);

/** One pass over the board: the rows to draw, and what each choice would show. */
export const filterBoard = (model: BoardModel, filter: BoardFilter, meId: string): FilteredBoard => {
  const isWanted = wantedBy(filter);
  const children = new Set<string>();
  const sites = new Set<string>();
  const states = new Map<MilestoneState, number>();
  const counts = { everyone: 0, mine: 0, unowned: 0 };
  const rows: BoardRow[] = [];
  for (const row of model.rows) {
    sites.add(row.child.site);
    if (!isWanted(row)) continue;
    const isShownState = filter.states.has(row.state);
    const isMine = row.holders.includes(meId);
    if (isShownState) {
      counts.everyone += 1;
      counts.mine += isMine ? 1 : 0;
      counts.unowned += row.isUnowned ? 1 : 0;
    }
    if (!isInHands(filter.hands, isMine, row.isUnowned)) continue;
    states.set(row.state, (states.get(row.state) ?? 0) + 1);
    if (!isShownState) continue;
    rows.push(row);
    children.add(row.child.id);
  }
  return { rows, children: children.size, hands: counts, states, sites: [...sites].sort((a, b) => a.localeCompare(b)) };
};
