import { useId, useRef, type ReactNode } from 'react';
import { Selvedge } from '../page/selvedge.tsx';
import { CloseIcon } from '../icons.tsx';
import { kitWords } from '../../words/kit.ts';
import { useSheetKeyboard } from './use-sheet-keyboard.ts';

interface SideSheetProps {
  readonly title: string;
  /** The mark of what the sheet is about, before the title. */
  readonly mark?: ReactNode;
  readonly onClose: () => void;
  readonly children: ReactNode;
  /** Stays at the foot while the rest scrolls. */
  readonly actions?: ReactNode;
}

/**
 * 428 wide, not modal, a sibling of what it explains inside a `SheetLayout`. Escape closes; F6 moves between the sheet
 * and what was focused before; the focus goes back there on closing. Give it a `key` per thing it shows.
 */
export function SideSheet({ title, mark, onClose, children, actions }: SideSheetProps) {
  const titleId = useId();
  const sheet = useRef<HTMLElement>(null);
  useSheetKeyboard(sheet, onClose);
  return (
    <section
      ref={sheet}
      aria-labelledby={titleId}
      className="bg-bleached flex max-md:z-30 w-[428px] max-w-full shrink-0 self-stretch max-md:fixed max-md:inset-0 max-md:w-full"
    >
      <Selvedge direction="down" />
      <div className="flex min-w-0 grow flex-col">
        <header className="flex items-start gap-2.5 px-6 pt-4 pb-2 max-md:px-5">
          {mark ? <span className="flex h-6.5 items-center">{mark}</span> : null}
          <h2 id={titleId} tabIndex={-1} data-sheet-start="" className="text-sheet m-0 grow">
            {title}
          </h2>
          <button
            type="button"
            aria-label={kitWords.close}
            onClick={onClose}
            className="hover:bg-linen -mt-1 -mr-2 flex size-9 shrink-0 items-center justify-center rounded max-md:size-11"
          >
            <CloseIcon size={14} />
          </button>
        </header>
        <div className="flex grow scroll-pb-48 flex-col gap-5 overflow-y-auto px-6 pb-6 max-md:px-5">{children}</div>
        {actions ? (
          <footer className="bg-paper border-hair sticky bottom-0 flex flex-col gap-2 border-t px-6 py-3 max-md:px-5">
            {actions}
          </footer>
        ) : null}
      </div>
    </section>
  );
}

/** The work on the left gives way to the sheet on the right; the sheet never covers it. */
export function SheetLayout({ children, sheet }: { readonly children: ReactNode; readonly sheet: ReactNode }) {
  return (
    <div className="flex min-h-0 grow items-stretch">
      <div className="min-w-0 grow">{children}</div>
      {sheet}
    </div>
  );
}
