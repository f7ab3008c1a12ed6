import { execFile } from 'node:child_process';
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';
import Database from 'better-sqlite3';
import type { Knex } from 'knex';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { defaultProtocol } from '@weftway/pathway/default-protocol';
import { openDatabase } from '../db/connection.ts';
import { childFields } from '../testing/child-fields.ts';
import { addChild, sign } from '../testing/pathway-builders.ts';
import { createTestApp } from '../testing/test-app.ts';
import type { TestApp } from '../testing/test-app.ts';
import { foundTeam } from '../team/found-team.ts';
import { AccessLog } from './access-log.ts';
import { appendEvents } from './append-events.ts';
import { writeAnchor } from './trail-anchors.ts';
import { askOf } from './verify-ask.ts';
import { proveChanges, proveReads } from './verify-chains.ts';

const command = async (folder: string): Promise<{ code: number; text: string }> => {
  try {
    const { stdout } = await promisify(execFile)(
      process.execPath,
      ['--import', 'tsx', 'apps/api/scripts/trail-verify.ts'],
      { env: { ...process.env, WEFTWAY_DATA: folder } },
    );
    return { code: 0, text: stdout };
  } catch (error) {
    const { code, stdout, stderr } = error as { code: number; stdout: string; stderr: string }; // what execFile rejects with
    return { code, text: stdout + stderr };
  }
};

const author = {
  at: '2026-12-01T09:00:00.000Z',
  actorId: null,
  actorName: 'Founding',
  actorRole: '',
  requestId: 'test',
};
const word = 'Wrenfield';

/** A small installation in a folder: a team, and forty children that each were registered and changed once. */
const install = async (folder: string): Promise<void> => {
  const db = openDatabase(path.join(folder, 'weftway.sqlite'));
  await db.migrate.latest();
  await db.transaction(async (trx) => {
    await foundTeam(trx, {
      name: 'Tern Estuary Cleft Team',
      zone: 'UTC',
      sites: ['Tern Quay'],
      protocol: defaultProtocol,
      members: [],
      at: author.at,
    });
    for (let number = 1; number <= 40; number += 1) {
      const childId = `child-${number}`;
      await appendEvents(
        trx,
        [
          {
            kind: 'child-registered',
            childId,
            after: { fields: childFields({ recordNumber: `TE-${1000 + number}` }), protocolVersion: 1 },
          },
        ],
        author,
      );
      await appendEvents(
        trx,
        [
          {
            kind: 'child-edited',
            childId,
            after: {
              fields: childFields({
                recordNumber: `TE-${1000 + number}`,
                familyName: `${word}${String(number).padStart(2, '0')}`,
              }),
            },
          },
        ],
        author,
      );
    }
  });
  await db.destroy();
};

/** Somebody with the file and a tool of their own. */
const tamper = (folder: string, statements: (db: Database.Database) => void): void => {
  const db = new Database(path.join(folder, 'weftway.sqlite'));
  for (const { name } of db.prepare(`select name from sqlite_master where type = 'trigger'`).all() as {
    name: string;
  }[])
    db.exec(`drop trigger ${name}`); // one column
  statements(db);
  db.pragma('wal_checkpoint(truncate)');
  db.close();
};

const prove = async (folder: string, file: string | null = null) => {
  const db: Knex = openDatabase(path.join(folder, 'weftway.sqlite'));
  try {
    return await proveChanges(askOf(db), { file });
  } finally {
    await db.destroy();
  }
};

