/** Versions of the team's protocol. A version never changes, so it is fetched once. */
import { queryOptions, type QueryClient } from '@tanstack/react-query';
import {
  activateProtocol,
  addProtocol,
  checkProtocol,
  listProtocols,
  readProtocolVersion,
} from '@weftway/contract/protocol';
import { call, newIdempotencyKey, type CallInput } from '../api/api-client.ts';

export const protocolQueries = {
  all: () =>
    queryOptions({
      queryKey: ['protocols'],
      queryFn: ({ signal }) => call(listProtocols, { signal }),
    }),
  version: (version: number) =>
    queryOptions({
      queryKey: ['protocols', 'versions', version],
      queryFn: ({ signal }) => call(readProtocolVersion, { params: { version }, signal }),
      staleTime: Infinity,
      gcTime: Infinity,
    }),
};

export const protocolMutations = {
  check: () => ({
    mutationFn: (protocol: unknown) => call(checkProtocol, { body: { protocol } }),
  }),
  add: (client: QueryClient) => {
    // One key for every try of the same document.
    let last = { text: '', key: '' };
    return {
      mutationFn: (body: CallInput<typeof addProtocol>['body']) => {
        const text = JSON.stringify(body);
        if (last.text !== text) last = { text, key: newIdempotencyKey() };
        return call(addProtocol, { body, idempotencyKey: last.key });
      },
      onSuccess: () => client.invalidateQueries({ queryKey: ['protocols'], exact: true }),
    };
  },
  /** Every pathway may have moved. */
  activate: (client: QueryClient, version: number) => ({
    mutationFn: (body: CallInput<typeof activateProtocol>['body']) =>
      call(activateProtocol, { params: { version }, body }),
    onSuccess: async () => {
      for (const noun of ['pathways', 'board', 'my-work', 'children', 'trail'])
        void client.invalidateQueries({ queryKey: [noun] });
      await client.invalidateQueries({ queryKey: ['protocols'] });
    },
  }),
};
