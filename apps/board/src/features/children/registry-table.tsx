import { ageText } from '@weftway/calendar/age';
import { formatDate } from '@weftway/calendar/format-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { ChildRow } from '@weftway/contract/child';
import { parseCleftCode } from '@weftway/pathway/cleft-code';
import { cleftLabel } from '@weftway/pathway/cleft-facts';
import { Cell, ColumnHead, Row, RowLink, Table } from '../../ui/page/table.tsx';
import { Tag } from '../../ui/page/tag.tsx';
import { Mark } from '../../marks/mark.tsx';
import { registryWords } from '../../words/children.ts';
import type { Names } from './field-text.ts';
import type { RegistryOrder } from './registry-search.tsx';

interface RegistryTableProps {
  readonly rows: readonly ChildRow[];
  readonly today: PlainDate;
  readonly names: Names;
  readonly order: RegistryOrder;
  readonly onOrder: (order: RegistryOrder) => void;
}

/** Hairlines, numbers to the right; a row opens the child's pathway. */
export function RegistryTable({ rows, today, names, order, onOrder }: RegistryTableProps) {
  const sort = (by: RegistryOrder, direction: 'ascending' | 'descending') => ({
    direction: order === by ? direction : ('none' as const),
    onSort: () => onOrder(by),
  });
  return (
    <Table
      label={registryWords.title}
      head={
        <>
          <ColumnHead sort={sort('name', 'ascending')}>{registryWords.child}</ColumnHead>
          <ColumnHead sort={sort('birth', 'descending')}>{registryWords.born}</ColumnHead>
          <ColumnHead>{registryWords.cleft}</ColumnHead>
          <ColumnHead>{registryWords.site}</ColumnHead>
          <ColumnHead>{registryWords.lead}</ColumnHead>
          <ColumnHead kind="number" sort={sort('late', 'descending')}>
            {registryWords.late}
          </ColumnHead>
          <ColumnHead kind="number">{registryWords.closing}</ColumnHead>
          <ColumnHead kind="number">{registryWords.unowned}</ColumnHead>
        </>
      }
    >
      {rows.map((row) => (
        <ChildLine
          key={row.id}
          row={row}
          today={today}
          lead={row.leadClinicianId === null ? registryWords.noLead : (names.get(row.leadClinicianId) ?? '')}
        />
      ))}
    </Table>
  );
}

function ChildLine({ row, today, lead }: { readonly row: ChildRow; readonly today: PlainDate; readonly lead: string }) {
  const reading = parseCleftCode(row.cleft);
  return (
    <Row>
      <Cell kind="head">
        <RowLink to={row.careEndedOn === null ? `/children/${row.id}` : `/children/${row.id}/record`}>
          {row.familyName}, {row.firstName}
        </RowLink>
        <span className="text-fine text-ink-3 figures block">
          {row.recordNumber}
          {row.transferredOn === null ? '' : `, ${registryWords.transferred(formatDate(row.transferredOn))}`}
          {row.careEndedOn === null ? '' : `, ${registryWords.careEnded(formatDate(row.careEndedOn))}`}
        </span>
        {/* On a phone the counts stand far to the right. */}
        <span className="text-fine text-ink-2 block sm:hidden">{registryWords.inShort(row)}</span>
        {row.alerts.length === 0 ? null : (
          <span className="flex flex-wrap gap-1 pt-0.5">
            {row.alerts.map((alert) => (
              <Tag key={alert} kind="alert">
                {alert}
              </Tag>
            ))}
          </span>
        )}
      </Cell>
      <Cell>
        <span className="figures whitespace-nowrap">
          {row.bornOn === null
            ? row.dueOn === null
              ? ''
              : registryWords.expected(formatDate(row.dueOn))
            : formatDate(row.bornOn)}
        </span>
        {row.bornOn === null ? null : (
          <span className="text-fine text-ink-3 block whitespace-nowrap">{ageText(row.bornOn, today)}</span>
        )}
      </Cell>
      <Cell>
        <span className="whitespace-nowrap">{reading.ok ? cleftLabel(reading.code) : row.cleft}</span>
        <span className="text-fine text-ink-3 block">{row.cleft}</span>
      </Cell>
      <Cell>{row.site}</Cell>
      <Cell>
        <span className={row.leadClinicianId === null ? 'text-ink-3' : ''}>{lead}</span>
      </Cell>
      <Count number={row.late} state="late" />
      <Count number={row.closing} state="closing" />
      <Cell kind="number">
        <span className={row.unowned === 0 ? 'text-ink-3' : 'font-semibold'}>{row.unowned}</span>
      </Cell>
    </Row>
  );
}

/** A number with its mark, so that colour is never the only difference. */
function Count({ number, state }: { readonly number: number; readonly state: 'late' | 'closing' }) {
  if (number === 0) {
    return (
      <Cell kind="number">
        <span className="text-ink-3">0</span>
      </Cell>
    );
  }
  return (
    <Cell kind="number">
      <span
        className={`inline-flex items-center justify-end gap-1.5 font-semibold ${state === 'late' ? 'text-madder' : 'text-weld'}`}
      >
        <Mark state={state} size={12} />
        {number}
      </span>
    </Cell>
  );
}
