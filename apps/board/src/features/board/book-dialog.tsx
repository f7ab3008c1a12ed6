import { useState } from 'react';
import { readPlainDate, type PlainDate } from '@weftway/calendar/plain-date';
import type { BoardRow } from '../../queries/board-model.ts';
import { Button } from '../../ui/actions/button.tsx';
import { DateField } from '../../ui/fields/date-field.tsx';
import { Dialog, DialogActions } from '../../ui/overlays/dialog.tsx';
import { boardWords } from '../../words/board.ts';
import { kitWords } from '../../words/kit.ts';
import { childName, windowOf } from './row-words.ts';

interface BookDialogProps {
  readonly row: BoardRow;
  readonly onBook: (on: PlainDate) => void;
  readonly onClose: () => void;
}

export function BookDialog({ row, onBook, onClose }: BookDialogProps) {
  const [typed, setTyped] = useState('');
  const read = readPlainDate(typed);
  return (
    <Dialog isOpen onClose={onClose} title={boardWords.bookTitle(row.milestone.title, childName(row))}>
      <DateField label={boardWords.bookDate} hint={windowOf(row)} value={typed} onChange={setTyped} />
      <DialogActions>
        <Button
          look="filled"
          notYet={read.kind === 'date' ? null : boardWords.noDate}
          onClick={() => {
            if (read.kind === 'date') onBook(read.date);
          }}
        >
          {boardWords.bookDo}
        </Button>
        <Button onClick={onClose}>{kitWords.cancel}</Button>
      </DialogActions>
    </Dialog>
  );
}
