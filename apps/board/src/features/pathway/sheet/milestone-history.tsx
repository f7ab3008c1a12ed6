import { formatDate } from '@weftway/calendar/format-date';
import { readPlainDate } from '@weftway/calendar/plain-date';
import type { Pathway } from '@weftway/contract/pathway';
import type { PlannedOccurrence } from '@weftway/pathway/pathway-plan';
import { Section } from '../../../ui/page/section.tsx';
import { pathwayWords } from '../../../words/pathway.ts';
import { timeOf } from '../evidence/evidence-form.tsx';

type Entry = Pathway['history'][number];

interface MilestoneHistoryProps {
  readonly entries: readonly Entry[];
  readonly past: readonly PlannedOccurrence[];
}

/** "6 Oct 2026" of an instant, on this computer's clock. */
export const dayOfInstant = (instant: string): string => {
  const day = new Date(instant);
  const iso = `${String(day.getFullYear()).padStart(4, '0')}-${String(day.getMonth() + 1).padStart(2, '0')}-${String(day.getDate()).padStart(2, '0')}`;
  const reading = readPlainDate(iso);
  return reading.kind === 'date' ? formatDate(reading.date) : instant;
};

/** Who did what with this milestone, newest first; then its earlier times. */
export function MilestoneHistory({ entries, past }: MilestoneHistoryProps) {
  const words = pathwayWords.history;
  return (
    <Section title={words.title} level={3}>
      {entries.length === 0 && past.length === 0 ? <p className="text-body text-ink-2 m-0">{words.empty}</p> : null}
      <ul className="text-body m-0 flex list-none flex-col gap-1 p-0">
        {entries
          .toSorted((a, b) => b.seq - a.seq)
          .map((entry) => (
            <li key={entry.seq} className="grid grid-cols-[6.5rem_1fr] gap-2">
              <span className="figures text-ink-2" title={timeOf(entry.at)}>
                {dayOfInstant(entry.at)}
              </span>
              <span>
                {entry.detail === '' ? (words.kinds[entry.kind] ?? entry.kind) : entry.detail}
                {entry.detail.includes(entry.byName) ? null : (
                  <span className="text-ink-2"> {words.by(entry.byName)}</span>
                )}
              </span>
            </li>
          ))}
      </ul>
      {past.length === 0 ? null : (
        <details className="text-body">
          <summary className="cursor-pointer rounded">{words.earlierCount(past.length)}</summary>
          <ul className="m-0 list-none p-0 pt-1">
            {past.toReversed().map((one) => (
              <li key={`${String(one.occurrence)} ${one.on}`} className="figures">
                {words[one.kind](formatDate(one.on))}
              </li>
            ))}
          </ul>
        </details>
      )}
    </Section>
  );
}
