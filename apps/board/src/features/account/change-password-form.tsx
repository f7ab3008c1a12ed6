import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { newPasswordSchema } from '@weftway/contract/passwords';
import type { ProblemDocument } from '../../api/api-client.ts';
import { placeFaults } from '../../api/form-faults.ts';
import { sessionMutations } from '../../queries/session-queries.ts';
import { Button } from '../../ui/actions/button.tsx';
import { PasswordField } from '../../ui/fields/password-field.tsx';
import { ProblemNotice } from '../../ui/notices/problem-notice.tsx';
import { showToast } from '../../ui/overlays/toasts.ts';
import { accountWords } from '../../words/account.ts';

type Faults = Readonly<Record<string, string>>;

/** The present password and the new one; each can be shown, so neither is asked for twice. */
export function ChangePasswordForm({ email }: { readonly email: string }) {
  const [current, setCurrent] = useState('');
  const [next, setNext] = useState('');
  const [faults, setFaults] = useState<Faults>({});
  const [problem, setProblem] = useState<ProblemDocument | null>(null);
  const change = useMutation(sessionMutations.changePassword(useQueryClient()));

  const lookAtNext = () => {
    const read = newPasswordSchema.safeParse(next);
    setFaults((known) => ({
      ...known,
      next: next === '' || read.success ? '' : (read.error.issues[0]?.message ?? ''),
    }));
  };
  const send = async (event: FormEvent) => {
    event.preventDefault();
    if (change.isPending) return;
    setFaults({});
    setProblem(null);
    try {
      await change.mutateAsync({ current, next });
      setCurrent('');
      setNext('');
      showToast({ text: accountWords.changed });
    } catch (error) {
      const found: Record<string, string> = {};
      setProblem(
        placeFaults(error, { names: ['current', 'next'], setFault: (name, message) => (found[name] = message) }),
      );
      setFaults(found);
    }
  };

  return (
    <form noValidate onSubmit={(event) => void send(event)} className="flex max-w-[400px] flex-col gap-4">
      <input type="email" name="username" autoComplete="username" value={email} readOnly hidden />
      <PasswordField
        label={accountWords.current}
        name="current"
        value={current}
        onChange={setCurrent}
        error={faults['current']}
      />
      <PasswordField
        label={accountWords.next}
        name="next"
        autoComplete="new-password"
        value={next}
        onChange={setNext}
        onBlur={lookAtNext}
        error={faults['next']}
        hint={accountWords.nextHint}
      />
      {problem === null ? null : <ProblemNotice problem={problem} />}
      <div>
        <Button type="submit" look="filled" isBusy={change.isPending}>
          {accountWords.change}
        </Button>
      </div>
    </form>
  );
}
