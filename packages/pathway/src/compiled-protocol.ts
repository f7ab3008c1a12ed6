/**
 * A protocol made ready for reckoning: spans as integers, conditions as functions, milestones as numbers.
 * Made once for each protocol object and remembered with it.
 */
import { span, type Span } from '@weftway/calendar/span';
import { compileCondition, numberOfFact, type FactNames, type FactTest } from './compile-condition.ts';
import { fraction, type Fraction } from './fraction.ts';
import type { MilestoneRule, Protocol } from './protocol.ts';

export interface SpanWindow {
  readonly earliest: Span;
  readonly target: Span;
  readonly latest: Span;
}

export interface CompiledWindow {
  readonly window: SpanWindow;
  readonly texts: MilestoneRule['window'];
  readonly note?: string;
}

export interface CompiledNeed {
  readonly index: number;
  /** The milestone that has this need. */
  readonly ownerId: string;
  /** The need is kept for each operation, under the key of the operation. */
  readonly isForOperation: boolean;
  readonly rule: MilestoneRule['prerequisites'][number];
  readonly gap: Span | null;
  readonly freshFor: Span | null;
  readonly when: FactTest | null;
  /** Whether a completion moves the opening: freshness alone never does, a gap always does. */
  readonly movesDates: boolean;
}

export interface CompiledRepeat extends CompiledWindow {
  readonly rule: MilestoneRule['repeats'][number];
  readonly when: FactTest | null;
  readonly ageFrom: Span | null;
  readonly ageTo: Span | null;
  /** No other interval begins at `ageTo`, so a visit on that very day still belongs here. */
  readonly isAgeToIncluded: boolean;
  readonly byAge: boolean;
  /** Milestone whose completion this occurrence counts from, else -1. */
  readonly eventIndex: number;
  readonly until: readonly Ending[];
}

/** What ends a milestone: another milestone signed or waived, or a fact. */
export interface Ending {
  readonly name: string;
  readonly index: number;
  readonly fact: number;
}

export interface CompiledMilestone {
  readonly index: number;
  readonly rule: MilestoneRule;
  readonly applies: FactTest | null;
  /** The same with conditions other than anatomy and findings taken as given. */
  readonly appliesGiven: FactTest | null;
  readonly window: SpanWindow;
  /** The window for every child to whom no variant applies. */
  readonly plain: CompiledWindow;
  readonly variants: readonly (CompiledWindow & { readonly when: FactTest; readonly note: string })[];
  readonly repeatKind: 'none' | 'intervals' | 'bands' | 'around-event';
  readonly clockFrom: MilestoneRule['clock']['from'];
  /** Milestone of an event or booking clock, else -1. */
  readonly clockIndex: number;
  /** Number of the finding of a finding clock, else -1. */
  readonly clockFinding: number;
  readonly gates: readonly CompiledNeed[];
  /** Gates first, then checks and soft links. */
  readonly needs: readonly CompiledNeed[];
  readonly repeats: readonly CompiledRepeat[];
  readonly endings: readonly Ending[];
  readonly moves: readonly string[];
  readonly source: string;
}

export interface CompiledProtocol {
  readonly protocol: Protocol;
  readonly names: FactNames;
  readonly milestones: readonly CompiledMilestone[];
  readonly indexOf: ReadonlyMap<string, number>;
  /** Days for which a fitness check stays good. */
  readonly fitnessFor: Span;
  /** Facts that hold once a milestone is completed, by number of the milestone. */
  readonly factsOfDone: readonly (readonly number[])[];
  /** Numbers of the milestones that follow the canine root, -1 where there is none. */
  readonly rootMilestones: Readonly<Record<'tracking' | 'readiness' | 'graft', number>>;
  readonly rootLower: Fraction;
  readonly rootUpper: Fraction;
  /** Milestones of which another asks that they be fresh or good. */
  readonly renewable: ReadonlySet<string>;
}

