import type { ReactNode } from 'react';
import { AlertIcon } from '../icons.tsx';

/** A boxed word in a sentence: an alert, or a plain remark. */
export function Tag({ kind = 'note', children }: { readonly kind?: 'alert' | 'note'; readonly children: ReactNode }) {
  const look = kind === 'alert' ? 'border-madder text-madder bg-bleached font-semibold' : 'border-thread-2 text-ink-2';
  return (
    <span className={`rounded-tag text-small inline-flex items-center gap-1 border px-1.5 align-middle ${look}`}>
      {kind === 'alert' ? <AlertIcon size={12} /> : null}
      {children}
    </span>
  );
}