describe('an installation on disk', () => {
  let origin: string;
  let folder: string;
  beforeAll(async () => {
    origin = fs.mkdtempSync(path.join(os.tmpdir(), 'weftway-trail-'));
    await install(origin);
  });
  beforeEach(() => {
    folder = fs.mkdtempSync(path.join(os.tmpdir(), 'weftway-trail-copy-'));
    for (const name of fs.readdirSync(origin)) fs.copyFileSync(path.join(origin, name), path.join(folder, name));
  });
  afterEach(() => fs.rmSync(folder, { recursive: true, force: true }));
  afterAll(() => fs.rmSync(origin, { recursive: true, force: true }));

  test('that nobody touched holds', async () => {
    expect(await prove(folder)).toEqual({ lines: 83, broken: null });
  });

  test('L02: one byte changed in the file is found, and the line is named', async () => {
    tamper(folder, () => undefined);
    const file = path.join(folder, 'weftway.sqlite');
    const bytes = fs.readFileSync(file);
    // The table of children holds the name too; every place but the trail's is passed over.
    const needle = Buffer.from(`"familyName":"${word}17"`);
    const at = bytes.indexOf(needle);
    expect(at).toBeGreaterThan(0);
    expect(bytes.indexOf(needle, at + 1)).toBe(-1);
    const place = at + needle.length - 2;
    bytes.writeUInt8(bytes.readUInt8(place) ^ 1, place);
    fs.writeFileSync(file, bytes);
    const { broken } = await prove(folder);
    expect(broken).toEqual({
      seq: 37,
      kind: 'child-edited',
      why: 'What line 37 wrote was altered: its digest does not fit.',
    });
    const answer = await command(folder);
    expect(answer.code).toBe(1);
    expect(answer.text).toContain('BROKEN at line 37 (child-edited)');
  });

  test.each([
    ['actor_name', `'Somebody Else'`],
    ['at', `'2026-12-01T09:00:00.001Z'`],
    ['child_id', `'child-2'`],
    ['milestone', `'SURG-03'`],
    ['after_digest', `'${'1'.repeat(64)}'`],
    ['hash', `'${'1'.repeat(64)}'`],
  ])('a changed %s of a line is found', async (column, value) => {
    tamper(folder, (db) => void db.exec(`update trail_lines set ${column} = ${value} where seq = 20`));
    const { broken } = await prove(folder);
    expect(broken?.seq).toBe(20);
    expect(broken?.why).toMatch(/^Line 20 itself was altered/);
  });

  test('L04: two lines swapped are found', async () => {
    tamper(folder, (db) => {
      db.pragma('foreign_keys = off');
      for (const table of ['trail_lines', 'trail_payloads'])
        db.exec(
          `update ${table} set seq = -1 where seq = 30; update ${table} set seq = 30 where seq = 31; update ${table} set seq = 31 where seq = -1`,
        );
    });
    const { broken } = await prove(folder);
    expect(broken).toMatchObject({ seq: 30, why: 'Line 30 does not join the line before it.' });
  });

  test('a line taken out, and a payload taken out, are found', async () => {
    tamper(folder, (db) => {
      db.pragma('foreign_keys = off');
      db.exec('delete from trail_payloads where seq = 44');
    });
    expect((await prove(folder)).broken).toMatchObject({ seq: 44, why: 'What line 44 says was changed is missing.' });
    tamper(folder, (db) => {
      db.pragma('foreign_keys = off');
      db.exec('delete from trail_lines where seq = 40');
    });
    expect((await prove(folder)).broken).toMatchObject({
      seq: 40,
      kind: 'missing',
      why: 'Line 40 is missing; the next one is line 41.',
    });
  });

  test('L03: the last lines cut off still hold in themselves, and the anchor tells', async () => {
    const anchors = path.join(folder, 'anchors.jsonl');
    const db = openDatabase(path.join(folder, 'weftway.sqlite'));
    const head: { seq: number; hash: string } | undefined = await db('trail_lines')
      .orderBy('seq', 'desc')
      .first('seq', 'hash');
    await db.destroy();
    const nothing = { seq: 0, hash: '0'.repeat(64) };
    writeAnchor(anchors, { at: '2026-12-01T10:00:00.000Z', changes: head ?? nothing, reads: nothing });
    expect((await prove(folder, anchors)).broken).toBeNull();
    tamper(folder, (file) => {
      file.pragma('foreign_keys = off');
      for (const table of ['trail_payloads', 'trail_lines']) file.exec(`delete from ${table} where seq > 73`);
    });
    expect(await prove(folder)).toEqual({ lines: 73, broken: null });
    expect((await prove(folder, anchors)).broken).toEqual({
      seq: 83,
      kind: 'anchor',
      why: 'The anchor of 2026-12-01T10:00:00.000Z knows line 83, which is gone: the end was cut off.',
    });
    const answer = await command(folder);
    expect(answer.code).toBe(1);
    expect(answer.text).toContain('the end was cut off');
  });

  test('the command counts the lines and exits 0 while the chains hold', async () => {
    const log = new AccessLog(path.join(folder, 'access.sqlite'));
    const line = {
      at: author.at,
      actorId: 'surgeon',
      actorName: 'Test surgeon',
      actorRole: 'Cleft surgeon',
      operation: 'readChild',
      childId: 'child-1',
      requestId: 'r',
    };
    log.append(line);
    log.append({ ...line, childId: 'child-2' });
    log.close();
    const answer = await command(folder);
    expect(answer).toEqual({
      code: 0,
      text: 'Changes: 83 lines\n  the chain holds\nReads: 2 lines\n  the chain holds\n',
    });
  });

  test('the command says so when there is nothing to prove', async () => {
    const answer = await command(path.join(folder, 'nowhere'));
    expect(answer.code).toBe(1);
    expect(answer.text).toMatch(/could not be read/);
  });
});

