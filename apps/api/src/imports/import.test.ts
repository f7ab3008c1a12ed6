import fs from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { ImportFault, ImportPreview } from '@weftway/contract/caseload-import';
import { childFields } from '../testing/child-fields.ts';
import { createTestApp } from '../testing/test-app.ts';
import type { TestApp, TestBrowser } from '../testing/test-app.ts';

const files = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../../../../packages/sample-team/files');
const head = 'record_number,first_name,family_name,birth_date,cleft,site';
const good = `${head}\nTE-1,Amara,Okonjo,2024-03-18,...SHAL,Tern Quay\nTE-2,Łucja,Żak,2019-05-25,LAHSHAL,Saltmarsh\n`;

let test: TestApp;
let coordinator: TestBrowser;
beforeEach(async () => {
  test = await createTestApp();
  coordinator = await test.as('coordinator');
});
afterEach(() => test.close());

const preview = async (text: string, dateOrder = 'day-first'): Promise<ImportPreview> => {
  const answer = await coordinator.post('/imports', { fileName: 'caseload.csv', text, dateOrder });
  expect(answer.status).toBe(201);
  return answer.body;
};
const accept = (id: string) => coordinator.post(`/imports/${id}/acceptance`);
const takeIn = async (text: string): Promise<ImportPreview> => {
  const made = await preview(text);
  const answer = await accept(made.id);
  expect(answer.status).toBe(200);
  return answer.body;
};
const count = async (table: string): Promise<number> => (await test.db(table)).length;
const told = (faults: readonly ImportFault[]) =>
  faults.map(({ row, column, severity }) => `${row} ${column} ${severity}`);

describe('a preview', () => {
  it('counts what would happen and writes no child', async () => {
    expect(await preview(good)).toMatchObject({
      rows: 2,
      added: 2,
      updated: 0,
      unchanged: 0,
      faultCount: 0,
      status: 'previewed',
      sample: [{ row: 2, name: 'Amara Okonjo', cleft: '•••SHAL', action: 'add' }, { row: 3 }],
    });
    expect(await count('children')).toBe(0);
    expect(await test.db('trail_lines').where('kind', 'like', 'child-%')).toEqual([]);
  });

  it('is for the coordinator', async () => {
    for (const person of ['nurse', 'surgeon', 'administrator'] as const) {
      expect((await (await test.as(person)).post('/imports', { fileName: 'x', text: good })).status).toBe(403);
    }
  });

  it('finds every deliberate fault of the example file, by row and column', async () => {
    const made = await preview(fs.readFileSync(path.join(files, 'caseload-with-faults.csv'), 'utf8'));
    const faults = told(made.faults);
    for (const one of [
      '1 shoe_size fault',
      '3 record_number fault',
      '4 record_number fault',
      '5 record_number fault',
      '6 first_name fault',
      '7 birth_date fault',
      '8 birth_date fault',
      '9 birth_date fault',
      '10 birth_date warning',
      '11 birth_date fault',
      '12 birth_date fault',
      '13 birth_date fault',
      '14 due_date fault',
      '15 birth_date fault',
      '16 birth_date warning',
      '17 sex fault',
      '18 gestation warning',
      '19 gestation fault',
      '20 gestation fault',
      '21 cleft fault',
      '22 cleft fault',
      '23 cleft fault',
      '24 flags fault',
      '25 site fault',
      '26 team_start fault',
      '27 referral_date warning',
      '28 contact_email fault',
      '29 contact_phone warning',
      '30 contact_name fault',
      '31 contact_relation fault',
      '32 interpreter fault',
      '33 first_name warning',
      '33 family_name warning',
      '36 first_name fault',
      '37 first_name warning',
      '38 lip_repair fault',
      '39 palate_repair fault',
      '40 bone_graft fault',
      '41 first_name fault',
      '42  fault',
      '43  fault',
      '44  fault',
      '45  fault',
    ])
      expect(faults).toContain(one);
    expect(faults.filter((one) => /^(2|34|35) /.test(one) && one.endsWith('fault'))).toEqual([]);
    expect(made.faults.find(({ row }) => row === 21)?.message).toBe('Place 2 is the right gum: A, a, * or •, not X.');
  });

  it('reads dates month first when that is chosen', async () => {
    const text = `${head}\nTE-1,Amara,Okonjo,10/25/2023,...SHAL,Tern Quay\n`;
    expect((await preview(text)).faults).toMatchObject([{ row: 2, column: 'birth_date', severity: 'fault' }]);
    expect((await preview(text, 'month-first')).sample[0]).toMatchObject({ bornOn: '2023-10-25' });
  });

  it('understands a BOM, semicolons, other line ends and other spellings of the header', async () => {
    const text =
      '\uFEFFRecord No;Given name;Surname;Date of birth;LAHSHAL;hospital\r\nTE-1;Amara;"Okonjo; Bell";2024-03-18;...SHAL;tern quay\r\n\r\n';
    expect(await preview(text)).toMatchObject({
      rows: 1,
      added: 1,
      faultCount: 0,
      sample: [{ name: 'Amara Okonjo; Bell' }],
    });
  });

  it.each([
    ['an empty file', ''],
    ['a header alone', head],
    ['no record numbers', 'first_name,family_name\nA,B\n'],
    ['bytes of another encoding', '\u0000r\u0000e\u0000c\nx'],
  ])('says what is wrong with %s', async (_what, text) => {
    expect((await preview(text)).faultCount).toBeGreaterThan(0);
  });

  it('keeps scripts, formulas and names of prototypes as plain text', async () => {
    const text = `${head}\nTE-1,<img src=x onerror=alert(1)>,__proto__,2024-03-18,...SHAL,Tern Quay\nTE-2,"=HYPERLINK(""http://evil.example"")",' OR 1=1--,2024-03-18,...SHAL,Tern Quay\n`;
    await takeIn(text);
    expect(await test.db('children').orderBy('record_number').select('first_name', 'family_name')).toEqual([
      { first_name: '<img src=x onerror=alert(1)>', family_name: '__proto__' },
      { first_name: '=HYPERLINK("http://evil.example")', family_name: "' OR 1=1--" },
    ]);
  });
});

