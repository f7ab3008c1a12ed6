import { useState } from 'react';
import type { PathwayChange } from '@weftway/pathway/what-if';
import { Button } from '../../../ui/actions/button.tsx';
import { NumberField } from '../../../ui/fields/number-field.tsx';
import { RadioField } from '../../../ui/fields/radio-field.tsx';
import { Section } from '../../../ui/page/section.tsx';
import { pathwayWords } from '../../../words/pathway.ts';
import type { ChildPlan } from '../model/child-plan.ts';
import { whatWouldMove, type WhatIfLine } from './what-if-answer.ts';

interface WhatIfProps {
  readonly of: ChildPlan;
  readonly milestone: string;
}

type Kind = 'slip' | 'waive';

/** Asks what would move; nothing is written. */
export function WhatIf({ of, milestone }: WhatIfProps) {
  const words = pathwayWords.whatIf;
  const [kind, setKind] = useState<Kind>('slip');
  const [weeks, setWeeks] = useState<number | null>(4);
  const [lines, setLines] = useState<readonly WhatIfLine[] | null>(null);
  const isSound = kind === 'waive' || (weeks !== null && Number.isInteger(weeks) && weeks >= 1 && weeks <= 104);
  const ask = () => {
    if (!isSound) return;
    const change: PathwayChange = kind === 'waive' ? { kind, milestone } : { kind, milestone, weeks: weeks ?? 1 };
    setLines(whatWouldMove(of, change));
  };
  return (
    <Section title={words.title} level={3}>
      <form
        className="flex flex-col gap-2"
        onSubmit={(event) => {
          event.preventDefault();
          ask();
        }}
      >
        <RadioField
          label={words.kind}
          isLabelHidden
          direction="across"
          value={kind}
          onChange={(value) => {
            setKind(value === 'waive' ? 'waive' : 'slip');
            setLines(null);
          }}
          options={[
            { value: 'slip', label: words.slips },
            { value: 'waive', label: words.waived },
          ]}
        />
        <div className="flex flex-wrap items-end gap-3">
          {kind === 'slip' ? (
            <NumberField
              label={words.weeksLabel}
              unit={words.weeks}
              value={weeks}
              error={isSound ? undefined : words.error}
              onChange={(value) => {
                setWeeks(value);
                setLines(null);
              }}
            />
          ) : null}
          <Button type="submit">{words.ask}</Button>
        </div>
      </form>
      <div role="status">
        {lines === null ? null : (
          <>
            <p className="text-label m-0 pt-1">{lines.length === 0 ? words.nothing : words.would(lines.length)}</p>
            <ul className="text-body m-0 list-none p-0">
              {lines.map((line) => (
                <li key={line.key} className="flex justify-between gap-3 py-0.5">
                  <span>{line.title}</span>
                  <span className="text-ink-2 text-right">{line.text}</span>
                </li>
              ))}
            </ul>
            <p className="text-fine text-ink-3 m-0">{words.notWritten}</p>
          </>
        )}
      </div>
    </Section>
  );
}
