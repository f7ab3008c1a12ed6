/** The filter of the trail lives in the address, so that it can be kept, sent and gone back to. */
import { useSearchParams } from 'react-router-dom';
import type { TrailFilter } from '../../queries/trail-queries.ts';

const names = ['child', 'member', 'kind', 'from', 'to'] as const;
type FilterName = (typeof names)[number];

const isDate = (text: string): boolean => /^\d{4}-\d{2}-\d{2}$/.test(text) && !Number.isNaN(Date.parse(text));

export const filterIn = (search: URLSearchParams): TrailFilter => {
  const read = (name: FilterName): string | undefined => {
    const text = search.get(name) ?? '';
    return text === '' || ((name === 'from' || name === 'to') && !isDate(text)) ? undefined : text;
  };
  return {
    log: search.get('log') === 'reads' ? 'reads' : 'changes',
    child: read('child'),
    member: read('member'),
    kind: read('kind'),
    from: read('from'),
    to: read('to'),
  };
};

export interface FilterState {
  readonly filter: TrailFilter;
  readonly isNarrowed: boolean;
  readonly set: (name: FilterName, value: string) => void;
  readonly setLog: (log: 'changes' | 'reads') => void;
  readonly clear: () => void;
}

export const useTrailFilter = (): FilterState => {
  const [search, setSearch] = useSearchParams();
  const filter = filterIn(search);
  const put = (changes: readonly (readonly [string, string])[]) =>
    setSearch(
      (now) => {
        const next = new URLSearchParams(now);
        for (const [name, value] of changes) {
          if (value === '') next.delete(name);
          else next.set(name, value);
        }
        return next;
      },
      { preventScrollReset: true },
    );
  return {
    filter,
    isNarrowed: names.some((name) => filter[name] !== undefined),
    set: (name, value) => put([[name, value]]),
    // The kinds of one log mean nothing in the other.
    setLog: (log) =>
      put([
        ['log', log === 'changes' ? '' : log],
        ['kind', ''],
      ]),
    clear: () => put(names.map((name) => [name, ''] as const)),
  };
};
