/** All rows of one child's plan, in the order of the protocol: the part that planning and bulk work share. */
import type { PlainDate } from '@weftway/calendar/plain-date';
import { sharedBases } from './clock-base.ts';
import { childRecord } from './child-record.ts';
import { compileProtocol } from './compiled-protocol.ts';
import { operationRows } from './operations.ts';
import type { PathwayFacts } from './pathway-facts.ts';
import type { PlanOptions, Planning, Row } from './planning.ts';
import { emptyRow, planRow } from './plan-row.ts';
import type { Protocol } from './protocol.ts';

export interface PlannedRows {
  readonly planning: Planning;
  readonly rows: readonly Row[];
}

/** Plans every milestone of one child for a day. Throws a RangeError when neither birth nor expected date is known. */
export function planRows(
  protocol: Protocol,
  facts: PathwayFacts,
  today: PlainDate,
  options: PlanOptions = {},
): PlannedRows {
  const compiled = compileProtocol(protocol);
  const child = childRecord(compiled, facts, today);
  const rowsByPlace = new Array<Row | undefined>(compiled.milestones.length * 3);
  const planning: Planning = { compiled, child, options, ...sharedBases(child), rows: rowsByPlace };
  const rows: Row[] = [];
  for (const milestone of compiled.milestones) {
    if (milestone.clockFrom === 'operation-booked' || milestone.clockFrom === 'operation-done') {
      const ofOperations = operationRows(planning, milestone);
      if (ofOperations.length > 0) rows.push(...ofOperations);
      else rows.push(withoutOperation(planning, milestone));
    } else if (milestone.rule.perSide && planning.child.gumSides.length > 0) {
      for (const side of planning.child.gumSides) rows.push(planRow(planning, milestone.index, side));
    } else rows.push(planRow(planning, milestone.index, null));
  }
  return { planning, rows };
}

function withoutOperation(planning: Planning, milestone: Row['milestone']): Row {
  const row = emptyRow(planning, milestone, null, null);
  if (milestone.clockFrom === 'operation-booked') row.fixed = 'not_started';
  else row.offPath = 'no-operation';
  return row;
}

/** The key under which facts about a row are kept: it stays the same when a second side or operation joins. */
export function stableKeyOf(row: Row): string {
  const { id } = row.milestone.rule;
  if (row.side !== null) return `${id}:${row.side}`;
  return row.operation === null || row.operation === '' ? id : `${id}:${row.operation}`;
}

/** The key as the `path` command prints it: plain while the row is the only one of its milestone. */
export function keyOf(planned: PlannedRows, row: Row): string {
  const { id } = row.milestone.rule;
  if (row.side !== null) return planned.planning.child.gumSides.length > 1 ? `${id}:${row.side}` : id;
  if (row.operation === null || row.operation === '') return id;
  const isSingle = planned.rows.filter((other) => other.milestone === row.milestone).length === 1;
  return isSingle ? id : `${id}:${row.operation}`;
}
