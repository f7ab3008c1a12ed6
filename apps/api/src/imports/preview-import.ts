/** Reads a file and lists every problem. The caseload is not touched; the preview waits to be accepted. */
import { createHash } from 'node:crypto';
import { previewImport } from '@weftway/contract/caseload-import';
import type { ImportPreview } from '@weftway/contract/caseload-import';
import { endpoint } from '../http/endpoint.ts';
import { done } from '../http/outcome.ts';
import { limits } from '../limits.ts';
import { keepPreview, registryVersion } from './import-store.ts';
import { loadKnownCaseload } from './known-caseload.ts';
import { planImport } from './plan-import.ts';
import type { PlannedImport } from './plan-import.ts';

const shownFaults = 500;
const shownRows = 20;

const previewOf = (id: string, fileName: string, planned: PlannedImport): ImportPreview => {
  const count = (action: string): number => planned.rows.filter((row) => row.action === action).length;
  const faultCount = planned.faults.filter(({ severity }) => severity === 'fault').length;
  return {
    id,
    fileName,
    rows: planned.rows.length,
    added: count('add'),
    updated: count('update'),
    unchanged: count('unchanged'),
    faultCount,
    warningCount: planned.faults.length - faultCount,
    faults: planned.faults.slice(0, shownFaults),
    sample: planned.rows.slice(0, shownRows).map(({ row, action, fields }) => ({
      row,
      action,
      name: `${fields.firstName} ${fields.familyName}`.trim(),
      recordNumber: fields.recordNumber,
      bornOn: fields.bornOn,
      cleft: fields.cleft,
    })),
    status: 'previewed',
  };
};

export const previewImportEndpoint = endpoint<typeof previewImport>({
  operation: previewImport,
  can: { action: 'run', subject: 'Import' },
  bodyLimit: limits.importBytes,
  handle: async ({ trx, body, actor, today, now, services }) => {
    const planned = planImport(
      { text: body.text, dateOrder: body.dateOrder, today },
      await loadKnownCaseload(trx, body.text),
    );
    const preview = previewOf(services.newId(), body.fileName, planned);
    const digest = createHash('sha256').update(body.text).digest('hex');
    // A file with faults can never be accepted: its rows need not be kept.
    const rows = preview.faultCount > 0 ? [] : planned.rows;
    await keepPreview(trx, { preview, rows, digest, byId: actor.id, at: now, baseVersion: await registryVersion(trx) });
    return done([], async () => preview);
  },
});
