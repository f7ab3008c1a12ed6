import { memo } from 'react';
import type { MilestoneState } from '@weftway/pathway/milestone-state';
import type { BoardModel, BoardRow } from '../../queries/board-model.ts';
import { boardWords } from '../../words/board.ts';
import type { Strip } from './board-strips.ts';
import { BoardDrag } from './drag/board-drag.tsx';
import { memberOfPlace } from './drag/drag-places.ts';
import { HandsColumn } from './drag/hands-column.tsx';
import { BoardGrid } from './grid/board-grid.tsx';
import { claimOf, handingOf, type BoardViewer } from './row-permissions.ts';
import type { WideActs } from './use-stable-acts.ts';

interface WideBoardProps {
  readonly model: BoardModel;
  readonly viewer: BoardViewer;
  readonly strips: readonly Strip[];
  readonly unrolled: ReadonlySet<string>;
  readonly mine: number;
  readonly shown: ReadonlySet<MilestoneState>;
  readonly counts: ReadonlyMap<MilestoneState, number>;
  readonly isLive: boolean;
  /** The same at every drawing. */
  readonly acts: WideActs;
}

/** The grid with its hands beside it; left alone while only the choices above it change. */
export const WideBoard = memo(function WideBoard(props: WideBoardProps) {
  const { model, viewer, strips, unrolled, mine, shown, counts, isLive, acts } = props;
  const { onHandOver, onShow, onKeys, ...rowActs } = acts;
  return (
    <div className="no-print flex items-stretch pl-6">
      <BoardDrag
        model={model}
        describe={(row, place) => describeDrop(viewer, model, row, place)}
        onClaim={acts.onClaim}
        onHandOver={onHandOver}
        side={(carried) => (
          <HandsColumn
            model={model}
            viewer={viewer}
            carried={carried}
            mine={mine}
            shown={shown}
            counts={counts}
            onShow={onShow}
            isLive={isLive}
            onKeys={onKeys}
          />
        )}
      >
        <BoardGrid model={model} strips={strips} unrolled={unrolled} {...rowActs} />
      </BoardDrag>
    </div>
  );
});

/** What a drop would do, or why it would do nothing. */
const describeDrop = (viewer: BoardViewer, model: BoardModel, row: BoardRow, place: string): string => {
  const memberId = memberOfPlace(place);
  if (memberId === null) {
    const claim = claimOf(viewer, model, row);
    return claim.isAllowed ? boardWords.claims(row.milestone.title) : claim.why;
  }
  const handing = handingOf(viewer, model, row);
  if (!handing.isAllowed) return handing.why;
  const from = handing.value.from === null ? null : (model.colleagues.get(handing.value.from)?.name ?? null);
  return boardWords.handsTo(model.colleagues.get(memberId)?.name ?? '', row.milestone.title, from);
};
