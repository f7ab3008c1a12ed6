import { useMemo, useState } from 'react';
import { Dialog } from 'react-aria-components/Dialog';
import { Popover } from 'react-aria-components/Popover';
import { milestoneStateNames } from '@weftway/pathway/milestone-state';
import { disciplineNames } from '@weftway/team/disciplines';
import { Mark } from '../../marks/mark.tsx';
import type { BoardColleague, BoardModel, BoardRow } from '../../queries/board-model.ts';
import { Button } from '../../ui/actions/button.tsx';
import { LinkButton } from '../../ui/actions/link-button.tsx';
import { boardWords } from '../../words/board.ts';
import { addressOf } from './row-address.ts';
import { bookingOf, candidatesOf, claimOf, handingOf, releaseOf, type BoardViewer } from './row-permissions.ts';
import { ageOf, childName, holdersText, timeOf, windowOf } from './row-words.ts';
import type { BoardActs } from './use-board-acts.ts';

export type PanelView = 'all' | 'hand-to';

interface RowPanelProps {
  readonly row: BoardRow;
  readonly model: BoardModel;
  readonly viewer: BoardViewer;
  readonly anchor: HTMLElement;
  readonly view: PanelView;
  readonly acts: BoardActs;
  readonly onBook: (row: BoardRow) => void;
  readonly onClose: () => void;
}

/** Everything that a drag can do, and more, beside the row: for the mouse, for fingers, for the keyboard. */
export function RowPanel({ row, model, viewer, anchor, view: firstView, acts, onBook, onClose }: RowPanelProps) {
  const [view, setView] = useState(firstView);
  const triggerRef = useMemo(() => ({ current: anchor }), [anchor]);
  const then = (act: () => void) => () => {
    onClose();
    act();
  };
  return (
    <Popover
      isOpen
      triggerRef={triggerRef}
      placement="bottom start"
      offset={4}
      onOpenChange={(isOpen) => {
        if (!isOpen) onClose();
      }}
      className="bg-bleached shadow-lift w-72 max-w-[calc(100vw-16px)] rounded"
    >
      <Dialog
        aria-label={`${boardWords.actions}: ${childName(row)}, ${row.milestone.title}`}
        className="flex max-h-[70vh] flex-col gap-3 overflow-y-auto p-4 outline-none"
      >
        <RowSummary row={row} model={model} />
        {view === 'all' ? (
          <AllActs
            row={row}
            model={model}
            viewer={viewer}
            acts={acts}
            then={then}
            onBook={onBook}
            onHandTo={() => setView('hand-to')}
          />
        ) : (
          <HandTo
            row={row}
            model={model}
            viewer={viewer}
            onHand={(to) => then(() => acts.handOver(row, to))()}
            onBack={() => setView('all')}
          />
        )}
      </Dialog>
    </Popover>
  );
}

function RowSummary({ row, model }: { readonly row: BoardRow; readonly model: BoardModel }) {
  return (
    <p className="text-small m-0 flex flex-col gap-0.5">
      <span>
        <b>{childName(row)}</b> {ageOf(row, model.day)}
      </span>
      <span className="flex items-center gap-1.5">
        <Mark state={row.state} size={13} title={null} ground="bleached" />
        {row.milestone.title}, {milestoneStateNames[row.state].toLowerCase()}, {timeOf(row, model.day)}
      </span>
      <span className="text-fine text-ink-2">{windowOf(row)}</span>
      <span className="text-fine text-ink-2">{boardWords.holder(holdersText(row, model))}</span>
    </p>
  );
}

interface AllActsProps {
  readonly row: BoardRow;
  readonly model: BoardModel;
  readonly viewer: BoardViewer;
  readonly acts: BoardActs;
  readonly then: (act: () => void) => () => void;
  readonly onBook: (row: BoardRow) => void;
  readonly onHandTo: () => void;
}

function AllActs({ row, model, viewer, acts, then, onBook, onHandTo }: AllActsProps) {
  const claim = claimOf(viewer, model, row);
  const release = releaseOf(viewer, row);
  const handing = handingOf(viewer, model, row);
  const booking = bookingOf(viewer, row);
  return (
    <div className="flex flex-col items-stretch gap-2 [&>span]:-mt-1.5">
      <LinkButton look={claim.isAllowed ? 'plain' : 'filled'} to={addressOf(row)}>
        {boardWords.open}
      </LinkButton>
      {release.isAllowed ? (
        <Button onClick={then(() => acts.letGo(row))}>{boardWords.letGo}</Button>
      ) : (
        <Button
          look={claim.isAllowed ? 'filled' : 'plain'}
          notYet={claim.isAllowed ? null : claim.why}
          onClick={then(() => acts.claim(row))}
        >
          {boardWords.claim}
        </Button>
      )}
      <Button notYet={handing.isAllowed ? null : handing.why} onClick={onHandTo}>
        {boardWords.handTo}
      </Button>
      <Button notYet={booking.isAllowed ? null : booking.why} onClick={then(() => onBook(row))}>
        {boardWords.book}
      </Button>
    </div>
  );
}

interface HandToProps {
  readonly row: BoardRow;
  readonly model: BoardModel;
  readonly viewer: BoardViewer;
  readonly onHand: (memberId: string) => void;
  readonly onBack: () => void;
}

const roleOf = (colleague: BoardColleague): string =>
  colleague.disciplines.map((one) => disciplineNames[one].toLowerCase()).join(', ');

function HandTo({ row, model, viewer, onHand, onBack }: HandToProps) {
  const handing = handingOf(viewer, model, row);
  const candidates = handing.isAllowed ? candidatesOf(model, row, handing.value) : [];
  const inHand = (memberId: string) => model.rows.filter((one) => one.holders.includes(memberId)).length;
  return (
    <section aria-label={boardWords.handOverTo} className="flex flex-col gap-1">
      <h3 className="text-body m-0 font-semibold">{boardWords.handOverTo}</h3>
      {handing.isAllowed ? null : <p className="text-small text-ink-2 m-0">{handing.why}</p>}
      {handing.isAllowed && candidates.length === 0 ? (
        <p className="text-small text-ink-2 m-0">{boardWords.noCandidate}</p>
      ) : null}
      {candidates.map((colleague) => (
        <button
          key={colleague.id}
          type="button"
          onClick={() => onHand(colleague.id)}
          className="hover:bg-indigo-wash text-body flex min-h-9 flex-col rounded px-2 py-1 text-left max-[1179px]:min-h-11"
        >
          {colleague.name}
          <span className="text-fine text-ink-2">
            {roleOf(colleague)}, {boardWords.inHand(inHand(colleague.id))}
          </span>
        </button>
      ))}
      <Button look="quiet" onClick={onBack}>
        {boardWords.back}
      </Button>
    </section>
  );
}
