import { useLayoutEffect, useMemo, useRef, type RefObject } from 'react';
import type { BoardLine } from '../board-layout.ts';
import { placeText, type GridPlace } from './grid-moves.ts';

interface KeptFocus {
  readonly onFocus: () => void;
  readonly onBlur: () => void;
}

/** A lane that is rolled or unrolled is drawn anew: the focus that stood on it is not lost with what was there before. */
export function useKeptFocus(
  body: RefObject<HTMLElement | null>,
  lines: readonly BoardLine[],
  focus: GridPlace | null,
): KeptFocus {
  const hasFocus = useRef(false);
  useLayoutEffect(() => {
    if (!hasFocus.current || focus === null || document.activeElement !== document.body) return;
    body.current?.querySelector<HTMLElement>(`[data-place="${placeText(focus)}"]`)?.focus({ preventScroll: true });
  }, [body, lines, focus]);
  return useMemo(
    () => ({
      onFocus: () => {
        hasFocus.current = true;
      },
      onBlur: () => {
        hasFocus.current = false;
      },
    }),
    [],
  );
}
