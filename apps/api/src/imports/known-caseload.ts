/** What a file is held against: children with its record numbers, their history, namesakes, sites, the protocol. */
import type { Knex } from 'knex';
import { childRowsByRecordNumber, fieldsOf } from '../children/child-view.ts';
import { completionsOf } from '../children/completions-view.ts';
import { knownNamesakes, nameKeyOf } from '../children/duplicate-view.ts';
import { sitesOf } from '../children/team-choices-view.ts';
import { activeProtocolVersion, loadProtocol } from '../protocol/protocol-store.ts';
import { readCsvFile } from './csv-file.ts';
import { readHeader } from './header-row.ts';
import type { KnownCaseload, KnownChild } from './plan-import.ts';

const recordNumbersIn = (text: string): string[] => {
  const file = readCsvFile(text);
  const place = readHeader(file.header).places.get('record_number');
  return place === undefined ? [] : file.rows.map(({ cells }) => (cells[place] ?? '').normalize('NFC').trim());
};

export const loadKnownCaseload = async (db: Knex, text: string): Promise<KnownCaseload> => {
  const rows = await childRowsByRecordNumber(db, recordNumbersIn(text));
  const completions = await completionsOf(
    db,
    [...rows.values()].map((row) => row.id),
  );
  const children = new Map(
    [...rows].map(([number, row]): [string, KnownChild] => {
      const done = completions.get(row.id) ?? [];
      return [
        number,
        {
          id: row.id,
          fields: fieldsOf(row),
          recorded: new Set(done.map(({ milestone, on }) => `${milestone}|${on}`)),
          recordedMilestones: new Set(done.map(({ milestone }) => milestone)),
        },
      ];
    }),
  );
  const protocol = await loadProtocol(db, await activeProtocolVersion(db));
  return {
    children,
    namesakes: await knownNamesakes(db),
    nameKeyOf,
    sites: await sitesOf(db),
    protocolMilestones: new Set(protocol.milestones.map((milestone) => milestone.id)),
  };
};
