/** How high the window of each state is drawn, and where its mark sits. Pixels. */
import type { MilestoneState } from '@weftway/pathway/milestone-state';

export const fullHeight = 11;
export const thinHeight = 7;
/** Under this width a window is drawn thin with its mark in the middle. */
export const thinUnder = 19;
export const leastWidth = 13;

const markInset = 6.5;

export function isDone(state: MilestoneState): boolean {
  return state === 'signed' || state === 'partly-signed' || state === 'waived' || state === 'transferred';
}

export function bodyHeight(state: MilestoneState, width: number, full = fullHeight): number {
  return isDone(state) || width < thinUnder ? (full * thinHeight) / fullHeight : full;
}

/** Where the mark sits on a window from `left` to `right`; a knot has its own place. */
export function markPlace(of: { state: MilestoneState; left: number; right: number; knotX: number | null }): number {
  if (of.knotX !== null) return of.knotX;
  if (of.right - of.left < thinUnder) return (of.left + of.right) / 2;
  return of.state === 'late' ? of.right - markInset : of.left + markInset;
}

export interface BodyEnds {
  readonly left: number;
  readonly right: number;
  readonly y: number;
  readonly height: number;
  /** Cut by the edge of the axis: a flat end without a border. */
  readonly isCutLeft: boolean;
  readonly isCutRight: boolean;
}

/** Outline of a window for its border: open where it is cut. */
export function borderPath({ left, right, y, height, isCutLeft, isCutRight }: BodyEnds): string {
  const r = Math.min(height / 2, (right - left) / 2);
  const top = y - height / 2;
  const foot = y + height / 2;
  const n = (value: number) => String(Math.round(value * 100) / 100);
  if (isCutLeft && isCutRight) return `M${n(left)} ${n(top)}H${n(right)}M${n(left)} ${n(foot)}H${n(right)}`;
  if (isCutRight)
    return `M${n(right)} ${n(top)}H${n(left + r)}A${n(r)} ${n(r)} 0 0 0 ${n(left + r)} ${n(foot)}H${n(right)}`;
  if (isCutLeft)
    return `M${n(left)} ${n(top)}H${n(right - r)}A${n(r)} ${n(r)} 0 0 1 ${n(right - r)} ${n(foot)}H${n(left)}`;
  const rightEnd = `H${n(right - r)}A${n(r)} ${n(r)} 0 0 1 ${n(right - r)} ${n(foot)}`;
  return `M${n(left + r)} ${n(top)}${rightEnd}H${n(left + r)}A${n(r)} ${n(r)} 0 0 1 ${n(left + r)} ${n(top)}Z`;
}

/** The same outline, closed, for its fill. */
export function fillPath(ends: BodyEnds): string {
  const { left, right, y, height, isCutLeft, isCutRight } = ends;
  if (!isCutLeft || !isCutRight) return borderPath(ends);
  return `M${String(left)} ${String(y - height / 2)}H${String(right)}V${String(y + height / 2)}H${String(left)}Z`;
}
