import { memo } from 'react';
import type { MilestoneRule } from '@weftway/pathway/protocol';
import { ChevronIcon } from '../../../ui/icons.tsx';
import { clockWords, protocolWords, signersWords, windowWords, type TitleOf } from '../../../words/protocol.ts';
import type { DescribedPart } from './described-rule.ts';

interface RuleEntryProps {
  readonly rule: MilestoneRule;
  readonly titleOf: TitleOf;
  readonly isOpen: boolean;
  readonly onToggle: (id: string) => void;
  /** Told only while it is open. */
  readonly parts: readonly DescribedPart[];
}

/** Parts that the first lines say already. */
const saidAbove: readonly string[] = ['name', 'lane', 'kind', 'opens', 'aim', 'closes', 'counted'];

const firstLine = (rule: MilestoneRule, titleOf: TitleOf): string =>
  [
    windowWords(rule.window),
    protocolWords.countedFrom(clockWords(rule.clock, titleOf)),
    protocolWords.signedBy(rule.signatures.map((one) => signersWords(one.disciplines)).join(' and ')),
  ].join(' · ');

/** One milestone: its window and who signs it; opened, its whole rule. The address `#SURG-03` leads here. */
export const RuleEntry = memo(function RuleEntry({ rule, titleOf, isOpen, onToggle, parts }: RuleEntryProps) {
  return (
    <li id={rule.id} className="border-hair scroll-mt-20 break-inside-avoid border-t py-2">
      <h3 className="m-0">
        <button
          type="button"
          data-rule=""
          aria-expanded={isOpen}
          onClick={() => onToggle(rule.id)}
          className="text-body text-ink flex min-h-6 w-full items-baseline gap-2 rounded text-left font-semibold hover:underline max-sm:min-h-11 max-sm:items-center"
        >
          <span className={`no-print text-ink-2 self-center ${isOpen ? '' : '-rotate-90'}`}>
            <ChevronIcon size={12} />
          </span>
          <span>{rule.title}</span>
          <span className="text-small text-ink-3 figures font-normal whitespace-nowrap">{rule.id}</span>
          <span className="text-small text-ink-3 font-normal">{protocolWords.kinds[rule.kind]}</span>
        </button>
      </h3>
      <p className="text-small text-ink-2 m-0 pl-5">{firstLine(rule, titleOf)}</p>
      {isOpen ? (
        <dl className="m-0 mt-2 grid grid-cols-[10rem_minmax(0,72ch)] gap-x-4 gap-y-1.5 pl-5 max-sm:grid-cols-1 max-sm:gap-y-0.5">
          {parts
            .filter((part) => !saidAbove.includes(part.name))
            .map((part) => (
              <div key={part.name} className="contents">
                <dt className="text-small text-ink-2 max-sm:pt-1.5">{protocolWords.rule[part.name]}</dt>
                <dd
                  className={`text-body m-0 ${part.name === 'evidence' && part.items.length > 6 ? 'gap-x-6 sm:columns-2' : ''}`}
                >
                  {part.items.map((item) => (
                    <div key={item} className="break-inside-avoid">
                      {item}
                    </div>
                  ))}
                </dd>
              </div>
            ))}
        </dl>
      ) : null}
    </li>
  );
});
