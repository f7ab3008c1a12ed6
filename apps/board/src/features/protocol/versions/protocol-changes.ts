/** What differs between two versions, in the same words in which the rules are read. */
import type { MilestoneRule, Protocol } from '@weftway/pathway/protocol';
import { protocolWords } from '../../../words/protocol.ts';
import { describeRule, titlesOf } from '../rules/described-rule.ts';
import type { DescribedPart } from '../rules/described-rule.ts';

export interface PartChange {
  readonly label: string;
  /** What is no longer said. */
  readonly before: readonly string[];
  /** What is said now. */
  readonly after: readonly string[];
}

export interface ProtocolChange {
  /** Milestone id; null for the settings and the list of sources. */
  readonly id: string | null;
  readonly title: string;
  readonly kind: 'added' | 'removed' | 'changed';
  readonly parts: readonly PartChange[];
}

const without = (items: readonly string[], others: readonly string[]): string[] =>
  items.filter((item) => !others.includes(item));

const partChange = (label: string, before: readonly string[], after: readonly string[]): PartChange[] => {
  const change = { label, before: without(before, after), after: without(after, before) };
  return change.before.length === 0 && change.after.length === 0 ? [] : [change];
};

const itemsOf = (parts: readonly DescribedPart[], name: string): readonly string[] =>
  parts.find((part) => part.name === name)?.items ?? [];

/** A rule that says the same differs only in its sources, which have a part of their own. */
const ruleChange = (before: MilestoneRule, after: MilestoneRule, from: Protocol, to: Protocol): ProtocolChange[] => {
  if (JSON.stringify(before) === JSON.stringify(after)) return [];
  const [old, now] = [describeRule(before, from, titlesOf(from)), describeRule(after, to, titlesOf(to))];
  const names = [...new Set([...old, ...now].map((part) => part.name))];
  const parts = names.flatMap((name) => partChange(protocolWords.rule[name], itemsOf(old, name), itemsOf(now, name)));
  return parts.length === 0 ? [] : [{ id: after.id, title: after.title, kind: 'changed', parts }];
};

const settingsText = ({ settings }: Protocol): string[] => [
  protocolWords.offersMolding(settings.offersMolding),
  protocolWords.moldingClock(settings.moldingClock),
  protocolWords.graftBounds(settings.graftRootLower, settings.graftRootUpper),
];

const sourcesText = ({ sources }: Protocol): string[] =>
  Object.entries(sources).map(([name, text]) => `[${name}] ${text}`);

const wholeChange = (title: string, before: readonly string[], after: readonly string[]): ProtocolChange[] => {
  const parts = partChange('', before, after);
  return parts.length === 0 ? [] : [{ id: null, title, kind: 'changed', parts }];
};

/** Settings first, then the milestones in the order of the later version, then those that went, then sources. */
export const protocolChanges = (from: Protocol, to: Protocol): ProtocolChange[] => {
  const old = new Map(from.milestones.map((rule) => [rule.id, rule]));
  const kept = new Set(to.milestones.map((rule) => rule.id));
  return [
    ...(from.name === to.name ? [] : wholeChange(protocolWords.proposal.name, [from.name], [to.name])),
    ...wholeChange(protocolWords.settingsPart, settingsText(from), settingsText(to)),
    ...to.milestones.flatMap((rule): ProtocolChange[] => {
      const before = old.get(rule.id);
      return before === undefined
        ? [{ id: rule.id, title: rule.title, kind: 'added', parts: [] }]
        : ruleChange(before, rule, from, to);
    }),
    ...from.milestones
      .filter((rule) => !kept.has(rule.id))
      .map((rule): ProtocolChange => ({ id: rule.id, title: rule.title, kind: 'removed', parts: [] })),
    ...wholeChange(protocolWords.sourcesPart, sourcesText(from), sourcesText(to)),
  ];
};
