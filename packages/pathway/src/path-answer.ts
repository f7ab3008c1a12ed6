/**
 * Answers one case of the `path` command: facts from the case, one plan, and for every milestone on or off the path its
 * clinical word and dates.
 */
import { fromEpochDay, type PlainDate } from '@weftway/calendar/plain-date';
import { cleftAnatomy } from './cleft-anatomy.ts';
import type { PathCase, PathChild } from './path-case.ts';
import type { Completion, PathwayFacts, RootReading, Side } from './pathway-facts.ts';
import type { ClinicalStatus } from './pathway-plan.ts';
import type { Row } from './planning.ts';
import { keyOf, planRows, type PlannedRows } from './plan-rows.ts';
import type { MilestoneRule, Protocol } from './protocol.ts';
import { clinicalStatus } from './state-of-milestone.ts';

/** Clinical word, then earliest, target and latest where there is a window. */
export type Answer = readonly [ClinicalStatus, ...PlainDate[]];

export interface PathAnswer {
  readonly example?: number | string;
  readonly as_of: PlainDate;
  readonly got: Readonly<Record<string, Answer>>;
}

/** Milestones named in a case that the protocol does not have. */
export function unknownMilestones(protocol: Protocol, one: PathCase): string[] {
  const { child } = one;
  const known = new Set(protocol.milestones.map((rule) => rule.id));
  const named = [child.done, child.partial, child.held, child.waived, one.expect ?? {}].flatMap((record) =>
    Object.keys(record),
  );
  const all = [...named, ...child.unverified, ...(one.ask ?? []), ...(child.ask ?? [])];
  return [...new Set(all.filter((key) => !known.has(idOf(key))))];
}

/** Plans a case. Nothing is stored; the answer depends on the case and the protocol alone. */
export function answerPathCase(protocol: Protocol, one: PathCase): PathAnswer {
  const own = withSettings(protocol, one);
  const asked = one.ask ?? one.child.ask ?? Object.keys(one.expect ?? {});
  const planned = planRows(own, factsOfCase(own, one), one.as_of, {
    reasons: false,
    given: givenMilestones(own, asked),
    unstatedResultsAreGood: true,
  });
  const got: Record<string, Answer> = {};
  for (const row of planned.rows) got[keyOf(planned, row)] = answerOf(planned, row);
  for (const key of asked) {
    const row = got[key] === undefined ? rowForKey(planned, key) : undefined;
    if (row) got[key] = answerOf(planned, row);
  }
  return { ...(one.example === undefined ? {} : { example: one.example }), as_of: one.as_of, got };
}

function withSettings(protocol: Protocol, one: PathCase): Protocol {
  const { settings } = one;
  if (!settings) return protocol;
  const given = Object.fromEntries(Object.entries(settings).filter(([, value]) => value !== undefined));
  return { ...protocol, settings: { ...protocol.settings, ...given } };
}

function answerOf(planned: PlannedRows, row: Row): Answer {
  const status = clinicalStatus(planned.planning, row, planned.planning.child.today);
  const { hasWindow, earliest, target, latest } = row.draft;
  if (!hasWindow || status === 'not_applicable' || status === 'not_started') return [status];
  return [status, fromEpochDay(earliest), fromEpochDay(target), fromEpochDay(latest)];
}

/** The row meant by a key that is not printed: a full key of a single row, or a plain id of several (the one still open). */
function rowForKey(planned: PlannedRows, key: string): Row | undefined {
  const rows = planned.rows.filter((row) => row.milestone.rule.id === idOf(key));
  if (key.includes(':')) {
    const suffix = key.slice(key.indexOf(':') + 1);
    return rows.find((row) => row.operation === suffix || row.side === suffix);
  }
  return rows.find((row) => row.fixed === null && row.offPath === null) ?? rows[rows.length - 1];
}

function idOf(key: string): string {
  return key.split(':')[0] ?? key;
}

/** The asked milestones and, so that they can wait for them, the gates before them. */
function givenMilestones(protocol: Protocol, asked: readonly string[]): Set<string> {
  const rules = new Map(protocol.milestones.map((rule) => [rule.id, rule]));
  const given = new Set<string>();
  const add = (id: string): void => {
    if (given.has(id)) return;
    given.add(id);
    for (const need of rules.get(id)?.prerequisites ?? []) {
      const isSwitchedByGate = need.when !== undefined && need.when === rules.get(need.milestone)?.applies;
      if (need.type === 'gate' && !isSwitchedByGate) add(need.milestone);
    }
  };
  for (const key of asked) add(idOf(key));
  return given;
}

