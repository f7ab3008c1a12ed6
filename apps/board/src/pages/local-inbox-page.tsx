import { useQuery } from '@tanstack/react-query';
import { isProblem } from '../api/api-client.ts';
import { problemOf } from '../api/form-faults.ts';
import { LetterList } from '../features/sign-in/letter-list.tsx';
import { OutsideFrame } from '../features/sign-in/outside-frame.tsx';
import { sessionQueries } from '../queries/session-queries.ts';
import { LinkButton } from '../ui/actions/link-button.tsx';
import { EmptyState } from '../ui/notices/empty-state.tsx';
import { Loading } from '../ui/notices/loading.tsx';
import { Notice } from '../ui/notices/notice.tsx';
import { ProblemNotice } from '../ui/notices/problem-notice.tsx';
import { signInWords } from '../words/sign-in.ts';

export function Component() {
  const session = useQuery(sessionQueries.current()).data;
  const isSignedIn = (session?.me ?? null) !== null;
  return (
    <OutsideFrame team={session?.team.name}>
      <title>{signInWords.inboxTitle}</title>
      <div className="flex flex-col gap-5">
        <div className="flex flex-wrap items-baseline justify-between gap-4">
          <h1 className="text-title m-0">{signInWords.inboxTitle}</h1>
          <LinkButton to={isSignedIn ? '/' : '/sign-in'}>
            {isSignedIn ? signInWords.backToWork : signInWords.backToSignIn}
          </LinkButton>
        </div>
        <Letters />
      </div>
    </OutsideFrame>
  );
}

function Letters() {
  const inbox = useQuery(sessionQueries.inbox());
  if (isProblem(inbox.error, 'not-found')) {
    return (
      <Notice kind="note" title={signInWords.inboxClosed}>
        {signInWords.inboxClosedText}
      </Notice>
    );
  }
  const problem = problemOf(inbox.error);
  if (problem !== null) return <ProblemNotice problem={problem} onRetry={() => void inbox.refetch()} />;
  if (inbox.data === undefined) return <Loading />;
  return (
    <>
      <p className="text-sentence text-ink-2 m-0 max-w-[68ch]">{signInWords.inboxSentence}</p>
      {inbox.data.mails.length === 0 ? (
        <EmptyState kind="time" title={signInWords.inboxEmptyTitle}>
          {signInWords.inboxEmpty}
        </EmptyState>
      ) : (
        <LetterList letters={inbox.data.mails} />
      )}
    </>
  );
}
