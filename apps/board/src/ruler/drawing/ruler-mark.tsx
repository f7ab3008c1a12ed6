import { markDye, MarkShape } from '../../marks/mark-shapes.tsx';
import type { MilestoneState } from '@weftway/pathway/milestone-state';

interface RulerMarkProps {
  readonly state: MilestoneState;
  readonly unowned: boolean;
  readonly x: number;
  readonly y: number;
  readonly size?: number;
}

const grounds = { ahead: 'fill-paper', waiting: 'fill-woad-wash' } as const;

/** A mark at a point of a drawing. */
export function RulerMark({ state, unowned, x, y, size = 12 }: RulerMarkProps) {
  const scale = size / 16;
  const ground = state === 'waiting' || state === 'ahead' ? grounds[state] : 'fill-paper';
  return (
    <g
      transform={`translate(${String(x - size / 2)} ${String(y - size / 2)}) scale(${String(scale)})`}
      fill="none"
      className={markDye(state)}
    >
      <MarkShape state={state} unowned={unowned} ground={ground} />
    </g>
  );
}
