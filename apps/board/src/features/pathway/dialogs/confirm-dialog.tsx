import { useState } from 'react';
import { isProblem } from '../../../api/api-client.ts';
import { pathwayMutations, type Place } from '../../../queries/pathway-queries.ts';
import { PasswordField } from '../../../ui/fields/password-field.tsx';
import { showToast } from '../../../ui/overlays/toasts.ts';
import { signingWords } from '../../../words/signing.ts';
import { useAct } from '../use-act.ts';
import { ActDialog } from './act-dialog.tsx';

interface ConfirmDialogProps {
  readonly place: Place;
  readonly title: string;
  /** As it is read: "Oct 2024". */
  readonly doneOn: string;
  readonly signer: string;
  readonly onClose: () => void;
}

/** A surgeon of the team stands by an operation that was done elsewhere. */
export function ConfirmDialog({ place, title, doneOn, signer, onClose }: ConfirmDialogProps) {
  const words = signingWords.confirm;
  const act = useAct(pathwayMutations.confirm, place);
  const [password, setPassword] = useState('');
  const [isTried, setTried] = useState(false);
  const wrong = isProblem(act.error, 'wrong-password')
    ? (act.error.problem.detail ?? signingWords.wrongPassword)
    : undefined;
  const submit = () => {
    setTried(true);
    if (password === '') return;
    act.mutate(
      { body: { password } },
      {
        onSuccess: () => {
          showToast({ text: words.done });
          onClose();
        },
      },
    );
  };
  return (
    <ActDialog
      title={words.title}
      onClose={onClose}
      onSubmit={submit}
      submitLabel={words.save(signer)}
      isBusy={act.isPending}
      error={act.error}
    >
      <p className="text-body m-0">{words.text(title, doneOn)}</p>
      <PasswordField
        label={signingWords.password}
        value={password}
        onChange={setPassword}
        error={wrong ?? (isTried && password === '' ? signingWords.passwordMissing : undefined)}
      />
    </ActDialog>
  );
}
