/** Previews that wait to be accepted. They hold names, so only the last one of each person is kept. */
import type { Knex } from 'knex';
import type { ImportPreview } from '@weftway/contract/caseload-import';
import type { PlannedRow } from './plan-import.ts';

export interface StoredImport {
  readonly preview: ImportPreview;
  readonly rows: readonly PlannedRow[];
  /** Last change of the registry that the preview saw. */
  readonly baseVersion: number;
}

interface ImportRow {
  readonly preview: string;
  readonly rows: string;
  readonly base_version: number;
}

/** Number of the last line of the trail that changed who is on the list or what is recorded about them. */
export const registryVersion = async (db: Knex): Promise<number> => {
  const kinds = [
    'child-registered',
    'child-edited',
    'child-transferred',
    'child-returned',
    'care-ended',
    'history-imported',
  ];
  const row: { seq: number | null } | undefined = await db('trail_lines')
    .whereIn('kind', kinds)
    .first(db.raw('max(seq) as seq'));
  return row?.seq ?? 0;
};

export interface NewImport {
  readonly preview: ImportPreview;
  readonly rows: readonly PlannedRow[];
  readonly digest: string;
  readonly byId: string;
  readonly at: string;
  readonly baseVersion: number;
}

export const keepPreview = async (trx: Knex, made: NewImport): Promise<void> => {
  await trx('imports').where({ by_id: made.byId, status: 'previewed' }).delete();
  await trx('imports').insert({
    id: made.preview.id,
    file_name: made.preview.fileName,
    digest: made.digest,
    preview: JSON.stringify(made.preview),
    rows: JSON.stringify(made.rows),
    status: 'previewed',
    by_id: made.byId,
    at: made.at,
    base_version: made.baseVersion,
  });
};

export const findImport = async (db: Knex, importId: string): Promise<StoredImport | null> => {
  const row: ImportRow | undefined = await db('imports')
    .where({ id: importId })
    .first('preview', 'rows', 'base_version');
  if (row === undefined) return null;
  // Both were written by keepPreview.
  return {
    preview: JSON.parse(row.preview) as ImportPreview,
    rows: JSON.parse(row.rows) as PlannedRow[],
    baseVersion: row.base_version,
  };
};

/** The rows are in the trail now and need not be kept twice. */
export const markAccepted = async (trx: Knex, preview: ImportPreview): Promise<void> => {
  await trx('imports')
    .where({ id: preview.id })
    .update({ status: 'accepted', preview: JSON.stringify(preview), rows: '[]' });
};
