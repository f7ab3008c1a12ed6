import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { ApiProblem } from '../../../api/api-client.ts';
import { protocolMutations } from '../../../queries/protocol-queries.ts';
import { Button } from '../../../ui/actions/button.tsx';
import { Checkbox } from '../../../ui/fields/checkbox.tsx';
import { ErrorSummary } from '../../../ui/fields/error-summary.tsx';
import { PasswordField } from '../../../ui/fields/password-field.tsx';
import { TextArea } from '../../../ui/fields/text-area.tsx';
import { TextField } from '../../../ui/fields/text-field.tsx';
import { ProblemNotice } from '../../../ui/notices/problem-notice.tsx';
import { Dialog, DialogActions } from '../../../ui/overlays/dialog.tsx';
import { showToast } from '../../../ui/overlays/toasts.ts';
import { kitWords } from '../../../words/kit.ts';
import { protocolWords } from '../../../words/protocol.ts';

const words = protocolWords.activate;

interface Fields {
  readonly agreedBy: string;
  readonly reason: string;
  readonly password: string;
}

type Errors = Partial<Record<keyof Fields, string>>;

const faultsIn = (fields: Fields): Errors => ({
  ...(fields.agreedBy.trim() === '' ? { agreedBy: words.agreedMissing } : {}),
  ...(fields.reason.trim().length < 3 ? { reason: words.reasonMissing } : {}),
  ...(fields.password === '' ? { password: words.passwordMissing } : {}),
});

const wrongPassword = (error: unknown): string | undefined =>
  error instanceof ApiProblem && error.kind === 'wrong-password' ? error.problem.title : undefined;

interface ActivateDialogProps {
  readonly version: number;
  /** Children in care who follow another version, as far as the list of versions tells. */
  readonly others: number;
  readonly onClose: () => void;
}

/** Password, the clinical lead who agreed, why, and whether the children on the path move along. */
export function ActivateDialog({ version, others, onClose }: ActivateDialogProps) {
  const client = useQueryClient();
  const activate = useMutation(protocolMutations.activate(client, version));
  const [fields, setFields] = useState<Fields>({ agreedBy: '', reason: '', password: '' });
  const [moveOpenChildren, setMove] = useState(false);
  const [attempt, setAttempt] = useState(0);
  const errors: Errors = attempt === 0 ? {} : faultsIn(fields);
  const change = (name: keyof Fields) => (value: string) => setFields((now) => ({ ...now, [name]: value }));
  const refusal = wrongPassword(activate.error);

  const send = (event: FormEvent) => {
    event.preventDefault();
    setAttempt((count) => count + 1);
    if (Object.keys(faultsIn(fields)).length > 0) return;
    activate.mutate(
      { ...fields, moveOpenChildren },
      {
        onSuccess: () => {
          showToast({ text: words.done(version) });
          onClose();
        },
      },
    );
  };
  return (
    <Dialog isOpen onClose={onClose} title={words.title(version)}>
      <form noValidate onSubmit={send} className="flex flex-col gap-4">
        <p className="text-body m-0">{words.text}</p>
        <ErrorSummary attempt={attempt} errors={Object.entries(errors).map(([name, message]) => ({ name, message }))} />
        {activate.error instanceof ApiProblem && refusal === undefined ? (
          <ProblemNotice problem={activate.error.problem} />
        ) : null}
        <TextField
          name="agreedBy"
          label={words.agreedBy}
          value={fields.agreedBy}
          onChange={change('agreedBy')}
          error={errors.agreedBy}
          maxLength={100}
        />
        <TextArea
          name="reason"
          label={words.reason}
          rows={2}
          value={fields.reason}
          onChange={change('reason')}
          error={errors.reason}
          maxLength={1000}
        />
        {others === 0 ? (
          <p className="text-small text-ink-2 m-0">{words.noMove}</p>
        ) : (
          <Checkbox label={words.move(others)} hint={words.moveHint} value={moveOpenChildren} onChange={setMove} />
        )}
        <PasswordField
          name="password"
          label={words.password}
          value={fields.password}
          onChange={change('password')}
          error={errors.password ?? refusal}
        />
        <DialogActions>
          <Button type="submit" look="filled" isBusy={activate.isPending}>
            {words.save(version)}
          </Button>
          <Button onClick={onClose}>{kitWords.cancel}</Button>
        </DialogActions>
      </form>
    </Dialog>
  );
}
