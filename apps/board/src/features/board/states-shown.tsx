import { milestoneStateNames, type MilestoneState } from '@weftway/pathway/milestone-state';
import { LooseEndMark } from '../../marks/legend.tsx';
import { Mark } from '../../marks/mark.tsx';
import { boardWords } from '../../words/board.ts';
import { boardStates } from './board-filter.ts';

interface StatesShownProps {
  readonly shown: ReadonlySet<MilestoneState>;
  readonly counts: ReadonlyMap<MilestoneState, number>;
  readonly onShow: (states: ReadonlySet<MilestoneState>) => void;
}

/** Which states are drawn, with how many there are of each; it is the legend of the marks too. */
export function StatesShown({ shown, counts, onShow }: StatesShownProps) {
  const toggle = (state: MilestoneState) => {
    const next = new Set(shown);
    if (!next.delete(state)) next.add(state);
    onShow(next);
  };
  return (
    <fieldset className="m-0 flex flex-col gap-0.5 border-0 p-0">
      <legend className="text-body mb-1 p-0 font-semibold">{boardWords.statesShown}</legend>
      {boardStates.map((state) => (
        <label
          key={state}
          className="text-small flex min-h-6 cursor-pointer items-center gap-2.5 max-[1179px]:min-h-11"
        >
          <input
            type="checkbox"
            className="accent-ink size-4"
            checked={shown.has(state)}
            onChange={() => toggle(state)}
          />
          <Mark state={state} size={13} title={null} ground="linen" />
          {milestoneStateNames[state]}
          <span className="text-ink-2 figures ml-auto">{counts.get(state) ?? 0}</span>
        </label>
      ))}
      <span className="text-small text-ink-2 flex min-h-6 items-center gap-2.5 pl-6.5">
        <LooseEndMark size={15} /> {boardWords.looseEnd}
      </span>
    </fieldset>
  );
}
