/** What opens over the board: fetched once the board is drawn, so that it is at hand when it is asked for. */
import { lazy, Suspense, useEffect, type ComponentProps } from 'react';
import { whenIdle } from '../../ui/when-idle.ts';

const fetchPanel = () => import('./row-panel.tsx');
const fetchBooking = () => import('./book-dialog.tsx');
const fetchKeys = () => import('./keys-dialog.tsx');

const Panel = lazy(async () => ({ default: (await fetchPanel()).RowPanel }));
const Booking = lazy(async () => ({ default: (await fetchBooking()).BookDialog }));
const Keys = lazy(async () => ({ default: (await fetchKeys()).KeysDialog }));

/** Before anybody presses anything, so that no press waits for it. */
export function usePanelsAtHand(): void {
  useEffect(
    () =>
      whenIdle(() => {
        for (const fetchOne of [fetchPanel, fetchBooking, fetchKeys]) fetchOne().catch(() => undefined); // asked for again when it is shown
      }),
    [],
  );
}

export function RowPanel(props: ComponentProps<typeof Panel>) {
  return (
    <Suspense fallback={null}>
      <Panel {...props} />
    </Suspense>
  );
}

export function BookDialog(props: ComponentProps<typeof Booking>) {
  return (
    <Suspense fallback={null}>
      <Booking {...props} />
    </Suspense>
  );
}

export function KeysDialog(props: ComponentProps<typeof Keys>) {
  return (
    <Suspense fallback={null}>
      <Keys {...props} />
    </Suspense>
  );
}
