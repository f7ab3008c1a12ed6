import type { MilestoneState } from '@weftway/pathway/milestone-state';
import type { ReactNode } from 'react';

/** `ground` is the class that fills a hollow shape with what lies under it. */
type Shape = (ground: string) => ReactNode;

const shapes: Readonly<Record<MilestoneState, Shape>> = {
  ahead: (ground) => <circle cx="8" cy="8" r="5.25" className={ground} stroke="currentColor" strokeWidth="1.75" />,
  open: () => <path d="M.25 8Q8-2.5 15.75 8Q8 18.5.25 8Z" fill="currentColor" />,
  closing: () => <path d="M2.5 1.5H13.5L9.25 8L13.5 14.5H2.5L6.75 8Z" fill="currentColor" />,
  late: () => (
    <path d="M8 .75V15.25M1.72 4.375 14.28 11.625M14.28 4.375 1.72 11.625" stroke="currentColor" strokeWidth="2.9" />
  ),
  waiting: (ground) => (
    <path d="M2 8L13 2V14Z" className={ground} stroke="currentColor" strokeWidth="1.9" strokeLinejoin="round" />
  ),
  held: () => <path d="M2.75 1.75h3.75v12.5H2.75ZM9.5 1.75h3.75v12.5H9.5Z" fill="currentColor" />,
  'partly-signed': (ground) => (
    <>
      <circle cx="8" cy="8" r="5.4" className={ground} stroke="currentColor" strokeWidth="1.75" />
      <path d="M8 2.6a5.4 5.4 0 0 0 0 10.8Z" fill="currentColor" />
    </>
  ),
  signed: () => <circle cx="8" cy="8" r="6.25" fill="currentColor" />,
  waived: (ground) => (
    <>
      <circle cx="8" cy="8" r="4.6" className={ground} stroke="currentColor" strokeWidth="1.6" />
      <path d="M1.6 14.4 14.4 1.6" stroke="currentColor" strokeWidth="1.6" />
    </>
  ),
  // Not drawn in the design study: the path is frozen, so the loop is carried off by an arrow pointing onward.
  transferred: (ground) => (
    <>
      <circle cx="6.25" cy="8" r="4.4" className={ground} stroke="currentColor" strokeWidth="1.6" />
      <path d="M6.25 8H14.75M11.5 4.75 14.75 8 11.5 11.25" fill="none" stroke="currentColor" strokeWidth="1.6" />
    </>
  ),
};

const dyes: Readonly<Record<MilestoneState, string>> = {
  ahead: 'text-ink-3',
  open: 'text-indigo',
  closing: 'text-weld',
  late: 'text-madder',
  waiting: 'text-woad',
  held: 'text-walnut',
  'partly-signed': 'text-ink',
  signed: 'text-ink',
  waived: 'text-ink-3',
  transferred: 'text-ink-3',
};

/** Where the loose end leaves each mark. */
const looseEndFrom: Partial<Record<MilestoneState, number>> = { open: 13.4, waiting: 11.6, ahead: 14 };

export function markDye(state: MilestoneState): string {
  return dyes[state];
}

interface MarkShapeProps {
  readonly state: MilestoneState;
  readonly unowned: boolean;
  readonly ground?: 'fill-paper' | 'fill-linen' | 'fill-bleached' | 'fill-indigo-wash' | 'fill-woad-wash';
}

/** The bare shape on the 16 by 16 grid, 16 by 25 with a loose end, for use inside a drawing. */
export function MarkShape({ state, unowned, ground = 'fill-paper' }: MarkShapeProps) {
  return (
    <>
      {unowned ? <LooseEnd from={looseEndFrom[state] ?? 14.6} /> : null}
      <g className={dyes[state]}>{shapes[state](ground)}</g>
    </>
  );
}

function LooseEnd({ from }: { readonly from: number }) {
  return (
    <path
      d={`M8 ${String(from)}L8 16q3.4 2 0 4.2t0 4.2`}
      fill="none"
      className="stroke-ink"
      strokeWidth="1.75"
      strokeLinecap="round"
    />
  );
}
