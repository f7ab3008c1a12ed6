import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { problemOf } from '../../api/form-faults.ts';
import { sessionMutations, sessionQueries } from '../../queries/session-queries.ts';
import { Button } from '../../ui/actions/button.tsx';
import { Loading } from '../../ui/notices/loading.tsx';
import { ProblemNotice } from '../../ui/notices/problem-notice.tsx';
import { showToast } from '../../ui/overlays/toasts.ts';
import { Cell, ColumnHead, Row, Table } from '../../ui/page/table.tsx';
import { accountWords } from '../../words/account.ts';
import { deviceName } from './device-name.ts';

const when = (instant: string): string =>
  new Date(instant).toLocaleString('en-GB', { dateStyle: 'medium', timeStyle: 'short' });

/** Every place where this account is signed in, with a way to end each of the others. */
export function MySessions() {
  const list = useQuery(sessionQueries.mine());
  const end = useMutation(sessionMutations.endMySession(useQueryClient()));
  const problem = problemOf(list.error ?? end.error);
  if (list.data === undefined)
    return problem === null ? (
      <Loading label={accountWords.loading} />
    ) : (
      <ProblemNotice problem={problem} onRetry={() => void list.refetch()} />
    );
  return (
    <div className="flex flex-col gap-3">
      {problem === null ? null : <ProblemNotice problem={problem} />}
      <Table
        label={accountWords.sessionsTitle}
        head={
          <>
            <ColumnHead>{accountWords.device}</ColumnHead>
            <ColumnHead>{accountWords.began}</ColumnHead>
            <ColumnHead>{accountWords.seen}</ColumnHead>
            <ColumnHead>{''}</ColumnHead>
          </>
        }
      >
        {list.data.sessions.map((session) => {
          const device = deviceName(session.device) ?? accountWords.unknownDevice;
          return (
            <Row key={session.id}>
              <Cell kind="head">{device}</Cell>
              <Cell>
                <span className="figures">{when(session.startedAt)}</span>
              </Cell>
              <Cell>
                <span className="figures">{when(session.seenAt)}</span>
              </Cell>
              <Cell>
                {session.isThis ? (
                  <span className="text-ink-2">{accountWords.here}</span>
                ) : (
                  <Button
                    size="small"
                    aria-label={accountWords.endOf(device)}
                    isBusy={end.isPending && end.variables === session.id}
                    onClick={() => end.mutate(session.id, { onSuccess: () => showToast({ text: accountWords.ended }) })}
                  >
                    {accountWords.end}
                  </Button>
                )}
              </Cell>
            </Row>
          );
        })}
      </Table>
    </div>
  );
}
