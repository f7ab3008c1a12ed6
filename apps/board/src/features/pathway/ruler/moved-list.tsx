import { Section } from '../../../ui/page/section.tsx';
import { pathwayWords } from '../../../words/pathway.ts';
import { reasonsWords } from '../../../words/reasons.ts';
import { namingOf, type ChildPlan } from '../model/child-plan.ts';
import { moveText, type WhatMoved } from './what-moved.ts';

interface MovedListProps {
  readonly of: ChildPlan;
  readonly moved: WhatMoved;
  readonly onOpen: (key: string) => void;
}

/** Each move with its days and its reason; stays until it is dismissed. */
export function MovedList({ of, moved, onOpen }: MovedListProps) {
  return (
    <div className="border-hair border-b pb-3">
      <Section title={pathwayWords.moved.title} level={3}>
        <ul className="text-body m-0 flex list-none flex-col p-0">
          {moved.moves.map((move) => (
            <li
              key={move.key}
              className="grid grid-cols-[minmax(10rem,16rem)_1fr] gap-4 py-0.5 max-sm:grid-cols-1 max-sm:gap-0"
            >
              <span>
                {move.after === null ? (
                  of.titleOf(move.key)
                ) : (
                  <button
                    type="button"
                    className="text-indigo rounded text-left underline underline-offset-3"
                    onClick={() => onOpen(move.key)}
                  >
                    {of.titleOf(move.key)}
                  </button>
                )}
              </span>
              <span className="text-ink-2">{moveText(move, namingOf(of))}</span>
            </li>
          ))}
        </ul>
        <p className="text-fine text-ink-3 m-0">{reasonsWords.calculation}</p>
      </Section>
    </div>
  );
}
