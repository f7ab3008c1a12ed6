/** What was done before the import: operations as unverified completions, reviews and tests as plain ones. */
import { cleftFacts } from '@weftway/pathway/cleft-facts';
import { parseCleftCode } from '@weftway/pathway/cleft-code';
import type { ChildFields } from '@weftway/contract/child';
import type { ImportColumn } from '@weftway/contract/caseload-import';
import type { ReadDate, RowCells } from './row-cells.ts';

export interface HistoryEntry {
  /** Milestone key: `SURG-01`, `ORTH-05:R`. */
  readonly milestone: string;
  readonly performedOn: string;
  readonly precision: 'day' | 'month' | 'year';
  readonly isUnverified: boolean;
}

interface Rule {
  readonly column: ImportColumn;
  readonly milestone: string;
  readonly isOperation: boolean;
  readonly what: string;
}

const rules: readonly Rule[] = [
  { column: 'lip_repair', milestone: 'SURG-01', isOperation: true, what: 'A lip repair' },
  { column: 'palate_repair', milestone: 'SURG-03', isOperation: true, what: 'A palate repair' },
  { column: 'bone_graft', milestone: 'ORTH-05', isOperation: true, what: 'A bone graft' },
  { column: 'last_team_review', milestone: 'TEAM-05', isOperation: false, what: 'A review' },
  { column: 'last_hearing_test', milestone: 'EAR-06', isOperation: false, what: 'A hearing test' },
  { column: 'last_dental_visit', milestone: 'DENT-02', isOperation: false, what: 'A dental visit' },
];

export interface HistoryAsk {
  readonly fields: ChildFields;
  readonly today: string;
  /** Completions already recorded, as `milestone|date`. */
  readonly recorded: ReadonlySet<string>;
  /** Milestones with a completion on any day. */
  readonly recordedMilestones: ReadonlySet<string>;
  readonly protocolMilestones: ReadonlySet<string>;
}

const keysOf = (rule: Rule, fields: ChildFields, cells: RowCells): string[] => {
  const reading = parseCleftCode(fields.cleft);
  if (!reading.ok) return [];
  const facts = cleftFacts(reading.code);
  if (rule.column === 'lip_repair' && !facts.hasLip && !fields.flags.includes('midline_lip'))
    cells.warn('lip_repair', 'The code has no cleft of the lip.');
  if (rule.column === 'palate_repair' && !facts.hasPalate && !fields.flags.includes('smcp'))
    cells.warn('palate_repair', 'The code has no cleft of the palate.');
  if (rule.column !== 'bone_graft') return [rule.milestone];
  if (facts.graftSides.length === 0)
    cells.fault('bone_graft', 'The code has no open gum, so the graft has no side. Correct the code or the date.');
  return facts.graftSides.map((side) => `${rule.milestone}:${side}`);
};

const isPossible = (cells: RowCells, rule: Rule, read: ReadDate, ask: HistoryAsk): boolean => {
  const { bornOn } = ask.fields;
  if (read.precision === 'day' ? read.date > ask.today : read.date.slice(0, 4) > ask.today.slice(0, 4)) {
    cells.fault(rule.column, `${rule.what} on ${read.date} is still to come.`);
    return false;
  }
  if (bornOn === null || (read.precision === 'day' ? read.date < bornOn : read.date.slice(0, 4) < bornOn.slice(0, 4))) {
    cells.fault(
      rule.column,
      bornOn === null ? `${rule.what} before birth cannot be.` : `${rule.what} on ${read.date} is before the birth.`,
    );
    return false;
  }
  return true;
};

export const historyFromRow = (cells: RowCells, ask: HistoryAsk): HistoryEntry[] =>
  rules.flatMap((rule) => {
    const read = cells.date(rule.column);
    if (read === undefined || !isPossible(cells, rule, read, ask)) return [];
    if (!ask.protocolMilestones.has(rule.milestone)) {
      cells.warn(rule.column, `The protocol has no ${rule.milestone}; this date is left out.`);
      return [];
    }
    return keysOf(rule, ask.fields, cells).flatMap((milestone): HistoryEntry[] => {
      if (ask.recorded.has(`${milestone}|${read.date}`)) return [];
      if (rule.isOperation && ask.recordedMilestones.has(milestone)) {
        cells.warn(rule.column, 'This operation is recorded already with another date; the file does not change it.');
        return [];
      }
      return [{ milestone, performedOn: read.date, precision: read.precision, isUnverified: rule.isOperation }];
    });
  });
