/** The trail keeps private evidence as it was written; readers outside the signing disciplines do not see it here either. */
import type { Knex } from 'knex';
import type { Protocol } from '@weftway/pathway/protocol';
import { hiddenFields, keptPrivate } from '../pathways/private-evidence.ts';
import type { Reader } from '../pathways/private-evidence.ts';
import { ruleIdOf, rulesOf } from '../pathways/whole-protocol.ts';
import { loadProtocol } from '../protocol/protocol-store.ts';
import type { TrailRow } from './read-lines-view.ts';

type Json = Readonly<Record<string, unknown>>;

const isObject = (value: unknown): value is Json =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

const blank = (values: unknown, hidden: readonly string[]): unknown =>
  isObject(values)
    ? Object.fromEntries(
        Object.entries(values).map(([name, value]) => [name, hidden.includes(name) ? keptPrivate : value]),
      )
    : values;

/** Values stand under `values` (drafts), `signature.values` (signatures) or `results` (imports). */
const withoutPrivate = (payload: unknown, hidden: readonly string[]): unknown => {
  if (!isObject(payload) || hidden.length === 0) return payload;
  const { signature } = payload;
  return {
    ...payload,
    ...('values' in payload ? { values: blank(payload['values'], hidden) } : {}),
    ...('results' in payload ? { results: blank(payload['results'], hidden) } : {}),
    ...(isObject(signature) ? { signature: { ...signature, values: blank(signature['values'], hidden) } } : {}),
  };
};

/** Long texts that say again what stands beside them. */
const shortened = (payload: unknown): unknown => {
  if (!isObject(payload)) return payload;
  const { signedText: _again, document, ...rest } = payload;
  return isObject(document)
    ? {
        ...rest,
        name: document['name'],
        milestones: Array.isArray(document['milestones']) ? document['milestones'].length : 0,
      }
    : rest;
};

export interface Contents {
  readonly before: unknown;
  readonly after: unknown;
}

/** Names of the fields of a line that the reader may not see, by the version that the child follows and the active one. */
const hiddenOf = (row: TrailRow, protocol: Protocol | null, reader: Reader): readonly string[] =>
  protocol === null || row.milestone === null
    ? []
    : hiddenFields(rulesOf(protocol).get(ruleIdOf(row.milestone)), reader, row.lead_clinician_id);

/** What stood before and after, as this reader may see it. */
export const contentsOf = async (db: Knex, row: TrailRow, reader: Reader): Promise<Contents> => {
  const protocol =
    row.protocol_version === null || row.milestone === null ? null : await loadProtocol(db, row.protocol_version);
  const hidden = hiddenOf(row, protocol, reader);
  const shown = (text: string): unknown => withoutPrivate(shortened(JSON.parse(text)), hidden);
  return { before: shown(row.before), after: shown(row.after) };
};

/** "Palate repair (SURG-03)"; the id alone where the child's version does not know it. */
export const milestoneWords = async (db: Knex, row: TrailRow): Promise<string | null> => {
  if (row.milestone === null || row.protocol_version === null) return row.milestone;
  const title = rulesOf(await loadProtocol(db, row.protocol_version)).get(ruleIdOf(row.milestone))?.title;
  return title === undefined ? row.milestone : `${title} (${row.milestone})`;
};
