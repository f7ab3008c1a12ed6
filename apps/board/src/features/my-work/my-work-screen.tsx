import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { WorkItem } from '@weftway/contract/board';
import type { Session } from '@weftway/contract/session';
import { ApiProblem } from '../../api/api-client.ts';
import { myWorkMutations, myWorkQueries } from '../../queries/my-work-queries.ts';
import { LinkButton } from '../../ui/actions/link-button.tsx';
import { Loading } from '../../ui/notices/loading.tsx';
import { ProblemNotice } from '../../ui/notices/problem-notice.tsx';
import { showToast } from '../../ui/overlays/toasts.ts';
import { PageHead } from '../../ui/page/page-head.tsx';
import { kitWords } from '../../words/kit.ts';
import { formatDateWithDay } from '../../words/dates.ts';
import { myWorkWords } from '../../words/my-work.ts';
import { WorkList } from './work-list.tsx';
import { sumOf } from './work-rows.ts';

const tellProblem = (error: unknown): void => {
  const text = error instanceof ApiProblem ? (error.problem.detail ?? error.problem.title) : kitWords.notSaved;
  showToast({ text: myWorkWords.refused(text) });
};

/** Claims at once, with a way back while the message stands. */
function useClaim(): (item: WorkItem) => void {
  const client = useQueryClient();
  const claim = useMutation(myWorkMutations.claim(client));
  const release = useMutation(myWorkMutations.release(client));
  return (item) => {
    const { childId, milestone, part, title, childName } = item;
    const undo = () =>
      release.mutate(
        { childId, milestone, part, reason: myWorkWords.undoReason },
        { onSuccess: () => showToast({ text: myWorkWords.undone(title, childName) }), onError: tellProblem },
      );
    claim.mutate(
      { childId, milestone, part },
      {
        onSuccess: () => showToast({ text: myWorkWords.claimed(title, childName), onUndo: undo }),
        onError: tellProblem,
      },
    );
  };
}

export function MyWorkScreen({ me, today }: { readonly me: NonNullable<Session['me']>; readonly today: PlainDate }) {
  const work = useQuery(myWorkQueries.mine());
  const onClaim = useClaim();
  const { data, error } = work;
  return (
    <>
      <PageHead
        title={formatDateWithDay(data === undefined ? today : (data.today as PlainDate))} // the team's day, as the contract has it
        beside={data === undefined ? null : sumOf(data)}
        actions={<LinkButton to={`/team/${me.id}`}>{myWorkWords.handOver}</LinkButton>}
      />
      {data === undefined ? (
        <div className="px-6 py-4 max-sm:px-5">
          {error === null ? (
            <Loading label={myWorkWords.loading} />
          ) : (
            <ProblemNotice
              problem={error instanceof ApiProblem ? error.problem : { title: kitWords.notSaved, status: 500 }}
              onRetry={() => void work.refetch()}
            />
          )}
        </div>
      ) : (
        <WorkList work={data} onClaim={onClaim} />
      )}
    </>
  );
}
