import type { Member } from '@weftway/contract/member';
import { disciplineNames } from '@weftway/team/disciplines';
import { useState } from 'react';
import { pathwayMutations, type Place } from '../../../queries/pathway-queries.ts';
import { RadioField } from '../../../ui/fields/radio-field.tsx';
import { TextField } from '../../../ui/fields/text-field.tsx';
import { showToast } from '../../../ui/overlays/toasts.ts';
import { signingWords } from '../../../words/signing.ts';
import { useAct } from '../use-act.ts';
import { ActDialog } from './act-dialog.tsx';

interface HandOverDialogProps {
  readonly place: Place;
  readonly title: string;
  readonly part: string;
  readonly from: string | null;
  readonly colleagues: readonly Member[];
  readonly onClose: () => void;
}

export function HandOverDialog({ place, title, part, from, colleagues, onClose }: HandOverDialogProps) {
  const words = signingWords.handOver;
  const act = useAct(pathwayMutations.handOver, place);
  const [to, setTo] = useState('');
  const [isTried, setTried] = useState(false);
  const name = colleagues.find((colleague) => colleague.id === to)?.name ?? '';
  const submit = () => {
    setTried(true);
    if (to === '') return;
    act.mutate(
      { body: { part, to, from } },
      {
        onSuccess: () => {
          showToast({ text: words.done(name) });
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
      submitLabel={colleagues.length === 0 ? null : words.save(name)}
      isBusy={act.isPending}
      error={act.error}
    >
      <p className="text-body m-0 font-semibold">{title}</p>
      {colleagues.length === 0 ? (
        <p className="text-body m-0">{words.nobody}</p>
      ) : (
        <RadioField
          label={words.to}
          hint={words.hint}
          value={to}
          onChange={setTo}
          error={isTried && to === '' ? words.toError : undefined}
          options={colleagues.map((colleague) => ({
            value: colleague.id,
            label: colleague.name,
            detail: colleague.disciplines.map((one) => disciplineNames[one]).join(', '),
          }))}
        />
      )}
    </ActDialog>
  );
}

type ReleaseDialogProps = Pick<HandOverDialogProps, 'place' | 'title' | 'part' | 'onClose'>;

export function ReleaseDialog({ place, title, part, onClose }: ReleaseDialogProps) {
  const words = signingWords.release;
  const act = useAct(pathwayMutations.release, place);
  const [reason, setReason] = useState('');
  const submit = () =>
    act.mutate(
      { body: { part, reason: reason.trim() } },
      {
        onSuccess: () => {
          showToast({ text: words.done(title) });
          onClose();
        },
      },
    );
  return (
    <ActDialog
      title={words.title}
      onClose={onClose}
      onSubmit={submit}
      submitLabel={words.save}
      isBusy={act.isPending}
      error={act.error}
    >
      <p className="text-body m-0">
        <strong>{title}.</strong> {words.text}
      </p>
      <TextField label={words.reason} value={reason} onChange={setReason} maxLength={300} />
    </ActDialog>
  );
}
