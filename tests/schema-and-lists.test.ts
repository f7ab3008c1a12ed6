/** Migrations spell closed lists out and must not follow the code by themselves: here the two are held together. */
import type { Knex } from 'knex';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { sexes } from '@weftway/contract/child';
import { memberStatuses } from '@weftway/contract/member';
import { protocolStatuses } from '@weftway/contract/protocol';
import { defaultProtocol } from '@weftway/pathway/default-protocol';
import { milestoneStates } from '@weftway/pathway/milestone-state';
import { disciplines } from '@weftway/team/disciplines';
import { lanes } from '@weftway/team/lanes';
import { standings } from '@weftway/team/standings';
import { openDatabase } from '../apps/api/src/db/connection.ts';

/** The list of the domain behind each CHECK; lists that only the table knows are spelled out. */
const listOf: Readonly<Record<string, readonly string[]>> = {
  'members.standing': standings,
  'members.status': memberStatuses,
  'protocols.status': protocolStatuses,
  'children.sex': sexes,
  'board_rows.state': milestoneStates,
  'board_rows.lane': lanes,
  'mailed_links.purpose': ['invitation', 'reset'],
  'outbox.kind': ['mail', 'reset-request'],
  'imported_completions.date_precision': ['day', 'month', 'year'],
  'waivers.kind': ['waived', 'not-recoverable'],
  'imports.status': ['previewed', 'accepted'],
};

interface Table {
  readonly name: string;
  readonly sql: string;
}

let db: Knex;
let tables: readonly Table[];

beforeAll(async () => {
  db = openDatabase(':memory:');
  await db.migrate.latest();
  tables = await db.raw(
    `select name, sql from sqlite_master where type = 'table' and name not like 'sqlite_%' and name not like 'knex_%'`,
  );
});
afterAll(async () => db.destroy());

/** `column -> values` of every CHECK that lists words. */
const checksOf = ({ name, sql }: Table): [string, string[]][] =>
  [...sql.matchAll(/check \((\w+) in \(([^)]*)\)\)/g)]
    .map(([, column, values]): [string, string[]] => [
      `${name}.${String(column)}`,
      [...String(values).matchAll(/'([^']*)'/g)].map((match) => String(match[1])),
    ])
    .filter(([, values]) => values.length > 0);

describe('closed lists', () => {
  test('of the tables are those of the domain, in words and in order', () => {
    const checks = tables.flatMap(checksOf);
    expect(checks.length).toBeGreaterThan(7);
    for (const [place] of checks) expect(listOf[place], `${place} has a list that nothing is held to`).toBeDefined();
    for (const [place, values] of checks) expect(values, place).toEqual(listOf[place]);
  });

  test('guard the columns that the code takes as given', () => {
    const guarded = tables.flatMap(checksOf).map(([place]) => place);
    for (const place of ['members.standing', 'members.status', 'protocols.status', 'board_rows.state', 'children.sex'])
      expect(guarded).toContain(place);
  });

  test('of lanes and disciplines are used whole by the default protocol', () => {
    expect(new Set(defaultProtocol.milestones.map((rule) => rule.lane))).toEqual(new Set(lanes));
    const signers = new Set(
      defaultProtocol.milestones.flatMap((rule) => [
        ...rule.mayClaim,
        ...rule.signatures.flatMap((part) => part.disciplines),
      ]),
    );
    for (const signer of signers) expect([...disciplines, 'lead-clinician']).toContain(signer);
  });
});

describe('tables', () => {
  test('are strict, but for the one that the session library reads', () => {
    expect(tables.filter(({ sql }) => !/\)\s*strict\s*$/i.test(sql)).map(({ name }) => name)).toEqual(['sessions']);
  });

  test('guard every 0/1 column with a check', () => {
    const unguarded = tables.flatMap(({ name, sql }) =>
      [...sql.matchAll(/^\s*((?:is|has|needs|may)_\w+) integer not null(.*)$/gm)]
        .filter(([, , rest]) => !String(rest).includes('check'))
        .map(([, column]) => `${name}.${String(column)}`),
    );
    // The projection is made by the planner and can be thrown away.
    expect(unguarded.filter((place) => !place.startsWith('board_rows.'))).toEqual([]);
  });

  test('can be taken down and set up again', async () => {
    const other = openDatabase(':memory:');
    await other.migrate.latest();
    await other.migrate.rollback(undefined, true);
    const left: Table[] = await other.raw(
      `select name from sqlite_master where type = 'table' and name not like 'sqlite_%' and name not like 'knex_%'`,
    );
    expect(left).toEqual([]);
    await other.migrate.latest();
    await other.destroy();
  });
});
