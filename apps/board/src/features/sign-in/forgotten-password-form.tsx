import { useMutation } from '@tanstack/react-query';
import { useRef, useState, type FormEvent } from 'react';
import { placeFaults } from '../../api/form-faults.ts';
import type { ProblemDocument } from '../../api/api-client.ts';
import { sessionMutations } from '../../queries/session-queries.ts';
import { Button } from '../../ui/actions/button.tsx';
import { TextLink } from '../../ui/actions/text-link.tsx';
import { TextField } from '../../ui/fields/text-field.tsx';
import { Notice } from '../../ui/notices/notice.tsx';
import { ProblemNotice } from '../../ui/notices/problem-notice.tsx';
import { signInWords } from '../../words/sign-in.ts';

interface ForgottenPasswordFormProps {
  /** Shown once the letter is on its way: where it can be read in the demonstration. */
  readonly isDemo: boolean;
}

/** Says the same whether or not the address belongs to anybody. */
export function ForgottenPasswordForm({ isDemo }: ForgottenPasswordFormProps) {
  const [email, setEmail] = useState('');
  const [fault, setFault] = useState('');
  const [problem, setProblem] = useState<ProblemDocument | null>(null);
  const input = useRef<HTMLInputElement>(null);
  const ask = useMutation(sessionMutations.askPasswordReset());

  const send = async (event: FormEvent) => {
    event.preventDefault();
    if (ask.isPending) return;
    setFault('');
    try {
      await ask.mutateAsync({ email: email.trim() });
    } catch (error) {
      setProblem(placeFaults(error, { names: ['email'], setFault: (_name, message) => setFault(message) }));
      input.current?.focus();
    }
  };

  if (ask.isSuccess) {
    return (
      <Notice
        kind="note"
        title={signInWords.letterSentTitle}
        actions={
          <>
            {isDemo ? <TextLink to="/inbox">{signInWords.openInbox}</TextLink> : null}
            <Button look="quiet" onClick={() => ask.reset()}>
              {signInWords.otherEmail}
            </Button>
          </>
        }
      >
        {signInWords.letterSent(email.trim())}
      </Notice>
    );
  }
  return (
    <form noValidate onSubmit={(event) => void send(event)} className="flex w-full max-w-[400px] flex-col gap-4">
      <TextField
        ref={input}
        label={signInWords.email}
        name="email"
        type="email"
        inputMode="email"
        autoComplete="username"
        value={email}
        onChange={setEmail}
        error={fault}
      />
      {problem === null ? null : <ProblemNotice problem={problem} />}
      <div className="flex flex-wrap items-center gap-4">
        <Button type="submit" look="filled" size="touch" isBusy={ask.isPending}>
          {signInWords.sendLetter}
        </Button>
        <TextLink to="/sign-in">{signInWords.backToSignIn}</TextLink>
      </div>
    </form>
  );
}
