import type { ReactNode } from 'react';

interface EmptyStateProps {
  /** `filter`: bare threads, what was asked, a way to widen. `time`: one sentence, and how to start. */
  readonly kind: 'filter' | 'time';
  readonly title?: string | undefined;
  readonly children?: ReactNode;
  readonly actions?: ReactNode;
}

export function EmptyState({ kind, title, children, actions }: EmptyStateProps) {
  return (
    <div className="flex flex-col gap-2 py-3">
      {kind === 'filter' ? (
        <svg aria-hidden="true" width="100%" height="82" className="mb-1 max-w-2xl">
          {[1, 27, 53, 79].map((y) => (
            <line key={y} x1="0" x2="100%" y1={y} y2={y} className="stroke-thread" strokeWidth="2" />
          ))}
        </svg>
      ) : null}
      {title === undefined ? null : <p className="text-sheet m-0">{title}</p>}
      {children ? <div className="text-body text-ink-2 max-w-[72ch]">{children}</div> : null}
      {actions ? <div className="flex flex-wrap items-center gap-2 pt-1">{actions}</div> : null}
    </div>
  );
}
