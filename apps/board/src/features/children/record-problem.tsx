import { problemOf } from '../../api/form-faults.ts';
import { LinkButton } from '../../ui/actions/link-button.tsx';
import { ProblemNotice } from '../../ui/notices/problem-notice.tsx';
import { recordWords, registryWords } from '../../words/children.ts';

/** The record cannot be shown: not here, not open to this person, or a failure. */
export function RecordProblem({ error, onRetry }: { readonly error: unknown; readonly onRetry: () => void }) {
  const problem = problemOf(error);
  if (problem === null) return null;
  const isClosed = problem.status === 403;
  const retry = problem.status >= 500 ? { onRetry } : {};
  return (
    <div className="px-6 py-5 max-sm:px-5">
      <title>{isClosed ? recordWords.closedTitle : problem.title}</title>
      <ProblemNotice
        problem={isClosed ? { ...problem, title: recordWords.closedTitle } : problem}
        {...retry}
        actions={<LinkButton to="/children">{registryWords.title}</LinkButton>}
      />
    </div>
  );
}
