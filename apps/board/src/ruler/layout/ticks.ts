/** Tick marks, tick labels and names of the segments of the age ruler. */
import { daysPerMonth, lastAge, positionOfAge, segmentsOf, type Period, type SegmentName } from '../scale.ts';
import { textWidth } from './text-width.ts';
import { rulerWords } from '../../words/ruler.ts';

export interface Tick {
  readonly age: number;
  /** Empty for a tick without a label. */
  readonly label: string;
}

const steps: Readonly<Record<SegmentName, number>> = {
  'before-birth': 1,
  'first-six-months': 7 / daysPerMonth,
  'to-eighteen-months': 1,
  'early-years': 3,
  school: 6,
  'growing-up': 12,
};

const labelled: readonly Tick[] = [
  { age: 0, label: rulerWords.birth },
  ...[1, 2, 3, 4, 5].map((month) => ({ age: month, label: String(month) })),
  { age: 6, label: rulerWords.months(6) },
  { age: 9, label: rulerWords.months(9) },
  { age: 12, label: rulerWords.years(1) },
  { age: 15, label: rulerWords.months(15) },
  { age: 18, label: rulerWords.months(18) },
  ...[2, 3, 4, 5].map((year) => ({ age: year * 12, label: String(year) })),
  { age: 72, label: rulerWords.years(6) },
  ...[7, 8, 9, 10, 11].map((year) => ({ age: year * 12, label: String(year) })),
  { age: 144, label: rulerWords.years(12) },
  ...[14, 16, 18].map((year) => ({ age: year * 12, label: String(year) })),
  { age: 252, label: rulerWords.years(21) },
];

/** Ages at which the scale changes, marked with a notch. */
export const notchAges = [6, 18, 72, 144] as const;

/** Closer than this, ticks would run into one band: the segment keeps only its ends. Pixels. */
const leastTickGap = 2.5;

/** Ticks without labels, as ages, on an axis of so many pixels. */
export function plainTicks(period: Period, width: number): readonly number[] {
  const ages = segmentsOf(period).flatMap(({ name, from, to, share }) => {
    const step = steps[name];
    if ((width * share * step) / (to - from) < leastTickGap) return [from];
    const count = Math.ceil((to - from) / step - 1e-9);
    return Array.from({ length: count }, (_, index) => from + index * step);
  });
  return [...ages, lastAge];
}

interface Span {
  readonly left: number;
  readonly right: number;
}

export interface PlacedText extends Span {
  readonly text: string;
  readonly x: number;
}

export interface AxisFrame {
  readonly x0: number;
  readonly width: number;
  readonly period: Period;
  readonly todayX: number;
}

/** Labels of the ticks that fit beside one another and clear of the today line; the others are dropped whole. */
export function placedTickLabels(axis: AxisFrame): readonly PlacedText[] {
  const important = new Set<number>([0, ...notchAges, 252]);
  const placed: PlacedText[] = [];
  const byImportance = labelled.toSorted(
    (left, right) => Number(important.has(right.age)) - Number(important.has(left.age)),
  );
  for (const { age, label } of byImportance) {
    const half = textWidth(label, age === 0 ? 'bold' : 'regular') / 2;
    const x = Math.min(axis.x0 + axis.width * positionOfAge(age, axis.period), axis.x0 + axis.width - half + 8);
    const span = { left: x - half, right: x + half };
    const meetsToday = span.left < axis.todayX + 3 && span.right > axis.todayX - 3;
    if (meetsToday || placed.some((other) => meets(span, other, 5))) continue;
    placed.push({ ...span, text: label, x });
  }
  return placed;
}

export interface PlacedSegmentName extends PlacedText {
  readonly tick: string;
}

const flagHalf = 22;

/** Names of the segments with what one tick means, where they fit; they step aside for the today flag. */
export function placedSegmentNames(axis: AxisFrame): readonly PlacedSegmentName[] {
  const flag = { left: axis.todayX - flagHalf - 6, right: axis.todayX + flagHalf + 6 };
  return segmentsOf(axis.period).flatMap(({ name, from, to }) => {
    const start = axis.x0 + axis.width * positionOfAge(from, axis.period) + 5;
    const end = axis.x0 + axis.width * positionOfAge(to, axis.period) - 4;
    const words = rulerWords.segments[name];
    for (const tick of [words.tick, '']) {
      const length = textWidth(words.name, 'bold') + (tick === '' ? 0 : 6 + textWidth(tick, 'regular'));
      const x = meets({ left: start, right: start + length }, flag, 0) ? flag.right : start;
      if (x + length <= end) return [{ text: words.name, tick, x, left: x, right: x + length }];
    }
    return [];
  });
}

function meets(left: Span, right: Span, gap: number): boolean {
  return left.left < right.right + gap && left.right > right.left - gap;
}
