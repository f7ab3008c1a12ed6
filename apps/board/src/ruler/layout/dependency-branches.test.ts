import { expect, test } from 'vitest';
import { rulerBirth, rulerItem, rulerLanes, rulerToday, rulerWindow } from '../../testing/ruler-builders.ts';
import { branchPath, dependencyBranches } from './dependency-branches.ts';
import { layoutRuler, rulerFrame } from './ruler-layout.ts';

const items = [
  rulerItem({ key: 'graft', label: 'Graft', state: 'waiting', window: rulerWindow(100, 117) }),
  rulerItem({ key: 'near', label: 'Teeth clear', lane: 'teeth', state: 'open', window: rulerWindow(93, 104) }),
  rulerItem({
    key: 'far',
    label: 'Palate repair',
    lane: 'speech',
    state: 'signed',
    window: rulerWindow(9, 13),
    knotOn: rulerToday,
  }),
];
const frame = rulerFrame({ width: 1200, birth: rulerBirth, today: rulerToday, period: 'all' });
const layout = layoutRuler(frame, rulerLanes, items);
const leftOf = (key: string) => layout.items.find((item) => item.item.key === key)?.left ?? 0;

test('one trunk runs 16 left of the chosen window and its near prerequisites', () => {
  const branches = dependencyBranches(layout, 'graft', [
    { key: 'near', isMet: false },
    { key: 'far', isMet: true },
  ]);
  expect(new Set(branches.map(({ trunk }) => trunk))).toEqual(
    new Set([Math.min(leftOf('near'), leftOf('graft')) - 16]),
  );
  expect(branches.map(({ isMet }) => isMet)).toEqual([false, true]);
});

test('nothing is drawn while nothing is chosen, nor to what is not on the ruler', () => {
  expect(dependencyBranches(layout, null, [{ key: 'near', isMet: false }])).toEqual([]);
  expect(dependencyBranches(layout, 'graft', [{ key: 'elsewhere', isMet: false }])).toEqual([]);
});

test('a prerequisite on the same thread is joined by a straight line', () => {
  const path = branchPath({ key: 'a', isMet: true, start: 100, trunk: 150, end: 200, fromY: 40, toY: 40 });
  expect(path).toBe('M200 40H100');
});
