/** What the browser says about the screen: wide enough for the lanes, or about to print. */
import { useEffect, useState, useSyncExternalStore } from 'react';
import { flushSync } from 'react-dom';

const wideQuery = '(min-width: 1180px)';

const watchWidth = (onChange: () => void): (() => void) => {
  if (typeof window.matchMedia !== 'function') return () => undefined;
  const query = window.matchMedia(wideQuery);
  query.addEventListener('change', onChange);
  return () => query.removeEventListener('change', onChange);
};

/** Lanes need room for eight bins of names. */
export const useIsWide = (): boolean =>
  useSyncExternalStore(
    watchWidth,
    () => typeof window.matchMedia !== 'function' || window.matchMedia(wideQuery).matches,
  );

/** True from just before printing until just after, so that long lists exist only on paper. */
export function useIsPrinting(): boolean {
  const [isPrinting, setPrinting] = useState(false);
  useEffect(() => {
    const begin = () => flushSync(() => setPrinting(true));
    const end = () => setPrinting(false);
    window.addEventListener('beforeprint', begin);
    window.addEventListener('afterprint', end);
    return () => {
      window.removeEventListener('beforeprint', begin);
      window.removeEventListener('afterprint', end);
    };
  }, []);
  return isPrinting;
}
