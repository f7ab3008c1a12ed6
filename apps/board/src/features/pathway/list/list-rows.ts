/** The pathway as rows by date: now, next, later, done; sortable by any column. */
import { daysBetween, type PlainDate } from '@weftway/calendar/plain-date';
import { milestoneStates } from '@weftway/pathway/milestone-state';
import { laneNames, lanes } from '@weftway/team/lanes';
import type { MilestoneView } from '../model/milestone-view.ts';

export const listGroups = ['now', 'next', 'later', 'done'] as const;
export type ListGroup = (typeof listGroups)[number];

export const sortColumns = ['state', 'milestone', 'lane', 'earliest', 'target', 'latest', 'owner'] as const;
export type SortColumn = (typeof sortColumns)[number];
export interface Sorting {
  readonly column: SortColumn;
  readonly direction: 'ascending' | 'descending';
}

const nextWithinDays = 183;
const noDate = '9999-12-31';

export const groupOf = (view: MilestoneView, today: PlainDate): ListGroup => {
  const { state, window } = view.planned;
  if (view.isFinished) return 'done';
  if (state !== 'ahead') return 'now';
  return window !== null && daysBetween(today, window.earliest) <= nextWithinDays ? 'next' : 'later';
};

/** Most pressing first: what is late, then what closes first. */
const urgency = (view: MilestoneView, group: ListGroup): string => {
  if (group === 'done') return view.doneOn ?? '';
  const { state, window } = view.planned;
  const date = (group === 'now' ? window?.latest : window?.earliest) ?? noDate;
  const rank = group === 'now' ? String(['late', 'closing'].includes(state) ? 0 : 1) : '0';
  return `${rank} ${date}`;
};

const sortKey = (view: MilestoneView, column: SortColumn): string => {
  const { window, state } = view.planned;
  switch (column) {
    case 'state':
      return String(milestoneStates.indexOf(state)).padStart(2, '0');
    case 'milestone':
      return view.title;
    case 'lane':
      return String(lanes.indexOf(view.rule.lane)).padStart(2, '0') + laneNames[view.rule.lane];
    case 'owner':
      return view.ownerNames ?? '\uffff';
    default:
      return window?.[column] ?? noDate;
  }
};

export const rowsOf = (
  views: readonly MilestoneView[],
  group: ListGroup,
  today: PlainDate,
  sorting: Sorting | null,
): MilestoneView[] => {
  const rows = views.filter((view) => groupOf(view, today) === group);
  if (sorting === null) {
    const sign = group === 'done' ? -1 : 1;
    return rows.toSorted((a, b) => sign * urgency(a, group).localeCompare(urgency(b, group)));
  }
  const sign = sorting.direction === 'ascending' ? 1 : -1;
  return rows.toSorted((a, b) => sign * sortKey(a, sorting.column).localeCompare(sortKey(b, sorting.column)));
};
