import type { ReactNode } from 'react';
import { ApiProblem, isProblem } from '../../../api/api-client.ts';
import { Button } from '../../../ui/actions/button.tsx';
import { Dialog, DialogActions } from '../../../ui/overlays/dialog.tsx';
import { ProblemNotice } from '../../../ui/notices/problem-notice.tsx';
import { Notice } from '../../../ui/notices/notice.tsx';
import { kitWords } from '../../../words/kit.ts';
import { pathwayWords } from '../../../words/pathway.ts';

interface ActDialogProps {
  readonly title: string;
  readonly onClose: () => void;
  readonly onSubmit: () => void;
  /** Null where nothing can be done here: then there is only the way back. */
  readonly submitLabel: string | null;
  readonly isBusy: boolean;
  readonly look?: 'filled' | 'danger';
  /** What the server refused; a wrong password is said at its field instead. */
  readonly error: unknown;
  readonly children: ReactNode;
  readonly extraActions?: ReactNode;
  readonly width?: 'narrow' | 'wide';
}

const firstWrong = '[aria-invalid=true], fieldset[aria-describedby*="-error"]';

/** A dialog that does one thing to a milestone: text, fields, the button that names it, and Cancel. */
export function ActDialog(props: ActDialogProps) {
  const {
    title,
    onClose,
    onSubmit,
    submitLabel,
    isBusy,
    look = 'filled',
    error,
    children,
    extraActions,
    width = 'narrow',
  } = props;
  return (
    <Dialog isOpen onClose={onClose} title={title} width={width}>
      <form
        noValidate
        className="flex flex-col gap-4"
        onSubmit={(event) => {
          event.preventDefault();
          if (isBusy) return;
          const form = event.currentTarget;
          onSubmit();
          requestAnimationFrame(() => form.querySelector<HTMLElement>(firstWrong)?.focus());
        }}
      >
        {children}
        <ActError error={error} />
        <DialogActions>
          {submitLabel === null ? null : (
            <Button type="submit" look={look} isBusy={isBusy}>
              {submitLabel}
            </Button>
          )}
          {extraActions}
          <Button onClick={onClose}>{kitWords.cancel}</Button>
        </DialogActions>
      </form>
    </Dialog>
  );
}

/** Any refusal or failure, in words; nothing while there is none, or while it is said at a field. */
export function ActError({ error }: { readonly error: unknown }) {
  if (error === null || error === undefined || isProblem(error, 'wrong-password')) return null;
  if (error instanceof ApiProblem) return <ProblemNotice problem={error.problem} />;
  return (
    <Notice kind="error" title={pathwayWords.states.failedTitle}>
      {pathwayWords.states.notDone}
    </Notice>
  );
}
