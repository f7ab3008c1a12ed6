import type { ReactNode } from 'react';
import { kitWords } from '../../words/kit.ts';
import { Button } from '../actions/button.tsx';
import { Notice } from './notice.tsx';

/** An RFC 9457 problem as the server sends it. */
export interface ProblemShape {
  readonly type?: string | undefined;
  readonly title: string;
  readonly status: number;
  readonly detail?: string | undefined;
  readonly instance?: string | undefined;
  readonly errors?: readonly { readonly detail: string; readonly pointer: string }[] | undefined;
}

interface ProblemNoticeProps {
  readonly problem: ProblemShape;
  readonly onRetry?: (() => void) | undefined;
  readonly actions?: ReactNode;
}

/** Says what the server refused or that it failed; never a raw message of a surprise. */
export function ProblemNotice({ problem, onRetry, actions }: ProblemNoticeProps) {
  const isSurprise = problem.status >= 500;
  const isConflict = problem.status === 409 || problem.status === 412;
  const retry = onRetry === undefined ? null : <Button onClick={onRetry}>{kitWords.tryAgain}</Button>;
  return (
    <Notice
      kind={isConflict ? 'conflict' : 'error'}
      title={isSurprise ? kitWords.notSaved : problem.title}
      actions={
        retry === null && !actions ? undefined : (
          <>
            {retry}
            {actions}
          </>
        )
      }
      footnote={problem.instance === undefined ? undefined : kitWords.reference(problem.instance)}
    >
      {isSurprise ? kitWords.surprise : problem.detail}
      {problem.errors === undefined || problem.errors.length === 0 ? null : (
        <ul className="m-0 list-none p-0">
          {problem.errors.map((error) => (
            <li key={`${error.pointer} ${error.detail}`}>{error.detail}</li>
          ))}
        </ul>
      )}
    </Notice>
  );
}
