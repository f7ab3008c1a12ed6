import { useMutation, useQuery } from '@tanstack/react-query';
import { problemOf } from '../api/form-faults.ts';
import { isProblem } from '../api/api-client.ts';
import { LinkGone, NewPasswordForm } from '../features/sign-in/new-password-form.tsx';
import { OutsideFrame } from '../features/sign-in/outside-frame.tsx';
import { useLinkToken } from '../features/sign-in/use-link-token.ts';
import { sessionMutations, sessionQueries } from '../queries/session-queries.ts';
import { LinkButton } from '../ui/actions/link-button.tsx';
import { Loading } from '../ui/notices/loading.tsx';
import { Notice } from '../ui/notices/notice.tsx';
import { ProblemNotice } from '../ui/notices/problem-notice.tsx';
import { signInWords } from '../words/sign-in.ts';

export function Component() {
  const session = useQuery(sessionQueries.current()).data;
  const token = useLinkToken();
  return (
    <OutsideFrame team={session?.team.name}>
      <title>{signInWords.join}</title>
      <Invitation token={token} />
    </OutsideFrame>
  );
}

const gone = (
  <LinkGone actions={<LinkButton to="/sign-in">{signInWords.backToSignIn}</LinkButton>}>
    {signInWords.linkGoneInvitation}
  </LinkGone>
);

function Invitation({ token }: { readonly token: string }) {
  const view = useQuery({ ...sessionQueries.invitation(token), enabled: token.length >= 20 });
  const accept = useMutation(sessionMutations.acceptInvitation());
  if (token.length < 20 || isProblem(view.error, 'link-not-valid')) return gone;
  const problem = problemOf(view.error);
  if (problem !== null) return <ProblemNotice problem={problem} onRetry={() => void view.refetch()} />;
  if (view.data === undefined) return <Loading label={signInWords.checkingLink} />;
  const { name, email, team, invitedBy } = view.data;
  return (
    <div className="flex flex-col gap-5">
      <h1 className="text-title m-0">{signInWords.invitationTitle(team)}</h1>
      {accept.isSuccess ? (
        <Notice
          kind="note"
          title={signInWords.joined}
          actions={
            <LinkButton look="filled" to="/sign-in">
              {signInWords.signIn}
            </LinkButton>
          }
        >
          {signInWords.joinedText}
        </Notice>
      ) : (
        <>
          <p className="text-sentence m-0 max-w-[60ch]">
            {signInWords.invitationFor(name, email)} {invitedBy === '' ? null : signInWords.invitedBy(invitedBy)}
          </p>
          <NewPasswordForm
            action={signInWords.join}
            email={email}
            onSave={(password) => accept.mutateAsync({ token, password })}
            linkGone={gone}
          />
        </>
      )}
    </div>
  );
}
