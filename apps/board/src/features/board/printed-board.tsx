import { formatDate } from '@weftway/calendar/format-date';
import { fromEpochDay } from '@weftway/calendar/plain-date';
import { milestoneStateNames } from '@weftway/pathway/milestone-state';
import { Mark } from '../../marks/mark.tsx';
import type { BoardModel } from '../../queries/board-model.ts';
import { boardWords } from '../../words/board.ts';
import { rowsOfStrip, type Strip } from './board-strips.ts';
import { childName, holdersText, timeOf } from './row-words.ts';

/** The board on paper: a plain list, lane by lane, by urgency. */
export function PrintedBoard({ model, strips }: { readonly model: BoardModel; readonly strips: readonly Strip[] }) {
  const { columns } = boardWords;
  return (
    <div data-print="" className="hidden px-1 print:block">
      <p className="text-small">{boardWords.printed(formatDate(fromEpochDay(model.day)))}</p>
      {strips
        .filter((strip) => strip.count > 0)
        .map((strip) => (
          <table key={strip.key} className="text-small mb-4 w-full border-collapse text-left">
            <caption className="text-body py-1 text-left font-semibold">
              {boardWords.laneName(strip.name, strip.count, strip.loose)}
            </caption>
            <thead>
              <tr>
                {[columns.state, columns.child, columns.milestone, columns.time, columns.owner].map((name) => (
                  <th key={name} scope="col" className="text-fine pr-3 font-normal">
                    {name}
                  </th>
                ))}
              </tr>
            </thead>
            <tbody>
              {rowsOfStrip(strip).map((row) => (
                <tr key={row.id} className="border-hair break-inside-avoid border-t">
                  <td className="py-0.5 pr-3 whitespace-nowrap">
                    <Mark state={row.state} unowned={row.isUnowned} size={12} title={null} />{' '}
                    {milestoneStateNames[row.state]}
                  </td>
                  <td className="pr-3">{childName(row)}</td>
                  <td className="pr-3">{row.milestone.title}</td>
                  <td className="figures pr-3 whitespace-nowrap">{timeOf(row, model.day)}</td>
                  <td>{holdersText(row, model)}</td>
                </tr>
              ))}
            </tbody>
          </table>
        ))}
    </div>
  );
}
