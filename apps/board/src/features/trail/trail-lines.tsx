import { useInfiniteQuery, useQuery } from '@tanstack/react-query';
import type { TrailLine } from '@weftway/contract/trail';
import { ApiProblem } from '../../api/api-client.ts';
import { trailQueries } from '../../queries/trail-queries.ts';
import { Button } from '../../ui/actions/button.tsx';
import { EmptyState } from '../../ui/notices/empty-state.tsx';
import { Loading } from '../../ui/notices/loading.tsx';
import { ProblemNotice } from '../../ui/notices/problem-notice.tsx';
import { trailWords } from '../../words/trail.ts';
import { useTrailFilter, type FilterState } from './trail-filter.ts';
import { TrailFilters } from './trail-filters.tsx';
import { TrailTable } from './trail-table.tsx';

interface TrailLinesProps {
  /** The team's zone. */
  readonly zone: string;
  readonly seesAll: boolean;
  readonly seesContent: boolean;
}

function NoLines({ state: { filter, isNarrowed, clear } }: { readonly state: FilterState }) {
  const title = filter.log === 'reads' && !isNarrowed ? trailWords.emptyReads : trailWords.empty;
  return (
    <EmptyState
      kind="filter"
      title={title}
      actions={isNarrowed ? <Button onClick={clear}>{trailWords.clear}</Button> : undefined}
    />
  );
}

interface PagerProps {
  readonly count: number;
  readonly isBusy: boolean;
  /** Null at the end. */
  readonly onOlder: (() => void) | null;
  readonly end: string;
}

function Pager({ count, isBusy, onOlder, end }: PagerProps) {
  return (
    <div className="flex flex-wrap items-center gap-3">
      {onOlder === null ? (
        <span className="text-small text-ink-2">{end}</span>
      ) : (
        <Button onClick={onOlder} isBusy={isBusy}>
          {trailWords.older}
        </Button>
      )}
      <span role="status" className="text-small text-ink-2">
        {trailWords.shown(count)}
      </span>
    </div>
  );
}

/** As far as a line that is shown tells it. */
const nameOfChild = (lines: readonly TrailLine[], childId: string | undefined): string | null =>
  childId === undefined ? null : (lines.find((line) => line.childId === childId)?.childName ?? null);

/** Filters and lines, page after page; the filter stands in the address. */
export function TrailLines({ zone, seesAll, seesContent }: TrailLinesProps) {
  const state = useTrailFilter();
  const { filter } = state;
  const lines = useInfiniteQuery(trailQueries.lines(filter));
  const members = useQuery(trailQueries.members()).data?.members ?? [];
  const shown = lines.data?.pages.flatMap((page) => page.items) ?? [];
  const names = new Map(members.map((member) => [member.id, member.name]));
  return (
    <>
      <TrailFilters
        state={state}
        members={members}
        seesContent={seesContent && seesAll}
        childName={nameOfChild(shown, filter.child)}
      />
      {lines.error instanceof ApiProblem ? (
        <ProblemNotice problem={lines.error.problem} onRetry={() => void lines.refetch()} />
      ) : null}
      {lines.isPending ? <Loading label={trailWords.loading} /> : null}
      {lines.data !== undefined && shown.length === 0 ? <NoLines state={state} /> : null}
      {shown.length === 0 ? null : (
        <>
          <TrailTable
            key={filter.log}
            lines={shown}
            zone={zone}
            nameOf={(id) => names.get(id)}
            seesContent={seesContent}
            onlyChild={(childId) => state.set('child', childId)}
          />
          <Pager
            count={shown.length}
            isBusy={lines.isFetchingNextPage}
            onOlder={lines.hasNextPage ? () => void lines.fetchNextPage() : null}
            end={state.isNarrowed || !seesAll ? '' : trailWords.end}
          />
        </>
      )}
    </>
  );
}
