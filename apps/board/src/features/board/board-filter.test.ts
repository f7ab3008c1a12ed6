import { describe, expect, test } from 'vitest';
import { filterBoard, filterOf, queryOf, widened } from './board-filter.ts';
import { aBoard, aRow, palateRepair } from './testing-board.ts';

const everything = filterOf(new URLSearchParams());
const board = aBoard([
  aRow({ childId: 'a', familyName: 'Huamán', firstName: 'Mateo', state: 'late', closesIn: -12, holders: [null] }),
  aRow({ childId: 'b', familyName: 'Wrońska', firstName: 'Ela', site: 'Saltmarsh', holders: ['m-hana'] }),
  aRow({
    childId: 'b',
    familyName: 'Wrońska',
    firstName: 'Ela',
    site: 'Saltmarsh',
    milestone: palateRepair,
    state: 'waiting',
    holders: ['m-obed'],
  }),
]);
const shown = (query: string, me = 'm-hana') => filterBoard(board, filterOf(new URLSearchParams(query)), me);

describe('the filter of the board', () => {
  test('an address without anything shows everything', () => {
    expect(shown('').rows).toHaveLength(3);
    expect(shown('').children).toBe(2);
    expect(queryOf(everything).toString()).toBe('');
  });

  test('every choice comes back from its address', () => {
    const address = 'discipline=surgeon&hands=mine&states=late.open&site=Saltmarsh&q=ela&open=lip.speech';
    expect(queryOf(filterOf(new URLSearchParams(address))).toString()).toBe(address);
  });

  test('what an address names wrongly is left out', () => {
    expect(filterOf(new URLSearchParams('discipline=weaver&hands=hers&states=gone'))).toMatchObject({
      discipline: null,
      hands: 'everyone',
    });
  });

  test('mine, unowned, site, discipline and states each narrow the rows', () => {
    expect(shown('hands=mine').rows.map((row) => row.child.id)).toEqual(['b']);
    expect(shown('hands=unowned').rows.map((row) => row.child.id)).toEqual(['a']);
    expect(shown('site=Saltmarsh').rows).toHaveLength(2);
    expect(shown('discipline=surgeon').rows.map((row) => row.milestone.id)).toEqual(['SURG-03']);
    expect(shown('states=late').rows.map((row) => row.state)).toEqual(['late']);
  });

  test('text is found without accents, in names and in milestones', () => {
    expect(shown('q=huaman').rows).toHaveLength(1);
    expect(shown('q=wronska palate').rows).toHaveLength(1);
    expect(shown('q=nobody').rows).toHaveLength(0);
  });

  test('counts tell what another choice would show', () => {
    const { hands, states } = shown('hands=mine&states=late');
    expect(hands).toEqual({ everyone: 1, mine: 0, unowned: 1 });
    expect(states.get('open')).toBe(1);
  });

  test('a wider view keeps the unrolled lanes', () => {
    expect(queryOf(widened(filterOf(new URLSearchParams('q=x&hands=mine&open=lip')))).toString()).toBe('open=lip');
  });
});
