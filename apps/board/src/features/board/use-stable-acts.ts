import { useLayoutEffect, useMemo, useRef } from 'react';
import type { BoardRow } from '../../queries/board-model.ts';
import type { BoardFilter } from './board-filter.ts';
import type { RowActs } from './grid/board-grid.tsx';

export interface WideActs extends RowActs {
  readonly onUnroll: (strip: string) => void;
  readonly onHandOver: (row: BoardRow, memberId: string) => void;
  readonly onShow: (states: BoardFilter['states']) => void;
  readonly onKeys: () => void;
}

/** The same functions at every drawing, each doing what the latest one would do: the grid need not be drawn for them. */
export function useStableActs(acts: WideActs): WideActs {
  const latest = useRef(acts);
  useLayoutEffect(() => {
    latest.current = acts;
  });
  return useMemo(
    () => ({
      onUnroll: (strip) => latest.current.onUnroll(strip),
      onOpen: (row) => latest.current.onOpen(row),
      onClaim: (row) => latest.current.onClaim(row),
      onActions: (row, anchor, view) => latest.current.onActions(row, anchor, view),
      onHandOver: (row, memberId) => latest.current.onHandOver(row, memberId),
      onShow: (states) => latest.current.onShow(states),
      onKeys: () => latest.current.onKeys(),
    }),
    [],
  );
}
