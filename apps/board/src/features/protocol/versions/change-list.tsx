import { Link } from 'react-router-dom';
import { protocolWords } from '../../../words/protocol.ts';
import type { PartChange, ProtocolChange } from './protocol-changes.ts';

function Sayings({
  items,
  label,
  isOld,
}: {
  readonly items: readonly string[];
  readonly label: string;
  readonly isOld: boolean;
}) {
  if (items.length === 0) return null;
  return (
    <div className="flex gap-2">
      <span className="text-fine text-ink-3 w-8 shrink-0 pt-0.5">{label}</span>
      <ul className={`m-0 list-none p-0 ${isOld ? 'text-ink-3 line-through decoration-1' : 'text-ink'}`}>
        {items.map((item) => (
          <li key={item}>{item}</li>
        ))}
      </ul>
    </div>
  );
}

function Part({ part }: { readonly part: PartChange }) {
  return (
    <div className="grid grid-cols-[9rem_minmax(0,1fr)] gap-x-4 py-1 max-sm:grid-cols-1">
      <div className="text-small text-ink-2">{part.label}</div>
      <div className="flex flex-col gap-0.5">
        <Sayings items={part.before} label={protocolWords.was} isOld />
        <Sayings items={part.after} label={protocolWords.is} isOld={false} />
      </div>
    </div>
  );
}

interface ChangeListProps {
  readonly changes: readonly ProtocolChange[];
  /** Version that the names lead to; absent: they lead nowhere. */
  readonly version?: number | undefined;
  /** Present in a proposal: takes the changes of one milestone back. */
  readonly onTakeBack?: ((id: string | null) => void) | undefined;
}

/** Differences as sentences: what was said, what is said now. */
export function ChangeList({ changes, version, onTakeBack }: ChangeListProps) {
  return (
    <ul className="m-0 list-none p-0">
      {changes.map((change) => (
        <li key={`${change.id ?? ''} ${change.title}`} className="border-hair border-t py-2.5">
          <div className="flex flex-wrap items-baseline gap-x-2">
            <span className="font-semibold">
              {version === undefined || change.id === null || change.kind === 'removed' ? (
                change.title
              ) : (
                <Link to={`/protocol/${String(version)}#${change.id}`} className="text-ink rounded hover:underline">
                  {change.title}
                </Link>
              )}
            </span>
            {change.id === null ? null : <span className="text-small text-ink-3 figures">{change.id}</span>}
            {change.kind === 'changed' ? null : (
              <span className="text-small text-ink-2">{protocolWords[change.kind]}</span>
            )}
            {onTakeBack === undefined ? null : (
              <button
                type="button"
                aria-label={protocolWords.proposal.takeBackOf(change.title)}
                onClick={() => onTakeBack(change.id)}
                className="text-small text-indigo ml-auto min-h-6 rounded underline underline-offset-3"
              >
                {protocolWords.proposal.takeBack}
              </button>
            )}
          </div>
          {change.parts.map((part) => (
            <Part key={part.label} part={part} />
          ))}
        </li>
      ))}
    </ul>
  );
}
