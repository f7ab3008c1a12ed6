import { readApiDocument } from '@weftway/contract/api-document';
import type { ApiDocument } from '@weftway/contract/api-document';
import { endpoint } from '../http/endpoint.ts';
import type { AnyEndpoint } from '../http/endpoint.ts';
import { answered } from '../http/outcome.ts';
import { apiDocumentOf } from './api-document.ts';

/** Describes the endpoints that are served, itself among them. Made once, when it is first asked for. */
export const readApiDocumentEndpoint = (others: readonly AnyEndpoint[]): AnyEndpoint => {
  let made: ApiDocument | null = null;
  const own: AnyEndpoint = endpoint<typeof readApiDocument>({
    operation: readApiDocument,
    can: { action: 'read', subject: 'ApiReference' },
    handle: async () => {
      made ??= apiDocumentOf([...others, own]);
      return answered(made);
    },
  });
  return own;
};
