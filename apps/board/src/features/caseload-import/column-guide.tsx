import { importAliases, importColumns } from '@weftway/contract/caseload-import';
import { Section } from '../../ui/page/section.tsx';
import { Cell, ColumnHead, Row, Table } from '../../ui/page/table.tsx';
import { columnGuides, importWords } from '../../words/import.ts';

/** Every column of the file: what it says, how it can be written, what else it may be called. */
export function ColumnGuide() {
  return (
    <Section title={importWords.guide}>
      <p className="text-body text-ink-2 m-0 max-w-[72ch]">{importWords.guideHelp}</p>
      <Table
        label={importWords.guide}
        head={
          <>
            <ColumnHead>{importWords.column}</ColumnHead>
            <ColumnHead>{importWords.means}</ColumnHead>
            <ColumnHead>{importWords.forms}</ColumnHead>
          </>
        }
      >
        {importColumns.map((column) => (
          <Row key={column}>
            <Cell kind="head">
              <span className="font-semibold">{column}</span>
              <span className="text-fine text-ink-3 block">{importWords.alsoCalled(importAliases[column])}</span>
            </Cell>
            <Cell>{columnGuides[column].means}</Cell>
            <Cell>{columnGuides[column].forms}</Cell>
          </Row>
        ))}
      </Table>
    </Section>
  );
}
