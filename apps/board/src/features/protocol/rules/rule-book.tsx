import { useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { MilestoneRule, Protocol } from '@weftway/pathway/protocol';
import { laneNames, lanes } from '@weftway/team/lanes';
import { Button } from '../../../ui/actions/button.tsx';
import { TextField } from '../../../ui/fields/text-field.tsx';
import { EmptyState } from '../../../ui/notices/empty-state.tsx';
import { Section } from '../../../ui/page/section.tsx';
import { protocolWords } from '../../../words/protocol.ts';
import { describeRule, titlesOf, type DescribedPart } from './described-rule.ts';
import { useOpenRules } from './open-rules.ts';
import { RuleEntry } from './rule-entry.tsx';

interface ToldRule {
  readonly rule: MilestoneRule;
  readonly parts: readonly DescribedPart[];
  /** Everything it says, for the search. */
  readonly text: string;
}

const plainText = (text: string): string => text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase();

const told = (protocol: Protocol): ToldRule[] => {
  const titleOf = titlesOf(protocol);
  return protocol.milestones.map((rule) => {
    const parts = describeRule(rule, protocol, titleOf);
    return {
      rule,
      parts,
      text: plainText([rule.id, rule.shortTitle, ...parts.flatMap((part) => part.items)].join(' ')),
    };
  });
};

const holds = (text: string, asked: string): boolean =>
  plainText(asked)
    .split(/\s+/)
    .every((word) => text.includes(word));

/** Every rule by lane: searched, opened one by one or all, printed whole. */
export function RuleBook({ protocol }: { readonly protocol: Protocol }) {
  const [search, setSearch] = useSearchParams();
  const asked = search.get('q') ?? '';
  const rules = useMemo(() => told(protocol), [protocol]);
  const titleOf = useMemo(() => titlesOf(protocol), [protocol]);
  const { isOpen, toggle, areAllOpen, openAll } = useOpenRules();
  const found = rules.filter((one) => holds(one.text, asked));
  const ask = (text: string) => setSearch(text === '' ? {} : { q: text }, { replace: true, preventScrollReset: true });
  return (
    <div className="flex flex-col gap-6">
      <div className="no-print flex flex-wrap items-end gap-3">
        <div className="w-full max-w-96">
          <TextField
            label={protocolWords.search}
            hint={protocolWords.searchHint}
            type="search"
            value={asked}
            onChange={ask}
          />
        </div>
        <div className="flex flex-wrap items-center gap-3 pb-5">
          <Button onClick={() => openAll(!areAllOpen)}>
            {areAllOpen ? protocolWords.closeAll : protocolWords.openAll}
          </Button>
          <span role="status" className="text-small text-ink-2">
            {protocolWords.found(found.length, rules.length)}
          </span>
        </div>
      </div>
      {found.length === 0 ? (
        <EmptyState
          kind="filter"
          title={protocolWords.nothingFound}
          actions={<Button onClick={() => ask('')}>{protocolWords.clearSearch}</Button>}
        />
      ) : null}
      {lanes.map((lane) => {
        const ofLane = found.filter((one) => one.rule.lane === lane);
        return ofLane.length === 0 ? null : (
          <Section key={lane} title={laneNames[lane]} aside={ofLane.length}>
            <ul className="m-0 list-none p-0">
              {ofLane.map(({ rule, parts }) => (
                <RuleEntry
                  key={rule.id}
                  rule={rule}
                  parts={parts}
                  titleOf={titleOf}
                  isOpen={isOpen(rule.id)}
                  onToggle={toggle}
                />
              ))}
            </ul>
          </Section>
        );
      })}
    </div>
  );
}
