/** The description of the API. It changes only with a new version of the server. */
import { queryOptions } from '@tanstack/react-query';
import { readApiDocument } from '@weftway/contract/api-document';
import { call } from '../api/api-client.ts';

export const apiReferenceQueries = {
  document: () =>
    queryOptions({
      queryKey: ['api-reference'],
      queryFn: ({ signal }) => call(readApiDocument, { signal }),
      staleTime: Infinity,
    }),
};
