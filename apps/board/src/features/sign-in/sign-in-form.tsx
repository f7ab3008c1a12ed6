import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef, useState, type FormEvent } from 'react';
import { placeFaults } from '../../api/form-faults.ts';
import { sessionMutations } from '../../queries/session-queries.ts';
import { Button } from '../../ui/actions/button.tsx';
import { TextLink } from '../../ui/actions/text-link.tsx';
import { FieldError } from '../../ui/fields/field-error.tsx';
import { PasswordField } from '../../ui/fields/password-field.tsx';
import { TextField } from '../../ui/fields/text-field.tsx';
import { signInWords } from '../../words/sign-in.ts';

export interface Filled {
  readonly email: string;
  readonly password: string;
  readonly name: string;
}

interface SignInFormProps {
  /** Somebody chosen from the list of the demonstration. */
  readonly filled: Filled | null;
  readonly onSignedIn: () => void;
}

const required = { email: 'Write your e-mail.', password: 'Write your password.' } as const;

/** Takes whatever stands in the fields; a refusal keeps both and stands under the password. */
export function SignInForm({ filled, onSignedIn }: SignInFormProps) {
  const client = useQueryClient();
  const [email, setEmail] = useState(filled?.email ?? '');
  const [password, setPassword] = useState(filled?.password ?? '');
  const [faults, setFaults] = useState<Readonly<Record<string, string>>>({});
  const [refusal, setRefusal] = useState('');
  const emailInput = useRef<HTMLInputElement>(null);
  const passwordInput = useRef<HTMLInputElement>(null);
  const submit = useRef<HTMLButtonElement>(null);
  const signIn = useMutation({ ...sessionMutations.signIn(client) });

  useEffect(() => {
    (filled === null ? emailInput : submit).current?.focus({ preventScroll: filled === null });
  }, [filled]);

  const send = async (event: FormEvent) => {
    event.preventDefault();
    if (signIn.isPending) return;
    setRefusal('');
    const missing = {
      ...(email.trim() === '' ? { email: required.email } : {}),
      ...(password === '' ? { password: required.password } : {}),
    };
    setFaults(missing);
    if ('email' in missing) return emailInput.current?.focus();
    if ('password' in missing) return passwordInput.current?.focus();
    try {
      await signIn.mutateAsync({ email, password });
      onSignedIn();
    } catch (error) {
      const found: Record<string, string> = {};
      const problem = placeFaults(error, {
        names: ['email', 'password'],
        setFault: (name, message) => (found[name] = message),
      });
      setFaults(found);
      setRefusal(problem === null ? '' : `${problem.title}. ${problem.detail ?? ''}`);
      passwordInput.current?.focus();
      passwordInput.current?.select();
    }
  };

  return (
    <form noValidate onSubmit={(event) => void send(event)} className="flex w-full max-w-[400px] flex-col gap-4">
      <TextField
        ref={emailInput}
        label={signInWords.email}
        name="email"
        type="email"
        inputMode="email"
        autoComplete="username"
        value={email}
        onChange={setEmail}
        error={faults['email']}
      />
      <PasswordField
        ref={passwordInput}
        label={signInWords.password}
        name="password"
        value={password}
        onChange={setPassword}
        error={faults['password']}
      />
      <div role="alert">
        <FieldError message={refusal} />
      </div>
      <div className="flex flex-wrap items-center gap-4">
        <Button ref={submit} type="submit" look="filled" size="touch" isBusy={signIn.isPending}>
          {signInWords.signIn}
        </Button>
        <TextLink to="/forgotten-password">{signInWords.forgot}</TextLink>
      </div>
      <p className="text-small text-ink-2 m-0">{signInWords.quietMinutes(15)}</p>
      <p role="status" className="sr-only">
        {filled === null ? '' : signInWords.demoFilled(filled.name)}
      </p>
    </form>
  );
}
