/** The child's milestones as the age ruler draws them. */
import { addDays, daysBetween, laterOf, type PlainDate } from '@weftway/calendar/plain-date';
import type { Discipline } from '@weftway/team/disciplines';
import { laneNames, lanes, type Lane } from '@weftway/team/lanes';
import type { RulerDependency, RulerItem, RulerLane } from '../../../ruler/ruler-item.ts';
import { pathwayWords } from '../../../words/pathway.ts';
import type { ChildPlan } from './child-plan.ts';
import { isAbout, viewNamed, type ChildViews, type MilestoneView } from './milestone-view.ts';
import type { Move } from './moved.ts';

/** Between the key of a milestone and the number of one of its occurrences, where it is drawn more than once. */
const separator = '@';
const mostLoops = 24;

export const keyOfItem = (itemKey: string): string => itemKey.split(separator)[0] ?? itemKey;

const baseItem = (view: MilestoneView): Pick<RulerItem, 'lane' | 'label' | 'unowned' | 'ownerName'> => ({
  lane: view.rule.lane,
  label: view.shortTitle,
  unowned: false,
  ownerName:
    view.ownerNames ?? view.parts.find((part) => part.signature !== null)?.signature?.signerName ?? pathwayWords.noOne,
});

const pastItems = (of: ChildPlan, view: MilestoneView): RulerItem[] => {
  const { planned, rule } = view;
  const signed = of.pathway.facts.completions.filter((one) => isAbout(one.milestone, planned)).map((one) => one.on);
  const isRepeating = rule.repeats.length > 0 || planned.past.length > 0;
  if (!isRepeating) return [];
  const days = signed.toSorted().filter((day) => day !== view.doneOn);
  const waived = planned.past.filter((one) => one.kind === 'waived').map((one) => one.on);
  return [
    ...days.map((day) => ({ day, state: 'signed' as const })),
    ...waived.map((day) => ({ day, state: 'waived' as const })),
  ].map(({ day, state }, at) => ({
    ...baseItem(view),
    key: `${view.key}${separator}${String(at)}`,
    state,
    window: planned.past.find((one) => one.on === day)?.window ?? null,
    knotOn: day,
    isPast: true,
    track: 0,
  }));
};

/** Future turns of a rhythm, thinned out where they would lie on top of each other. */
const thinned = (birth: PlainDate, days: readonly PlainDate[], from: PlainDate): PlainDate[] => {
  const kept: PlainDate[] = [];
  let last = from;
  for (const day of days) {
    const age = Math.max(0, daysBetween(birth, day));
    if (daysBetween(last, day) < Math.max(12, age * 0.04) || kept.length >= mostLoops) continue;
    kept.push(day);
    last = day;
  }
  return kept;
};

/** The day after which a rhythm ends because another milestone will have been done by then. */
const endOfRhythm = (views: ChildViews, view: MilestoneView): PlainDate | null => {
  const endings = view.rule.repeats.flatMap((repeat) => repeat.until ?? []);
  const days = endings.flatMap((id) => viewNamed(views, id)?.planned.window?.latest ?? []);
  return days.toSorted()[0] ?? null;
};

const loopItems = (of: ChildPlan, views: ChildViews, view: MilestoneView): RulerItem[] => {
  const { planned } = view;
  const from = laterOf(planned.window?.latest ?? of.today, of.today);
  const end = endOfRhythm(views, view);
  const days = planned.rhythm.filter((day) => day > from && (end === null || day <= end));
  return thinned(of.plan.base.birth, days, addDays(from, -1)).map((day, at) => ({
    ...baseItem(view),
    key: `${view.key}${separator}next${String(at)}`,
    state: 'ahead',
    window: null,
    knotOn: day,
    isPast: true,
    track: 0,
  }));
};

export const rulerItems = (of: ChildPlan, views: ChildViews, moves: readonly Move[]): RulerItem[] => {
  const ghosts = new Map(moves.map((move) => [move.key, move.kind === 'moved' ? (move.before?.window ?? null) : null]));
  return views.all.flatMap((view) => {
    const isGone = view.isFinished && view.planned.window === null && view.doneOn === null;
    const now: RulerItem = {
      ...baseItem(view),
      key: view.key,
      state: view.planned.state,
      unowned: view.unowned,
      window: view.planned.window,
      knotOn: view.doneOn,
      isPast: false,
      ghostWindow: ghosts.get(view.key) ?? null,
    };
    return [...pastItems(of, view), ...(isGone ? [] : [now]), ...loopItems(of, views, view)];
  });
};

interface Viewer {
  readonly id: string;
  readonly disciplines: readonly Discipline[];
}

/** The lane of which a discipline signs the largest share: the one thread that is its own. */
const laneOfDiscipline = (views: ChildViews, discipline: Discipline): Lane | null => {
  const shares = lanes.map((lane) => {
    const inLane = views.all.filter((view) => view.rule.lane === lane);
    const own = inLane.filter((view) =>
      view.parts.some((part) => part.disciplines.some((signer) => signer === discipline)),
    );
    return { lane, count: own.length, share: inLane.length === 0 ? 0 : own.length / inLane.length };
  });
  const [first] = shares.toSorted((a, b) => b.share - a.share || b.count - a.count);
  return first === undefined || first.count === 0 ? null : first.lane;
};

const laneOf = (lane: Lane, views: readonly MilestoneView[], viewer: Viewer, isOwn: boolean): RulerLane => {
  const open = views.filter((view) => !view.isFinished);
  const owners = open.flatMap((view) =>
    view.parts.flatMap((part) => (part.ownerId === null ? [] : [{ id: part.ownerId, name: part.ownerName ?? '' }])),
  );
  const counts = new Map<string, number>();
  for (const { id } of owners) counts.set(id, (counts.get(id) ?? 0) + 1);
  const most = [...counts].toSorted((a, b) => b[1] - a[1])[0]?.[0];
  const name = owners.find((owner) => owner.id === most)?.name ?? null;
  const needsOwner = open.some((view) => view.unowned);
  return {
    lane,
    name: laneNames[lane],
    ownerName:
      name === null
        ? needsOwner
          ? null
          : open.length === 0
            ? pathwayWords.laneDone
            : pathwayWords.laneAhead
        : most === viewer.id
          ? pathwayWords.you(name)
          : name,
    isOwn,
  };
};

/** The lanes that this child has anything on, each with whoever holds most of it. */
export const rulerLanes = (views: ChildViews, viewer: Viewer): RulerLane[] => {
  const own = viewer.disciplines.map((discipline) => laneOfDiscipline(views, discipline));
  return lanes.flatMap((lane) => {
    const inLane = views.all.filter((view) => view.rule.lane === lane);
    return inLane.length === 0 ? [] : [laneOf(lane, inLane, viewer, own.includes(lane))];
  });
};

/** What the chosen milestone waits for, as far as it is on the path. */
export const dependenciesOf = (views: ChildViews, view: MilestoneView | undefined): RulerDependency[] => {
  if (view === undefined) return [];
  const found = view.planned.waitsFor.flatMap((wait) => {
    const other = viewNamed(views, wait.milestone, view.planned.side);
    return other === undefined || other.key === view.key || wait.type === 'soft'
      ? []
      : [{ key: other.key, isMet: wait.isMet }];
  });
  return [
    ...new Map(found.toSorted((a, b) => Number(b.isMet) - Number(a.isMet)).map((one) => [one.key, one])).values(),
  ];
};