function factsOfCase(protocol: Protocol, one: PathCase): PathwayFacts {
  const { child, as_of: asOf } = one;
  const findings = [
    ...Object.entries(child.trig).map(([name, on]) => ({ name, on, isLate: false })),
    ...Object.entries(child.found).map(([name, on]) => ({ name, on, isLate: true })),
  ];
  return {
    birth: child.dob ?? null,
    due: child.due ?? null,
    isBirthEstimated: child.dob_estimated === true || child.dob_estimated === 'yes',
    gestation: child.ga ? { weeks: child.ga[0], days: child.ga[1] } : null,
    sex: child.sex,
    cleft: child.code,
    flags: child.flags,
    teamStart: child.team_start ?? null,
    transferredOn: child.transferred ?? null,
    findings,
    completions: completionsOfCase(protocol, one),
    parts: Object.keys(child.partial).map((milestone) => ({ milestone, part: 'first', on: asOf, kind: 'signed' })),
    waivers: Object.entries(child.waived).map(([milestone, { reason, on }]) => ({
      milestone,
      reason,
      on: on ?? asOf,
      kind: 'waived',
    })),
    holds: Object.entries(child.held).map(([milestone, { review, on }]) => ({
      milestone,
      on: on ?? asOf,
      reviewOn: review,
      reason: '',
    })),
    bookings: Object.entries(child.plan).map(([milestone, on]) => ({ milestone, on })),
    roots: rootsOfCase(child),
  };
}

function completionsOfCase(protocol: Protocol, one: PathCase): Completion[] {
  const operations = new Set(protocol.milestones.filter((rule) => rule.isOperation).map((rule) => rule.id));
  return Object.entries(one.child.done).flatMap(([milestone, dates]) => {
    const happened = dates.filter((on) => on <= one.as_of).sort();
    // Only operations wait for a surgeon's confirmation; a visit taken over from another team stands.
    const isUnverified =
      operations.has(idOf(milestone)) &&
      one.child.unverified.some((key) => key === milestone || key === idOf(milestone));
    return happened.map((on, at): Completion => {
      const results = resultsOf(protocol, one.child, idOf(milestone), on, happened.length - 1 - at);
      return { milestone, on, ...(isUnverified ? { isUnverified } : {}), ...(results === null ? {} : { results }) };
    });
  });
}

const goodWords: readonly string[] = [
  'yes',
  'good',
  'ok',
  'clear',
  'pass',
  'passed',
  'safe',
  'fit',
  'with plan',
  'with_plan',
  'none',
];

/** Results stated for a completion; `fromLast` 0 is the latest one, to which a bare word belongs. */
function resultsOf(
  protocol: Protocol,
  child: PathChild,
  id: string,
  on: PlainDate,
  fromLast: number,
): Record<string, string> | null {
  const results: Record<string, string> = {};
  const demands = demandsOn(protocol, id);
  const set = (field: string, word: string): void => {
    for (const demand of demands) if (demand.field === field) results[field] = answerWord(demand.oneOf, word);
  };
  const setBare = (word: string): void => {
    // A bare word about the airway screen means anaesthesia; the plate asks for its own.
    const fields = id === 'CARE-03' ? ['safe_for_anaesthesia'] : demands.map((demand) => demand.field);
    for (const field of fields) set(field, word);
  };
  const stated = child.result[id];
  if (typeof stated === 'string' && fromLast === 0) setBare(stated);
  else if (Array.isArray(stated)) {
    const word = stated[stated.length - 1 - fromLast];
    if (word !== undefined) setBare(word);
  } else if (typeof stated === 'object') {
    for (const [key, word] of Object.entries(stated)) {
      if (key === on) setBare(word);
      else if (fromLast === 0) set(key, word);
    }
  }
  for (const { field } of fromLast === 0 ? demands : []) {
    const word = child.result[`${id}.${field}`] ?? child.result[`${id}:${field}`] ?? child.result[field];
    if (typeof word === 'string') set(field, word);
  }
  return Object.keys(results).length === 0 ? null : results;
}

/** What a word means to a demand: a good word stands for the first good answer, any other refusal is kept apart from it. */
function answerWord(oneOf: readonly string[], word: string): string {
  const plain = word.trim().toLowerCase();
  if (plain === 'no') return 'refused';
  if (oneOf.includes(plain)) return plain;
  return goodWords.includes(plain) ? (oneOf[0] ?? plain) : 'refused';
}

function demandsOn(protocol: Protocol, id: string): NonNullable<MilestoneRule['prerequisites'][number]['result']>[] {
  return protocol.milestones.flatMap((rule) =>
    rule.prerequisites.flatMap((need) => (need.milestone === id && need.result !== undefined ? [need.result] : [])),
  );
}

/** Readings in one list belong to every cleft side; under `R` and `L` to their own. */
function rootsOfCase(child: PathChild): RootReading[] {
  const { roots } = child;
  if (!Array.isArray(roots)) {
    const both: readonly Side[] = ['R', 'L'];
    return both.flatMap((side) => (roots[side] ?? []).map(([on, stage]) => ({ on, stage, side })));
  }
  const { gumSides, notchedSides } = cleftAnatomy(child.code);
  const sides = [...gumSides, ...notchedSides];
  return roots.flatMap(([on, stage]) => sides.map((side) => ({ on, stage, side })));
}