describe('the log of reads', () => {
  test('is proved line by line as well', async () => {
    const file = path.join(fs.mkdtempSync(path.join(os.tmpdir(), 'weftway-reads-')), 'access.sqlite');
    const log = new AccessLog(file);
    for (let number = 1; number <= 6; number += 1) {
      log.append({
        at: author.at,
        actorId: 'nurse',
        actorName: 'Test nurse',
        actorRole: 'Cleft nurse',
        operation: 'readPathway',
        childId: `child-${number}`,
        requestId: `r${number}`,
      });
    }
    const source = {
      after: (seq: number, limit: number) => log.after(seq, limit),
      hashOf: (seq: number) => log.hashOf(seq),
    };
    expect(await proveReads(source, { file: null })).toEqual({ lines: 6, broken: null });
    const other = new Database(file);
    expect(() => other.exec(`update access_lines set child_id = 'x' where seq = 4`)).toThrow(/append-only/);
    expect(() => other.exec('delete from access_lines')).toThrow(/append-only/);
    other.exec(`drop trigger access_no_update; update access_lines set child_id = 'child-9' where seq = 4`);
    other.close();
    expect((await proveReads(source, { file: null })).broken).toMatchObject({ seq: 4, kind: 'readPathway' });
    log.close();
    fs.rmSync(path.dirname(file), { recursive: true, force: true });
  });
});

describe('a running app', () => {
  let app: TestApp;
  beforeAll(async () => {
    app = await createTestApp();
  });
  afterAll(async () => app.close());

  test.each(['trail_lines', 'trail_payloads', 'signatures'])(
    'L01: the database itself refuses to change or delete rows of %s',
    async (table) => {
      if (table === 'signatures') {
        const childId = await addChild(app, { bornOn: '2026-11-28' });
        const signed = await sign(app, await app.as('nurse'), childId, 'TEAM-02', { performedOn: '2026-11-29' });
        expect(signed.status).toBe(200);
      }
      const before: { count: number }[] = await app.db(table).count({ count: '*' });
      expect(before[0]?.count).toBeGreaterThan(0);
      const column = table === 'signatures' ? 'meaning' : table === 'trail_lines' ? 'actor_name' : 'after';
      await expect(app.db(table).update({ [column]: 'x' })).rejects.toThrow(/append-only|final/);
      await expect(app.db(table).delete()).rejects.toThrow(/append-only|final/);
      await expect(app.db.raw(`insert or replace into ${table} select * from ${table} limit 1`)).rejects.toThrow();
      expect(await app.db(table).count({ count: '*' })).toEqual(before);
    },
  );

  test('a signature that was altered, and one that no line wrote, are found', async () => {
    const childId = await addChild(app, { bornOn: '2026-11-28' });
    const signed = await sign(app, await app.as('nurse'), childId, 'TEAM-02', { performedOn: '2026-11-29' });
    expect(signed.status).toBe(200);
    expect((await proveChanges(askOf(app.db), { file: null })).broken).toBeNull();
    const line: { seq: number } | undefined = await app
      .db('trail_lines')
      .where({ kind: 'milestone-signed', child_id: childId })
      .first('seq');
    await app.db.raw('drop trigger signatures_no_update');
    await app.db('signatures').where({ child_id: childId }).update({ performed_on: '2026-11-28' });
    expect((await proveChanges(askOf(app.db), { file: null })).broken).toEqual({
      seq: line?.seq,
      kind: 'milestone-signed',
      why: `The signature that line ${String(line?.seq)} wrote was altered.`,
    });
    await app.db('signatures').where({ child_id: childId }).update({ performed_on: '2026-11-29' });
    await app.db.raw(
      `insert into signatures select 'forged', child_id, milestone, part, 7, performed_on, signed_at, signed_on, signer_id, signer_name, signer_role, meaning, evidence, drafted_by_id, drafted_by_name, overrides, protocol_version, digest, signed_text, previous_digest, amends, amend_reason from signatures where child_id = ?`,
      [childId],
    );
    expect((await proveChanges(askOf(app.db), { file: null })).broken).toMatchObject({
      kind: 'signature',
      why: 'No line of the trail wrote the signature forged.',
    });
  });
});
