import { useDeferredValue, useMemo, useState } from 'react';
import { useNavigate } from 'react-router-dom';
import type { Me } from '@weftway/contract/session';
import type { BoardModel, BoardRow } from '../../queries/board-model.ts';
import { Button } from '../../ui/actions/button.tsx';
import { LinkButton } from '../../ui/actions/link-button.tsx';
import { EmptyState } from '../../ui/notices/empty-state.tsx';
import { boardWords } from '../../words/board.ts';
import { filterBoard, widened, type BoardFilter } from './board-filter.ts';
import { BoardHead } from './board-head.tsx';
import { BoardList } from './board-list.tsx';
import { headsOf, stripsOf, unrolledAtFirst } from './board-strips.ts';
import { BookDialog, KeysDialog, RowPanel, usePanelsAtHand } from './late-panels.tsx';
import { PrintedBoard } from './printed-board.tsx';
import { addressOf } from './row-address.ts';
import type { PanelView } from './row-panel.tsx';
import { boardViewerOf } from './row-permissions.ts';
import { StatesShown } from './states-shown.tsx';
import { useBoardActs } from './use-board-acts.ts';
import { useStableActs } from './use-stable-acts.ts';
import { useKeysKey } from './use-keys-key.ts';
import { useIsPrinting, useIsWide } from './use-screen.ts';
import { WideBoard } from './wide-board.tsx';

interface BoardViewProps {
  readonly model: BoardModel;
  readonly me: Me;
  readonly filter: BoardFilter;
  readonly onFilter: (filter: BoardFilter) => void;
  readonly isLive: boolean;
}

interface OpenPanel {
  readonly rowId: string;
  readonly anchor: HTMLElement;
  readonly view: PanelView;
}

export function BoardView({ model, me, filter, onFilter, isLive }: BoardViewProps) {
  const navigate = useNavigate();
  const viewer = useMemo(() => boardViewerOf(me), [me]);
  // The choice itself shows at once; the many rows follow in the next moment and can be interrupted.
  const drawn = useDeferredValue(filter);
  const filtered = useMemo(() => filterBoard(model, drawn, me.id), [model, drawn, me.id]);
  const heads = useMemo(() => headsOf(model), [model]);
  const strips = useMemo(
    () => stripsOf({ rows: filtered.rows, heads, day: model.day, own: me.disciplines, discipline: drawn.discipline }),
    [filtered, heads, model.day, me.disciplines, drawn.discipline],
  );
  const unrolled = useMemo(() => new Set(drawn.unrolled ?? unrolledAtFirst(strips)), [drawn.unrolled, strips]);
  const acts = useBoardActs(viewer, model);
  const isWide = useIsWide();
  const isPrinting = useIsPrinting();
  const [panel, setPanel] = useState<OpenPanel | null>(null);
  const [booking, setBooking] = useState<BoardRow | null>(null);
  const [showsKeys, setShowsKeys] = useState(false);
  useKeysKey(() => setShowsKeys(true));
  usePanelsAtHand();

  const onUnroll = (strip: string) => {
    const next = new Set(unrolled);
    if (!next.delete(strip)) next.add(strip);
    onFilter({ ...filter, unrolled: [...next] });
  };
  const onActions = (row: BoardRow, anchor: HTMLElement, view: PanelView) => setPanel({ rowId: row.id, anchor, view });
  const onOpen = (row: BoardRow) => void navigate(addressOf(row));
  const onShow = (states: BoardFilter['states']) => onFilter({ ...filter, states });
  const stable = useStableActs({
    onUnroll,
    onOpen,
    onActions,
    onClaim: acts.claim,
    onHandOver: acts.handOver,
    onShow,
    onKeys: () => setShowsKeys(true),
  });
  const panelRow = panel === null ? undefined : model.rows.find((row) => row.id === panel.rowId);

  return (
    <>
      <BoardHead filter={filter} filtered={filtered} onFilter={onFilter} />
      {filtered.rows.length === 0 ? (
        <NothingShown all={model.rows.length} onWiden={() => onFilter(widened(filter))} />
      ) : null}
      {isWide ? (
        <WideBoard
          model={model}
          viewer={viewer}
          strips={strips}
          unrolled={unrolled}
          mine={filtered.hands.mine}
          shown={filter.states}
          counts={filtered.states}
          isLive={isLive}
          acts={stable}
        />
      ) : (
        <>
          <details className="no-print border-hair border-b px-6 py-2 max-sm:px-5">
            <summary className="text-body min-h-8 cursor-pointer font-semibold">{boardWords.statesShown}</summary>
            <StatesShown shown={filter.states} counts={filtered.states} onShow={onShow} />
          </details>
          <BoardList model={model} strips={strips} unrolled={unrolled} onUnroll={onUnroll} onActions={onActions} />
        </>
      )}
      {panel === null || panelRow === undefined ? null : (
        <RowPanel
          key={panel.rowId + panel.view}
          row={panelRow}
          model={model}
          viewer={viewer}
          anchor={panel.anchor}
          view={panel.view}
          acts={acts}
          onBook={setBooking}
          onClose={() => setPanel(null)}
        />
      )}
      {booking === null ? null : (
        <BookDialog
          row={booking}
          onClose={() => setBooking(null)}
          onBook={(on) => {
            acts.book(booking, on);
            setBooking(null);
          }}
        />
      )}
      {showsKeys ? <KeysDialog onClose={() => setShowsKeys(false)} /> : null}
      {isPrinting ? <PrintedBoard model={model} strips={strips} /> : null}
    </>
  );
}

function NothingShown({ all, onWiden }: { readonly all: number; readonly onWiden: () => void }) {
  return (
    <div className="no-print px-6 max-sm:px-5">
      {all === 0 ? (
        <EmptyState kind="time" actions={<LinkButton to="/children/new">{boardWords.registerChild}</LinkButton>}>
          {boardWords.nothingYet}
        </EmptyState>
      ) : (
        <EmptyState
          kind="filter"
          title={boardWords.emptyTitle}
          actions={<Button onClick={onWiden}>{boardWords.showAll}</Button>}
        >
          {boardWords.empty(all)}
        </EmptyState>
      )}
    </div>
  );
}
