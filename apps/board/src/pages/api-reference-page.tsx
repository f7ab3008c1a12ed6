import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { abilityFor, canSome } from '@weftway/abilities/ability-for';
import type { ApiDocument } from '@weftway/contract/api-document';
import { ApiProblem } from '../api/api-client.ts';
import { OperationList } from '../features/api-reference/operation-list.tsx';
import { PermissionList } from '../features/api-reference/permission-list.tsx';
import { sessionQueries } from '../queries/session-queries.ts';
import { apiReferenceQueries } from '../queries/api-reference-queries.ts';
import { Button } from '../ui/actions/button.tsx';
import { Segment } from '../ui/actions/segment.tsx';
import { Loading } from '../ui/notices/loading.tsx';
import { Notice } from '../ui/notices/notice.tsx';
import { ProblemNotice } from '../ui/notices/problem-notice.tsx';
import { PageHead } from '../ui/page/page-head.tsx';
import { apiReferenceWords as words } from '../words/api-reference.ts';

const parts = [
  { value: 'operations', label: words.operations },
  { value: 'permissions', label: words.permissions },
] as const;

const save = (document_: ApiDocument): void => {
  const address = URL.createObjectURL(new Blob([JSON.stringify(document_, null, 2)], { type: 'application/json' }));
  const link = document.createElement('a');
  link.href = address;
  link.download = 'weftway-openapi.json';
  link.click();
  URL.revokeObjectURL(address);
};

export function Component() {
  const session = useQuery(sessionQueries.current()).data;
  const mayRead = canSome(abilityFor(session?.me ?? null), 'read', 'ApiReference');
  const read = useQuery({ ...apiReferenceQueries.document(), enabled: mayRead });
  const [search, setSearch] = useSearchParams();
  const part = search.get('part') === 'permissions' ? 'permissions' : 'operations';
  const { data, error } = read;
  const isClosed = !mayRead || (error instanceof ApiProblem && error.kind === 'not-allowed');
  return (
    <>
      <PageHead
        title={words.title}
        sentence={words.sentence}
        actions={
          data === undefined ? null : (
            <>
              <Button onClick={() => window.print()}>{words.print}</Button>
              <Button onClick={() => save(data)}>{words.download}</Button>
            </>
          )
        }
      />
      <div className="flex flex-col gap-5 px-6 py-5 max-sm:px-5">
        {isClosed ? <Notice kind="note" title={words.forWhom} /> : null}
        {error instanceof ApiProblem && !isClosed ? (
          <ProblemNotice problem={error.problem} onRetry={() => void read.refetch()} />
        ) : null}
        {read.isLoading ? <Loading label={words.loading} /> : null}
        {data === undefined ? null : (
          <>
            <Segment
              label={words.tabs}
              options={parts}
              value={part}
              onChange={(value) => setSearch(value === 'operations' ? {} : { part: value }, { replace: true })}
            />
            {part === 'operations' ? <OperationList document={data} /> : <PermissionList />}
          </>
        )}
      </div>
    </>
  );
}
