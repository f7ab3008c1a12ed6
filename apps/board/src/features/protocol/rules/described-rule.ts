/** A milestone's rule told in words, part by part: what is read, searched, printed and compared. */
import type { EvidenceField, MilestoneRule, Protocol } from '@weftway/pathway/protocol';
import { laneNames } from '@weftway/team/lanes';
import { findingWords } from '../../../words/findings.ts';
import {
  clockWords,
  conditionWords,
  protocolWords,
  signersWords,
  spanWords,
  windowWords,
  type TitleOf,
} from '../../../words/protocol.ts';

export type PartName = keyof typeof protocolWords.rule;

export interface DescribedPart {
  readonly name: PartName;
  readonly items: readonly string[];
}

const words = protocolWords;

export const titlesOf = (protocol: Protocol): TitleOf => {
  const titles = new Map(protocol.milestones.map((rule) => [rule.id, rule.title]));
  return (id) => titles.get(id) ?? id;
};

type Prerequisite = MilestoneRule['prerequisites'][number];

const prerequisite = (need: Prerequisite, protocol: Protocol, titleOf: TitleOf): string => {
  const { result } = need;
  const asked = protocol.milestones
    .find((rule) => rule.id === need.milestone)
    ?.evidence.find((field) => field.name === result?.field);
  return (
    [
      titleOf(need.milestone),
      ...(need.gap === undefined ? [] : [words.gap(need.gap)]),
      ...(need.freshFor === undefined ? [] : [words.fresh(need.freshFor)]),
      ...(result === undefined ? [] : [words.demand(asked?.label ?? result.field, result.oneOf)]),
      ...(need.when === undefined ? [] : [words.onlyWhen(conditionWords(need.when, titleOf))]),
      ...(need.secondName === true ? [words.secondName] : []),
    ].join(', ') + (need.note === undefined ? '' : `. ${need.note}`)
  );
};

const repeat = (one: MilestoneRule['repeats'][number], titleOf: TitleOf): string => {
  const window = windowWords(one.window);
  const how =
    one.clock !== undefined
      ? words.repeatClock(window, clockWords(one.clock, titleOf))
      : one.byAge === true
        ? words.repeatAge(window)
        : words.repeatAgain(window);
  const ends = (one.until ?? []).map((name) =>
    /^[A-Z]/.test(name) ? `“${titleOf(name)}”` : findingWords(name).toLowerCase(),
  );
  return [
    how,
    words.agesBetween(one.ageFrom ?? null, one.ageTo ?? null),
    one.when === undefined ? '' : words.onlyWhen(conditionWords(one.when, titleOf)),
    ends.length === 0 ? '' : words.until(ends),
  ]
    .filter((text) => text !== '')
    .join('; ');
};

const field = (one: EvidenceField): string =>
  words.field(
    one.label,
    [
      one.unit ?? words.fieldKinds[one.kind] ?? '',
      (one.choices ?? []).join(', '),
      one.likely === undefined ? '' : words.likely(one.likely[0], one.likely[1]),
      one.isPrivate === true ? words.privateField : '',
    ]
      .filter((text) => text !== '')
      .join('; '),
  );

const raises = (rule: MilestoneRule): string[] =>
  rule.raises.map((raise) =>
    words.raise(
      raise.finding,
      rule.evidence.find((one) => one.name === raise.field)?.label ?? raise.field,
      raise.oneOf,
    ),
  );

const details = (rule: MilestoneRule): string[] => [
  ...(rule.perSide ? [words.details.perSide] : []),
  ...(rule.isOperation ? [words.details.isOperation] : []),
  ...(rule.followsRoot === undefined ? [] : [words.details.followsRoot]),
];

const waived = (rule: MilestoneRule): string[] => [
  ...rule.waivedWhen,
  words.familyChoice,
  ...(rule.waiverNeeds === undefined ? [] : [words.waiverNeeds(rule.waiverNeeds.map(signersWords))]),
];

const forWhom = (rule: MilestoneRule, titleOf: TitleOf): string[] => [
  rule.appliesText,
  ...(rule.applies === undefined ? [] : [words.onPath(conditionWords(rule.applies, titleOf))]),
];

/** Every part of the rule that says something. */
export const describeRule = (rule: MilestoneRule, protocol: Protocol, titleOf: TitleOf): DescribedPart[] => {
  const needs = (type: Prerequisite['type']) =>
    rule.prerequisites.filter((one) => one.type === type).map((one) => prerequisite(one, protocol, titleOf));
  const parts: [PartName, readonly string[]][] = [
    ['name', [rule.title]],
    ['plain', [rule.plain]],
    ['lane', [laneNames[rule.lane]]],
    ['kind', [words.kinds[rule.kind]]],
    ['counted', [clockWords(rule.clock, titleOf)]],
    ['opens', [spanWords(rule.window.earliest)]],
    ['aim', [spanWords(rule.window.target)]],
    ['closes', [spanWords(rule.window.latest)]],
    ['closing', [words.lastDays(rule.closingDays)]],
    ['forWhom', forWhom(rule, titleOf)],
    [
      'variants',
      rule.variants.map((one) => words.variant(conditionWords(one.when, titleOf), windowWords(one.window), one.note)),
    ],
    ['gates', needs('gate')],
    ['checks', needs('check')],
    ['soft', needs('soft')],
    ['repeats', rule.repeats.map((one) => repeat(one, titleOf))],
    ['catchUp', [rule.catchUp === undefined ? words.noCatchUp : words.catchUp(rule.catchUp[0], rule.catchUp[1])]],
    ['lapse', rule.lapse === undefined ? [] : [words.lapses(rule.lapse.after)]],
    ['claims', [signersWords(rule.mayClaim)]],
    ['signs', rule.signatures.map((one) => words.signature(one.label, one.meaning, signersWords(one.disciplines)))],
    ['evidence', rule.evidence.map(field)],
    ['raises', raises(rule)],
    ['waived', waived(rule)],
    ['late', [rule.lateMeans]],
    ['moves', rule.moves.map(titleOf)],
    ['details', details(rule)],
    [
      'sources',
      rule.sources.length === 0
        ? [words.commonPractice]
        : rule.sources.map((source) => `[${source}] ${protocol.sources[source] ?? ''}`),
    ],
  ];
  return parts
    .filter(([, items]) => items.some((item) => item !== ''))
    .map(([name, items]) => ({ name, items: items.filter((item) => item !== '') }));
};
