import { formatDate } from '@weftway/calendar/format-date';
import { readPlainDate, type PlainDate } from '@weftway/calendar/plain-date';
import type { PlannedWindow } from '@weftway/pathway/pathway-plan';
import { useState } from 'react';
import { pathwayMutations, type Place } from '../../../queries/pathway-queries.ts';
import { Button } from '../../../ui/actions/button.tsx';
import { DateField } from '../../../ui/fields/date-field.tsx';
import { TextField } from '../../../ui/fields/text-field.tsx';
import { showToast } from '../../../ui/overlays/toasts.ts';
import { signingWords } from '../../../words/signing.ts';
import { useAct } from '../use-act.ts';
import { ActDialog } from './act-dialog.tsx';

interface BookDialogProps {
  readonly place: Place;
  readonly title: string;
  readonly birth: PlainDate | null;
  readonly booked: PlainDate | null;
  readonly window: PlannedWindow | null;
  readonly onClose: () => void;
}

export function BookDialog({ place, title, birth, booked, window, onClose }: BookDialogProps) {
  const words = signingWords.book;
  const act = useAct(pathwayMutations.book, place);
  const [on, setOn] = useState<string>(booked ?? '');
  const [reason, setReason] = useState('');
  const [isTried, setTried] = useState(false);
  const reading = readPlainDate(on);
  const day = reading.kind === 'date' ? reading.date : null;
  const isOutside = day !== null && window !== null && (day < window.earliest || day > window.latest);
  const send = (next: PlainDate | null) =>
    act.mutate(
      { body: { on: next, reason: reason.trim() } },
      {
        onSuccess: () => {
          showToast({ text: next === null ? words.removed : words.done(formatDate(next)) });
          onClose();
        },
      },
    );
  const submit = () => {
    setTried(true);
    if (day !== null) send(day);
  };
  return (
    <ActDialog
      title={booked === null ? words.title : words.move}
      onClose={onClose}
      onSubmit={submit}
      submitLabel={booked === null ? words.save : words.saveMove}
      isBusy={act.isPending}
      error={act.error}
      extraActions={booked === null ? null : <Button onClick={() => send(null)}>{words.remove}</Button>}
    >
      <p className="text-body m-0 font-semibold">{title}</p>
      <DateField
        label={words.on}
        value={on}
        onChange={setOn}
        birth={birth ?? undefined}
        error={isTried && day === null ? words.error : undefined}
      />
      {isOutside && window !== null ? (
        <p role="status" className="text-label text-weld m-0">
          {words.outside(window.earliest, window.latest)}
        </p>
      ) : null}
      {booked === null ? null : <TextField label={words.reason} value={reason} onChange={setReason} maxLength={300} />}
    </ActDialog>
  );
}
