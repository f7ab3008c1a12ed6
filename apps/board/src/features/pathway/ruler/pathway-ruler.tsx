import { useMemo } from 'react';
import { Mark } from '../../../marks/mark.tsx';
import { Legend } from '../../../marks/legend.tsx';
import { AgeRuler } from '../../../ruler/age-ruler.tsx';
import type { Period } from '../../../ruler/scale.ts';
import { pathwayWords, undatedText } from '../../../words/pathway.ts';
import type { ChildPlan } from '../model/child-plan.ts';
import type { ChildViews, MilestoneView } from '../model/milestone-view.ts';
import type { Move } from '../model/moved.ts';
import type { Viewer } from '../model/permissions.ts';
import { dependenciesOf, keyOfItem, rulerItems, rulerLanes } from '../model/ruler-items.ts';

interface PathwayRulerProps {
  readonly of: ChildPlan;
  readonly views: ChildViews;
  readonly viewer: Viewer;
  readonly name: string;
  readonly selected: MilestoneView | undefined;
  /** Shown as ghosts of the old windows. */
  readonly moves: readonly Move[];
  readonly period: Period;
  readonly onPeriodChange: (period: Period) => void;
  readonly onSelect: (key: string) => void;
}

const none: readonly never[] = [];

export function PathwayRuler({
  of,
  views,
  viewer,
  name,
  selected,
  moves,
  period,
  onPeriodChange,
  onSelect,
}: PathwayRulerProps) {
  const { id, disciplines } = viewer.me;
  const lanes = useMemo(() => rulerLanes(views, { id, disciplines }), [views, id, disciplines]);
  const items = useMemo(() => rulerItems(of, views, moves), [of, views, moves]);
  const dependencies = useMemo(
    () => (selected === undefined ? none : dependenciesOf(views, selected)),
    [views, selected],
  );
  return (
    <div className="flex flex-col gap-2">
      <AgeRuler
        label={pathwayWords.rulerOf(name)}
        lanes={lanes}
        items={items}
        birth={of.plan.base.birth}
        today={of.today}
        period={period}
        selectedKey={selected?.key ?? null}
        dependencies={dependencies}
        onSelect={(key) => onSelect(keyOfItem(key))}
        onPeriodChange={onPeriodChange}
      />
      <Undated views={views} onSelect={onSelect} titleOf={of.titleOf} />
      <Legend />
    </div>
  );
}

interface UndatedProps extends Pick<PathwayRulerProps, 'views' | 'onSelect'> {
  readonly titleOf: (key: string) => string;
}

/** What is on the path and cannot be on the axis yet, because its dates come from something that is still to happen. */
function Undated({ views, onSelect, titleOf }: UndatedProps) {
  const undated = views.all.filter((view) => view.planned.window === null && !view.isFinished);
  if (undated.length === 0) return null;
  return (
    <section aria-label={pathwayWords.undated} className="text-small flex flex-wrap items-baseline gap-x-4 gap-y-0.5">
      <h3 className="text-label text-ink-2 m-0">{pathwayWords.undated}</h3>
      <ul className="m-0 contents list-none p-0">
        {undated.map((view) => (
          <li key={view.key} className="flex min-h-6 items-center gap-1.5">
            <Mark state={view.planned.state} unowned={false} size={12} title={null} />
            <span>
              <button
                type="button"
                className="text-indigo rounded text-left underline underline-offset-3 print:no-underline"
                onClick={() => onSelect(view.key)}
              >
                {view.shortTitle}
              </button>{' '}
              <span className="text-ink-2">{undatedText(view.planned.remark, titleOf)}</span>
            </span>
          </li>
        ))}
      </ul>
    </section>
  );
}
