/** Which lines of the board are in sight: only those are drawn, and the one that has the focus. */
import { defaultRangeExtractor, useWindowVirtualizer } from '@tanstack/react-virtual';
import { useCallback, useLayoutEffect, useState, type RefObject } from 'react';
interface AnyLine {
  readonly key: string;
  readonly height: number;
}

export interface LineInSight<Line> {
  readonly line: Line;
  readonly index: number;
  readonly top: number;
}

const overscan = 4;

interface InSight<Line> {
  readonly inSight: readonly LineInSight<Line>[];
  readonly height: number;
}

export function useLinesInSight<Line extends AnyLine>(
  body: RefObject<HTMLElement | null>,
  lines: readonly Line[],
  focusedIndex: number,
): InSight<Line> {
  const [margin, setMargin] = useState(0);
  useLayoutEffect(() => {
    const top = body.current?.getBoundingClientRect().top ?? 0;
    setMargin(Math.round(top + window.scrollY));
  }, [body]);
  const keyOf = useCallback((index: number) => lines[index]?.key ?? index, [lines]);
  const virtualizer = useWindowVirtualizer({
    count: lines.length,
    estimateSize: (index) => lines[index]?.height ?? 0,
    getItemKey: keyOf,
    overscan,
    scrollMargin: margin,
    initialRect: { width: 1440, height: 900 },
    rangeExtractor: (range) => {
      const seen = defaultRangeExtractor(range);
      return focusedIndex < 0 || seen.includes(focusedIndex) ? seen : [...seen, focusedIndex].sort((a, b) => a - b);
    },
  });
  const inSight = virtualizer.getVirtualItems().flatMap(({ index, start }) => {
    const line = lines[index];
    return line === undefined ? [] : [{ line, index, top: start - margin }];
  });
  return { inSight, height: virtualizer.getTotalSize() };
}
