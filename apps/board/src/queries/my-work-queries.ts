/** What is mine to do. It is asked for again every minute, and after every act. */
import { queryOptions, type QueryClient } from '@tanstack/react-query';
import { readMyWork } from '@weftway/contract/board';
import { claimMilestone, releaseMilestone } from '@weftway/contract/pathway';
import { call } from '../api/api-client.ts';

const askAgainMs = 60_000;

export const myWorkQueries = {
  all: ['my-work'] as const,
  mine: () =>
    queryOptions({
      queryKey: ['my-work', 'mine'],
      queryFn: ({ client, queryKey, signal }) =>
        call(readMyWork, { signal, isBackground: client.getQueryData(queryKey) !== undefined }),
      refetchInterval: askAgainMs,
    }),
};

export interface ClaimInput {
  readonly childId: string;
  readonly milestone: string;
  readonly part: string;
}

const afterAct = (client: QueryClient) => () => {
  void client.invalidateQueries({ queryKey: myWorkQueries.all });
  void client.invalidateQueries({ queryKey: ['board'] });
};

export const myWorkMutations = {
  claim: (client: QueryClient) => ({
    mutationFn: ({ childId, milestone, part }: ClaimInput) =>
      call(claimMilestone, { params: { childId, milestone }, body: { part } }),
    onSettled: afterAct(client),
  }),
  release: (client: QueryClient) => ({
    mutationFn: ({ childId, milestone, part, reason }: ClaimInput & { readonly reason: string }) =>
      call(releaseMilestone, { params: { childId, milestone }, body: { part, reason } }),
    onSettled: afterAct(client),
  }),
};
