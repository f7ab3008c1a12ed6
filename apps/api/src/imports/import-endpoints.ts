/** Bringing a caseload in. */
import type { AnyEndpoint } from '../http/endpoint.ts';
import { acceptImportEndpoint } from './accept-import.ts';
import { previewImportEndpoint } from './preview-import.ts';

export const importEndpoints: readonly AnyEndpoint[] = [previewImportEndpoint, acceptImportEndpoint];
