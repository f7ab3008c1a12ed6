import type { TrailLine } from '@weftway/contract/trail';
import { trailWords } from '../../words/trail.ts';
import { differenceRows, type NameOf } from './difference.ts';

interface TrailLineDetailsProps {
  readonly line: TrailLine;
  readonly nameOf: NameOf;
  readonly seesContent: boolean;
}

function Contents({ line, nameOf, seesContent }: TrailLineDetailsProps) {
  if (line.log === 'reads') return null;
  if (!seesContent) return <p className="text-small text-ink-2 m-0">{trailWords.contentsHidden}</p>;
  const rows = differenceRows(line.before, line.after, nameOf);
  if (rows.length === 0)
    return (
      <p className="text-small text-ink-2 m-0">
        {line.before === null ? trailWords.noContent : trailWords.nothingChanged}
      </p>
    );
  return (
    <dl className="m-0 flex flex-col gap-1">
      {rows.map((row, index) => (
        <div
          key={`${String(index)} ${row.label}`}
          className="grid grid-cols-[12rem_minmax(0,1fr)] gap-x-4 max-sm:grid-cols-1"
        >
          <dt className="text-small text-ink-2">{row.label}</dt>
          <dd className="text-body m-0 max-w-[72ch] [overflow-wrap:anywhere]">
            {row.before === null ? null : (
              <>
                <span className="sr-only">{trailWords.before} </span>
                <span className="text-ink-3 line-through decoration-1">{row.before}</span>
                <span aria-hidden="true"> → </span>
                <span className="sr-only">, {trailWords.after} </span>
              </>
            )}
            {row.after}
          </dd>
        </div>
      ))}
    </dl>
  );
}

/** What stood before and after, and how the line is found again. */
export function TrailLineDetails(props: TrailLineDetailsProps) {
  const { line } = props;
  return (
    <div className="flex flex-col gap-2 pb-3">
      <Contents {...props} />
      <p className="text-fine text-ink-3 m-0 [overflow-wrap:anywhere]">
        {trailWords.reference(line.requestId)} · <span title={line.hash}>{trailWords.hash(line.hash)}</span>
      </p>
    </div>
  );
}
