/** The registry and children's records. */
import { infiniteQueryOptions, queryOptions, type QueryClient } from '@tanstack/react-query';
import {
  assignTrainees,
  editChild,
  endCare,
  findDuplicates,
  listChildren,
  readChild,
  registerChild,
  transferChild,
  type Child,
  type ChildFields,
} from '@weftway/contract/child';
import { listChildChanges, readRecordChoices } from '@weftway/contract/child-history';
import type { PlainDate } from '@weftway/calendar/plain-date';
import { call } from '../api/api-client.ts';

export type RegistryOrder = 'name' | 'birth' | 'late';

export interface PossibleChild {
  readonly firstName: string;
  readonly familyName: string;
  readonly recordNumber: string;
  readonly bornOn: PlainDate | null;
}

const pageSize = 50;

export const childQueries = {
  list: (q: string, order: RegistryOrder) =>
    infiniteQueryOptions({
      queryKey: ['children', 'list', { q, order }],
      queryFn: ({ signal, pageParam }) =>
        call(listChildren, {
          query: { q, order, limit: pageSize, ...(pageParam === '' ? {} : { cursor: pageParam }) },
          signal,
        }),
      initialPageParam: '',
      getNextPageParam: (page) => page.next,
      placeholderData: (previous) => previous,
    }),
  one: (childId: string) =>
    queryOptions({
      queryKey: ['children', childId],
      queryFn: ({ signal }) => call(readChild, { params: { childId }, signal }),
    }),
  changes: (childId: string) =>
    infiniteQueryOptions({
      queryKey: ['children', childId, 'changes'],
      queryFn: ({ signal, pageParam }) =>
        call(listChildChanges, {
          params: { childId },
          query: { limit: 20, ...(pageParam === '' ? {} : { cursor: pageParam }) },
          signal,
        }),
      initialPageParam: '',
      getNextPageParam: (page) => page.next,
    }),
  /** Sites, lead clinicians and trainees that a record may name. */
  choices: () =>
    queryOptions({
      queryKey: ['members', 'record-choices'],
      queryFn: ({ signal }) => call(readRecordChoices, { signal }),
      staleTime: 300_000,
    }),
  duplicates: (child: PossibleChild) =>
    queryOptions({
      queryKey: ['children', 'duplicates', child],
      queryFn: async ({ signal }) =>
        (await call(findDuplicates, { body: { ...child, exceptId: null }, signal })).candidates,
      staleTime: 30_000,
    }),
};

/** The record is in the cache; lists, board and pathway are stale from now on. */
const take = (client: QueryClient, child: Child): void => {
  client.setQueryData(childQueries.one(child.id).queryKey, child);
  void client.invalidateQueries({ queryKey: ['children', 'list'] });
  void client.invalidateQueries({ queryKey: ['children', child.id, 'changes'] });
  for (const key of ['board', 'my-work', 'pathways', 'trail']) void client.invalidateQueries({ queryKey: [key] });
};

export const childMutations = {
  /** `key`: one for one intent, so that a repeated press adds no second child. */
  register: (client: QueryClient, key: string) => ({
    mutationFn: ({ fields, isDistinct }: { readonly fields: ChildFields; readonly isDistinct: boolean }) =>
      call(registerChild, { body: { fields, isDistinct }, idempotencyKey: key }),
    onSuccess: (child: Child) => take(client, child),
  }),
  edit: (client: QueryClient, childId: string) => ({
    mutationFn: ({ fields, version }: { readonly fields: ChildFields; readonly version: number }) =>
      call(editChild, { params: { childId }, body: fields, ifMatch: version }),
    onSuccess: (child: Child) => take(client, child),
  }),
  transfer: (client: QueryClient, childId: string) => ({
    mutationFn: (body: { readonly on: string | null; readonly to: string; readonly reason: string }) =>
      call(transferChild, { params: { childId }, body }),
    onSuccess: (child: Child) => take(client, child),
  }),
  endCare: (client: QueryClient, childId: string) => ({
    mutationFn: (body: { readonly on: string; readonly reason: string }) =>
      call(endCare, { params: { childId }, body }),
    onSuccess: (child: Child) => take(client, child),
  }),
  assignTrainees: (client: QueryClient, childId: string) => ({
    mutationFn: (memberIds: string[]) => call(assignTrainees, { params: { childId }, body: { memberIds } }),
    onSuccess: () => void client.invalidateQueries({ queryKey: ['children', childId] }),
  }),
};
