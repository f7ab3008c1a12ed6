import { useState, type FormEvent } from 'react';
import { Button } from '../../ui/actions/button.tsx';
import { DateField } from '../../ui/fields/date-field.tsx';
import { TextArea } from '../../ui/fields/text-area.tsx';
import { TextField } from '../../ui/fields/text-field.tsx';
import { ProblemNotice, type ProblemShape } from '../../ui/notices/problem-notice.tsx';
import { Dialog, DialogActions } from '../../ui/overlays/dialog.tsx';
import { kitWords } from '../../words/kit.ts';
import { recordWords } from '../../words/children.ts';

export type CareAct = 'transfer' | 'return' | 'end';

export interface CareEntry {
  readonly on: string;
  readonly to: string;
  readonly reason: string;
}

interface CareDialogProps {
  readonly act: CareAct;
  readonly today: string;
  readonly isBusy: boolean;
  readonly problem: ProblemShape | null;
  readonly onClose: () => void;
  readonly onSend: (entry: CareEntry) => void;
}

const texts = {
  transfer: { title: recordWords.transfer, lead: recordWords.transferLead, send: recordWords.doTransfer },
  return: { title: recordWords.comeBack, lead: recordWords.returnLead, send: recordWords.doReturn },
  end: { title: recordWords.endCare, lead: recordWords.endLead, send: recordWords.doEnd },
} as const;

/** Moves of care with their effect said before. Faults of the server come back to their field. */
export function CareDialog({ act, today, isBusy, problem, onClose, onSend }: CareDialogProps) {
  const [entry, setEntry] = useState<CareEntry>({ on: today, to: '', reason: '' });
  const text = texts[act];
  const faultOf = (pointer: string): string | undefined =>
    problem?.errors?.find((error) => error.pointer === pointer)?.detail;
  const hasFaults = (problem?.errors?.length ?? 0) > 0;
  const send = (event: FormEvent) => {
    event.preventDefault();
    onSend(entry);
  };
  return (
    <Dialog isOpen onClose={onClose} title={text.title} role={act === 'end' ? 'alertdialog' : 'dialog'}>
      <form noValidate onSubmit={send} className="flex flex-col gap-4">
        <p className="text-body m-0">{text.lead}</p>
        {problem === null || hasFaults ? null : <ProblemNotice problem={problem} />}
        {act === 'return' ? null : (
          <DateField
            label={recordWords.onDay}
            value={entry.on}
            onChange={(on) => setEntry({ ...entry, on })}
            error={faultOf('/on')}
          />
        )}
        {act === 'transfer' ? (
          <TextField
            label={recordWords.toTeam}
            value={entry.to}
            onChange={(to) => setEntry({ ...entry, to })}
            error={faultOf('/to')}
          />
        ) : null}
        <TextArea
          label={recordWords.why}
          rows={3}
          value={entry.reason}
          onChange={(reason) => setEntry({ ...entry, reason })}
          error={faultOf('/reason')}
        />
        <DialogActions>
          <Button type="submit" look={act === 'end' ? 'danger' : 'filled'} isBusy={isBusy}>
            {text.send}
          </Button>
          <Button look="quiet" onClick={onClose}>
            {kitWords.cancel}
          </Button>
        </DialogActions>
      </form>
    </Dialog>
  );
}
