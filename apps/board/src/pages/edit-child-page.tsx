import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate, useParams } from 'react-router-dom';
import { abilityFor, canChild } from '@weftway/abilities/ability-for';
import type { Child, ChildFields } from '@weftway/contract/child';
import type { Session } from '@weftway/contract/session';
import { isProblem } from '../api/api-client.ts';
import { problemOf } from '../api/form-faults.ts';
import { ChildForm } from '../features/children/child-form.tsx';
import { fieldNameOf, formOf } from '../features/children/child-form-values.ts';
import { ConflictView } from '../features/children/conflict-view.tsx';
import { RecordProblem } from '../features/children/record-problem.tsx';
import { CleftEntry } from '../features/cleft-diagram/cleft-entry.tsx';
import { childMutations, childQueries } from '../queries/child-queries.ts';
import { memberQueries } from '../queries/member-queries.ts';
import { sessionQueries } from '../queries/session-queries.ts';
import { LinkButton } from '../ui/actions/link-button.tsx';
import { Loading } from '../ui/notices/loading.tsx';
import { ProblemNotice } from '../ui/notices/problem-notice.tsx';
import { showToast } from '../ui/overlays/toasts.ts';
import { PageHead } from '../ui/page/page-head.tsx';
import { childFormWords, recordWords } from '../words/children.ts';

/** Change a record; if somebody else was faster, both versions stand side by side. */
export function Component() {
  const { childId = '' } = useParams();
  const session = useQuery(sessionQueries.current()).data;
  const child = useQuery({ ...childQueries.one(childId), refetchOnMount: 'always', refetchOnWindowFocus: false });
  const choices = useQuery(childQueries.choices()).data;
  if (child.isError) return <RecordProblem error={child.error} onRetry={() => void child.refetch()} />;
  // Editing begins from what is recorded now, never from what the cache still had.
  if (child.data === undefined || !child.isFetchedAfterMount || session === undefined || choices === undefined)
    return <Loading label={recordWords.fetching} />;
  const { firstName, familyName } = child.data.fields;
  const title = childFormWords.editTitle(`${firstName} ${familyName}`);
  return (
    <>
      <title>{title}</title>
      <PageHead title={title} />
      <div className="px-6 py-5 max-sm:px-5">
        <EditChild key={childId} loaded={child.data} session={session} choices={choices} />
      </div>
    </>
  );
}

interface EditChildProps {
  readonly loaded: Child;
  readonly session: Session;
  readonly choices: {
    readonly sites: readonly string[];
    readonly leads: readonly { readonly id: string; readonly name: string }[];
  };
}

interface Editing {
  /** The version the form began from: what "as it was" means. */
  readonly base: Child;
  readonly start: ChildFields;
  /** Counts fresh starts of the form. */
  readonly round: number;
}

const theirsOf = (error: unknown): Child | null =>
  isProblem(error, 'changed-meanwhile') ? ((error.problem.current ?? null) as Child | null) : null; // editChild answers with it

function EditChild({ loaded, session, choices }: EditChildProps) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const [editing, setEditing] = useState<Editing>({ base: loaded, start: loaded.fields, round: 0 });
  const [mine, setMine] = useState<ChildFields | null>(null);
  const edit = useMutation(childMutations.edit(client, loaded.id));
  const ability = abilityFor(session.me);
  const trainees = { trainees: loaded.traineeIds };
  const mayCleft = canChild(ability, 'edit-cleft', trainees);
  const theirs = theirsOf(edit.error);
  const problem = problemOf(edit.error);
  const refusals = (problem?.errors ?? []).map(({ pointer, detail }) => ({
    name: fieldNameOf(pointer),
    message: detail,
  }));
  const recordPath = `/children/${loaded.id}/record`;
  const members = useQuery(memberQueries.list()).data ?? [];
  const names = new Map(members.map(({ id, name }) => [id, name]));

  const send = (fields: ChildFields, version: number) => {
    setMine(fields);
    edit.mutate(
      { fields, version },
      {
        onSuccess: (child) => {
          showToast({ text: child.version === version ? childFormWords.noChange : childFormWords.saved });
          void navigate(recordPath);
        },
      },
    );
  };
  const goOn = (fields: ChildFields, base: Child) => {
    edit.reset();
    setEditing({ base, start: fields, round: editing.round + 1 });
  };
  return (
    <>
      {theirs !== null && mine !== null ? (
        <ConflictView
          was={editing.base.fields}
          mine={mine}
          theirs={theirs.fields}
          names={names}
          isBusy={edit.isPending}
          onSave={(fields) => send(fields, theirs.version)}
          onBack={(fields) => goOn(fields, theirs)}
          onLeave={() => void navigate(recordPath)}
        />
      ) : (
        <ChildForm
          key={editing.round}
          start={formOf(editing.start)}
          reach={{ mayIdentity: canChild(ability, 'edit', trainees), mayCleft, mayConfirm: mayCleft }}
          choices={choices}
          today={session.today}
          kind="any"
          sendLabel={childFormWords.save}
          isBusy={edit.isPending}
          refusals={refusals}
          renderCleft={(slot) => <CleftEntry {...slot} />}
          onSend={(fields) => send(fields, editing.base.version)}
          leave={
            <LinkButton look="quiet" to={recordPath}>
              {childFormWords.leave}
            </LinkButton>
          }
        >
          {problem === null || refusals.length > 0 ? null : <ProblemNotice problem={problem} />}
        </ChildForm>
      )}
    </>
  );
}
