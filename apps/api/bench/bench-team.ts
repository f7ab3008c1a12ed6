/** A team in a file of its own: real members, invented children, and a board of a given size, written straight into the tables. */
import fs from 'node:fs';
import http from 'node:http';
import type { AddressInfo } from 'node:net';
import os from 'node:os';
import path from 'node:path';
import Database from 'better-sqlite3';
import type { Knex } from 'knex';
import { v7 as newId } from 'uuid';
import { addDays } from '@weftway/calendar/plain-date';
import { defaultProtocol } from '@weftway/pathway/default-protocol';
import { disciplines } from '@weftway/team/disciplines';
import { createApp } from '../src/app.ts';
import { openDatabase } from '../src/db/connection.ts';
import { readEnv } from '../src/env.ts';
import type { Services } from '../src/http/services.ts';
import { hashPassword } from '../src/sign-in/password-hash.ts';
import { startServices } from '../src/start-services.ts';
import { foundTeam } from '../src/team/found-team.ts';
import { benchToday, numbers, sampleChildren } from './sample-facts.ts';

export const benchPassword = 'a steady hand on the loom';
export const childrenOnBoard = 500;
export const rowsEach = 30;

const names = [
  'Abara',
  'Bielak',
  'Carver',
  'Demirel',
  'Ekdal',
  'Farahani',
  'Gwilym',
  'Huamán',
  'Iglesias',
  'Jama',
  'Kamau',
  'Lindqvist',
  'Mensah',
  'Novák',
  'Okoye',
  'Paredes',
  'Quispe',
  'Saunders',
  'Tavares',
  'Wrońska',
];
const states = ['late', 'closing', 'open', 'open', 'open', 'waiting', 'held', 'ahead', 'ahead', 'ahead'];

const childRow = (id: string, at: number, birth: string, cleft: string) => ({
  id,
  version: 1,
  pathway_version: 1,
  first_name: `Child${String(at)}`,
  family_name: names[at % names.length] ?? '',
  record_number: `B-${String(100_000 + at)}`,
  search_text: `child${String(at)}`,
  born_on: birth,
  due_on: null,
  is_birth_estimated: 0,
  gestation_days: 273,
  sex: 'female',
  cleft,
  is_cleft_provisional: 0,
  flags: '[]',
  syndromes: '[]',
  referred_on: null,
  prenatal_referral_on: null,
  team_start_on: null,
  site: at % 3 === 0 ? 'Saltmarsh' : 'Tern Quay',
  lead_clinician_id: 'surgeon',
  contacts: '[]',
  alerts: '[]',
  notes: '',
  protocol_version: defaultProtocol.version,
  transferred_on: null,
  transferred_to: null,
  care_ended_on: null,
  care_ended_reason: null,
  registered_at: `${birth}T09:00:00.000Z`,
});

/** So many milestones of the protocol, from every lane. */
const evenly = (count: number) => {
  const { milestones } = defaultProtocol;
  return milestones.filter(
    (_rule, at) =>
      Math.floor((at * count) / milestones.length) !== Math.floor(((at - 1) * count) / milestones.length) || at === 0,
  );
};

const boardRows = (childId: string, count: number, isOnBoard: boolean, next: (below: number) => number) =>
  evenly(count).map((rule) => {
    const latest = addDays(benchToday, next(420) - 120);
    const owners = rule.signatures.map(({ part, disciplines: signers }) => [
      part,
      next(6) === 0 ? null : signers[0] === 'lead-clinician' ? 'surgeon' : (signers[0] ?? null),
    ]);
    return {
      child_id: childId,
      milestone: rule.id,
      milestone_id: rule.id,
      lane: rule.lane,
      state: states[next(states.length)] ?? 'open',
      is_due: next(2),
      squeezed_days: null,
      is_lapsed: 0,
      occurrence: 1,
      earliest: addDays(latest, -60 - next(4) * 30),
      target: addDays(latest, -30),
      latest,
      closing: addDays(latest, -28),
      changes_on: addDays(latest, 1),
      owners: JSON.stringify(owners),
      is_unowned: owners.some(([, owner]) => owner === null) ? 1 : 0,
      is_on_board: isOnBoard ? 1 : 0,
    };
  });

