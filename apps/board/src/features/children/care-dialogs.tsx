import { useMutation, useQueryClient } from '@tanstack/react-query';
import { problemOf } from '../../api/form-faults.ts';
import { childMutations } from '../../queries/child-queries.ts';
import { showToast } from '../../ui/overlays/toasts.ts';
import { recordWords } from '../../words/children.ts';
import { CareDialog, type CareAct, type CareEntry } from './care-dialog.tsx';

interface CareDialogsProps {
  readonly act: CareAct;
  readonly childId: string;
  readonly today: string;
  readonly onClose: () => void;
}

/** Sends a move or the end of care, and says that it is done. */
export function CareDialogs({ act, childId, today, onClose }: CareDialogsProps) {
  const client = useQueryClient();
  const transfer = useMutation(childMutations.transfer(client, childId));
  const end = useMutation(childMutations.endCare(client, childId));
  const done = (text: string) => ({
    onSuccess: () => {
      showToast({ text });
      onClose();
    },
  });
  const send = ({ on, to, reason }: CareEntry) => {
    if (act === 'end') end.mutate({ on, reason }, done(recordWords.done.end));
    else
      transfer.mutate(
        { on: act === 'return' ? null : on, to, reason },
        done(act === 'return' ? recordWords.done.return : recordWords.done.transfer),
      );
  };
  return (
    <CareDialog
      act={act}
      today={today}
      isBusy={transfer.isPending || end.isPending}
      problem={problemOf(transfer.error ?? end.error)}
      onClose={onClose}
      onSend={send}
    />
  );
}
