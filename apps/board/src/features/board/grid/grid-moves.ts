/** Where the arrow keys lead on the board: up and down from lane to lane, left and right from child to child. */
import { rowsOfStrip, type Strip } from '../board-strips.ts';

/** A lane's head, or a child's row in an unrolled lane. */
export interface GridPlace {
  readonly strip: string;
  readonly row: string | null;
}

export type GridMove =
  { readonly kind: 'go'; readonly to: GridPlace } | { readonly kind: 'unroll'; readonly strip: string } | null;

export interface GridShape {
  readonly strips: readonly Strip[];
  readonly unrolled: ReadonlySet<string>;
}

const head = (strip: Strip | undefined): GridMove =>
  strip === undefined ? null : { kind: 'go', to: { strip: strip.key, row: null } };

const alongLane = (strip: Strip, isUnrolled: boolean, place: GridPlace, key: string): GridMove => {
  const isForward = key === 'ArrowRight';
  // As in any tree: right opens a closed branch, left closes an open one.
  if (place.row === null && isForward !== isUnrolled) return { kind: 'unroll', strip: strip.key };
  if (place.row === null && !isForward) return { kind: 'unroll', strip: strip.key };
  const rows = rowsOfStrip(strip);
  const at = place.row === null ? -1 : rows.findIndex((row) => row.id === place.row);
  if (at <= 0 && !isForward) return head(strip);
  const next = rows[at + (isForward ? 1 : -1)];
  return next === undefined ? null : { kind: 'go', to: { strip: strip.key, row: next.id } };
};

export const gridMove = ({ strips, unrolled }: GridShape, place: GridPlace | null, key: string): GridMove => {
  const at = place === null ? -1 : strips.findIndex((strip) => strip.key === place.strip);
  const strip = strips[at];
  if (strip === undefined || place === null) return head(strips[0]);
  if (key === 'ArrowDown') return head(strips[at + 1]);
  if (key === 'ArrowUp') return place.row === null ? head(strips[at - 1]) : head(strip);
  const isUnrolled = unrolled.has(strip.key);
  if (key === 'ArrowRight' || key === 'ArrowLeft') {
    if (place.row === null && key === 'ArrowLeft' && !isUnrolled) return null;
    return alongLane(strip, isUnrolled, place, key);
  }
  const rows = isUnrolled ? rowsOfStrip(strip) : [];
  const end = key === 'Home' ? rows[0] : rows[rows.length - 1];
  return end === undefined ? head(strip) : { kind: 'go', to: { strip: strip.key, row: end.id } };
};

export const placeText = (place: GridPlace): string => place.row ?? `lane ${place.strip}`;
