import { formatDate } from '@weftway/calendar/format-date';
import { laneNames } from '@weftway/team/lanes';
import { Mark } from '../../../marks/mark.tsx';
import { Selvedge } from '../../../ui/page/selvedge.tsx';
import { pathwayWords, stateWord, windowLine } from '../../../words/pathway.ts';
import { childName } from '../head/child-sentence.ts';
import { rowsOf } from '../list/list-rows.ts';
import type { ChildPlan } from '../model/child-plan.ts';
import { missingOf } from '../model/missing-of.ts';
import type { ChildViews } from '../model/milestone-view.ts';

interface PrintPartProps {
  readonly of: ChildPlan;
  readonly views: ChildViews;
  readonly team: string;
  readonly who: string;
}

/** On paper only: what is due and what is missing for it, and the foot of the page. */
export function PrintPart({ of, views, team, who }: PrintPartProps) {
  const rows = rowsOf(views.all, 'now', of.today, null);
  const words = pathwayWords.columns;
  return (
    <div className="hidden px-6 print:block">
      <Selvedge />
      <h2 className="text-head m-0 pt-2">{pathwayWords.printDue}</h2>
      {rows.length === 0 ? <p className="text-body m-0">{pathwayWords.nothingHere}</p> : null}
      <table className="text-body w-full border-collapse text-left">
        <thead>
          <tr className="text-fine">
            <th className="py-1 pr-3 font-normal">{words.state}</th>
            <th className="py-1 pr-3 font-normal">{words.milestone}</th>
            <th className="py-1 pr-3 font-normal">{words.latest}</th>
            <th className="py-1 pr-3 font-normal">{words.owner}</th>
            <th className="py-1 font-normal">{pathwayWords.printMissing}</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((view) => (
            <tr key={view.key} className="border-hair break-inside-avoid border-t align-baseline">
              <td className="py-1 pr-3 whitespace-nowrap">
                <span className="flex items-center gap-1.5">
                  <Mark state={view.planned.state} unowned={view.unowned} size={12} title={null} />
                  {stateWord(view.planned)}
                </span>
              </td>
              <td className="py-1 pr-3">
                {view.title}
                <span className="text-fine block">
                  {laneNames[view.rule.lane]}, {windowLine(view.planned, of.today)}
                </span>
              </td>
              <td className="py-1 pr-3 whitespace-nowrap">
                {view.planned.window === null ? '–' : formatDate(view.planned.window.latest)}
              </td>
              <td className="py-1 pr-3">{view.ownerNames ?? pathwayWords.noOne}</td>
              <td className="py-1">{missingOf(of, view).join(', ')}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <p className="text-fine m-0 pt-4">
        {pathwayWords.printFoot(team, childName(of.pathway.child), formatDate(of.today), who)}
      </p>
    </div>
  );
}
