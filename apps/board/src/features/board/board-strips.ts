/** The lanes of the board. Busy lanes of the pathway are cut into strips of a few milestones each. */
import { laneNames, lanes, type Lane } from '@weftway/team/lanes';
import type { Discipline } from '@weftway/team/disciplines';
import { boardBinOf, boardBins } from '../../ruler/board-axis.ts';
import type { BoardModel, BoardRow, MilestoneHead } from '../../queries/board-model.ts';

interface StripRule {
  readonly key: string;
  readonly name: string;
  readonly lane: Lane;
  /** Milestones of the lane that stand here; absent: all that stand nowhere else. */
  readonly milestones?: readonly string[];
}

const cut: readonly StripRule[] = [
  { key: 'lip', name: 'Lip and nose repair', lane: 'surgery', milestones: ['SURG-01', 'SURG-02'] },
  { key: 'palate', name: 'Palate repair', lane: 'surgery', milestones: ['SURG-03', 'SURG-04', 'SURG-06'] },
  { key: 'speech', name: 'Speech review', lane: 'speech' },
  {
    key: 'palate-function',
    name: 'Palate function',
    lane: 'speech',
    milestones: ['SPCH-05', 'SPCH-06', 'SPCH-07', 'SPCH-08'],
  },
  {
    key: 'expansion',
    name: 'Records and expansion',
    lane: 'orthodontics-and-graft',
    milestones: ['ORTH-01', 'ORTH-03'],
  },
  {
    key: 'graft',
    name: 'Bone graft',
    lane: 'orthodontics-and-graft',
    milestones: ['ORTH-02', 'ORTH-04', 'ORTH-05', 'ORTH-06', 'ORTH-07'],
  },
  { key: 'braces', name: 'Braces and bite', lane: 'orthodontics-and-graft' },
  { key: 'jaw', name: 'Jaw surgery', lane: 'growth-and-jaw' },
  { key: 'final-nose', name: 'Final nose surgery', lane: 'growth-and-jaw', milestones: ['GROW-04'] },
  { key: 'missing-teeth', name: 'Missing teeth', lane: 'growth-and-jaw', milestones: ['GROW-05', 'GROW-06'] },
  { key: 'surgery', name: 'Surgery, other', lane: 'surgery' },
];

const wholeLane = (lane: Lane): StripRule => ({ key: lane, name: laneNames[lane], lane });

/** In the order in which care begins. */
const stripRules: readonly StripRule[] = lanes.flatMap((lane) => {
  const parts = cut.filter((strip) => strip.lane === lane);
  return parts.length === 0 ? [wholeLane(lane)] : parts;
});

const stripOf = (head: MilestoneHead): string => {
  const ofLane = stripRules.filter((strip) => strip.lane === head.lane);
  return (
    (
      ofLane.find((strip) => strip.milestones?.includes(head.id)) ??
      ofLane.find((strip) => strip.milestones === undefined)
    )?.key ?? head.lane
  );
};

export interface Strip {
  readonly key: string;
  readonly name: string;
  readonly lane: Lane;
  readonly count: number;
  readonly loose: number;
  readonly late: number;
  /** The viewer's own thread: most of what stands there is theirs to sign. */
  readonly isOwn: boolean;
  /** In board order, which is the order of the arrow keys too. */
  readonly bins: readonly (readonly BoardRow[])[];
}

/** Without a window there is no close to count to: it stands at the far end. */
const binOf = (row: BoardRow, day: number): number =>
  row.closes === null ? boardBins.length - 1 : boardBinOf(row.closes - day);

interface Filling {
  count: number;
  loose: number;
  late: number;
  whole: number;
  /** Of the whole, what the viewer may sign. */
  own: number;
  isOfDiscipline: boolean;
  readonly bins: BoardRow[][];
}

const isFor = (head: MilestoneHead, discipline: Discipline): boolean =>
  head.parts.some((part) => part.mayClaim.includes(discipline) || part.maySign.includes(discipline));

export interface StripsInput {
  readonly rows: readonly BoardRow[];
  /** Every milestone of the board with how often it stands there, shown or not. */
  readonly heads: ReadonlyMap<MilestoneHead, number>;
  readonly day: number;
  readonly own: readonly Discipline[];
  /** Only lanes of this discipline. */
  readonly discipline: Discipline | null;
}

export const headsOf = ({ rows }: BoardModel): ReadonlyMap<MilestoneHead, number> => {
  const heads = new Map<MilestoneHead, number>();
  for (const { milestone } of rows) heads.set(milestone, (heads.get(milestone) ?? 0) + 1);
  return heads;
};

export const stripsOf = ({ rows, heads, day, own, discipline }: StripsInput): readonly Strip[] => {
  const fillings = new Map<string, Filling>(
    stripRules.map(({ key }) => [
      key,
      {
        count: 0,
        loose: 0,
        late: 0,
        whole: 0,
        own: 0,
        isOfDiscipline: discipline === null,
        bins: boardBins.map(() => []),
      },
    ]),
  );
  const fillingOf = new Map<MilestoneHead, Filling>();
  for (const [head, times] of heads) {
    const filling = fillings.get(stripOf(head));
    if (filling === undefined) continue;
    fillingOf.set(head, filling);
    filling.whole += times;
    if (own.some((one) => head.parts.some((part) => part.maySign.includes(one)))) filling.own += times;
    filling.isOfDiscipline ||= discipline !== null && isFor(head, discipline);
  }
  for (const row of rows) {
    const filling = fillingOf.get(row.milestone);
    if (filling === undefined) continue;
    filling.count += 1;
    if (row.isUnowned) filling.loose += 1;
    if (row.state === 'late') filling.late += 1;
    filling.bins[binOf(row, day)]?.push(row);
  }
  return stripRules.flatMap(({ key, name, lane }) => {
    const filling = fillings.get(key);
    if (filling === undefined || !filling.isOfDiscipline) return [];
    const { count, loose, late, bins } = filling;
    return [{ key, name, lane, count, loose, late, isOwn: filling.own > 0 && filling.own * 2 >= filling.whole, bins }];
  });
};

/** A lane longer than this would push every other lane off the screen. */
const rowsAtFirst = 24;

const isShort = (strip: Strip): boolean => Math.max(...strip.bins.map((bin) => bin.length)) <= rowsAtFirst;

/**
 * The viewer's own lanes, long ones left rolled so that the whole board is seen first; for somebody without any, the
 * lane with most late ones.
 */
export const unrolledAtFirst = (strips: readonly Strip[]): readonly string[] => {
  const own = strips.filter((strip) => strip.isOwn && strip.count > 0);
  if (own.length > 0) return own.filter(isShort).map((strip) => strip.key);
  const worst = strips.reduce<Strip | null>((found, strip) => (strip.late > (found?.late ?? 0) ? strip : found), null);
  return worst === null ? [] : [worst.key];
};

export const rowsOfStrip = (strip: Strip): readonly BoardRow[] => strip.bins.flat();
