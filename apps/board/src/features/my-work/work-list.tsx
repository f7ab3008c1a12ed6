import { useState } from 'react';
import type { MyWork, WorkItem } from '@weftway/contract/board';
import { WeeksAxis, WeeksGrid } from '../../ruler/weeks-axis.tsx';
import { Button } from '../../ui/actions/button.tsx';
import { TextLink } from '../../ui/actions/text-link.tsx';
import { myWorkWords } from '../../words/my-work.ts';
import { WorkRow, workGrid } from './work-row.tsx';
import { shownGroups, type ShownGroup } from './work-rows.ts';

interface WorkListProps {
  readonly work: MyWork;
  readonly onClaim: (item: WorkItem) => void;
}

/** All groups over one axis of weeks. */
export function WorkList({ work, onClaim }: WorkListProps) {
  const groups = shownGroups(work);
  const first = groups.find(({ items }) => items.length > 0)?.items[0];
  return (
    <div className="px-6 pb-8 max-sm:px-5">
      <div
        className={`${workGrid} bg-paper text-fine text-ink-2 sticky top-[60px] z-10 items-end pt-2 max-[1099px]:hidden`}
      >
        <span className="text-right">{myWorkWords.timeLeft}</span>
        <span />
        <WeeksAxis />
        <span>{myWorkWords.inTheWay}</span>
        <span />
      </div>
      <div className="relative">
        <div className={`${workGrid} pointer-events-none absolute inset-0 max-[1099px]:hidden`}>
          <span className="relative col-start-3">
            <WeeksGrid />
          </span>
        </div>
        <div className="relative">
          {groups.map((shown) => (
            <WorkGroupRows key={shown.group} shown={shown} today={work.today} first={first} onClaim={onClaim} />
          ))}
        </div>
      </div>
    </div>
  );
}

interface WorkGroupRowsProps {
  readonly shown: ShownGroup;
  readonly today: string;
  readonly first: WorkItem | undefined;
  readonly onClaim: (item: WorkItem) => void;
}

const boardOf: Readonly<Partial<Record<ShownGroup['group'], string>>> = {
  doNow: '/board?hands=mine',
  waiting: '/board?hands=mine',
  looseEnds: '/board?hands=unowned',
  late: '/board?states=late',
};

/** Shown before the person asks for all of a group. */
const atFirst: Readonly<Partial<Record<ShownGroup['group'], number>>> = { doNow: 20 };
const fewAtFirst = 8;

function WorkGroupRows({ shown: { group, items, more }, today, first, onClaim }: WorkGroupRowsProps) {
  const [showsAll, setShowsAll] = useState(false);
  const few = atFirst[group] ?? fewAtFirst;
  const listed = showsAll || items.length <= few + 2 ? items : items.slice(0, few);
  const id = `work-${group}`;
  return (
    <section aria-labelledby={id}>
      <div className={`${workGrid} items-baseline`}>
        <h2 id={id} className="text-body bg-paper col-start-2 m-0 w-max pt-3 pb-1.5 font-semibold max-sm:col-start-1">
          {myWorkWords.groups[group]}
        </h2>
      </div>
      {items.length === 0 ? (
        <div className={`${workGrid} border-hair border-t py-2`}>
          <p className="text-small text-ink-2 bg-paper col-span-2 col-start-2 m-0 w-max max-w-full pr-2 max-sm:col-start-1">
            {myWorkWords.empty[group]}
          </p>
        </div>
      ) : (
        <ul className="m-0 list-none p-0">
          {listed.map((item) => (
            <WorkRow
              key={`${item.childId} ${item.milestone} ${item.part}`}
              group={group}
              item={item}
              today={today}
              isFirst={item === first}
              onClaim={onClaim}
            />
          ))}
        </ul>
      )}
      {listed.length === items.length ? null : (
        <p className="border-hair m-0 border-t py-1.5 pl-30 max-[1099px]:pl-27 max-sm:pl-0">
          <span className="bg-paper">
            <Button look="quiet" size="small" onClick={() => setShowsAll(true)}>
              {myWorkWords.showAll(items.length)}
            </Button>
          </span>
        </p>
      )}
      {more === 0 || listed.length < items.length ? null : (
        <p className="text-small border-hair m-0 border-t py-2 pl-30 max-[1099px]:pl-27 max-sm:pl-0">
          <span className="bg-paper pr-2">
            <TextLink to={boardOf[group] ?? '/board'}>{myWorkWords.more(more)}</TextLink>
          </span>
        </p>
      )}
    </section>
  );
}
