import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect, useEffectEvent, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { Me } from '@weftway/contract/session';
import { lanes, laneNames } from '@weftway/team/lanes';
import { ApiProblem } from '../../api/api-client.ts';
import { boardQueries, followBoard } from '../../queries/board-queries.ts';
import { Loading } from '../../ui/notices/loading.tsx';
import { ProblemNotice } from '../../ui/notices/problem-notice.tsx';
import { PageHead } from '../../ui/page/page-head.tsx';
import { boardWords } from '../../words/board.ts';
import { kitWords } from '../../words/kit.ts';
import { filterOf, queryOf, type BoardFilter } from './board-filter.ts';
import { BoardView } from './board-view.tsx';

const laneList = lanes.map((lane) => laneNames[lane]);

/** What is looked at: shown at once, and written into the address, from where it comes back. */
function useFilter(): readonly [BoardFilter, (filter: BoardFilter) => void] {
  const [query, setQuery] = useSearchParams();
  const address = query.toString();
  const [known, setKnown] = useState({ address, filter: filterOf(query), writing: null as string | null });
  if (address !== known.address) {
    // While a change of ours is on its way, older addresses may still arrive.
    const isOurs = known.writing !== null;
    setKnown({
      address,
      filter: isOurs ? known.filter : filterOf(query),
      writing: address === known.writing ? null : known.writing,
    });
  }
  const onFilter = (filter: BoardFilter) => {
    const next = queryOf(filter);
    setKnown({ address, filter, writing: next.toString() === address ? null : next.toString() });
  };
  // After the choice was drawn: writing an address takes as long as drawing it.
  const { writing } = known;
  const write = useEffectEvent((next: string) => void setQuery(next, { replace: true, preventScrollReset: true }));
  useEffect(() => {
    if (writing === null) return;
    const timer = setTimeout(() => write(writing), 60);
    return () => clearTimeout(timer);
  }, [writing]);
  return [known.filter, onFilter];
}

/** Fetches the board and keeps it fresh; what is looked at is kept in the address. */
export function BoardScreen({ me }: { readonly me: Me }) {
  const client = useQueryClient();
  const board = useQuery(boardQueries.whole());
  const [filter, onFilter] = useFilter();
  const [isLive, setLive] = useState(false);
  useEffect(() => followBoard(client, setLive), [client]);

  if (board.data !== undefined)
    return <BoardView model={board.data} me={me} filter={filter} onFilter={onFilter} isLive={isLive} />;
  const { error } = board;
  return (
    <>
      <PageHead title={boardWords.title} />
      <div className="px-6 py-4 max-sm:px-5">
        {error === null ? (
          <Loading label={boardWords.loading} rows={laneList} />
        ) : (
          <ProblemNotice
            problem={error instanceof ApiProblem ? error.problem : { title: kitWords.notSaved, status: 500 }}
            onRetry={() => void board.refetch()}
          />
        )}
      </div>
    </>
  );
}
