import { formatDate } from '@weftway/calendar/format-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import { Cell, ColumnHead, Row, RowLink, Table } from '../../../ui/page/table.tsx';
import { protocolWords } from '../../../words/protocol.ts';

export interface VersionHead {
  readonly version: number;
  readonly status: 'draft' | 'active' | 'retired';
  readonly changes: string;
  readonly createdAt: string;
  readonly createdBy: string;
  readonly activatedAt: string | null;
  readonly agreedBy: string | null;
  readonly children: number;
}

const dayOf = (instant: string): string => formatDate(instant.slice(0, 10) as PlainDate); // an ISO instant begins with its date

const { columns } = protocolWords;

export function VersionTable({ heads }: { readonly heads: readonly VersionHead[] }) {
  return (
    <Table
      label={protocolWords.versions}
      head={
        <>
          <ColumnHead>{columns.version}</ColumnHead>
          <ColumnHead>{columns.status}</ColumnHead>
          <ColumnHead>{columns.changes}</ColumnHead>
          <ColumnHead>{columns.made}</ColumnHead>
          <ColumnHead>{columns.active}</ColumnHead>
          <ColumnHead>{columns.agreed}</ColumnHead>
          <ColumnHead kind="number">{columns.children}</ColumnHead>
        </>
      }
    >
      {heads.map((head) => (
        <Row key={head.version}>
          <Cell kind="head">
            <span className="whitespace-nowrap">
              <RowLink to={`/protocol/${String(head.version)}`}>{protocolWords.versionName(head.version)}</RowLink>
            </span>
          </Cell>
          <Cell>
            <span className={head.status === 'active' ? 'font-semibold' : 'text-ink-2'}>
              {protocolWords.statuses[head.status]}
            </span>
          </Cell>
          <Cell>
            <span className="block max-w-[48ch] min-w-48">{head.changes}</span>
          </Cell>
          <Cell>{protocolWords.madeBy(dayOf(head.createdAt), head.createdBy)}</Cell>
          <Cell>{head.activatedAt === null ? '' : dayOf(head.activatedAt)}</Cell>
          <Cell>{head.agreedBy ?? ''}</Cell>
          <Cell kind="number">{head.children}</Cell>
        </Row>
      ))}
    </Table>
  );
}
