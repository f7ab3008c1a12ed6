/** The warning before a session ends and the lock after it; both are fetched when somebody first moves. */
import { lazy, Suspense, useEffect, type ComponentProps } from 'react';
import { fetchUntilThere } from '../../ui/fetch-until-there.ts';
import { whenIdle } from '../../ui/when-idle.ts';

const fetchWarning = () => import('./session-warning.tsx');
const fetchLock = () => import('./locked-screen.tsx');

const LateWarning = lazy(async () => ({ default: (await fetchUntilThere(fetchWarning)).SessionWarning }));
const LateLock = lazy(async () => ({ default: (await fetchUntilThere(fetchLock)).LockedScreen }));

/** A session only ends after somebody was there: from their first key or press on, everything is at hand. */
export function useSessionEndAtHand(): void {
  useEffect(() => {
    const fetchBoth = () => {
      // Not reached now: asked for again when it is shown.
      fetchWarning().catch(() => undefined);
      fetchLock().catch(() => undefined);
    };
    const acts = ['pointerdown', 'keydown'] as const;
    const once = () => {
      for (const act of acts) document.removeEventListener(act, once);
      whenIdle(fetchBoth);
    };
    for (const act of acts) document.addEventListener(act, once, { passive: true });
    return () => {
      for (const act of acts) document.removeEventListener(act, once);
    };
  }, []);
}

export function SessionEndsSoon(props: ComponentProps<typeof LateWarning>) {
  return (
    <Suspense fallback={null}>
      <LateWarning {...props} />
    </Suspense>
  );
}

/** The screen is covered at once, whether the way back in is there yet or not. */
export function SessionIsOver(props: ComponentProps<typeof LateLock>) {
  return (
    <Suspense fallback={<div className="bg-linen fixed inset-0 z-50" />}>
      <LateLock {...props} />
    </Suspense>
  );
}
