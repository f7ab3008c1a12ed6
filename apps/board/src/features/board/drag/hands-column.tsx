import type { MilestoneState } from '@weftway/pathway/milestone-state';
import type { BoardModel, BoardRow } from '../../../queries/board-model.ts';
import { boardWords } from '../../../words/board.ts';
import { candidatesOf, claimOf, handingOf, type BoardViewer } from '../row-permissions.ts';
import { StatesShown } from '../states-shown.tsx';
import { myHands, placeOfMember } from './drag-places.ts';
import { DropPlace } from './drop-place.tsx';

interface HandsColumnProps {
  readonly model: BoardModel;
  readonly viewer: BoardViewer;
  readonly carried: BoardRow | null;
  readonly mine: number;
  readonly shown: ReadonlySet<MilestoneState>;
  readonly counts: ReadonlyMap<MilestoneState, number>;
  readonly onShow: (states: ReadonlySet<MilestoneState>) => void;
  readonly isLive: boolean;
  readonly onKeys: () => void;
}

export function HandsColumn({ model, viewer, carried, mine, shown, counts, onShow, isLive, onKeys }: HandsColumnProps) {
  const claim = carried === null ? null : claimOf(viewer, model, carried);
  return (
    <aside className="bg-linen border-hair no-print sticky top-[60px] flex max-h-[calc(100vh-60px)] min-h-[calc(100vh-60px)] w-[216px] shrink-0 flex-col gap-5 self-start overflow-y-auto border-l px-4 py-3">
      <section className="flex flex-col gap-2">
        <h2 className="text-body m-0 flex justify-between font-semibold">
          {boardWords.myHands} <span className="text-small text-ink-2 figures font-normal">{mine}</span>
        </h2>
        <DropPlace
          place={myHands}
          title={boardWords.dropToClaim}
          effect={
            claim?.isAllowed === true && carried !== null ? boardWords.claims(carried.milestone.title) : undefined
          }
          refusal={claim?.isAllowed === false ? claim.why : undefined}
        />
      </section>
      {carried === null ? null : <HandOverPlaces model={model} viewer={viewer} row={carried} />}
      <StatesShown shown={shown} counts={counts} onShow={onShow} />
      <p className="text-fine text-ink-3 m-0 mt-auto flex flex-col items-start gap-1">
        <span role="status">{isLive ? boardWords.live : boardWords.polling}</span>
        <button type="button" onClick={onKeys} className="text-indigo rounded underline underline-offset-3">
          {boardWords.keyHint}
        </button>
      </p>
    </aside>
  );
}

interface HandOverPlacesProps {
  readonly model: BoardModel;
  readonly viewer: BoardViewer;
  readonly row: BoardRow;
}

/** Only colleagues who may hold what is carried, each with how much they hold already. */
function HandOverPlaces({ model, viewer, row }: HandOverPlacesProps) {
  const handing = handingOf(viewer, model, row);
  const candidates = handing.isAllowed ? candidatesOf(model, row, handing.value) : [];
  const inHand = (memberId: string) => model.rows.filter((one) => one.holders.includes(memberId)).length;
  const from =
    handing.isAllowed && handing.value.from !== null ? (model.colleagues.get(handing.value.from)?.name ?? null) : null;
  return (
    <section className="flex flex-col gap-2">
      <h2 className="text-body m-0 font-semibold">{boardWords.handOverTo}</h2>
      {handing.isAllowed ? null : <p className="text-fine text-ink-2 m-0">{handing.why}</p>}
      {handing.isAllowed && candidates.length === 0 ? (
        <p className="text-fine text-ink-2 m-0">{boardWords.noCandidate}</p>
      ) : null}
      {candidates.map((colleague) => (
        <DropPlace
          key={colleague.id}
          place={placeOfMember(colleague.id)}
          title={
            <span className="flex justify-between gap-2">
              {colleague.name} <span className="text-fine text-ink-3 figures">{inHand(colleague.id)}</span>
            </span>
          }
          effect={boardWords.handsTo(colleague.name, row.milestone.title, from)}
        />
      ))}
    </section>
  );
}
