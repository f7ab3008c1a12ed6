/** Writes a previewed import, all or nothing: every row becomes events of its child, in one transaction. */
import { isDeepStrictEqual } from 'node:util';
import { acceptImport } from '@weftway/contract/caseload-import';
import type { ImportPreview } from '@weftway/contract/caseload-import';
import { endpoint } from '../http/endpoint.ts';
import { done, refused } from '../http/outcome.ts';
import { activeProtocolVersion } from '../protocol/protocol-store.ts';
import type { TrailEvent } from '../trail/trail-event.ts';
import { findImport, markAccepted, registryVersion } from './import-store.ts';
import type { PlannedRow } from './plan-import.ts';

interface Writing {
  readonly fileName: string;
  readonly protocolVersion: number;
  readonly newId: () => string;
}

const eventsOf = (row: PlannedRow, { fileName, protocolVersion, newId }: Writing): TrailEvent[] => {
  if (row.action !== 'add' && row.action !== 'update') return [];
  const childId = row.childId ?? newId();
  const isChanged = !isDeepStrictEqual(row.before, row.fields);
  const record: TrailEvent[] =
    row.before === null
      ? [{ kind: 'child-registered', childId, after: { fields: row.fields, protocolVersion } }]
      : isChanged
        ? [{ kind: 'child-edited', childId, before: { fields: row.before }, after: { fields: row.fields } }]
        : [];
  const history = row.history.map(({ milestone, performedOn, precision, isUnverified }): TrailEvent => ({
    kind: 'history-imported',
    childId,
    milestone,
    after: { performedOn, precision, isUnverified, results: {}, source: `Imported from ${fileName}` },
  }));
  return [...record, ...history];
};

export const acceptImportEndpoint = endpoint<typeof acceptImport>({
  operation: acceptImport,
  can: { action: 'run', subject: 'Import' },
  handle: async ({ trx, params, services }) => {
    const found = await findImport(trx, params.importId);
    if (found === null) return refused('not-found');
    const { preview, rows, baseVersion } = found;
    if (preview.status === 'accepted')
      return refused('already-done', { detail: 'This file has been taken in already.' });
    if (preview.faultCount > 0)
      return refused('import-has-faults', {
        detail: `${preview.faultCount} faults have to be put right in the file first.`,
      });
    if ((await registryVersion(trx)) !== baseVersion) {
      return refused('changed-meanwhile', {
        detail: 'The caseload has changed since this preview. Nothing was written. Check the file again.',
      });
    }
    const writing: Writing = {
      fileName: preview.fileName,
      protocolVersion: await activeProtocolVersion(trx),
      newId: services.newId,
    };
    const accepted: ImportPreview = { ...preview, status: 'accepted' };
    await markAccepted(trx, accepted);
    const line: TrailEvent = {
      kind: 'import-accepted',
      after: { importId: preview.id, fileName: preview.fileName, added: preview.added, updated: preview.updated },
    };
    return done([...rows.flatMap((row) => eventsOf(row, writing)), line], async () => accepted);
  },
});
