import { Button } from '../../ui/actions/button.tsx';
import { Dialog, DialogActions } from '../../ui/overlays/dialog.tsx';
import { boardWords } from '../../words/board.ts';
import { kitWords } from '../../words/kit.ts';

export function KeysDialog({ onClose }: { readonly onClose: () => void }) {
  return (
    <Dialog isOpen onClose={onClose} title={boardWords.keysTitle}>
      <dl className="m-0 grid grid-cols-[auto_1fr] gap-x-5 gap-y-1.5">
        {boardWords.keys.map(([key, what]) => (
          <div key={key} className="contents">
            <dt>
              <kbd className="border-thread-2 text-initials rounded-tag border px-1.5 py-0.5">{key}</kbd>
            </dt>
            <dd className="text-body m-0">{what}</dd>
          </div>
        ))}
      </dl>
      <DialogActions>
        <Button onClick={onClose}>{kitWords.close}</Button>
      </DialogActions>
    </Dialog>
  );
}
