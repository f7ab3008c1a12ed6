import { describe, expect, test } from 'vitest';
import type { Board, BoardChanges } from '@weftway/contract/board';
import { boardModelOf, heldBy, withChanges, withRow } from './board-model.ts';

const board: Board = {
  version: 3,
  day: 20_788,
  team: '2.2',
  members: [
    ['m-1', 'Shirin Vaziri', 'SV', 0, [5], 1],
    ['m-2', 'Obed Nkansah', 'ON', 0, [1], 1],
  ],
  milestones: [
    ['SPCH-02', 'SPCH-02', 'Speech at 18 months', 6, [['milestone', 'Sign-off', [5], [5]]]],
    [
      'MOLD-06',
      'MOLD-06',
      'Molding finished',
      3,
      [
        ['molding', 'Molding finished', [4], [4]],
        ['lip-repair-plan', 'Plan', [1], [1]],
      ],
    ],
  ],
  children: [
    [
      'c-1',
      'Siddiqui',
      'Hamza',
      'Tern Quay',
      20_000,
      1,
      [],
      [0, 1],
      [3, 6],
      [0, 1],
      [20_776, -1],
      [60, 0],
      [-1, [-2, 1]],
    ],
    ['c-2', 'Aksoy', 'Elif', 'Saltmarsh', -1, -1, [0], [0], [1], [0], [20_900], [30], [0]],
  ],
};

describe('the board as the screens read it', () => {
  test('columns become rows in the order in which they are drawn', () => {
    const { rows } = boardModelOf(board);
    expect(rows.map((row) => [row.child.id, row.milestone.id, row.state])).toEqual([
      ['c-1', 'SPCH-02', 'late'],
      ['c-2', 'SPCH-02', 'open'],
      ['c-1', 'MOLD-06', 'partly-signed'],
    ]);
    expect(rows[0]).toMatchObject({
      opens: 20_716,
      closes: 20_776,
      holders: [null],
      isUnowned: true,
      child: { shortName: 'Siddiqui, H', leadId: 'm-2' },
    });
    expect(rows[2]).toMatchObject({ closes: null, holders: ['signed', 'm-2'], isUnowned: false, isDue: true });
    expect(rows[1]?.child).toMatchObject({ birthDay: null, traineeIds: ['m-1'] });
  });

  const changes = (children: BoardChanges['children'], version = 4): BoardChanges => ({
    ...board,
    version,
    isWhole: false,
    children,
  });

  test('changes replace the rows of their children, and what looks different is fresh', () => {
    const model = boardModelOf(board);
    const after = withChanges(
      model,
      changes([['c-2', 'Aksoy', 'Elif', 'Saltmarsh', -1, -1, [], [0], [2], [0], [20_900], [30], [0]]]),
    );
    expect(after.version).toBe(4);
    expect(after.rows.find((row) => row.child.id === 'c-2')?.state).toBe('closing');
    expect([...after.fresh]).toEqual(['c-2 SPCH-02']);
    expect(after.rows.filter((row) => row.child.id === 'c-1')).toEqual(
      model.rows.filter((row) => row.child.id === 'c-1'),
    );
  });

  test('a child without rows leaves the board', () => {
    const after = withChanges(
      boardModelOf(board),
      changes([['c-1', 'Siddiqui', 'Hamza', 'Tern Quay', 20_000, 1, [], [], [], [], [], [], []]]),
    );
    expect(after.rows.map((row) => row.child.id)).toEqual(['c-2']);
  });

  test('nothing changed gives the same board', () => {
    const model = boardModelOf(board);
    expect(withChanges(model, changes([], 3))).toBe(model);
  });

  test('what I did myself is not marked as fresh when it comes back', () => {
    const model = boardModelOf(board);
    const [loose] = model.rows;
    if (loose === undefined) throw new Error('No row');
    const claimed = withRow(model, heldBy(loose, 'milestone', 'm-1'));
    expect(claimed.rows[0]).toMatchObject({ holders: ['m-1'], isUnowned: false });
    const [first] = board.children;
    if (first === undefined) throw new Error('No child');
    const [...columns] = first;
    columns[12] = [0, [-2, 1]];
    expect(withChanges(claimed, changes([columns])).fresh.size).toBe(0);
  });
});
