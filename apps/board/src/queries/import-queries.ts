/** Bringing a caseload in from a file. */
import type { QueryClient } from '@tanstack/react-query';
import { acceptImport, previewImport, type ImportPreview } from '@weftway/contract/caseload-import';
import type { DateOrder } from '@weftway/calendar/written-date';
import { call } from '../api/api-client.ts';

export interface ImportFile {
  readonly fileName: string;
  readonly text: string;
  readonly dateOrder: DateOrder;
}

export const importMutations = {
  preview: () => ({ mutationFn: (file: ImportFile): Promise<ImportPreview> => call(previewImport, { body: file }) }),
  accept: (client: QueryClient) => ({
    mutationFn: (importId: string): Promise<ImportPreview> => call(acceptImport, { params: { importId } }),
    onSuccess: () => client.invalidateQueries({ predicate: ({ queryKey }) => queryKey[0] !== 'session' }),
  }),
};
