/** What would move, asked in the browser of the same pure code as the server asks. */
import { milestoneStateNames } from '@weftway/pathway/milestone-state';
import { whatIf, type PathwayChange, type WhatIfDifference } from '@weftway/pathway/what-if';
import { pathwayWords } from '../../../words/pathway.ts';
import type { ChildPlan } from '../model/child-plan.ts';

export interface WhatIfLine {
  readonly key: string;
  readonly title: string;
  readonly text: string;
}

const describe = ({ before, after, daysMoved }: WhatIfDifference): string => {
  const words = pathwayWords.moved;
  if (before.state === null) return words.came;
  if (after.state === null) return words.left;
  const dates =
    daysMoved === null
      ? []
      : (['earliest', 'target', 'latest'] as const).flatMap((which) =>
          daysMoved[which] === 0 ? [] : [words.date(which, daysMoved[which])],
        );
  const squeeze =
    after.squeezedByDays === null || before.squeezedByDays !== null
      ? []
      : [pathwayWords.whatIf.squeezed(after.squeezedByDays)];
  const state =
    dates.length === 0 && before.state !== after.state
      ? [words.state(milestoneStateNames[before.state], milestoneStateNames[after.state])]
      : [];
  return [...dates, ...squeeze, ...state].join(', ');
};

export const whatWouldMove = (of: ChildPlan, change: PathwayChange): WhatIfLine[] =>
  whatIf(of.protocol, of.pathway.facts, of.today, change).flatMap((difference) => {
    const text = describe(difference);
    const isOther = difference.key !== change.milestone;
    return isOther && text !== '' ? [{ key: difference.key, title: of.titleOf(difference.key), text }] : [];
  });
