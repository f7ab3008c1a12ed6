/** The audit trail, page by page, and its proof. */
import { infiniteQueryOptions, queryOptions } from '@tanstack/react-query';
import { listChildren } from '@weftway/contract/child';
import { listMembers } from '@weftway/contract/member';
import { readTrail, verifyTrail } from '@weftway/contract/trail';
import { call } from '../api/api-client.ts';

export interface TrailFilter {
  readonly log: 'changes' | 'reads';
  readonly child?: string | undefined;
  readonly member?: string | undefined;
  readonly kind?: string | undefined;
  readonly from?: string | undefined;
  readonly to?: string | undefined;
}

export const trailQueries = {
  lines: (filter: TrailFilter) =>
    infiniteQueryOptions({
      queryKey: ['trail', 'lines', filter],
      queryFn: ({ pageParam, signal }) =>
        call(readTrail, {
          query: { ...filter, limit: 50, ...(pageParam === null ? {} : { cursor: pageParam }) },
          signal,
        }),
      initialPageParam: null as string | null, // the first page has no cursor
      getNextPageParam: (page) => page.next,
    }),
  /** For the filter by member, and to name members in what was changed. */
  members: () =>
    queryOptions({
      queryKey: ['trail', 'members'],
      queryFn: ({ signal }) => call(listMembers, { signal }),
      staleTime: 300_000,
    }),
  /** For the filter by child. */
  children: (text: string) =>
    queryOptions({
      queryKey: ['trail', 'children', text],
      queryFn: ({ signal }) => call(listChildren, { query: { q: text, limit: 12 }, signal }),
      enabled: text.trim().length > 1,
      staleTime: 60_000,
    }),
};

export const trailMutations = {
  verify: () => ({ mutationFn: () => call(verifyTrail, {}) }),
};
