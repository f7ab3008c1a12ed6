/**
 * Whole courses of molding, day by day: a team that signs what opens, sees the child weekly and repairs the lip when
 * molding is finished is never late, and nothing waits for anything but the running molding.
 */
import { addDays, type PlainDate } from '@weftway/calendar/plain-date';
import { describe, expect, it } from 'vitest';
import { defaultProtocol } from './default-protocol.ts';
import { findingsFromCompletion } from './findings-from-completion.ts';
import type { Completion, PathwayFacts } from './pathway-facts.ts';
import type { PlannedMilestone } from './pathway-plan.ts';
import { planPathway } from './plan-pathway.ts';
import type { Protocol } from './protocol.ts';
import { protocolSchema } from './protocol.ts';
import { childFacts } from './testing/child-facts.ts';

interface Course {
  readonly cleft: string;
  /** Days from birth to the end of molding and to the lip repair. */
  readonly moldingEnds: number;
  readonly lipRepaired: number;
}

/** Days of the course on which its own steps are signed; everything else is signed on the day it opens. */
const courseDays = (course: Course): Readonly<Record<string, number>> => ({
  'MOLD-01': 10,
  'MOLD-02': 14,
  'MOLD-03': 21,
  'MOLD-06': course.moldingEnds,
  'SURG-01': course.lipRepaired,
});

const good: Readonly<Record<string, Readonly<Record<string, string>>>> = {
  'CARE-03': { safe_for_plate: 'yes', safe_for_anaesthesia: 'yes' },
  'MOLD-01': { option_chosen: 'plate' },
  'CARE-04': { fit: 'yes' },
};

function signed(protocol: Protocol, facts: PathwayFacts, key: string, on: PlainDate): PathwayFacts {
  const id = key.split(':')[0] ?? key;
  const rule = protocol.milestones.find((one) => one.id === id);
  const results = good[id];
  const completion: Completion = { milestone: key, on, ...(results ? { results } : {}) };
  const raised = rule ? findingsFromCompletion(rule, completion) : [];
  return { ...facts, completions: [...facts.completions, completion], findings: [...facts.findings, ...raised] };
}

function signWhatOpens(
  protocol: Protocol,
  facts: PathwayFacts,
  today: PlainDate,
  age: number,
  course: Course,
): PathwayFacts {
  const days = courseDays(course);
  const isReady = ({ key, id, state }: PlannedMilestone): boolean => {
    const courseDay = days[id];
    if (courseDay !== undefined) return age === courseDay && state !== 'signed' && state !== 'waiting';
    if (id === 'MOLD-04') return state === 'open' && age % 7 === 0;
    return key !== '' && (state === 'open' || state === 'closing');
  };
  let now = facts;
  // What is signed can open something else on the same day.
  for (let round = 0; round < 4; round += 1) {
    const ready = planPathway(protocol, now, today, { reasons: false }).milestones.filter(isReady);
    if (ready.length === 0) return now;
    for (const { key } of ready) now = signed(protocol, now, key, today);
  }
  return now;
}

/** Everything late, and everything that waits for something other than the end of molding, over the whole course. */
function troubles(protocol: Protocol, course: Course): string[] {
  let facts = childFacts({ cleft: course.cleft, bookings: [] });
  const { birth } = facts;
  if (birth === null) return ['no birth'];
  const found: string[] = [];
  for (let age = 0; age <= course.lipRepaired + 30; age += 1) {
    const today = addDays(birth, age);
    if (age === course.lipRepaired - 20)
      facts = { ...facts, bookings: [{ milestone: 'SURG-01', on: addDays(birth, course.lipRepaired) }] };
    facts = signWhatOpens(protocol, facts, today, age, course);
    for (const one of planPathway(protocol, facts, today, { reasons: false }).milestones) {
      if (one.state === 'late') found.push(`day ${String(age)}: ${one.key} late`);
      const unmet = one.waitsFor.filter((wait) => wait.type === 'gate' && !wait.isMet).map((wait) => wait.milestone);
      if (one.state === 'waiting' && unmet.join() !== 'MOLD-06')
        found.push(`day ${String(age)}: ${one.key} waits for ${unmet.join()}`);
    }
  }
  return found;
}

const withLongerCourse: Protocol = protocolSchema.parse({
  ...defaultProtocol,
  version: 2,
  changes: 'Two-sided clefts: molding to 26 weeks, lip repair to 7 months.',
  milestones: defaultProtocol.milestones.map((rule) => {
    const note = 'Cleft of both sides';
    if (rule.id === 'MOLD-06') {
      const window = { earliest: '10w', target: '22w', latest: '26w' };
      return { ...rule, variants: [{ when: 'two_sided', window, note }, ...rule.variants] };
    }
    if (rule.id !== 'SURG-01') return rule;
    const window = { earliest: '10w', target: '6m', latest: '7m' };
    return { ...rule, variants: [{ when: 'two_sided', window, note }, ...rule.variants] };
  }),
});

describe('a course of molding has nothing late and nothing waits but for molding', () => {
  it('three months for a one-sided cleft (common practice)', () => {
    expect(troubles(defaultProtocol, { cleft: '•••SHAL', moldingEnds: 91, lipRepaired: 98 })).toEqual([]);
  });

  it('four months for a two-sided cleft (common practice)', () => {
    expect(troubles(defaultProtocol, { cleft: 'LAHSHAL', moldingEnds: 121, lipRepaired: 128 })).toEqual([]);
  });

  it('six months for a two-sided cleft under a second version that differs in data alone (common practice)', () => {
    const course = { cleft: 'LAHSHAL', moldingEnds: 182, lipRepaired: 196 };
    expect(troubles(withLongerCourse, course)).toEqual([]);
    expect(troubles(defaultProtocol, course)).not.toEqual([]);
  });
});
