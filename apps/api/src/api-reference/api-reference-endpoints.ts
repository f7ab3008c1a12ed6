import type { AnyEndpoint } from '../http/endpoint.ts';
import { readApiDocumentEndpoint } from './read-api-document.ts';

export const apiReferenceEndpoints = (served: readonly AnyEndpoint[]): readonly AnyEndpoint[] => [
  readApiDocumentEndpoint(served),
];
