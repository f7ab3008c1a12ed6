/**
 * The facts about one child, sorted by milestone and turned into integers for the planner.
 * A fact dated after today has not happened yet and is left out; bookings are plans and stay.
 */
import { correctionDays } from '@weftway/calendar/corrected-age';
import { toEpochDay, type PlainDate } from '@weftway/calendar/plain-date';
import { cleftAnatomy } from './cleft-anatomy.ts';
import type { CompiledProtocol } from './compiled-protocol.ts';
import { fraction, type Fraction } from './fraction.ts';
import type { Completion, Hold, PartCompletion, PathwayFacts, Side, Waiver } from './pathway-facts.ts';

/** A day that never comes, or never was. */
export const never = -1_000_000_000;

/** What is known of one occurrence; `suffix` is the side or the operation behind the colon of its key. */
export interface Dated<T> {
  readonly on: number;
  readonly suffix: string;
  readonly fact: T;
}

export interface RootRecord {
  readonly on: number;
  readonly side: Side;
  readonly stage: Fraction;
}

export interface ChildRecord {
  readonly today: number;
  readonly isBorn: boolean;
  readonly birth: number;
  readonly corrected: number;
  readonly teamStart: number;
  readonly isTransferred: boolean;
  readonly truth: Uint8Array;
  /** Earliest day of each finding, by name. */
  readonly findings: ReadonlyMap<string, number>;
  /** Findings that were made late, oldest first: number of the fact and the day it was found. */
  readonly foundLate: readonly { readonly fact: number; readonly name: string; readonly on: number }[];
  readonly done: readonly (readonly Dated<Completion>[])[];
  readonly waived: readonly (readonly Dated<Waiver>[])[];
  readonly held: readonly (readonly Dated<Hold>[])[];
  readonly parts: readonly (readonly Dated<PartCompletion>[])[];
  readonly booked: readonly (readonly Dated<null>[])[];
  /** A booked operation that is not named. */
  readonly unnamedBooking: number;
  readonly roots: readonly RootRecord[];
  readonly gumSides: readonly Side[];
  readonly hasGumQuestion: boolean;
  readonly facts: PathwayFacts;
}

/** Facts of the body: found late, they start the milestones that they switch on at the day they were found. */
const phenotypes = new Set(['lip', 'gum', 'palate', 'smcp', 'robin', 'airway', 'syndrome']);

const none: readonly never[] = [];

/** Sorts the facts for one day. Throws a RangeError when neither the birth nor the expected date is known. */
export function childRecord(compiled: CompiledProtocol, facts: PathwayFacts, today: PlainDate): ChildRecord {
  const isBorn = facts.birth !== null && facts.birth <= today;
  const base = isBorn ? facts.birth : (facts.due ?? facts.birth);
  if (base === null) throw new RangeError('Neither the date of birth nor the expected date is known.');
  const birth = toEpochDay(base);
  const truth = new Uint8Array(compiled.names.size);
  const setTrue = (name: string): void => {
    const number = compiled.names.get(name);
    if (number !== undefined) truth[number] = 1;
  };
  const findings = new Map<string, number>();
  for (const finding of facts.findings) {
    const on = toEpochDay(finding.on);
    const known = findings.get(finding.name);
    if (finding.on <= today && (known === undefined || on < known)) findings.set(finding.name, on);
  }
  const anatomy = setStatedFacts(compiled, facts, today, truth, findings);
  const foundLate = facts.findings
    .flatMap(({ name, on, isLate }) => {
      const fact = compiled.names.get(name);
      if (fact === undefined || on > today || !(isLate ?? phenotypes.has(name))) return [];
      return [{ fact, name, on: toEpochDay(on) }];
    })
    .sort((left, right) => left.on - right.on);
  const day = today;
  const done = byMilestone(compiled, facts.completions, (one) => one.on <= day);
  countFirstReading(compiled, facts, done);
  setFactsOfDone(compiled, done, truth, setTrue);
  return {
    today: toEpochDay(today),
    isBorn,
    birth,
    corrected: isBorn ? birth + correctionDays(facts.gestation) : birth,
    teamStart: facts.teamStart !== null && facts.teamStart <= today ? toEpochDay(facts.teamStart) : never,
    isTransferred: facts.transferredOn !== null && facts.transferredOn <= today,
    truth,
    findings,
    foundLate,
    done,
    waived: byMilestone(compiled, facts.waivers, (one) => one.on <= day),
    held: byMilestone(compiled, facts.holds, (one) => one.on <= day),
    parts: byMilestone(compiled, facts.parts, (one) => one.on <= day),
    booked: byMilestone(compiled, facts.bookings, null),
    unnamedBooking: unnamedBooking(facts),
    roots: rootRecords(facts, today, anatomy.gumSides),
    gumSides: anatomy.gumSides,
    hasGumQuestion: anatomy.hasGumQuestion,
    facts,
  };
}

