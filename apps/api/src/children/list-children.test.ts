import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { childFields } from '../testing/child-fields.ts';
import { createTestApp } from '../testing/test-app.ts';
import type { TestApp, TestBrowser, TestPerson } from '../testing/test-app.ts';

let test: TestApp;
const ids: Record<string, string> = {};
beforeAll(async () => {
  test = await createTestApp();
  const coordinator = await test.as('coordinator');
  const children = [
    childFields({ firstName: 'Łucja', familyName: 'Żółć', recordNumber: 'TE-0101' }),
    childFields({
      firstName: 'Nguyễn',
      familyName: 'Đặng',
      recordNumber: 'TE-0102',
      bornOn: '2019-05-04',
      referredOn: null,
      teamStartOn: '2019-06-01',
    }),
    childFields({
      firstName: 'Amara',
      familyName: 'Bell',
      recordNumber: 'TE-0103',
      bornOn: '2026-11-20',
      referredOn: null,
      teamStartOn: null,
    }),
    childFields({
      firstName: 'Baby',
      familyName: 'Costa',
      recordNumber: 'TE-0104',
      bornOn: null,
      dueOn: '2027-03-01',
      gestation: null,
      referredOn: null,
      teamStartOn: null,
    }),
  ];
  for (const fields of children) {
    const answer = await coordinator.post('/children', { fields, isDistinct: true });
    ids[fields.recordNumber] = answer.body.id;
  }
  await (await test.as('surgeon')).put(`/children/${ids['TE-0103']}/trainees`, { memberIds: ['trainee'] });
});
afterAll(() => test.close());

// One sign-in each: only a few sessions of a person live side by side.
const browsers = new Map<TestPerson, Promise<TestBrowser>>();
const browserOf = (person: TestPerson): Promise<TestBrowser> => {
  const browser = browsers.get(person) ?? test.as(person);
  browsers.set(person, browser);
  return browser;
};

const numbers = async (query: string, person: TestPerson = 'nurse'): Promise<string[]> => {
  const answer = await (await browserOf(person)).get(`/children${query}`);
  expect(answer.status).toBe(200);
  return answer.body.items.map((item: { recordNumber: string }) => item.recordNumber);
};

describe('the registry', () => {
  it('is in the order of names, accents aside', async () => {
    expect(await numbers('')).toEqual(['TE-0103', 'TE-0104', 'TE-0102', 'TE-0101']);
  });

  it.each([
    ['zolc lucja', ['TE-0101']],
    ['LUCJA ŻÓŁĆ', ['TE-0101']],
    ['dang nguyen', ['TE-0102']],
    ['te-0102', ['TE-0102']],
    ['2019-05-04', ['TE-0102']],
    ['4/5/2019', ['TE-0102']],
    ['4 May 2019', ['TE-0102']],
    ['dang 4.5.2019', ['TE-0102']],
    ['1 Mar 2027', ['TE-0104']],
    ['bell 4.5.2019', []],
    [`' OR 1=1--`, []],
    ['%', []],
  ])('finds by “%s”', async (q, expected) => {
    expect(await numbers(`?q=${encodeURIComponent(q)}`)).toEqual(expected);
  });

  it.each(['name', 'birth', 'late'] as const)('pages by %s without losing or repeating anybody', async (order) => {
    const nurse = await browserOf('nurse');
    const whole = await numbers(`?order=${order}`);
    const seen: string[] = [];
    let cursor: string | null = '';
    while (cursor !== null) {
      const answer = await nurse.get(`/children?order=${order}&limit=1${cursor === '' ? '' : `&cursor=${cursor}`}`);
      seen.push(...answer.body.items.map((item: { recordNumber: string }) => item.recordNumber));
      expect(answer.body.total).toBe(4);
      cursor = answer.body.next;
    }
    expect(seen).toEqual(whole);
    expect(whole).toHaveLength(4);
  });

  it('puts who has most late first, when asked, and counts as the board does', async () => {
    const answer = await (await browserOf('nurse')).get('/children?order=late');
    const late = answer.body.items.map((item: { late: number }) => item.late);
    expect(late).toEqual([...late].toSorted((a: number, b: number) => b - a));
    const counted = await test
      .db('board_rows')
      .where({ child_id: answer.body.items[0].id, state: 'late', is_on_board: 1 });
    expect(answer.body.items[0].late).toBe(counted.length);
    expect(counted.length).toBeGreaterThan(0);
  });

  it('shows a trainee the children assigned to them, in search too', async () => {
    expect(await numbers('', 'trainee')).toEqual(['TE-0103']);
    expect(await numbers('?q=dang', 'trainee')).toEqual([]);
  });

  it('refuses a made-up cursor and an unknown order', async () => {
    const nurse = await browserOf('nurse');
    expect((await nurse.get('/children?cursor=abc')).status).toBe(400);
    expect((await nurse.get('/children?order=password')).status).toBe(400);
    expect((await (await browserOf('auditor')).get('/children')).status).toBe(403);
  });
});

describe('the look for duplicates', () => {
  const look = async (body: object) =>
    (
      await (
        await browserOf('coordinator')
      ).post('/duplicate-checks', {
        firstName: '',
        familyName: '',
        recordNumber: '',
        bornOn: null,
        exceptId: null,
        ...body,
      })
    ).body.candidates;

  it('says why each child may be the same', async () => {
    expect(await look({ firstName: 'lucja', familyName: 'zolc', bornOn: '2026-10-06' })).toMatchObject([
      { recordNumber: 'TE-0101', why: ['name-and-birth'] },
    ]);
    expect(await look({ firstName: 'Lucja', familyName: 'Zolc', bornOn: '2020-01-01' })).toMatchObject([
      { why: ['name'] },
    ]);
    expect(await look({ firstName: 'Zofia', familyName: 'Zolc', bornOn: '2026-10-06' })).toMatchObject([
      { why: ['birth'] },
    ]);
    expect(await look({ recordNumber: 'te-0101' })).toMatchObject([{ why: ['record-number'] }]);
    expect(await look({ firstName: 'Zofia', familyName: 'Nowak', bornOn: '2026-10-06' })).toEqual([]);
    expect(await look({ recordNumber: 'TE-0101', exceptId: ids['TE-0101'] })).toEqual([]);
  });

  it('is for those who add children', async () => {
    const answer = await (
      await browserOf('dentist')
    ).post('/duplicate-checks', { firstName: 'a', familyName: 'b', recordNumber: '', bornOn: null, exceptId: null });
    expect(answer.status).toBe(403);
  });
});
