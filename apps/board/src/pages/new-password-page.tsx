import { useMutation, useQuery } from '@tanstack/react-query';
import { LinkGone, NewPasswordForm } from '../features/sign-in/new-password-form.tsx';
import { OutsideFrame } from '../features/sign-in/outside-frame.tsx';
import { useLinkToken } from '../features/sign-in/use-link-token.ts';
import { sessionMutations, sessionQueries } from '../queries/session-queries.ts';
import { LinkButton } from '../ui/actions/link-button.tsx';
import { Notice } from '../ui/notices/notice.tsx';
import { signInWords } from '../words/sign-in.ts';

export function Component() {
  const session = useQuery(sessionQueries.current()).data;
  const token = useLinkToken();
  const reset = useMutation(sessionMutations.resetPassword());
  const gone = (
    <LinkGone actions={<LinkButton to="/forgotten-password">{signInWords.askAgain}</LinkButton>}>
      {signInWords.linkGoneReset}
    </LinkGone>
  );
  return (
    <OutsideFrame team={session?.team.name}>
      <title>{signInWords.newPasswordTitle}</title>
      <div className="flex flex-col gap-5">
        <h1 className="text-title m-0">{signInWords.newPasswordTitle}</h1>
        {reset.isSuccess ? (
          <Notice
            kind="note"
            title={signInWords.passwordSet}
            actions={
              <LinkButton look="filled" to="/sign-in">
                {signInWords.signIn}
              </LinkButton>
            }
          >
            {signInWords.passwordSetText}
          </Notice>
        ) : token === '' ? (
          gone
        ) : (
          <NewPasswordForm
            action={signInWords.savePassword}
            onSave={(password) => reset.mutateAsync({ token, password })}
            linkGone={gone}
          />
        )}
      </div>
    </OutsideFrame>
  );
}
