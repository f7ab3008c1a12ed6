import { useEffect, useRef, useState, useSyncExternalStore } from 'react';
import { kitWords } from '../../words/kit.ts';
import { currentToast, dismissToast, onToastChange } from './toasts.ts';

const shownFor = 6000;

/** Mounted once, at the root. F8 reaches it; it stays while hovered or focused. */
export function ToastRegion() {
  const toast = useSyncExternalStore(onToastChange, currentToast);
  const region = useRef<HTMLElement>(null);
  const [isKept, setKept] = useState(false);
  const id = toast?.id;

  useEffect(() => {
    if (id === undefined || isKept) return;
    const timer = setTimeout(() => dismissToast(id), shownFor);
    return () => clearTimeout(timer);
  }, [id, isKept]);

  useEffect(() => {
    const onKeyDown = (event: KeyboardEvent) => {
      if (event.key !== 'F8') return;
      event.preventDefault();
      (region.current?.querySelector('button') ?? region.current)?.focus();
    };
    document.addEventListener('keydown', onKeyDown);
    return () => document.removeEventListener('keydown', onKeyDown);
  }, []);

  return (
    <section
      ref={region}
      aria-label={kitWords.messages}
      tabIndex={-1}
      onMouseEnter={() => setKept(true)}
      onMouseLeave={() => setKept(false)}
      onFocus={() => setKept(true)}
      onBlur={() => setKept(false)}
      className="no-print pointer-events-none fixed right-6 bottom-6 z-50 max-sm:right-4 max-sm:bottom-4 max-sm:left-4"
    >
      <div role="status">
        {toast === null ? null : (
          <div
            key={toast.id}
            className="bg-ink text-paper text-body pointer-events-auto flex min-h-10 max-w-md items-center gap-4 rounded px-4 py-2"
          >
            <span>{toast.text}</span>
            {toast.onUndo === undefined ? null : (
              <button
                type="button"
                onClick={() => {
                  dismissToast(toast.id);
                  toast.onUndo?.();
                }}
                className="focus-visible:outline-paper min-h-6 rounded font-semibold underline underline-offset-3 focus-visible:-outline-offset-1"
              >
                {kitWords.undo}
              </button>
            )}
          </div>
        )}
      </div>
    </section>
  );
}
