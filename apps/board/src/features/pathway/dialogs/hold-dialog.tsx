import type { PlainDate } from '@weftway/calendar/plain-date';
import { readPlainDate } from '@weftway/calendar/plain-date';
import { useState } from 'react';
import { pathwayMutations, type Place } from '../../../queries/pathway-queries.ts';
import { Button } from '../../../ui/actions/button.tsx';
import { DateField } from '../../../ui/fields/date-field.tsx';
import { TextArea } from '../../../ui/fields/text-area.tsx';
import { showToast } from '../../../ui/overlays/toasts.ts';
import { signingWords } from '../../../words/signing.ts';
import { useAct } from '../use-act.ts';
import { ActDialog } from './act-dialog.tsx';

interface HoldDialogProps {
  readonly place: Place;
  readonly title: string;
  readonly today: PlainDate;
  readonly birth: PlainDate | null;
  /** A hold that stands already. */
  readonly hold: { readonly reason: string; readonly reviewOn: PlainDate } | null;
  readonly onClose: () => void;
}

export function HoldDialog({ place, title, today, birth, hold, onClose }: HoldDialogProps) {
  const words = signingWords.hold;
  const act = useAct(pathwayMutations.hold, place);
  const [reason, setReason] = useState(hold?.reason ?? '');
  const [reviewOn, setReviewOn] = useState<string>(hold?.reviewOn ?? '');
  const [isTried, setTried] = useState(false);
  const reading = readPlainDate(reviewOn);
  const day = reading.kind === 'date' && reading.date > today ? reading.date : null;
  const send = (next: { readonly reason: string; readonly reviewOn: string } | null, text: string) =>
    act.mutate(
      { body: { hold: next } },
      {
        onSuccess: () => {
          showToast({ text });
          onClose();
        },
      },
    );
  const submit = () => {
    setTried(true);
    if (reason.trim().length >= 3 && day !== null) send({ reason: reason.trim(), reviewOn: day }, words.done(title));
  };
  return (
    <ActDialog
      title={hold === null ? words.title : words.change}
      onClose={onClose}
      onSubmit={submit}
      submitLabel={hold === null ? words.save : words.saveChange}
      isBusy={act.isPending}
      error={act.error}
      extraActions={
        hold === null ? null : <Button onClick={() => send(null, words.lifted(title))}>{words.lift}</Button>
      }
    >
      <p className="text-body m-0">
        <strong>{title}.</strong> {words.text}
      </p>
      <TextArea
        label={words.reason}
        rows={2}
        value={reason}
        onChange={setReason}
        maxLength={1000}
        error={isTried && reason.trim().length < 3 ? words.reasonError : undefined}
      />
      <DateField
        label={words.reviewOn}
        value={reviewOn}
        onChange={setReviewOn}
        birth={birth ?? undefined}
        error={isTried && day === null ? words.reviewError : undefined}
      />
    </ActDialog>
  );
}
