import { useInfiniteQuery, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { abilityFor, canSome } from '@weftway/abilities/ability-for';
import type { Me, Session } from '@weftway/contract/session';
import { problemOf } from '../api/form-faults.ts';
import { RegistrySearch, type RegistryOrder } from '../features/children/registry-search.tsx';
import { RegistryTable } from '../features/children/registry-table.tsx';
import { childQueries } from '../queries/child-queries.ts';
import { memberQueries } from '../queries/member-queries.ts';
import { sessionQueries } from '../queries/session-queries.ts';
import { Button } from '../ui/actions/button.tsx';
import { LinkButton } from '../ui/actions/link-button.tsx';
import { EmptyState } from '../ui/notices/empty-state.tsx';
import { Loading } from '../ui/notices/loading.tsx';
import { ProblemNotice } from '../ui/notices/problem-notice.tsx';
import { PageHead } from '../ui/page/page-head.tsx';
import { registryWords } from '../words/children.ts';

const orderIn = (text: string | null): RegistryOrder => (text === 'birth' || text === 'late' ? text : 'name');

/** The registry: everyone on the list, found by name, number or birth date. */
export function Component() {
  const [params, setParams] = useSearchParams();
  const [begun, setBegun] = useState(0);
  const q = params.get('q') ?? '';
  const order = orderIn(params.get('order'));
  const session = useQuery(sessionQueries.current()).data;
  const total = useInfiniteQuery(childQueries.list(q, order)).data?.pages[0]?.total;

  const show = (next: { readonly q?: string; readonly order?: RegistryOrder }) => {
    const asked = { q, order, ...next };
    setParams(
      { ...(asked.q === '' ? {} : { q: asked.q }), ...(asked.order === 'name' ? {} : { order: asked.order }) },
      { replace: true },
    );
  };
  const clear = () => {
    show({ q: '' });
    setBegun(begun + 1);
  };
  return (
    <>
      <title>{registryWords.title}</title>
      <PageHead
        title={registryWords.title}
        beside={<span role="status">{total === undefined ? '' : registryWords.count(total)}</span>}
        actions={<WaysIn me={session?.me ?? null} />}
      />
      <div className="flex flex-col gap-4 px-6 py-5 max-sm:px-5">
        <RegistrySearch
          key={begun}
          q={q}
          order={order}
          onSearch={(text) => show({ q: text })}
          onOrder={(by) => show({ order: by })}
        />
        {session === undefined ? null : (
          <Registry q={q} order={order} session={session} onOrder={(by) => show({ order: by })} onClear={clear} />
        )}
      </div>
    </>
  );
}

interface RegistryProps {
  readonly q: string;
  readonly order: RegistryOrder;
  readonly session: Session;
  readonly onOrder: (order: RegistryOrder) => void;
  readonly onClear: () => void;
}

/** The list in its four states: on its way, in trouble, empty, there. */
function Registry({ q, order, session, onOrder, onClear }: RegistryProps) {
  const list = useInfiniteQuery(childQueries.list(q, order));
  const members = useQuery(memberQueries.list()).data ?? [];
  if (list.data === undefined)
    return list.isError ? (
      <Trouble error={list.error} onRetry={() => void list.refetch()} />
    ) : (
      <Loading label={registryWords.fetching} />
    );
  const rows = list.data.pages.flatMap((page) => page.items);
  const total = list.data.pages[0]?.total ?? 0;
  if (total === 0) return <Nobody q={q} isTrainee={session.me?.standing === 'trainee'} onClear={onClear} />;
  return (
    <>
      <RegistryTable
        rows={rows}
        today={session.today}
        names={new Map(members.map(({ id, name }) => [id, name]))}
        order={order}
        onOrder={onOrder}
      />
      {list.hasNextPage ? (
        <More
          shown={rows.length}
          total={total}
          isBusy={list.isFetchingNextPage}
          onMore={() => void list.fetchNextPage()}
        />
      ) : null}
    </>
  );
}

/** What this person may do to bring children onto the list. */
function WaysIn({ me }: { readonly me: Me | null }) {
  const ability = abilityFor(me);
  return (
    <>
      {canSome(ability, 'register', 'Child') ? (
        <>
          <LinkButton to="/children/new" look="filled">
            {registryWords.add}
          </LinkButton>
          <LinkButton to="/children/new?kind=expected">{registryWords.addExpected}</LinkButton>
        </>
      ) : null}
      {canSome(ability, 'run', 'Import') ? (
        <LinkButton to="/children/import">{registryWords.bringIn}</LinkButton>
      ) : null}
    </>
  );
}

interface MoreProps {
  readonly shown: number;
  readonly total: number;
  readonly isBusy: boolean;
  readonly onMore: () => void;
}

function More({ shown, total, isBusy, onMore }: MoreProps) {
  return (
    <div className="flex items-center gap-3">
      <Button isBusy={isBusy} onClick={onMore}>
        {registryWords.more(total - shown)}
      </Button>
      <span className="text-small text-ink-3">{registryWords.shown(shown, total)}</span>
    </div>
  );
}

function Nobody({
  q,
  isTrainee,
  onClear,
}: {
  readonly q: string;
  readonly isTrainee: boolean;
  readonly onClear: () => void;
}) {
  if (q !== '') {
    return (
      <EmptyState
        kind="filter"
        title={registryWords.nobodyFor(q)}
        actions={<Button onClick={onClear}>{registryWords.clear}</Button>}
      >
        {registryWords.nobodyForHelp}
      </EmptyState>
    );
  }
  return (
    <EmptyState kind="time" title={isTrainee ? registryWords.nobodyAssigned : registryWords.nobodyYet}>
      {isTrainee ? registryWords.nobodyAssignedHelp : registryWords.nobodyYetHelp}
    </EmptyState>
  );
}

function Trouble({ error, onRetry }: { readonly error: unknown; readonly onRetry: () => void }) {
  const problem = problemOf(error);
  return problem === null ? null : <ProblemNotice problem={problem} onRetry={onRetry} />;
}
