import { useRef, useState, type FormEvent, type ReactNode } from 'react';
import { placeFaults } from '../../api/form-faults.ts';
import type { ProblemDocument } from '../../api/api-client.ts';
import { isProblem } from '../../api/api-client.ts';
import { Button } from '../../ui/actions/button.tsx';
import { PasswordField } from '../../ui/fields/password-field.tsx';
import { Notice } from '../../ui/notices/notice.tsx';
import { ProblemNotice } from '../../ui/notices/problem-notice.tsx';
import { signInWords } from '../../words/sign-in.ts';

interface NewPasswordFormProps {
  /** What the button does: set the password, join the team. */
  readonly action: string;
  readonly onSave: (password: string) => Promise<unknown>;
  /** Shown when the link opens nothing (any more). */
  readonly linkGone: ReactNode;
  /** For password managers, which keep the password under this name. */
  readonly email?: string | undefined;
}

/** One field: the password can be shown, so it is not asked for twice. */
export function NewPasswordForm({ action, onSave, linkGone, email }: NewPasswordFormProps) {
  const [password, setPassword] = useState('');
  const [fault, setFault] = useState('');
  const [problem, setProblem] = useState<ProblemDocument | null>(null);
  const [isGone, setGone] = useState(false);
  const [isBusy, setBusy] = useState(false);
  const input = useRef<HTMLInputElement>(null);

  const send = async (event: FormEvent) => {
    event.preventDefault();
    if (isBusy) return;
    setBusy(true);
    setFault('');
    setProblem(null);
    try {
      await onSave(password);
    } catch (error) {
      if (isProblem(error, 'link-not-valid')) return setGone(true);
      setProblem(placeFaults(error, { names: ['password'], setFault: (_name, message) => setFault(message) }));
      input.current?.focus();
    } finally {
      setBusy(false);
    }
  };

  if (isGone) return linkGone;
  return (
    <form noValidate onSubmit={(event) => void send(event)} className="flex w-full max-w-[400px] flex-col gap-4">
      {email === undefined ? null : (
        <input type="email" name="username" autoComplete="username" value={email} readOnly hidden />
      )}
      <PasswordField
        ref={input}
        label={signInWords.newPassword}
        name="password"
        autoComplete="new-password"
        value={password}
        onChange={setPassword}
        error={fault}
        hint={
          <>
            {signInWords.newPasswordHint}{' '}
            <span className="figures block">{signInWords.characters([...password].length)}</span>
          </>
        }
      />
      {problem === null ? null : <ProblemNotice problem={problem} />}
      <div>
        <Button type="submit" look="filled" size="touch" isBusy={isBusy}>
          {action}
        </Button>
      </div>
    </form>
  );
}

/** Says that a link opens nothing any more, and what helps. */
export function LinkGone({ children, actions }: { readonly children: ReactNode; readonly actions?: ReactNode }) {
  return (
    <Notice kind="error" title={signInWords.linkGone} actions={actions}>
      {children}
    </Notice>
  );
}
