import { LooseEndMark } from '../../../marks/legend.tsx';
import { boardWords } from '../../../words/board.ts';
import type { Strip } from '../board-strips.ts';

interface LaneHeadProps {
  readonly strip: Strip;
  readonly isUnrolled: boolean;
  readonly isFocused: boolean;
}

/** Name of a lane, how many stand in it, and how many of them nobody holds. */
export function LaneHead({ strip, isUnrolled, isFocused }: LaneHeadProps) {
  return (
    <div
      role="rowheader"
      aria-colindex={1}
      aria-expanded={isUnrolled}
      aria-label={boardWords.laneName(strip.name, strip.count, strip.loose)}
      tabIndex={isFocused ? 0 : -1}
      data-lane={strip.key}
      data-place={`lane ${strip.key}`}
      className="hover:bg-linen absolute inset-y-0 left-0 flex w-[182px] cursor-pointer scroll-mt-32 scroll-mb-8 items-start gap-1.5 rounded pt-[5px] focus-visible:z-10 focus-visible:-outline-offset-3"
    >
      <span className={`truncate ${isUnrolled ? 'text-label' : 'text-small'}`}>{strip.name}</span>
      <span className="text-fine text-ink-3 figures pt-px font-normal">{strip.count}</span>
      {strip.loose === 0 ? null : (
        <span
          title={boardWords.looseTitle(strip.loose)}
          className="text-fine text-madder figures mr-2 ml-auto flex items-center gap-1 pt-px font-semibold"
        >
          <LooseEndMark size={13} />
          {strip.loose}
        </span>
      )}
    </div>
  );
}
