import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate, useSearchParams } from 'react-router-dom';
import { abilityFor, canChild, canSome } from '@weftway/abilities/ability-for';
import { readPlainDate } from '@weftway/calendar/plain-date';
import type { ChildFields } from '@weftway/contract/child';
import type { Session } from '@weftway/contract/session';
import { isProblem, newIdempotencyKey } from '../api/api-client.ts';
import { problemOf } from '../api/form-faults.ts';
import { ChildForm } from '../features/children/child-form.tsx';
import { blankChildForm, fieldNameOf, type ChildFormValues } from '../features/children/child-form-values.ts';
import { DuplicatePanel, type Candidate } from '../features/children/duplicate-panel.tsx';
import { CleftEntry } from '../features/cleft-diagram/cleft-entry.tsx';
import { childMutations, childQueries, type PossibleChild } from '../queries/child-queries.ts';
import { sessionQueries } from '../queries/session-queries.ts';
import { Segment } from '../ui/actions/segment.tsx';
import { LinkButton } from '../ui/actions/link-button.tsx';
import { Loading } from '../ui/notices/loading.tsx';
import { Notice } from '../ui/notices/notice.tsx';
import { ProblemNotice } from '../ui/notices/problem-notice.tsx';
import { showToast } from '../ui/overlays/toasts.ts';
import { PageHead } from '../ui/page/page-head.tsx';
import { childFormWords } from '../words/children.ts';

const kinds = [
  { value: 'born', label: childFormWords.bornAlready },
  { value: 'expected', label: childFormWords.notYetBorn },
] as const;

/** Add a child or an expected child. */
export function Component() {
  const [params, setParams] = useSearchParams();
  const kind = params.get('kind') === 'expected' ? 'expected' : 'born';
  const session = useQuery(sessionQueries.current()).data;
  const choices = useQuery(childQueries.choices()).data;
  const title = kind === 'expected' ? childFormWords.expectedTitle : childFormWords.newTitle;
  const mayAdd = session !== undefined && canSome(abilityFor(session.me), 'register', 'Child');
  return (
    <>
      <title>{title}</title>
      <PageHead title={title} />
      <div className="flex flex-col gap-6 px-6 py-5 max-sm:px-5">
        {mayAdd ? (
          <Segment
            label={childFormWords.kind}
            options={kinds}
            value={kind}
            onChange={(next) => setParams(next === 'expected' ? { kind: next } : {}, { replace: true })}
          />
        ) : null}
        {session !== undefined && !mayAdd ? <Notice kind="note" title={childFormWords.identityClosed} /> : null}
        {session === undefined || choices === undefined ? (
          <Loading />
        ) : mayAdd ? (
          <NewChild session={session} choices={choices} kind={kind} />
        ) : null}
      </div>
    </>
  );
}

/** What is known well enough to look for the child on the list; null before that. */
const possibleChild = (values: ChildFormValues): PossibleChild | null => {
  const reading = readPlainDate(values.bornOn);
  const isNamed = values.firstName.trim() !== '' && values.familyName.trim() !== '';
  if (!isNamed && values.recordNumber.trim() === '') return null;
  return {
    firstName: values.firstName.trim(),
    familyName: values.familyName.trim(),
    recordNumber: values.recordNumber.trim().slice(0, 20),
    bornOn: reading.kind === 'date' ? reading.date : null,
  };
};

interface NewChildProps {
  readonly kind: 'born' | 'expected';
  readonly session: Session;
  readonly choices: {
    readonly sites: readonly string[];
    readonly leads: readonly { readonly id: string; readonly name: string }[];
  };
}

const candidatesOf = (error: unknown): readonly Candidate[] =>
  isProblem(error, 'duplicate-record') ? ((error.problem['candidates'] ?? []) as readonly Candidate[]) : []; // registerChild answers with them

function NewChild({ session, choices, kind }: NewChildProps) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const [key] = useState(newIdempotencyKey);
  const [possible, setPossible] = useState<PossibleChild | null>(null);
  const [sent, setSent] = useState<ChildFields | null>(null);
  const register = useMutation(childMutations.register(client, key));
  const found = useQuery({
    ...childQueries.duplicates(possible ?? { firstName: '', familyName: '', recordNumber: '', bornOn: null }),
    enabled: possible !== null,
  });
  const mayConfirm = canChild(abilityFor(session.me), 'edit-cleft', { trainees: [] });
  const refused = candidatesOf(register.error);
  const noticed: readonly Candidate[] = refused.length > 0 || possible === null ? [] : (found.data ?? []);
  const problem = problemOf(register.error);
  const refusals = (problem?.errors ?? []).map(({ pointer, detail }) => ({
    name: fieldNameOf(pointer),
    message: detail,
  }));

  const send = (fields: ChildFields, isDistinct: boolean) => {
    setSent(fields);
    register.mutate(
      { fields, isDistinct },
      {
        onSuccess: (child) => {
          showToast({ text: childFormWords.added(`${fields.firstName} ${fields.familyName}`) });
          void navigate(`/children/${child.id}`);
        },
      },
    );
  };
  return (
    <ChildForm
      start={blankChildForm(choices.sites.length === 1 ? (choices.sites[0] ?? '') : '')}
      reach={{ mayIdentity: true, mayCleft: true, mayConfirm }}
      choices={choices}
      today={session.today}
      kind={kind}
      sendLabel={childFormWords.register}
      isBusy={register.isPending}
      refusals={refusals}
      renderCleft={(slot) => <CleftEntry {...slot} />}
      onSend={(fields) => send(fields, false)}
      besideIdentity={<DuplicatePanel candidates={noticed} isBusy={false} />}
      onIdentity={(values) => setPossible(possibleChild(values))}
      leave={
        <LinkButton look="quiet" to="/children">
          {childFormWords.leave}
        </LinkButton>
      }
    >
      {problem === null || refusals.length > 0 || refused.length > 0 ? null : <ProblemNotice problem={problem} />}
      <DuplicatePanel
        candidates={refused}
        isBusy={register.isPending}
        onDistinct={sent === null ? undefined : () => send(sent, true)}
      />
    </ChildForm>
  );
}
