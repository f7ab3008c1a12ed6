/** What stands between a milestone and its signature: unmet gates and checks, then evidence that is not here. */
import { fieldsOfPart, missingFields } from '@weftway/pathway/sign-off-evidence';
import { pathwayWords } from '../../../words/pathway.ts';
import type { ChildPlan } from './child-plan.ts';
import type { MilestoneView } from './milestone-view.ts';

export const missingOf = (of: ChildPlan, view: MilestoneView): string[] => {
  const waits = view.planned.waitsFor
    .filter((wait) => !wait.isMet && wait.type !== 'soft')
    .map((wait) => of.titleOf(wait.milestone));
  const empty = view.parts
    .filter((part) => part.signature === null)
    .reduce(
      (count, part) => count + missingFields(fieldsOfPart(view.rule, part.part), part.draft?.values ?? {}).length,
      0,
    );
  return [...waits, ...(empty === 0 ? [] : [pathwayWords.recordsMissing(empty)])];
};
