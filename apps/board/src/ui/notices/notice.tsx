import type { ReactNode } from 'react';

interface NoticeProps {
  /** madder bar, weld bar, indigo bar */
  readonly kind: 'error' | 'conflict' | 'note';
  readonly title: ReactNode;
  readonly mark?: ReactNode;
  /** What happened, where the work is safe, what will happen by itself. */
  readonly children?: ReactNode;
  readonly actions?: ReactNode;
  /** The short reference, or what follows from the buttons. */
  readonly footnote?: ReactNode;
}

const bars = { error: 'border-madder', conflict: 'border-weld', note: 'border-indigo' } as const;

export function Notice({ kind, title, mark, children, actions, footnote }: NoticeProps) {
  return (
    <div
      role={kind === 'note' ? 'status' : 'alert'}
      className={`flex flex-col gap-2 border-l-5 py-0.5 pl-4 ${bars[kind]}`}
    >
      <p className="text-sheet m-0 flex items-center gap-3">
        {mark}
        {title}
      </p>
      {children ? <div className="text-body text-ink max-w-[72ch]">{children}</div> : null}
      {actions ? <div className="flex flex-wrap items-center gap-2 pt-1">{actions}</div> : null}
      {footnote ? <p className="text-fine text-ink-3 m-0">{footnote}</p> : null}
    </div>
  );
}