/** One prepared statement for each table: thousands of rows through the query builder would take most of the run. */
const inserter = (file: Database.Database, table: string) => {
  const statements = new Map<string, Database.Statement>();
  return (row: Readonly<Record<string, unknown>>): void => {
    const columns = Object.keys(row);
    const sql = `insert into ${table} (${columns.join(', ')}) values (${columns.map((column) => `@${column}`).join(', ')})`;
    const statement = statements.get(sql) ?? file.prepare(sql);
    statements.set(sql, statement);
    statement.run(row);
  };
};

const fill = (databaseFile: string, children: number, onBoard: number): string[] => {
  const next = numbers(7);
  const file = new Database(databaseFile);
  const [addChild, addToBoard, addRow] = [
    inserter(file, 'children'),
    inserter(file, 'board_children'),
    inserter(file, 'board_rows'),
  ];
  const ids = sampleChildren(children).map((child, at) => ({ id: newId(), child, at }));
  file.transaction(() => {
    for (const { id, child, at } of ids) {
      addChild(childRow(id, at, child.birth, child.cleft));
      addToBoard({ child_id: id, changed_at_version: 1 });
      for (const row of boardRows(id, at < onBoard ? rowsEach : 45, at < onBoard, next)) addRow(row);
    }
    file.prepare('update board_counter set version = 1, rolled_on = ?').run(benchToday);
  })();
  file.close();
  return ids.map(({ id }) => id);
};

export interface BenchTeam {
  readonly db: Knex;
  readonly services: Services;
  readonly databaseFile: string;
  readonly childIds: readonly string[];
  /** Where the product listens. */
  readonly address: string;
  readonly close: () => Promise<void>;
}

/** The product on a port, over a team with so many children, of whom some have rows on the board. */
export const openBenchTeam = async (children: number, onBoard: number = childrenOnBoard): Promise<BenchTeam> => {
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'weftway-bench-'));
  const env = readEnv({ ...process.env, WEFTWAY_DATA: folder, WEFTWAY_LOG: 'silent', WEFTWAY_TODAY: benchToday });
  const db = openDatabase(env.databaseFile);
  await db.migrate.latest();
  const passwordHash = await hashPassword(benchPassword);
  const members = disciplines.map((one) => ({
    id: one,
    passwordHash,
    fields: {
      name: `Test ${one}`,
      email: `${one}@tern-estuary.example`,
      standing: 'member' as const,
      disciplines: [one],
      supervisorId: null,
    },
  }));
  await db.transaction((trx) =>
    foundTeam(trx, {
      name: 'Tern Estuary Cleft Team',
      zone: 'UTC',
      sites: ['Tern Quay', 'Saltmarsh'],
      protocol: defaultProtocol,
      members,
      at: `${benchToday}T08:00:00.000Z`,
    }),
  );
  const childIds = fill(env.databaseFile, children, onBoard);
  const services = startServices(db, env, 'UTC');
  const app = createApp(services, {
    sessionSecret: 'a secret that is only good for measuring',
    isSecure: false,
    sessionCleanupInterval: 0,
    limitsRate: false,
  });
  const server = http.createServer(app).listen(0, '127.0.0.1');
  await new Promise((resolve) => server.once('listening', resolve));
  return {
    db,
    services,
    databaseFile: env.databaseFile,
    childIds,
    address: `http://127.0.0.1:${String((server.address() as AddressInfo).port)}`, // listening on a port
    close: async () => {
      server.closeAllConnections();
      server.close();
      services.accessLog.close();
      await db.destroy();
      fs.rmSync(folder, { recursive: true, force: true });
    },
  };
};
