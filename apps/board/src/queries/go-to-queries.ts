/** Finding a child by a few letters, from anywhere. */
import { queryOptions } from '@tanstack/react-query';
import { listChildren } from '@weftway/contract/child';
import { call } from '../api/api-client.ts';

export const goToQueries = {
  children: (text: string) =>
    queryOptions({
      queryKey: ['children', 'go-to', text] as const,
      queryFn: ({ signal }) => call(listChildren, { query: { q: text, limit: 8 }, signal }),
      enabled: text.trim().length > 0,
    }),
};