function setStatedFacts(
  compiled: CompiledProtocol,
  facts: PathwayFacts,
  today: PlainDate,
  truth: Uint8Array,
  findings: ReadonlyMap<string, number>,
): { gumSides: readonly Side[]; hasGumQuestion: boolean } {
  const anatomy = cleftAnatomy(facts.cleft);
  const isStated = (name: string): boolean => facts.flags.includes(name) || findings.has(name);
  const gumAnswered = isStated('gum_lane_applies');
  const gumSides = gumAnswered && anatomy.notchedSides.length > 0 ? sidesOf(anatomy) : anatomy.gumSides;
  const set = (name: string, holds: boolean): void => {
    const number = compiled.names.get(name);
    if (number !== undefined) truth[number] = holds ? 1 : 0;
  };
  set('lip', anatomy.lip);
  set('lip_complete', anatomy.lipComplete);
  set('palate', anatomy.palate);
  set('two_sided', anatomy.isTwoSided);
  set('gum', gumSides.length > 0);
  set('gum_notched', anatomy.notchedSides.length > 0);
  set('molding_team', compiled.protocol.settings.offersMolding);
  set('sex_male', facts.sex === 'male');
  set('sex_unknown', facts.sex === 'unknown');
  // Jaw surgery is planned only where the jaws do not match.
  if (isStated('jaw_surgery_planned')) set('jaw_mismatch', true);
  for (const flag of facts.flags) set(flag, true);
  for (const finding of facts.findings) if (finding.on > today && !findings.has(finding.name)) set(finding.name, false);
  for (const name of findings.keys()) set(name, true);
  return { gumSides, hasGumQuestion: anatomy.notchedSides.length > 0 && !gumAnswered };
}

function sidesOf(anatomy: { gumSides: readonly Side[]; notchedSides: readonly Side[] }): Side[] {
  const both: readonly Side[] = ['R', 'L'];
  return both.filter((side) => anatomy.gumSides.includes(side) || anatomy.notchedSides.includes(side));
}

/** The root reading of the first orthodontic records counts as the first tracking x-ray. */
function countFirstReading(compiled: CompiledProtocol, facts: PathwayFacts, done: Dated<Completion>[][]): void {
  const tracking = compiled.rootMilestones.tracking;
  const records = done[compiled.indexOf.get('ORTH-01') ?? -1];
  if (tracking < 0 || records === undefined || facts.roots.length === 0) return;
  const xrays = done[tracking] ?? [];
  const first = records.filter(({ fact }) => facts.roots.some((reading) => reading.on === fact.on));
  const extra = first.filter(({ on }) => xrays.every((xray) => xray.on !== on));
  if (extra.length > 0) done[tracking] = [...xrays, ...extra].sort((left, right) => left.on - right.on);
}

function setFactsOfDone(
  compiled: CompiledProtocol,
  done: ChildRecord['done'],
  truth: Uint8Array,
  setTrue: (name: string) => void,
): void {
  for (let index = 0; index < done.length; index += 1) {
    const entries = done[index] ?? none;
    if (entries.length === 0) continue;
    for (const fact of compiled.factsOfDone[index] ?? none) truth[fact] = 1;
    for (const { fact } of entries) {
      if (fact.results === undefined) continue;
      for (const [field, value] of Object.entries(fact.results)) if (value === 'yes') setTrue(field);
    }
  }
}

function byMilestone<T extends { readonly milestone: string; readonly on: PlainDate }>(
  compiled: CompiledProtocol,
  facts: readonly T[],
  hasHappened: ((fact: T) => boolean) | null,
): Dated<T>[][];
function byMilestone(
  compiled: CompiledProtocol,
  facts: readonly { readonly milestone: string; readonly on: PlainDate }[],
  hasHappened: null,
): Dated<null>[][];
function byMilestone<T extends { readonly milestone: string; readonly on: PlainDate }>(
  compiled: CompiledProtocol,
  facts: readonly T[],
  hasHappened: ((fact: T) => boolean) | null,
): Dated<T | null>[][] {
  const lists: Dated<T | null>[][] = [];
  for (const fact of facts) {
    if (hasHappened !== null && !hasHappened(fact)) continue;
    const colon = fact.milestone.indexOf(':');
    const index = compiled.indexOf.get(colon < 0 ? fact.milestone : fact.milestone.slice(0, colon));
    if (index === undefined) continue;
    const list = (lists[index] ??= []);
    const on = toEpochDay(fact.on);
    let place = list.length;
    while (place > 0 && (list[place - 1]?.on ?? never) > on) place -= 1;
    list.splice(place, 0, { on, suffix: colon < 0 ? '' : fact.milestone.slice(colon + 1), fact });
  }
  return lists;
}

/** Bookings under the name `op` only say that some operation is planned; named ones on the same day take their place. */
function unnamedBooking(facts: PathwayFacts): number {
  const unnamed = facts.bookings.find((booking) => booking.milestone === 'op');
  if (!unnamed) return never;
  const isNamed = facts.bookings.some((other) => other.milestone !== 'op' && other.on === unnamed.on);
  return isNamed ? never : toEpochDay(unnamed.on);
}

/** Readings of the canines beside a cleft; one of the whole side says nothing about the graft. */
function rootRecords(facts: PathwayFacts, today: PlainDate, gumSides: readonly Side[]): RootRecord[] {
  if (facts.roots.length === 0) return [];
  return facts.roots
    .filter((reading) => reading.on <= today && gumSides.includes(reading.side))
    .map((reading) => ({ on: toEpochDay(reading.on), side: reading.side, stage: fraction(reading.stage) }))
    .sort((left, right) => left.on - right.on);
}