/** What must be fresh or good when another milestone is done can be recorded again; operations are never repeated so. */
function renewableIds(protocol: Protocol): Set<string> {
  const operations = new Set(protocol.milestones.filter((rule) => rule.isOperation).map((rule) => rule.id));
  const asked = protocol.milestones.flatMap((rule) =>
    rule.prerequisites.filter((need) => need.freshFor !== undefined || need.result !== undefined),
  );
  return new Set(asked.map((need) => need.milestone).filter((id) => !operations.has(id)));
}

/** The check that every operation has for itself. */
const fitnessCheck = 'CARE-04';

const remembered = new WeakMap<Protocol, CompiledProtocol>();

/** The compiled form of a protocol, made at the first asking and remembered by object identity. */
export function compileProtocol(protocol: Protocol): CompiledProtocol {
  const known = remembered.get(protocol);
  if (known) return known;
  const compiled = compile(protocol);
  remembered.set(protocol, compiled);
  return compiled;
}

/** Items that end unsigned when another milestone is signed, because nothing is left to do (molding after lip repair). */
const endedBySigning: Readonly<Record<string, string>> = {
  'MOLD-04': 'SURG-01',
  'MOLD-05': 'SURG-01',
  'MOLD-06': 'SURG-01',
};

/** Facts that a completed milestone stands for. */
const factsOfCompletion: Readonly<Record<string, readonly string[]>> = {
  // An eye check rules nothing out until its record says so.
  'GEN-02': ['stickler_not_excluded'],
  'MOLD-03': ['molding_started'],
  'SPCH-06': ['speech_surgery_done'],
  'ORTH-05': ['graft_done'],
  'EAR-07': ['tubes'],
};

function compile(protocol: Protocol): CompiledProtocol {
  const names: FactNames = new Map();
  const indexOf = new Map(protocol.milestones.map((rule, index) => [rule.id, index]));
  const milestones = protocol.milestones.map((rule, index) => compileMilestone(protocol, rule, index, names, indexOf));
  const fitness = protocol.milestones
    .flatMap((rule) => rule.prerequisites)
    .find((need) => need.milestone === fitnessCheck);
  const factsOfDone = protocol.milestones.map((rule) =>
    [`signed:${rule.id}`, ...(factsOfCompletion[rule.id] ?? [])].flatMap((name) => names.get(name) ?? []),
  );
  const following = (kind: string): number => protocol.milestones.findIndex((rule) => rule.followsRoot === kind);
  return {
    protocol,
    names,
    milestones,
    indexOf,
    fitnessFor: span(fitness?.freshFor ?? '30d'),
    renewable: renewableIds(protocol),
    factsOfDone,
    rootMilestones: { tracking: following('tracking'), readiness: following('readiness'), graft: following('graft') },
    rootLower: fraction(protocol.settings.graftRootLower),
    rootUpper: fraction(protocol.settings.graftRootUpper),
  };
}

function compileMilestone(
  protocol: Protocol,
  rule: MilestoneRule,
  index: number,
  names: FactNames,
  indexOf: ReadonlyMap<string, number>,
): CompiledMilestone {
  const until = rule.repeats.flatMap((repeat) => repeat.until ?? []);
  const never = until.map((name) => `signed:${name}`);
  const test = (given: boolean): FactTest | null =>
    rule.applies === undefined ? null : compileCondition(rule.applies, names, { given, never });
  const needs = rule.prerequisites.map((need) => compileNeed(rule.id, need, names, indexOf));
  const gates = needs.filter((need) => need.rule.type === 'gate');
  const endedBy = endedBySigning[rule.id];
  const corrects =
    rule.lane === 'molding' && protocol.settings.moldingClock === 'corrected' && rule.clock.from === 'birth';
  return {
    index,
    rule,
    applies: test(false),
    appliesGiven: test(true),
    window: spanWindow(rule.window),
    variants: rule.variants.map((variant) => ({
      when: compileCondition(variant.when, names),
      window: spanWindow(variant.window),
      texts: variant.window,
      note: variant.note,
    })),
    plain: { window: spanWindow(rule.window), texts: rule.window },
    repeatKind: repeatKind(rule),
    clockFrom: corrects ? 'corrected' : rule.clock.from,
    clockIndex: 'milestone' in rule.clock ? (indexOf.get(rule.clock.milestone) ?? -1) : -1,
    clockFinding: 'finding' in rule.clock ? numberOfFact(names, rule.clock.finding) : -1,
    gates,
    needs: [...gates, ...needs.filter((need) => need.rule.type !== 'gate')],
    repeats: rule.repeats.map((repeat) => compileRepeat(repeat, rule.repeats, names, indexOf)),
    endings: endedBy === undefined ? [] : [ending(endedBy, names, indexOf)],
    moves: dependants(protocol, rule),
    source: `Protocol ${String(protocol.version)}, ${rule.id}${rule.sources.length > 0 ? ` [${rule.sources.join('][')}]` : ''}`,
  };
}

