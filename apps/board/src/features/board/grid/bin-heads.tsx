import { binsBeforeToday, boardBins } from '../../../ruler/board-axis.ts';
import { kitWords } from '../../../words/kit.ts';
import { boardWords } from '../../../words/board.ts';
import type { BoardColumns } from '../board-layout.ts';

/** The names of the bins, and the today flag between late and left. */
export function BinHeads({ columns }: { readonly columns: BoardColumns }) {
  const today = columns.bins[binsBeforeToday]?.left ?? 0;
  return (
    <div role="row" aria-rowindex={1} className="bg-paper border-hair sticky top-[60px] z-10 h-11 border-b">
      <span role="columnheader" aria-colindex={1} className="sr-only">
        {boardWords.lane}
      </span>
      <span
        aria-hidden="true"
        style={{ left: today }}
        className="bg-ink text-paper text-fine font-emphasis absolute top-0 -translate-x-1/2 rounded-tag px-2 leading-[18px]"
      >
        {kitWords.today}
      </span>
      {boardBins.map((bin, at) => (
        <span
          key={bin.name}
          role="columnheader"
          aria-colindex={at + 2}
          style={{ left: (columns.bins[at]?.left ?? 0) + 6, width: (columns.bins[at]?.width ?? 0) - 8 }}
          className="text-fine text-ink-2 absolute bottom-1.5 truncate"
        >
          {boardWords.bins[bin.name]}
        </span>
      ))}
    </div>
  );
}

/** Hairlines between the bins and the today line, down the whole board. */
export function BinRules({ columns }: { readonly columns: BoardColumns }) {
  return (
    <div aria-hidden="true" className="pointer-events-none absolute inset-0">
      {columns.bins.slice(1).map(({ left }, at) => (
        <span
          key={left}
          style={{ left: left - (at + 1 === binsBeforeToday ? 1 : 0) }}
          className={`absolute inset-y-0 ${at + 1 === binsBeforeToday ? 'bg-ink z-[5] w-[1.8px]' : 'bg-hair w-px'}`}
        />
      ))}
    </div>
  );
}
