/** Puts windows on threads: horizontal place by age, track by first free, lanes one under the other. */
import type { PlainDate } from '@weftway/calendar/plain-date';
import { ageOnRuler, firstAge, lastAge, positionOfAge, type Period } from '../scale.ts';
import type { RulerItem, RulerLane, RulerWindow } from '../ruler-item.ts';
import { bodyHeight, leastWidth, markPlace, type BodyEnds } from './window-shape.ts';

export const headHeight = 52;
export const axisY = 44;
const laneHeight = 50;
/** Many lanes stand a little closer, so that a child with all of them fits a screen. */
const manyLanes = 10;
const closeLaneHeight = 44;
const trackStep = 15;
const footRoom = 6;

export interface RulerFrame {
  readonly gutter: number;
  readonly x0: number;
  readonly axisWidth: number;
  readonly width: number;
  readonly birth: PlainDate;
  readonly today: PlainDate;
  readonly period: Period;
}

export interface PlacedLane {
  readonly lane: RulerLane;
  readonly top: number;
  /** Height of the thread. */
  readonly y: number;
  readonly height: number;
}

export interface PlacedItem {
  readonly item: RulerItem;
  readonly laneIndex: number;
  /** `null` for a knot without a window. */
  readonly body: BodyEnds | null;
  readonly ghost: BodyEnds | null;
  readonly closingX: number | null;
  readonly markX: number;
  readonly y: number;
  /** Everything that is drawn of it, for labels and for the pointer. */
  readonly left: number;
  readonly right: number;
}

export interface RulerLayout {
  readonly frame: RulerFrame;
  readonly todayX: number;
  readonly lanes: readonly PlacedLane[];
  /** In order of lane, then of place from left to right. */
  readonly items: readonly PlacedItem[];
  readonly height: number;
}

export function xOfDate(frame: RulerFrame, date: PlainDate): number {
  return frame.x0 + frame.axisWidth * positionOfAge(ageOnRuler(frame.birth, date), frame.period);
}

/** Room for the lane names, then the axis; a little air right of the last tick. */
export function rulerFrame(of: Pick<RulerFrame, 'width' | 'birth' | 'today' | 'period'>): RulerFrame {
  const gutter = of.width < 800 ? 116 : 150;
  return { ...of, gutter, x0: gutter, axisWidth: of.width - gutter - 10 };
}

interface Flat {
  readonly item: RulerItem;
  readonly ends: Omit<BodyEnds, 'y' | 'height'> | null;
  readonly markX: number;
  readonly left: number;
  readonly right: number;
}

function endsOf(frame: RulerFrame, window: RulerWindow): Omit<BodyEnds, 'y' | 'height'> {
  const left = xOfDate(frame, window.earliest);
  const right = xOfDate(frame, window.latest);
  const room = Math.max(0, leastWidth - (right - left)) / 2;
  const isCutLeft = ageOnRuler(frame.birth, window.earliest) < firstAge;
  const isCutRight = ageOnRuler(frame.birth, window.latest) > lastAge;
  return { left: left - room, right: right + room, isCutLeft, isCutRight };
}

function flatten(frame: RulerFrame, item: RulerItem): Flat | null {
  const knotX = item.knotOn === null ? null : xOfDate(frame, item.knotOn);
  if (item.window === null || (item.isPast && knotX !== null)) {
    return knotX === null ? null : { item, ends: null, markX: knotX, left: knotX - 6, right: knotX + 6 };
  }
  const ends = endsOf(frame, item.window);
  const markX = markPlace({ state: item.state, left: ends.left, right: ends.right, knotX });
  const reach = item.state === 'late' ? xOfDate(frame, frame.today) : ends.right;
  return { item, ends, markX, left: Math.min(ends.left, markX - 6), right: Math.max(ends.right, markX + 6, reach) };
}

/** By opening date, each on the first track that is free where it lies. */
function tracksOf(flats: readonly Flat[]): ReadonlyMap<Flat, number> {
  const taken: { left: number; right: number }[][] = [];
  const tracks = new Map<Flat, number>();
  for (const flat of flats.toSorted((a, b) => a.left - b.left || a.right - b.right)) {
    const isFree = (track: number) =>
      (taken[track] ?? []).every((span) => flat.left > span.right + 2 || flat.right < span.left - 2);
    let track = flat.item.track ?? 0;
    while (flat.item.track === undefined && !isFree(track)) track += 1;
    (taken[track] ??= []).push({ left: flat.left, right: flat.right });
    tracks.set(flat, track);
  }
  return tracks;
}

/** Track 0 on the thread, 1 above it, 2 below it, 3 above that, and so on. */
function trackOffset(track: number): number {
  return track % 2 === 1 ? (-trackStep * (track + 1)) / 2 : (trackStep * track) / 2;
}

function placeItem(frame: RulerFrame, flat: Flat, at: { laneIndex: number; y: number }): PlacedItem {
  const { item, ends } = flat;
  const height = ends === null ? 0 : bodyHeight(item.state, ends.right - ends.left);
  const ghost = item.ghostWindow ? endsOf(frame, item.ghostWindow) : null;
  const hasClosing = item.state === 'closing' && item.window !== null;
  return {
    item,
    laneIndex: at.laneIndex,
    body: ends === null ? null : { ...ends, y: at.y, height },
    ghost:
      ghost === null
        ? null
        : { ...ghost, left: ghost.left - 2.5, right: ghost.right + 2.5, y: at.y, height: height + 5 },
    closingX: hasClosing && item.window !== null ? xOfDate(frame, item.window.closing) : null,
    markX: flat.markX,
    y: at.y,
    left: flat.left,
    right: flat.right,
  };
}

export function layoutRuler(frame: RulerFrame, lanes: readonly RulerLane[], items: readonly RulerItem[]): RulerLayout {
  const placedLanes: PlacedLane[] = [];
  const placedItems: PlacedItem[] = [];
  let top = headHeight;
  const leastHeight = lanes.length > manyLanes ? closeLaneHeight : laneHeight;
  for (const [laneIndex, lane] of lanes.entries()) {
    const flats = items.filter((item) => item.lane === lane.lane).flatMap((item) => flatten(frame, item) ?? []);
    const tracks = tracksOf(flats);
    const trackCount = Math.max(1, ...[...tracks.values()].map((track) => track + 1));
    const extra = Math.max(0, trackCount - 3);
    const height = leastHeight + trackStep * extra;
    const y = top + leastHeight / 2 + trackStep * Math.ceil(extra / 2);
    placedLanes.push({ lane, top, y, height });
    const placed = flats.map((flat) =>
      placeItem(frame, flat, { laneIndex, y: y + trackOffset(tracks.get(flat) ?? 0) }),
    );
    placedItems.push(...placed.toSorted((a, b) => a.markX - b.markX));
    top += height;
  }
  return { frame, todayX: xOfDate(frame, frame.today), lanes: placedLanes, items: placedItems, height: top + footRoom };
}
