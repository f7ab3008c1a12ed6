import { useEffect, useEffectEvent, useState } from 'react';
import { disciplineNames, disciplines, type Discipline } from '@weftway/team/disciplines';
import { Button } from '../../ui/actions/button.tsx';
import { Segment } from '../../ui/actions/segment.tsx';
import { SelectField } from '../../ui/fields/select-field.tsx';
import { PrintIcon } from '../../ui/icons.tsx';
import { boardWords } from '../../words/board.ts';
import { handsChoices, type BoardFilter, type FilteredBoard } from './board-filter.ts';

interface BoardHeadProps {
  readonly filter: BoardFilter;
  readonly filtered: FilteredBoard;
  readonly onFilter: (filter: BoardFilter) => void;
}

const disciplineChoices = disciplines.map((one) => ({ value: one, label: disciplineNames[one] }));

/** What is looked at, in one line; every choice is in the address. */
export function BoardHead({ filter, filtered, onFilter }: BoardHeadProps) {
  const hands = handsChoices.map((value) => ({
    value,
    label: boardWords.hands[value],
    ...(value === 'everyone' ? {} : { count: filtered.hands[value] }),
  }));
  return (
    <header className="bg-linen border-hair flex flex-wrap items-center justify-between gap-x-4 gap-y-2 border-b px-6 pt-2 pb-2.5 max-sm:px-5">
      <div className="flex flex-wrap items-baseline gap-x-3.5">
        <h1 className="text-page m-0">{boardWords.title}</h1>
        <p role="status" className="text-body text-ink-2 figures m-0">
          {boardWords.sum(filtered.rows.length, filtered.children)}
        </p>
      </div>
      <div className="no-print flex flex-wrap items-center gap-2 max-sm:w-full">
        <FindBox text={filter.text} onText={(text) => onFilter({ ...filter, text })} />
        <div className="w-54 max-sm:w-full max-sm:grow">
          <SelectField<Discipline>
            label={boardWords.lanesOf}
            isLabelHidden
            placeholder={boardWords.everyDiscipline}
            options={disciplineChoices}
            value={filter.discipline ?? ''}
            onChange={(value) => onFilter({ ...filter, discipline: value === '' ? null : value })}
          />
        </div>
        {filtered.sites.length < 2 ? null : (
          <div className="w-32 max-sm:w-full max-sm:grow">
            <SelectField
              label={boardWords.site}
              isLabelHidden
              placeholder={boardWords.everySite}
              options={filtered.sites.map((site) => ({ value: site, label: site }))}
              value={filter.site ?? ''}
              onChange={(value) => onFilter({ ...filter, site: value === '' ? null : value })}
            />
          </div>
        )}
        <Segment
          label={boardWords.whose}
          options={hands}
          value={filter.hands}
          onChange={(value) => onFilter({ ...filter, hands: value })}
        />
        <span className="max-sm:hidden">
          <Button onClick={() => window.print()}>
            <PrintIcon size={14} /> {boardWords.print}
          </Button>
        </span>
      </div>
    </header>
  );
}

interface FindBoxProps {
  readonly text: string;
  readonly onText: (text: string) => void;
}

const settleMs = 150;

/** What is typed shows at once; the board follows when the typing rests. */
function FindBox({ text, onText }: FindBoxProps) {
  const [typed, setTyped] = useState(text);
  const [reported, setReported] = useState(text);
  // The address changed from elsewhere: by the back button, or by a wider view.
  if (text !== reported) {
    setReported(text);
    setTyped(text);
  }
  const report = useEffectEvent(() => {
    setReported(typed);
    onText(typed);
  });
  useEffect(() => {
    if (typed === reported) return;
    const timer = setTimeout(report, settleMs);
    return () => clearTimeout(timer);
  }, [typed, reported]);
  return (
    <input
      type="search"
      aria-label={boardWords.find}
      placeholder={boardWords.find}
      value={typed}
      onChange={(event) => setTyped(event.target.value)}
      className="border-thread-2 bg-bleached text-body min-h-9 w-44 rounded border px-2.5 max-sm:min-h-11 max-sm:w-full"
    />
  );
}
