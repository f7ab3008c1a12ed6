import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { MilestoneState } from '@weftway/pathway/milestone-state';
import { rulerBirth, rulerItem, rulerLanes, rulerToday, rulerWindow } from '../../testing/ruler-builders.ts';
import type { RulerItem } from '../ruler-item.ts';
import { placeLabels } from './ruler-labels.ts';
import { layoutRuler, rulerFrame, type RulerLayout } from './ruler-layout.ts';

function laidOut(items: readonly RulerItem[], width = 1200): RulerLayout {
  return layoutRuler(rulerFrame({ width, birth: rulerBirth, today: rulerToday, period: 'all' }), rulerLanes, items);
}

describe('tracks', () => {
  test('windows that overlap in one lane lie on the thread, above it and below it, by opening date', () => {
    const layout = laidOut([
      rulerItem({ key: 'third', label: 'c', window: rulerWindow(124, 140) }),
      rulerItem({ key: 'first', label: 'a', window: rulerWindow(120, 144) }),
      rulerItem({ key: 'second', label: 'b', window: rulerWindow(122, 142) }),
    ]);
    const thread = layout.lanes[0]?.y ?? 0;
    const yOf = (key: string) => layout.items.find((item) => item.item.key === key)?.y;
    expect([yOf('first'), yOf('second'), yOf('third')]).toEqual([thread, thread - 15, thread + 15]);
  });

  test('windows of different lanes keep to their own threads', () => {
    const layout = laidOut([rulerItem({ key: 'a', label: 'a' }), rulerItem({ key: 'b', label: 'b', lane: 'speech' })]);
    expect(layout.items.map((item) => item.y)).toEqual([layout.lanes[0]?.y, layout.lanes[1]?.y]);
  });

  test('a lane grows from the fourth track on', () => {
    const five = Array.from({ length: 5 }, (_, index) => rulerItem({ key: String(index), label: 'x' }));
    expect(laidOut(five).lanes[0]?.height).toBe(50 + 2 * 15);
    expect(laidOut(five.slice(0, 3)).lanes[0]?.height).toBe(50);
  });
});

describe('windows', () => {
  test('are at least 13 wide', () => {
    const body = laidOut([rulerItem({ key: 'a', label: 'a', window: rulerWindow(130, 130) })]).items[0]?.body;
    expect((body?.right ?? 0) - (body?.left ?? 0)).toBeGreaterThanOrEqual(13);
  });

  test('end flat where the ruler ends', () => {
    const body = laidOut([rulerItem({ key: 'a', label: 'a', window: rulerWindow(240, 270) })]).items[0]?.body;
    expect(body).toMatchObject({ isCutLeft: false, isCutRight: true });
  });

  test('the knot sits on the date signed for, not in the window', () => {
    const window = rulerWindow(10, 12);
    const layout = laidOut([
      rulerItem({ key: 'a', label: 'a', state: 'signed', window, knotOn: rulerWindow(15, 15).earliest }),
    ]);
    const placed = layout.items[0];
    expect(placed?.markX).toBeGreaterThan(placed?.body?.right ?? Infinity);
  });

  test('the mark of a late window sits inside its right end, of others inside the left', () => {
    const late = laidOut([rulerItem({ key: 'a', label: 'a', state: 'late', window: rulerWindow(60, 90) })]).items[0];
    const open = laidOut([rulerItem({ key: 'a', label: 'a', state: 'open', window: rulerWindow(90, 120) })]).items[0];
    expect(late?.markX).toBeCloseTo((late?.body?.right ?? 0) - 6.5);
    expect(open?.markX).toBeCloseTo((open?.body?.left ?? 0) + 6.5);
  });

  test('something without dates and without a knot is not drawn', () => {
    expect(laidOut([rulerItem({ key: 'a', label: 'a', window: null })]).items).toEqual([]);
  });
});

const states: readonly MilestoneState[] = [
  'ahead',
  'open',
  'closing',
  'late',
  'waiting',
  'held',
  'partly-signed',
  'signed',
  'waived',
];
const anyItem = fc
  .record({
    lane: fc.integer({ min: 0, max: 2 }),
    state: fc.constantFrom(...states),
    from: fc.integer({ min: -4, max: 240 }),
    length: fc.integer({ min: 0, max: 40 }),
    word: fc.integer({ min: 3, max: 24 }),
  })
  .map((raw) => ({ ...raw, lane: rulerLanes[raw.lane]?.lane ?? 'surgery' }));

test('no label ever meets another label, a window or the today line', () => {
  fc.assert(
    fc.property(fc.array(anyItem, { maxLength: 40 }), fc.constantFrom(560, 900, 1400), (raws, width) => {
      const items = raws.map((raw, index) =>
        rulerItem({
          key: String(index),
          label: 'n'.repeat(raw.word),
          lane: raw.lane,
          state: raw.state,
          window: rulerWindow(raw.from, raw.from + raw.length),
        }),
      );
      const layout = laidOut(items, width);
      const labels = placeLabels(layout, { selectedKey: '0', dependencies: [{ key: '1', isMet: false }] });
      for (const [index, label] of labels.entries()) {
        const isApart = (other: { left: number; right: number; top: number; foot: number }) =>
          label.right <= other.left || label.left >= other.right || label.foot <= other.top || label.top >= other.foot;
        expect(labels.slice(index + 1).every(isApart)).toBe(true);
        const bodies = layout.items.flatMap(({ body }) =>
          body === null ? [] : [{ ...body, top: body.y - body.height / 2, foot: body.y + body.height / 2 }],
        );
        expect(bodies.every(isApart)).toBe(true);
        expect(isApart({ left: layout.todayX - 3, right: layout.todayX + 3, top: 0, foot: layout.height })).toBe(true);
        expect(label.left).toBeGreaterThanOrEqual(layout.frame.gutter);
        expect(label.right).toBeLessThanOrEqual(width);
      }
    }),
    { numRuns: 60 },
  );
});
