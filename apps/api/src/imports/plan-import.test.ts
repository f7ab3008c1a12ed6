import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { plainDate } from '@weftway/calendar/plain-date';
import { caseloadFile, csvText } from '@weftway/sample-team/caseload-file';
import { nameKeyOf } from '../children/duplicate-view.ts';
import { planImport } from './plan-import.ts';
import type { KnownCaseload } from './plan-import.ts';

const today = plainDate('2026-12-01');
const nobody: KnownCaseload = {
  children: new Map(),
  namesakes: new Map(),
  nameKeyOf,
  sites: ['Tern Quay', 'Saltmarsh'],
  protocolMilestones: new Set(['SURG-01', 'SURG-03', 'ORTH-05', 'TEAM-05', 'EAR-06', 'DENT-02']),
};
const plan = (text: string) => planImport({ text, dateOrder: 'day-first', today }, nobody);

describe('reading a caseload file', () => {
  it('takes what the sample team writes, however many and from wherever', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 60 }), fc.integer({ min: 100, max: 90_000 }), (children, firstNumber) => {
        const { rows, faults } = plan(caseloadFile({ children, today, sites: nobody.sites, firstNumber }));
        expect(faults.filter(({ severity }) => severity === 'fault')).toEqual([]);
        expect(rows.map(({ action }) => action)).toEqual(Array.from({ length: children }, () => 'add'));
      }),
      { numRuns: 20 },
    );
  });

  it('never throws, whatever the file holds, and points only at rows that exist', () => {
    const cell = fc.oneof(
      fc.string(),
      fc.constantFrom('"', '=1+1', '__proto__', '\u0000', '…', '2026-02-30', 'LAHSHAL', '\n'),
    );
    fc.assert(
      fc.property(
        fc.array(fc.array(cell, { minLength: 1, maxLength: 6 }), { maxLength: 8 }),
        fc.boolean(),
        (cells, isQuoted) => {
          const body = isQuoted ? csvText(cells) : cells.map((row) => row.join(',')).join('\n');
          const text = `record_number,first_name,family_name,birth_date,cleft,notes\n${body}`;
          const { faults } = plan(text);
          const lines = text.split(/\r\n|\r|\n/).length;
          for (const { row } of faults) expect(row >= 1 && row <= lines).toBe(true);
        },
      ),
    );
  });

  it('goes on after a broken quotation mark, so that no other fault is hidden', () => {
    const text =
      'record_number,first_name,family_name,birth_date,cleft,site\nTE-1,"Open,Quote,2024-01-01,.......,Tern Quay\nTE-2,Mid"dle,Quote,2024-01-01,.......,Tern Quay\nTE-3,,Nofirst,2024-01-01,.......,Tern Quay\nTE-4,Good,Row,2024-01-01,...S...,Tern Quay\n';
    const { rows, faults } = plan(text);
    expect(faults.map(({ row, column }) => `${row} ${column}`)).toEqual(['2 ', '3 ', '4 first_name']);
    expect(rows.at(-1)).toMatchObject({ row: 5, action: 'add' });
  });

  it('keeps a quoted line break in one row', () => {
    const { rows, faults } = plan(
      'record_number,first_name,family_name,birth_date,cleft,site,notes\nTE-1,Good,Row,2024-01-01,...S...,Tern Quay,"two\nlines"\nTE-2,Next,Row,2024-01-02,...S...,Tern Quay,\n',
    );
    expect(faults).toEqual([]);
    expect(rows.map(({ row }) => row)).toEqual([2, 3]);
    expect(rows[0]?.fields.notes).toBe('two\nlines');
  });
});
