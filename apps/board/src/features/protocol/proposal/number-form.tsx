import { useState, type ReactNode } from 'react';
import type { MilestoneRule, Protocol } from '@weftway/pathway/protocol';
import { laneNames } from '@weftway/team/lanes';
import { ComboboxField } from '../../../ui/fields/combobox-field.tsx';
import { NumberField } from '../../../ui/fields/number-field.tsx';
import { conditionWords, protocolWords } from '../../../words/protocol.ts';
import { titlesOf } from '../rules/described-rule.ts';
import { pointerOf, withValue } from './draft-protocol.ts';
import { SpanField } from './span-field.tsx';

const words = protocolWords.proposal;

export interface NumberFormProps {
  readonly draft: Protocol;
  readonly onChange: (draft: Protocol) => void;
  /** Messages by the pointer of their place. */
  readonly faults: ReadonlyMap<string, string>;
}

type Step = string | number;

function Group({ title, children }: { readonly title: string; readonly children: ReactNode }) {
  return (
    <fieldset className="m-0 min-w-0 border-0 p-0">
      <legend className="text-body mb-1 p-0 font-semibold">{title}</legend>
      <div className="flex flex-wrap items-start gap-x-4 gap-y-3">{children}</div>
    </fieldset>
  );
}

interface RuleNumbersProps extends NumberFormProps {
  readonly rule: MilestoneRule;
  readonly index: number;
}

function RuleNumbers({ draft, onChange, faults, rule, index }: RuleNumbersProps) {
  const titleOf = titlesOf(draft);
  const set = (path: readonly Step[], value: unknown) =>
    onChange(withValue(draft, ['milestones', index, ...path], value));
  const at = (path: readonly Step[]) => pointerOf(['milestones', index, ...path]);
  const span = (path: readonly Step[], value: string | undefined, label: string, isOptional = false) => (
    <SpanField
      key={at(path)}
      label={label}
      name={at(path)}
      value={value}
      onChange={(next) => set(path, next)}
      error={faults.get(at(path))}
      isOptional={isOptional}
    />
  );
  const days = (path: readonly Step[], value: number, label: string) => (
    <NumberField
      key={at(path)}
      label={label}
      name={at(path)}
      unit={words.days}
      value={value}
      onChange={(next) => set(path, next ?? 0)}
      error={faults.get(at(path))}
    />
  );
  const window = (path: readonly Step[], value: MilestoneRule['window']) => [
    span([...path, 'earliest'], value.earliest, words.earliest),
    span([...path, 'target'], value.target, words.target),
    span([...path, 'latest'], value.latest, words.latest),
  ];
  return (
    <div className="flex flex-col gap-5">
      <Group title={words.window}>
        {window(['window'], rule.window)}
        {days(['closingDays'], rule.closingDays, words.closing)}
      </Group>
      {rule.variants.map((variant, order) => (
        <Group key={order} title={words.variant(conditionWords(variant.when, titleOf))}>
          {window(['variants', order, 'window'], variant.window)}
        </Group>
      ))}
      {rule.repeats.map((repeat, order) => (
        <Group key={order} title={words.repeat(order + 1)}>
          {window(['repeats', order, 'window'], repeat.window)}
        </Group>
      ))}
      {rule.prerequisites.length === 0 ? null : (
        <Group title={words.gaps}>
          {rule.prerequisites.flatMap((need, order) => [
            span(['prerequisites', order, 'gap'], need.gap, words.gapAfter(titleOf(need.milestone)), true),
            ...(need.freshFor === undefined
              ? []
              : [
                  span(
                    ['prerequisites', order, 'freshFor'],
                    need.freshFor,
                    words.freshness(titleOf(need.milestone)),
                    true,
                  ),
                ]),
          ])}
        </Group>
      )}
      {rule.catchUp === undefined ? null : (
        <Group title={words.catchUp}>
          {days(['catchUp', 0], rule.catchUp[0], words.catchTarget)}
          {days(['catchUp', 1], rule.catchUp[1], words.catchLatest)}
        </Group>
      )}
      {faults.get(pointerOf(['milestones', index, 'prerequisites'])) === undefined ? null : (
        <p role="alert" className="text-label text-madder m-0">
          {faults.get(pointerOf(['milestones', index, 'prerequisites']))}
        </p>
      )}
      {faults.get(pointerOf(['milestones', index, 'catchUp'])) === undefined ? null : (
        <p role="alert" className="text-label text-madder m-0">
          {faults.get(pointerOf(['milestones', index, 'catchUp']))}
        </p>
      )}
    </div>
  );
}

/** The numbers that teams set most: windows, closing days, gaps. One milestone at a time. */
export function NumberForm({ draft, onChange, faults }: NumberFormProps) {
  const [chosen, setChosen] = useState<string | null>(null);
  const index = draft.milestones.findIndex((rule) => rule.id === chosen);
  const rule = draft.milestones[index];
  const options = draft.milestones.map((one) => ({
    value: one.id,
    label: `${one.title} (${one.id})`,
    detail: laneNames[one.lane],
  }));
  return (
    <div className="flex flex-col gap-5">
      <div className="max-w-120">
        <ComboboxField
          label={words.milestone}
          hint={words.milestoneHint}
          value={chosen}
          onChange={setChosen}
          options={options}
        />
      </div>
      {rule === undefined ? (
        <p className="text-body text-ink-2 m-0">{words.chooseFirst}</p>
      ) : (
        <RuleNumbers key={rule.id} draft={draft} onChange={onChange} faults={faults} rule={rule} index={index} />
      )}
    </div>
  );
}