describe('taking a file in', () => {
  it('adds the children, plans them and leaves a line for each and one for the file', async () => {
    const taken = await takeIn(good);
    expect(taken).toMatchObject({ status: 'accepted', added: 2 });
    expect((await test.db('trail_lines').orderBy('seq').select('kind')).slice(-3)).toEqual([
      { kind: 'child-registered' },
      { kind: 'child-registered' },
      { kind: 'import-accepted' },
    ]);
    expect(await test.db('children').pluck('is_cleft_provisional')).toEqual([1, 1]);
    expect(await count('board_rows')).toBeGreaterThan(40);
    expect((await accept(taken.id)).body.type).toBe('/problems/already-done');
  });

  it('refuses a file with faults whole', async () => {
    const made = await preview(`${good}TE-3,,Nofirst,2024-03-18,...SHAL,Tern Quay\n`);
    expect((await accept(made.id)).body.type).toBe('/problems/import-has-faults');
    expect(await count('children')).toBe(0);
  });

  it('refuses when the caseload changed after the preview', async () => {
    const made = await preview(good);
    await coordinator.post('/children', { fields: childFields(), isDistinct: false });
    expect((await accept(made.id)).status).toBe(412);
    expect(await count('children')).toBe(1);
  });

  it('does not find an import that is not there, and is for the coordinator', async () => {
    expect((await accept('nothing')).status).toBe(404);
    const made = await preview(good);
    expect((await (await test.as('nurse')).post(`/imports/${made.id}/acceptance`)).status).toBe(403);
  });

  it('brings history as completions, operations unverified, a graft on each open side', async () => {
    await takeIn(
      `${head},lip_repair,palate_repair,bone_graft,last_team_review\nTE-1,Amara,Okonjo,2014-03-18,LAHSHAL,Tern Quay,2014-07-01,Mar 2015,2023,2026-05-05\n`,
    );
    expect(
      await test
        .db('imported_completions')
        .orderBy('milestone')
        .select('milestone', 'performed_on', 'date_precision', 'is_unverified'),
    ).toEqual([
      { milestone: 'ORTH-05:L', performed_on: '2023-07-01', date_precision: 'year', is_unverified: 1 },
      { milestone: 'ORTH-05:R', performed_on: '2023-07-01', date_precision: 'year', is_unverified: 1 },
      { milestone: 'SURG-01', performed_on: '2014-07-01', date_precision: 'day', is_unverified: 1 },
      { milestone: 'SURG-03', performed_on: '2015-03-15', date_precision: 'month', is_unverified: 1 },
      { milestone: 'TEAM-05', performed_on: '2026-05-05', date_precision: 'day', is_unverified: 0 },
    ]);
  });
});

describe('the same children again', () => {
  it('are unchanged when nothing differs', async () => {
    await takeIn(good);
    expect(await preview(good)).toMatchObject({ added: 0, updated: 0, unchanged: 2 });
    await takeIn(good);
    expect(await test.db('trail_lines').where({ kind: 'child-edited' })).toEqual([]);
  });

  it('change in the columns of the file only, and an empty cell changes nothing', async () => {
    await takeIn(good);
    expect(
      await takeIn('record_number,family_name,contact_name,notes\nte-1,,Ada Reed,Comes by ferry\nTE-2,,,\n'),
    ).toMatchObject({ updated: 1, unchanged: 1 });
    const [row] = await test.db('children').where({ record_number: 'TE-1' });
    expect(row).toMatchObject({ family_name: 'Okonjo', notes: 'Comes by ferry', cleft: '•••SHAL', version: 2 });
    expect(JSON.parse(row.contacts)).toMatchObject([{ name: 'Ada Reed', mayConsent: false }]);
  });

  it('cannot change a code that a clinician has confirmed', async () => {
    const answer = await (
      await test.as('nurse')
    ).post('/children', {
      fields: childFields({ recordNumber: 'TE-1', isCleftProvisional: false }),
      isDistinct: false,
    });
    expect(answer.status).toBe(201);
    expect(await preview('record_number,cleft\nTE-1,LAHS...\n')).toMatchObject({
      faultCount: 1,
      faults: [{ row: 2, column: 'cleft' }],
    });
    expect(await preview('record_number,cleft\nTE-1,...SHAL\n')).toMatchObject({ faultCount: 0, unchanged: 1 });
  });

  it('need the other columns when the record number is new', async () => {
    expect(await preview('record_number,notes\nTE-77,Hello\n')).toMatchObject({
      faultCount: expect.any(Number),
      faults: expect.arrayContaining([expect.objectContaining({ column: 'record_number' })]),
    });
  });
});
