import { expect, test } from 'vitest';
import { nextStop, type Stop } from './ruler-moves.ts';

const stops: readonly Stop[] = [
  { key: 'lip', laneIndex: 0, x: 100 },
  { key: 'palate', laneIndex: 0, x: 210 },
  { key: 'graft', laneIndex: 0, x: 600 },
  { key: 'babble', laneIndex: 2, x: 190 },
  { key: 'speech at 10', laneIndex: 2, x: 700 },
];
const context = { stops, todayX: 590, dependencyKeys: ['babble', 'speech at 10'] };
const from = (key: string): Stop => stops.find((stop) => stop.key === key) ?? { key, laneIndex: 0, x: 0 };

test.each([
  ['palate', 'ArrowRight', 'graft'],
  ['palate', 'ArrowLeft', 'lip'],
  ['lip', 'ArrowLeft', 'lip'],
  ['graft', 'ArrowRight', 'graft'],
  ['palate', 'ArrowDown', 'babble'],
  ['graft', 'ArrowDown', 'speech at 10'],
  ['babble', 'ArrowUp', 'palate'],
  ['lip', 'ArrowUp', 'lip'],
  ['palate', 'Home', 'lip'],
  ['palate', 'End', 'graft'],
  ['lip', 't', 'graft'],
  ['graft', 'd', 'babble'],
  ['babble', 'd', 'speech at 10'],
  ['speech at 10', 'd', 'babble'],
])('from %s the key %s leads to %s', (start, pressed, end) => {
  expect(nextStop(context, from(start), pressed)?.key).toBe(end);
});

test('other keys do not move', () => {
  expect(nextStop(context, from('lip'), 'x')).toBeNull();
});

test('D stays where it is when nothing is waited for', () => {
  expect(nextStop({ ...context, dependencyKeys: [] }, from('lip'), 'D')?.key).toBe('lip');
});
