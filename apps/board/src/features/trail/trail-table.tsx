import { Fragment, useState } from 'react';
import type { TrailLine } from '@weftway/contract/trail';
import { TextLink } from '../../ui/actions/text-link.tsx';
import { ChevronIcon } from '../../ui/icons.tsx';
import { Cell, ColumnHead, Row, Table } from '../../ui/page/table.tsx';
import { readWords, trailWords } from '../../words/trail.ts';
import type { NameOf } from './difference.ts';
import { TrailLineDetails } from './trail-line-details.tsx';

interface TrailTableProps {
  readonly lines: readonly TrailLine[];
  /** The team's zone. */
  readonly zone: string;
  readonly nameOf: NameOf;
  readonly seesContent: boolean;
  readonly onlyChild: (childId: string) => void;
}

const { columns } = trailWords;

const clock = (zone: string) =>
  new Intl.DateTimeFormat('en-GB', {
    timeZone: zone,
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
    second: '2-digit',
    hourCycle: 'h23',
  });

const whatOf = (line: TrailLine): string =>
  line.log === 'reads' ? (readWords(line.kind) ?? line.summary) : line.summary;

function ChildCell({ line, onlyChild }: { readonly line: TrailLine; readonly onlyChild: (childId: string) => void }) {
  const { childId } = line;
  if (childId === null) return null;
  if (line.childName !== null) return <TextLink to={`/children/${childId}`}>{line.childName}</TextLink>;
  return (
    <button
      type="button"
      title={childId}
      onClick={() => onlyChild(childId)}
      className="text-ink-2 min-h-6 rounded underline decoration-dotted underline-offset-3"
    >
      {trailWords.aChild} <span className="figures">{childId.slice(-6)}</span>
    </button>
  );
}

/** Newest first; a line opens to what stood before and after. */
export function TrailTable({ lines, zone, nameOf, seesContent, onlyChild }: TrailTableProps) {
  const [open, setOpen] = useState<ReadonlySet<number>>(new Set());
  const format = clock(zone);
  const toggle = (seq: number) =>
    setOpen((now) => {
      const next = new Set(now);
      if (!next.delete(seq)) next.add(seq);
      return next;
    });
  return (
    <Table
      label={trailWords.title}
      head={
        <>
          <ColumnHead>{columns.when}</ColumnHead>
          <ColumnHead>{columns.what}</ColumnHead>
          <ColumnHead>{columns.child}</ColumnHead>
          <ColumnHead>{columns.who}</ColumnHead>
          <ColumnHead kind="number">{columns.line}</ColumnHead>
        </>
      }
    >
      {lines.map((line) => (
        <Fragment key={`${line.log} ${String(line.seq)}`}>
          <Row isChosen={open.has(line.seq)}>
            <Cell>
              <time dateTime={line.at} className="figures whitespace-nowrap">
                {format.format(new Date(line.at))}
              </time>
            </Cell>
            <Cell>
              <button
                type="button"
                data-row-link=""
                aria-expanded={open.has(line.seq)}
                aria-label={trailWords.show(whatOf(line), line.seq)}
                onClick={() => toggle(line.seq)}
                className="flex min-h-6 min-w-48 items-center gap-1.5 rounded text-left font-semibold hover:underline"
              >
                <span className={`text-ink-2 ${open.has(line.seq) ? '' : '-rotate-90'}`}>
                  <ChevronIcon size={12} />
                </span>
                {whatOf(line)}
              </button>
            </Cell>
            <Cell>
              <ChildCell line={line} onlyChild={onlyChild} />
            </Cell>
            <Cell>
              <span className="block">{line.actorName === '' ? trailWords.nobody : line.actorName}</span>
              <span className="text-fine text-ink-3">{line.actorRole}</span>
            </Cell>
            <Cell kind="number">{line.seq}</Cell>
          </Row>
          {open.has(line.seq) ? (
            <tr>
              <td colSpan={5} className="p-0 pl-5">
                <TrailLineDetails line={line} nameOf={nameOf} seesContent={seesContent} />
              </td>
            </tr>
          ) : null}
        </Fragment>
      ))}
    </Table>
  );
}
