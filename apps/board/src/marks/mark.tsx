import { milestoneStateNames, type MilestoneState } from '@weftway/pathway/milestone-state';
import { markWords } from '../words/marks.ts';
import { MarkShape } from './mark-shapes.tsx';

interface MarkProps {
  readonly state: MilestoneState;
  readonly unowned?: boolean | undefined;
  /** 12 to 20; 14 in lists. */
  readonly size?: number | undefined;
  /** What it is called: the state's name when absent; `null` when the same word stands right beside it. */
  readonly title?: string | null | undefined;
  /** The ground that a hollow shape lies on. */
  readonly ground?: 'paper' | 'linen' | 'bleached' | undefined;
}

const grounds = { paper: 'fill-paper', linen: 'fill-linen', bleached: 'fill-bleached' } as const;

export function Mark({ state, unowned = false, size = 14, title, ground = 'paper' }: MarkProps) {
  const name = title === undefined ? markWords.name(milestoneStateNames[state], unowned) : title;
  const height = unowned ? 25 : 16;
  return (
    <svg
      width={size}
      height={(size * height) / 16}
      viewBox={`0 0 16 ${String(height)}`}
      fill="none"
      focusable="false"
      className="inline-block shrink-0 overflow-visible"
      {...(name === null ? { 'aria-hidden': true } : { role: 'img', 'aria-label': name })}
    >
      <MarkShape state={state} unowned={unowned} ground={grounds[ground]} />
    </svg>
  );
}
