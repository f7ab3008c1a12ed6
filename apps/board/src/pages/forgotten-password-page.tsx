import { useQuery } from '@tanstack/react-query';
import { ForgottenPasswordForm } from '../features/sign-in/forgotten-password-form.tsx';
import { OutsideFrame } from '../features/sign-in/outside-frame.tsx';
import { sessionQueries } from '../queries/session-queries.ts';
import { signInWords } from '../words/sign-in.ts';

export function Component() {
  const session = useQuery(sessionQueries.current()).data;
  return (
    <OutsideFrame team={session?.team.name}>
      <title>{signInWords.forgotTitle}</title>
      <div className="flex flex-col gap-5">
        <h1 className="text-title m-0">{signInWords.forgotTitle}</h1>
        <p className="text-sentence m-0 max-w-[60ch]">{signInWords.forgotText}</p>
        <ForgottenPasswordForm isDemo={session?.isDemo ?? false} />
      </div>
    </OutsideFrame>
  );
}
