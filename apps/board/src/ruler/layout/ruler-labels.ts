/** Finds a place for the name of each window where it meets nothing, the most pressing first. */
import type { MilestoneState } from '@weftway/pathway/milestone-state';
import { dependencyBranches } from './dependency-branches.ts';
import type { RulerDependency } from '../ruler-item.ts';
import { headHeight, type PlacedItem, type RulerLayout } from './ruler-layout.ts';
import { textWidth, type TextWeight } from './text-width.ts';

interface Box {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly foot: number;
}

export interface PlacedLabel extends Box {
  readonly key: string;
  readonly text: string;
  readonly weight: TextWeight;
  readonly x: number;
  /** Of the letters' foot line. */
  readonly baseline: number;
}

export interface LabelFocus {
  readonly selectedKey: string | null;
  readonly dependencies: readonly RulerDependency[];
}

const classOfState: Readonly<Record<MilestoneState, number>> = {
  late: 2,
  closing: 3,
  open: 4,
  waiting: 4,
  held: 4,
  'partly-signed': 4,
  ahead: 5,
  signed: 6,
  waived: 6,
  transferred: 6,
};

function priority(item: PlacedItem, focus: LabelFocus): number {
  if (item.item.key === focus.selectedKey) return 0;
  if (focus.dependencies.some(({ key }) => key === item.item.key)) return 1;
  return item.item.isPast ? 7 : classOfState[item.item.state];
}

export function labelWeight(item: PlacedItem): TextWeight {
  const { state, isPast } = item.item;
  const isQuiet = isPast || state === 'ahead' || state === 'signed' || state === 'waived' || state === 'transferred';
  return isQuiet ? 'regular' : 'bold';
}

/** Places to try, best first: start of the letters and foot line. */
function* placesFor(item: PlacedItem, width: number): Generator<{ x: number; baseline: number }> {
  const { markX, y } = item;
  const left = item.body?.left ?? item.left;
  const right = item.body?.right ?? item.right;
  const half = Math.max(item.body?.height ?? 0, 12) / 2;
  const below = y + half + 13;
  const above = y - half - 5;
  const outerLeft = Math.min(item.left, item.ghost?.left ?? item.left);
  const outerRight = Math.max(item.right, item.ghost?.right ?? item.right);
  const start = left + 1;
  const end = right - width - 1;
  const middle = (left + right - width) / 2;
  const loose = item.item.unowned ? 8 : 0;
  yield { x: start, baseline: below + loose };
  yield { x: start, baseline: above };
  yield { x: end, baseline: below + loose };
  yield { x: end, baseline: above };
  yield { x: middle, baseline: below + loose };
  yield { x: middle, baseline: above };
  yield { x: markX - width / 2, baseline: below + loose };
  yield { x: markX - width / 2, baseline: above };
  yield { x: outerRight + 5, baseline: y + 4 };
  yield { x: outerLeft - width - 5, baseline: y + 4 };
  for (const shift of [width / 4, width / 2]) {
    yield { x: start - shift, baseline: below + loose };
    yield { x: start - shift, baseline: above };
  }
}

/** Further places for those that must have a label: sliding along above and below, then one row further out. */
function* morePlacesFor(item: PlacedItem, width: number): Generator<{ x: number; baseline: number }> {
  for (const row of [0, 13]) {
    for (let shift = 0; shift <= width + 12; shift += 4) {
      for (const x of [item.markX + shift - width / 2, item.markX - shift - width / 2]) {
        yield { x, baseline: item.y + 19 + row };
        yield { x, baseline: item.y - 11 - row };
      }
    }
  }
}

function boxAt(place: { x: number; baseline: number }, width: number): Box {
  return { left: place.x, right: place.x + width, top: place.baseline - 10, foot: place.baseline + 3 };
}

function meets(a: Box, b: Box): boolean {
  return a.left < b.right && a.right > b.left && a.top < b.foot && a.foot > b.top;
}

function drawnBoxes(item: PlacedItem): readonly Box[] {
  const half = Math.max(item.body?.height ?? 0, 12) / 2;
  const foot = item.y + half;
  const mark = {
    left: item.markX - 7,
    right: item.markX + 7,
    top: item.y - half,
    foot: foot + (item.item.unowned ? 9 : 0),
  };
  const ghost =
    item.ghost === null
      ? []
      : [{ left: item.ghost.left, right: item.ghost.right, top: item.y - half - 2.5, foot: foot + 2.5 }];
  return [{ left: item.left, right: item.right, top: item.y - half, foot }, mark, ...ghost];
}

/** The lines to prerequisites, three pixels wider than drawn. */
function dependencyBoxes(layout: RulerLayout, focus: LabelFocus): readonly Box[] {
  const branches = dependencyBranches(layout, focus.selectedKey, focus.dependencies);
  return branches.flatMap(({ start, trunk, end, fromY, toY }) => [
    { left: trunk - 3, right: trunk + 3, top: Math.min(fromY, toY), foot: Math.max(fromY, toY) },
    { left: Math.min(start, trunk), right: Math.max(start, trunk), top: fromY - 3, foot: fromY + 3 },
    { left: trunk, right: end, top: toY - 3, foot: toY + 3 },
  ]);
}

export function placeLabels(layout: RulerLayout, focus: LabelFocus): readonly PlacedLabel[] {
  const obstacles = [...layout.items.flatMap(drawnBoxes), ...dependencyBoxes(layout, focus)];
  const today = { left: layout.todayX - 3, right: layout.todayX + 3, top: headHeight, foot: layout.height };
  const labels: PlacedLabel[] = [];
  const isFree = (box: Box) =>
    box.left >= layout.frame.gutter &&
    box.right <= layout.frame.width &&
    box.top >= headHeight - 4 &&
    box.foot <= layout.height &&
    !meets(box, today) &&
    !labels.some((label) => meets(box, label)) &&
    !obstacles.some((obstacle) => meets(box, obstacle));

  // Earlier occurrences of one thing would only repeat its name; they say it on hover and focus.
  const named = layout.items.filter((item) => !item.item.isPast || priority(item, focus) < 2);
  const inOrder = named.toSorted((a, b) => priority(a, focus) - priority(b, focus));
  for (const item of inOrder) {
    const weight = labelWeight(item);
    const width = textWidth(item.item.label, weight) + 2;
    const isNeeded = priority(item, focus) < 6;
    const place =
      firstFree(placesFor(item, width), width, isFree) ??
      (isNeeded ? firstFree(morePlacesFor(item, width), width, isFree) : null);
    if (place === null) continue;
    labels.push({ key: item.item.key, text: item.item.label, weight, ...place, ...boxAt(place, width) });
  }
  return labels;
}

function firstFree(places: Iterable<{ x: number; baseline: number }>, width: number, isFree: (box: Box) => boolean) {
  for (const place of places) if (isFree(boxAt(place, width))) return place;
  return null;
}
