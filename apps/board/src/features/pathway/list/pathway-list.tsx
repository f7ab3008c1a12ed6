import { formatDate } from '@weftway/calendar/format-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import { laneNames } from '@weftway/team/lanes';
import { useState } from 'react';
import { Mark } from '../../../marks/mark.tsx';
import { Section } from '../../../ui/page/section.tsx';
import { Cell, ColumnHead, Row, RowLink, Table } from '../../../ui/page/table.tsx';
import { pathwayWords, remarkText, stateWord, windowLine } from '../../../words/pathway.ts';
import type { MilestoneView } from '../model/milestone-view.ts';
import { listGroups, rowsOf, type ListGroup, type SortColumn, type Sorting } from './list-rows.ts';

interface PathwayListProps {
  readonly views: readonly MilestoneView[];
  readonly today: PlainDate;
  readonly selectedKey: string | null;
  readonly titleOf: (key: string) => string;
  /** Address of the same page with a milestone open. */
  readonly hrefOf: (key: string) => string;
}

/** The ruler's content as tables by date. */
export function PathwayList(props: PathwayListProps) {
  const [sorting, setSorting] = useState<Sorting | null>(null);
  const sortBy = (column: SortColumn) =>
    setSorting((was) => {
      if (was?.column !== column) return { column, direction: 'ascending' };
      return was.direction === 'ascending' ? { column, direction: 'descending' } : null;
    });
  const groups = listGroups
    .map((group) => ({ group, rows: rowsOf(props.views, group, props.today, sorting) }))
    .filter(({ rows }) => rows.length > 0);
  return (
    <div className="flex flex-col gap-6 pt-2 pb-6">
      {groups.map(({ group, rows }) => (
        <Section
          key={group}
          title={pathwayWords.groups[group]}
          aside={`${String(rows.length)}, ${pathwayWords.groupHints[group]}`}
        >
          <GroupTable {...props} group={group} rows={rows} sorting={sorting} onSort={sortBy} />
        </Section>
      ))}
    </div>
  );
}

interface GroupTableProps extends PathwayListProps {
  readonly group: ListGroup;
  readonly rows: readonly MilestoneView[];
  readonly sorting: Sorting | null;
  readonly onSort: (column: SortColumn) => void;
}

function GroupTable(props: GroupTableProps) {
  const { group, rows, sorting, onSort } = props;
  const words = pathwayWords.columns;
  const head = (column: SortColumn, kind?: 'number') => (
    <ColumnHead
      {...(kind === undefined ? {} : { kind })}
      sort={{ direction: sorting?.column === column ? sorting.direction : 'none', onSort: () => onSort(column) }}
    >
      {words[column]}
    </ColumnHead>
  );
  return (
    <Table
      label={pathwayWords.groupCaption(pathwayWords.groups[group], rows.length)}
      head={
        <>
          {head('state')}
          {head('milestone')}
          {head('lane')}
          {head('earliest', 'number')}
          {head('target', 'number')}
          {head('latest', 'number')}
          <ColumnHead kind="number">
            <span className="inline-block leading-6 whitespace-nowrap">{words.closing}</span>
          </ColumnHead>
          {head('owner')}
          <ColumnHead>
            <span className="inline-block leading-6">{words.waits}</span>
          </ColumnHead>
        </>
      }
    >
      {rows.map((view) => (
        <ListRow key={view.key} {...props} view={view} />
      ))}
    </Table>
  );
}

const day = (date: PlainDate | undefined) => (
  <span className="inline-block w-22 whitespace-nowrap">{date === undefined ? '–' : formatDate(date)}</span>
);

function ListRow({
  view,
  group,
  selectedKey,
  hrefOf,
  titleOf,
  today,
}: GroupTableProps & { readonly view: MilestoneView }) {
  const { planned } = view;
  const { window } = planned;
  const waits = planned.waitsFor.filter((wait) => !wait.isMet && wait.type !== 'soft');
  const isDone = group === 'done';
  return (
    <Row isChosen={view.key === selectedKey}>
      <Cell>
        <span className="flex w-32 items-center gap-2 max-sm:w-22 max-sm:items-start">
          <Mark state={planned.state} unowned={view.unowned} size={14} title={null} />
          {stateWord(planned)}
        </span>
      </Cell>
      <Cell kind="head">
        <span className="block w-72 max-sm:w-[calc(100vw-10.5rem)]">
          <RowLink to={hrefOf(view.key)}>{view.title}</RowLink>
        </span>
        <span className="text-fine text-ink-3 block w-72 max-sm:w-[calc(100vw-10.5rem)]">
          {isDone && view.doneOn !== null
            ? pathwayWords.doneOn(formatDate(view.doneOn))
            : window === null
              ? remarkText(planned.remark, titleOf)
              : windowLine(planned, today)}
        </span>
      </Cell>
      <Cell>
        <span className="block w-36">{laneNames[view.rule.lane]}</span>
      </Cell>
      <Cell kind="number">{day(window?.earliest)}</Cell>
      <Cell kind="number">{day(window?.target)}</Cell>
      <Cell kind="number">{day(window?.latest)}</Cell>
      <Cell kind="number">{day(isDone ? undefined : window?.closing)}</Cell>
      <Cell>
        <span className="block w-36">
          <Owner view={view} />
        </span>
      </Cell>
      <Cell>
        <span className="block w-56">{isDone ? '' : waits.map((wait) => titleOf(wait.milestone)).join(', ')}</span>
      </Cell>
    </Row>
  );
}

/** Who holds it; of what is done, who signed. */
function Owner({ view }: { readonly view: MilestoneView }) {
  const signers = [...new Set(view.parts.flatMap((part) => part.signature?.signerName ?? []))].join(', ');
  if (view.isFinished && signers !== '') return signers;
  if (view.ownerNames !== null) return view.ownerNames;
  return view.unowned ? (
    <span className="text-madder font-semibold">{pathwayWords.noOne}</span>
  ) : (
    <span className="text-ink-3">–</span>
  );
}
