import { useState } from 'react';
import type { ImportFault, ImportPreview } from '@weftway/contract/caseload-import';
import { Segment } from '../../ui/actions/segment.tsx';
import { AlertIcon } from '../../ui/icons.tsx';
import { Section } from '../../ui/page/section.tsx';
import { Cell, ColumnHead, Row, Table } from '../../ui/page/table.tsx';
import { importWords } from '../../words/import.ts';

type Shown = 'all' | 'fault' | 'warning';

/** Every problem by row and column, faults first. */
export function FaultTable({ preview }: { readonly preview: ImportPreview }) {
  const [shown, setShown] = useState<Shown>('all');
  const total = preview.faultCount + preview.warningCount;
  if (total === 0) return null;
  const faults = preview.faults.filter(({ severity }) => shown === 'all' || severity === shown);
  const options = [
    { value: 'all', label: importWords.all, count: total },
    { value: 'fault', label: importWords.onlyFaults, count: preview.faultCount },
    { value: 'warning', label: importWords.onlyWarnings, count: preview.warningCount },
  ] as const;
  return (
    <Section
      title={importWords.problems}
      aside={preview.faults.length < total ? importWords.firstOnly(preview.faults.length, total) : undefined}
    >
      <Segment label={importWords.showing} options={options} value={shown} onChange={setShown} />
      <Table
        label={importWords.problems}
        head={
          <>
            <ColumnHead kind="number">{importWords.row}</ColumnHead>
            <ColumnHead>{importWords.column}</ColumnHead>
            <ColumnHead>{importWords.value}</ColumnHead>
            <ColumnHead>{importWords.problem}</ColumnHead>
          </>
        }
      >
        {faults.map((fault, index) => (
          <FaultRow key={`${String(fault.row)} ${fault.column} ${String(index)}`} fault={fault} />
        ))}
      </Table>
    </Section>
  );
}

function FaultRow({ fault }: { readonly fault: ImportFault }) {
  const isFault = fault.severity === 'fault';
  return (
    <Row>
      <Cell kind="number">{fault.row}</Cell>
      <Cell>{fault.column === '' ? importWords.wholeFile : fault.column}</Cell>
      <Cell>
        <span className="block max-w-xs break-words whitespace-pre-wrap">{fault.value}</span>
      </Cell>
      <Cell>
        <span className={`flex items-start gap-1.5 ${isFault ? 'text-madder font-semibold' : 'text-weld'}`}>
          <AlertIcon size={14} />
          <span>
            <span className="sr-only">{isFault ? importWords.fault : importWords.warning}: </span>
            {fault.message}
          </span>
        </span>
      </Cell>
    </Row>
  );
}
