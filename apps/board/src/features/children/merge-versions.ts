/** Two versions of a record that began as one: what each changed, and where a choice is needed. */
import type { ChildFields } from '@weftway/contract/child';
import { fieldWords } from '../../words/children.ts';

export type Side = 'mine' | 'theirs';

export interface Difference {
  readonly field: keyof ChildFields;
  readonly changedBy: 'me' | 'them' | 'both';
}

/** Text that does not depend on the order in which an object's fields were written. */
const steadyText = (value: unknown): string =>
  JSON.stringify(value, (_key, one: unknown) =>
    typeof one === 'object' && one !== null && !Array.isArray(one)
      ? Object.fromEntries(Object.entries(one).toSorted(([a], [b]) => (a < b ? -1 : 1)))
      : one,
  );

export const isSame = (a: unknown, b: unknown): boolean => steadyText(a) === steadyText(b);

export const differencesBetween = (was: ChildFields, mine: ChildFields, theirs: ChildFields): Difference[] =>
  (Object.keys(fieldWords) as (keyof ChildFields)[]) // keys of a complete record
    .filter((field) => !isSame(mine[field], was[field]) || !isSame(theirs[field], was[field]))
    .map((field) => {
      if (isSame(mine[field], was[field])) return { field, changedBy: 'them' };
      return {
        field,
        changedBy: isSame(theirs[field], was[field]) || isSame(mine[field], theirs[field]) ? 'me' : 'both',
      };
    });

/** What only one changed is kept; where both did, the choice decides. */
export const mergedFields = (
  versions: { readonly mine: ChildFields; readonly theirs: ChildFields },
  differences: readonly Difference[],
  choices: ReadonlyMap<string, Side>,
): ChildFields => {
  const takenFromMine = differences.filter(
    ({ field, changedBy }) => changedBy === 'me' || (changedBy === 'both' && choices.get(field) !== 'theirs'),
  );
  return { ...versions.theirs, ...Object.fromEntries(takenFromMine.map(({ field }) => [field, versions.mine[field]])) };
};
