import { formatDate } from '@weftway/calendar/format-date';
import { readPlainDate } from '@weftway/calendar/plain-date';
import type { ImportPreview } from '@weftway/contract/caseload-import';
import { Section } from '../../ui/page/section.tsx';
import { Cell, ColumnHead, Row, Table } from '../../ui/page/table.tsx';
import { importWords } from '../../words/import.ts';

const dateText = (text: string | null): string => {
  const reading = readPlainDate(text ?? '');
  return reading.kind === 'date' ? formatDate(reading.date) : '';
};

/** How the first rows were understood, so that a wrong date order or encoding is seen before it is written. */
export function SampleTable({ sample }: { readonly sample: ImportPreview['sample'] }) {
  if (sample.length === 0) return null;
  return (
    <Section title={importWords.sample}>
      <Table
        label={importWords.sample}
        head={
          <>
            <ColumnHead kind="number">{importWords.row}</ColumnHead>
            <ColumnHead>{importWords.name}</ColumnHead>
            <ColumnHead>{importWords.number}</ColumnHead>
            <ColumnHead>{importWords.born}</ColumnHead>
            <ColumnHead>{importWords.cleft}</ColumnHead>
            <ColumnHead>{importWords.action}</ColumnHead>
          </>
        }
      >
        {sample.map((row) => (
          <Row key={row.row}>
            <Cell kind="number">{row.row}</Cell>
            <Cell>{row.name}</Cell>
            <Cell>{row.recordNumber}</Cell>
            <Cell>
              <span className="figures whitespace-nowrap">{dateText(row.bornOn)}</span>
            </Cell>
            <Cell>{row.cleft}</Cell>
            <Cell>
              <span className={row.action === 'refused' ? 'text-madder' : 'text-ink-2'}>
                {importWords.actions[row.action]}
              </span>
            </Cell>
          </Row>
        ))}
      </Table>
    </Section>
  );
}
