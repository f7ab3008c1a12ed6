import { formatDate } from '@weftway/calendar/format-date';
import type { PlannedMilestone, ReasonStep } from '@weftway/pathway/pathway-plan';
import { useState } from 'react';
import { Segment } from '../../../ui/actions/segment.tsx';
import { TextLink } from '../../../ui/actions/text-link.tsx';
import { Section } from '../../../ui/page/section.tsx';
import { reasonEffect, reasonsWords, reasonText, type Naming, type Which } from '../../../words/reasons.ts';

interface ReckoningProps {
  readonly planned: PlannedMilestone;
  readonly naming: Naming;
  readonly protocolVersion: number;
  /** Published sources of the rule, as the protocol names them. */
  readonly sources: readonly string[];
}

const whiches: readonly Which[] = ['earliest', 'target', 'latest'];

/** Why a date is what it is: each reason left, its effect right, a rule over the total. */
export function Reckoning({ planned, naming, protocolVersion, sources }: ReckoningProps) {
  const [which, setWhich] = useState<Which>('earliest');
  const steps = planned.reasons[which];
  const href = `/protocol/${String(protocolVersion)}#${planned.id}`;
  if (planned.window === null) {
    return (
      <Section title={reasonsWords.title} level={3}>
        <p className="text-body text-ink-2 m-0">{reasonsWords.noDates}</p>
      </Section>
    );
  }
  return (
    <Section
      title={reasonsWords.title}
      level={3}
      aside={
        <Segment
          label={reasonsWords.which}
          options={whiches.map((value) => ({ value, label: reasonsWords.whichNames[value] }))}
          value={which}
          onChange={setWhich}
        />
      }
    >
      <table className="text-body w-full border-collapse text-left">
        <caption className="sr-only">
          {reasonsWords.title}: {reasonsWords.whichNames[which].toLowerCase()}
        </caption>
        <tbody>
          {steps.map((step, at) => (
            <Reason
              key={`${step.rule} ${String(at)}`}
              step={step}
              which={which}
              naming={naming}
              isFirst={at === 0}
              href={href}
            />
          ))}
        </tbody>
        <tfoot>
          <tr className="border-ink border-t-[1.5px] font-semibold">
            <th scope="row" className="py-1 pr-3 font-semibold">
              {reasonsWords.totals[which]}
            </th>
            <td className="figures py-1 text-right whitespace-nowrap">{formatDate(planned.window[which])}</td>
          </tr>
        </tfoot>
      </table>
      {sources.length === 0 ? null : (
        <details className="text-small text-ink-2">
          <summary className="cursor-pointer rounded">{reasonsWords.sourcesCount(sources.length)}</summary>
          <ul className="m-0 list-none p-0 pt-1">
            {sources.map((source) => (
              <li key={source} className="py-0.5">
                {source}
              </li>
            ))}
          </ul>
        </details>
      )}
      <p className="text-fine text-ink-3 m-0">{reasonsWords.calculation}</p>
    </Section>
  );
}

/** "Protocol 1, SURG-03"; the numbers of its sources are spelled out below. */
const ruleName = (source: string): string => source.replace(/ \[.*$/, '');

interface ReasonProps {
  readonly step: ReasonStep;
  readonly which: Which;
  readonly naming: Naming;
  readonly isFirst: boolean;
  readonly href: string;
}

function Reason({ step, which, naming, isFirst, href }: ReasonProps) {
  return (
    <tr className="align-baseline">
      <th scope="row" className="py-0.5 pr-3 font-normal">
        {reasonText(step, naming, which)}
        <span className="text-fine block">
          <TextLink to={href}>{ruleName(step.source)}</TextLink>
        </span>
      </th>
      <td className="figures text-ink-2 py-0.5 text-right whitespace-nowrap">{reasonEffect(step, isFirst)}</td>
    </tr>
  );
}
