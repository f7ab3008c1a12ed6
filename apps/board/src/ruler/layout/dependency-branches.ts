/** The lines that join a chosen milestone to what it waits for: one trunk, one branch for each. */
import type { RulerDependency } from '../ruler-item.ts';
import type { PlacedItem, RulerLayout } from './ruler-layout.ts';

const trunkRoom = 16;
const corner = 8;
/** Prerequisites that begin further left than this are reached from their right end. */
const near = 120;

export interface DependencyBranch {
  readonly key: string;
  readonly isMet: boolean;
  readonly start: number;
  readonly trunk: number;
  readonly end: number;
  readonly fromY: number;
  readonly toY: number;
}

export function dependencyBranches(
  layout: RulerLayout,
  selectedKey: string | null,
  dependencies: readonly RulerDependency[],
): readonly DependencyBranch[] {
  const byKey = new Map(layout.items.map((placed): [string, PlacedItem] => [placed.item.key, placed]));
  const chosen = selectedKey === null ? undefined : byKey.get(selectedKey);
  if (chosen === undefined) return [];
  const sources = dependencies.flatMap((dependency) => {
    const placed = byKey.get(dependency.key);
    return placed === undefined ? [] : [{ placed, isMet: dependency.isMet }];
  });
  const starts = sources.map(({ placed }) => placed.left).filter((left) => chosen.left - left < near);
  const trunk = Math.max(layout.frame.gutter + 6, Math.min(chosen.left, ...starts) - trunkRoom);
  return sources.map(({ placed, isMet }) => ({
    key: placed.item.key,
    isMet,
    start: placed.left >= trunk ? placed.left - 2 : Math.min(placed.right + 2, trunk - corner),
    trunk,
    end: chosen.left - 5,
    fromY: placed.y,
    toY: chosen.y,
  }));
}

/**
 * From the milestone round a corner, along the trunk, round a corner and along the prerequisite's thread. Drawn from the
 * milestone, so that the dashes of branches that share the trunk fall on one another.
 */
export function branchPath({ start, trunk, end, fromY, toY }: DependencyBranch): string {
  const fall = fromY - toY;
  if (Math.abs(fall) < 1) return `M${String(end)} ${String(toY)}H${String(start)}`;
  const turn = Math.min(corner, Math.abs(fall) / 2);
  const down = fall > 0 ? turn : -turn;
  const side = start >= trunk ? turn : -turn;
  return [
    `M${String(end)} ${String(toY)}H${String(trunk + turn)}`,
    `Q${String(trunk)} ${String(toY)} ${String(trunk)} ${String(toY + down)}`,
    `V${String(fromY - down)}`,
    `Q${String(trunk)} ${String(fromY)} ${String(trunk + side)} ${String(fromY)}H${String(start)}`,
  ].join('');
}
