import { useEffect, useState } from 'react';
import { kitWords } from '../../words/kit.ts';

interface LoadingProps {
  /** What is being fetched: "Loading the pathway". */
  readonly label?: string | undefined;
  /** Names of the rows that are known already. */
  readonly rows?: readonly string[] | undefined;
}

const pills = [
  [[6, 22]],
  [
    [4, 10],
    [48, 26],
  ],
  [[20, 34]],
  [
    [2, 14],
    [30, 12],
    [60, 20],
  ],
  [[40, 24]],
  [[12, 40]],
] as const;

/** Nothing for 0.3 s, then plain pills on threads; after 4 s a sentence. */
export function Loading({ label = kitWords.loading, rows = ['', '', '', ''] }: LoadingProps) {
  const [stage, setStage] = useState<'silent' | 'shown' | 'slow'>('silent');
  useEffect(() => {
    const show = setTimeout(() => setStage('shown'), 300);
    const slow = setTimeout(() => setStage('slow'), 4000);
    return () => {
      clearTimeout(show);
      clearTimeout(slow);
    };
  }, []);
  if (stage === 'silent') return null;
  return (
    <div className="flex flex-col gap-3 py-4">
      <p role="status" className="sr-only">
        {label}
      </p>
      {rows.map((row, index) => (
        <div key={`${row} ${String(index)}`} aria-hidden="true" className="flex h-4 items-center gap-4">
          {row === '' ? null : <span className="text-small text-ink-2 w-36 shrink-0 truncate">{row}</span>}
          <svg className="h-4 grow" width="100%" height="16">
            <line x1="0" x2="100%" y1="8" y2="8" className="stroke-thread" strokeWidth="2" />
            {(pills[index % pills.length] ?? []).map(([left, width]) => (
              <rect
                key={left}
                x={`${String(left)}%`}
                width={`${String(width)}%`}
                y="2"
                height="12"
                rx="6"
                className="fill-sunk"
              />
            ))}
          </svg>
        </div>
      ))}
      {stage === 'slow' ? <p className="text-small text-ink-2 m-0">{kitWords.stillLoading}</p> : null}
    </div>
  );
}
