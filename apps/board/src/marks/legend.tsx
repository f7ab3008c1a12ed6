import { milestoneStateNames, milestoneStates } from '@weftway/pathway/milestone-state';
import { markWords } from '../words/marks.ts';
import { Mark } from './mark.tsx';

/** What each mark means, for the foot of a drawing. */
export function Legend() {
  return (
    <ul aria-label={markWords.legend} className="m-0 flex list-none flex-wrap gap-x-5 gap-y-1 p-0">
      {milestoneStates
        .filter((state) => state !== 'transferred')
        .map((state) => (
          <li key={state} className="text-fine text-ink-2 flex items-center gap-1.5">
            <Mark state={state} size={12} title={null} />
            {milestoneStateNames[state]}
          </li>
        ))}
      <li className="text-fine text-ink-2 flex items-center gap-1.5">
        <LooseEndMark size={12} />
        {markWords.looseEnd}
      </li>
    </ul>
  );
}

/** The loose end by itself, before a number of unowned milestones. */
export function LooseEndMark({ size = 12 }: { readonly size?: number }) {
  return (
    <svg width={size * 0.6} height={size} viewBox="3.5 14.5 9 11.5" fill="none" aria-hidden="true" className="shrink-0">
      <path d="M8 15.5q3.4 2 0 4.5t0 5" stroke="currentColor" strokeWidth="1.6" strokeLinecap="round" />
    </svg>
  );
}