function repeatKind(rule: MilestoneRule): CompiledMilestone['repeatKind'] {
  if (rule.repeats.length === 0) return 'none';
  if (rule.repeats.some((repeat) => repeat.clock !== undefined)) return 'around-event';
  return rule.repeats.every((repeat) => repeat.byAge === true) ? 'bands' : 'intervals';
}

function dependants(protocol: Protocol, rule: MilestoneRule): string[] {
  const found = new Set(rule.moves);
  for (const other of protocol.milestones) {
    const counts = 'milestone' in other.clock && other.clock.milestone === rule.id;
    if (counts || other.prerequisites.some((need) => need.milestone === rule.id)) found.add(other.id);
  }
  found.delete(rule.id);
  return [...found];
}

function compileNeed(
  ownerId: string,
  need: MilestoneRule['prerequisites'][number],
  names: FactNames,
  indexOf: ReadonlyMap<string, number>,
): CompiledNeed {
  const gap = need.gap === undefined ? null : span(need.gap);
  const hasGap = gap !== null && (gap.months !== 0 || gap.days !== 0);
  return {
    index: indexOf.get(need.milestone) ?? -1,
    ownerId,
    isForOperation: need.milestone === fitnessCheck,
    rule: need,
    gap,
    freshFor: need.freshFor === undefined ? null : span(need.freshFor),
    when: need.when === undefined ? null : compileCondition(need.when, names),
    movesDates: need.freshFor === undefined || hasGap,
  };
}

function compileRepeat(
  repeat: MilestoneRule['repeats'][number],
  all: MilestoneRule['repeats'],
  names: FactNames,
  indexOf: ReadonlyMap<string, number>,
): CompiledRepeat {
  const begins = (at: string): boolean => all.some((other) => other.byAge !== true && other.ageFrom === at);
  return {
    rule: repeat,
    window: spanWindow(repeat.window),
    texts: repeat.window,
    when: repeat.when === undefined ? null : compileCondition(repeat.when, names),
    ageFrom: repeat.ageFrom === undefined ? null : span(repeat.ageFrom),
    ageTo: repeat.ageTo === undefined ? null : span(repeat.ageTo),
    isAgeToIncluded: repeat.ageTo !== undefined && !begins(repeat.ageTo) && all.some((other) => other.byAge === true),
    byAge: repeat.byAge === true,
    eventIndex: repeat.clock && 'milestone' in repeat.clock ? (indexOf.get(repeat.clock.milestone) ?? -1) : -1,
    until: (repeat.until ?? []).map((name) => ending(name, names, indexOf)),
  };
}

function ending(name: string, names: FactNames, indexOf: ReadonlyMap<string, number>): Ending {
  const index = indexOf.get(name) ?? -1;
  return { name, index, fact: index >= 0 ? -1 : numberOfFact(names, name) };
}

function spanWindow(window: { earliest: string; target: string; latest: string }): SpanWindow {
  return { earliest: span(window.earliest), target: span(window.target), latest: span(window.latest) };
}
