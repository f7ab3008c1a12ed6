import { useInfiniteQuery, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useParams } from 'react-router-dom';
import { abilityFor, canChild } from '@weftway/abilities/ability-for';
import { ageText } from '@weftway/calendar/age';
import { formatDate } from '@weftway/calendar/format-date';
import type { Child } from '@weftway/contract/child';
import type { Session } from '@weftway/contract/session';
import { CareDialogs } from '../features/children/care-dialogs.tsx';
import type { CareAct } from '../features/children/care-dialog.tsx';
import { ChangeList } from '../features/children/change-list.tsx';
import { ChildFacts } from '../features/children/child-facts.tsx';
import { RecordProblem } from '../features/children/record-problem.tsx';
import { TraineeChoice } from '../features/children/trainee-choice.tsx';
import { CleftDiagram } from '../features/cleft-diagram/cleft-diagram.tsx';
import { CleftReading } from '../features/cleft-diagram/cleft-reading.tsx';
import { childMutations, childQueries } from '../queries/child-queries.ts';
import { memberQueries } from '../queries/member-queries.ts';
import { sessionQueries } from '../queries/session-queries.ts';
import { Button } from '../ui/actions/button.tsx';
import { LinkButton } from '../ui/actions/link-button.tsx';
import { Loading } from '../ui/notices/loading.tsx';
import { Notice } from '../ui/notices/notice.tsx';
import { showToast } from '../ui/overlays/toasts.ts';
import { PageHead } from '../ui/page/page-head.tsx';
import { Section } from '../ui/page/section.tsx';
import { recordWords, registryWords } from '../words/children.ts';

/** Everything recorded about a child, and what was changed. */
export function Component() {
  const { childId = '' } = useParams();
  const session = useQuery(sessionQueries.current()).data;
  const child = useQuery(childQueries.one(childId));
  if (child.isError && child.data === undefined)
    return <RecordProblem error={child.error} onRetry={() => void child.refetch()} />;
  if (child.data === undefined || session === undefined) return <Loading label={recordWords.fetching} />;
  return <Record child={child.data} session={session} />;
}

function Record({ child, session }: { readonly child: Child; readonly session: Session }) {
  const { fields } = child;
  const [act, setAct] = useState<CareAct | null>(null);
  const members = useQuery(memberQueries.list()).data ?? [];
  const names = new Map(members.map(({ id, name }) => [id, name]));
  const ability = abilityFor(session.me);
  const may = (action: 'edit' | 'edit-cleft' | 'transfer' | 'end-care') =>
    canChild(ability, action, { trainees: child.traineeIds });
  const name = `${fields.firstName} ${fields.familyName}`;
  const hasEnded = child.careEnded !== null;
  const born =
    fields.bornOn === null
      ? fields.dueOn === null
        ? ''
        : registryWords.expected(formatDate(fields.dueOn))
      : `${formatDate(fields.bornOn)}, ${ageText(fields.bornOn, session.today)}`;
  return (
    <>
      <title>{recordWords.title(name)}</title>
      <PageHead
        kind="person"
        title={name}
        beside={<span className="figures">{`${fields.recordNumber}, ${born}`}</span>}
        actions={
          <>
            <LinkButton to={`/children/${child.id}`}>{recordWords.pathway}</LinkButton>
            {may('edit') || may('edit-cleft') ? (
              <LinkButton look="filled" to={`/children/${child.id}/edit`}>
                {recordWords.edit}
              </LinkButton>
            ) : null}
          </>
        }
      />
      <div className="grid grid-cols-[minmax(0,3fr)_minmax(0,2fr)] gap-x-12 gap-y-8 px-6 py-5 max-lg:grid-cols-1 max-sm:px-5">
        <div className="flex min-w-0 flex-col gap-6">
          <Standing child={child} />
          <ChildFacts
            child={child}
            names={names}
            cleft={
              <>
                <CleftReading code={fields.cleft} flags={fields.flags} />
                <CleftDiagram code={fields.cleft} />
              </>
            }
          />
        </div>
        <div className="flex min-w-0 flex-col gap-8">
          <Trainees child={child} session={session} names={names} />
          {hasEnded || !(may('transfer') || may('end-care')) ? null : (
            <div className="flex flex-wrap gap-2">
              {may('transfer') ? (
                <Button onClick={() => setAct(child.transferredOn === null ? 'transfer' : 'return')}>
                  {child.transferredOn === null ? recordWords.transfer : recordWords.comeBack}
                </Button>
              ) : null}
              {may('end-care') ? (
                <Button look="danger" onClick={() => setAct('end')}>
                  {recordWords.endCare}
                </Button>
              ) : null}
            </div>
          )}
          <History childId={child.id} names={names} />
        </div>
      </div>
      {act === null ? null : (
        <CareDialogs act={act} childId={child.id} today={session.today} onClose={() => setAct(null)} />
      )}
    </>
  );
}

/** Where care is, when it is not plainly here. */
function Standing({ child }: { readonly child: Child }) {
  return (
    <>
      {child.careEnded === null ? null : (
        <Notice kind="note" title={recordWords.endedNote(formatDate(child.careEnded.on))}>
          {child.careEnded.reason}
        </Notice>
      )}
      {child.transferredOn === null ? null : (
        <Notice kind="note" title={recordWords.transferredNote(child.transferredTo, formatDate(child.transferredOn))} />
      )}
    </>
  );
}

function Trainees({
  child,
  session,
  names,
}: {
  readonly child: Child;
  readonly session: Session;
  readonly names: ReadonlyMap<string, string>;
}) {
  const client = useQueryClient();
  const choices = useQuery(childQueries.choices()).data;
  const assign = useMutation(childMutations.assignTrainees(client, child.id));
  const mayChoose =
    canChild(abilityFor(session.me), 'assign', { trainees: child.traineeIds }) && child.careEnded === null;
  return (
    <TraineeChoice
      key={child.traineeIds.join()}
      assigned={child.traineeIds}
      trainees={choices?.trainees ?? []}
      names={names}
      mayChoose={mayChoose}
      isBusy={assign.isPending}
      onSave={(memberIds) =>
        assign.mutate(memberIds, { onSuccess: () => showToast({ text: recordWords.done.trainees }) })
      }
    />
  );
}

function History({ childId, names }: { readonly childId: string; readonly names: ReadonlyMap<string, string> }) {
  const changes = useInfiniteQuery(childQueries.changes(childId));
  return (
    <Section title={recordWords.history}>
      <p className="text-small text-ink-3 m-0">{recordWords.historyHelp}</p>
      <ChangeList changes={(changes.data?.pages ?? []).flatMap((page) => page.items)} names={names} />
      {changes.hasNextPage ? (
        <div>
          <Button isBusy={changes.isFetchingNextPage} onClick={() => void changes.fetchNextPage()}>
            {recordWords.olderChanges}
          </Button>
        </div>
      ) : null}
    </Section>
  );
}
