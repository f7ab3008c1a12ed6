/** Laws of the planner, checked on children made up at random. */
import { addDays, daysBetween, toEpochDay } from '@weftway/calendar/plain-date';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { defaultProtocol } from './default-protocol.ts';
import type { Completion, Finding, PathwayFacts, RootReading, Waiver } from './pathway-facts.ts';
import type { ClinicalStatus, PathwayPlan, PlannedMilestone, ReasonStep } from './pathway-plan.ts';
import { nextChange, planPathway } from './plan-pathway.ts';
import { childFacts, day } from './testing/child-facts.ts';

const born = day('2015-02-28');
const ids = defaultProtocol.milestones.filter((rule) => !rule.perSide).map((rule) => rule.id);
const anyDay = fc.integer({ min: 0, max: 7000 }).map((days) => addDays(born, days));
const anyId = fc.constantFrom(...ids, 'ORTH-05:R', 'ORTH-04:L', 'CARE-05:SURG-01');
const completion: fc.Arbitrary<Completion> = fc.record({ milestone: anyId, on: anyDay });
const waiver: fc.Arbitrary<Waiver> = fc.record({
  milestone: anyId,
  on: anyDay,
  reason: fc.constant('family choice'),
  kind: fc.constant('waived' as const),
});
const finding: fc.Arbitrary<Finding> = fc.record({
  name: fc.constantFrom(
    'vpi_suspected',
    'tubes_decided',
    'fistula_symptomatic',
    'smcp',
    'jaw_mismatch',
    'plate_chosen',
    'expansion_needed',
  ),
  on: anyDay,
});
const root: fc.Arbitrary<RootReading> = fc.record({
  on: anyDay,
  stage: fc.constantFrom('0', '1/4', '1/3', '1/2', '2/3', '3/4', '1'),
  side: fc.constantFrom('R' as const, 'L' as const),
});
const child: fc.Arbitrary<PathwayFacts> = fc
  .record({
    cleft: fc.constantFrom('•••SHAL', 'LAHSHAL', '••HSH••', 'L••••••', 'la•••••', '•••••••', 'l*HSH*L'),
    sex: fc.constantFrom('female' as const, 'male' as const, 'unknown' as const),
    gestation: fc.constantFrom(null, { weeks: 31, days: 4 }, { weeks: 40, days: 0 }),
    teamStart: fc.option(anyDay, { nil: null }),
    isBirthEstimated: fc.boolean(),
    completions: fc.uniqueArray(completion, { maxLength: 25, selector: ({ milestone, on }) => `${milestone} ${on}` }),
    waivers: fc.uniqueArray(waiver, { maxLength: 3, selector: ({ milestone }) => milestone }),
    findings: fc.uniqueArray(finding, { maxLength: 4, selector: ({ name }) => name }),
    roots: fc.uniqueArray(root, { maxLength: 4, selector: ({ on, side }) => `${on} ${side}` }),
  })
  .map((more) => childFacts({ ...more, birth: born }));

const runs = { numRuns: 60 };

function addsUp(steps: readonly ReasonStep[], date: string): boolean {
  const [first] = steps;
  if (first?.days !== 0) return false;
  const isChained = steps.every((step, at) => {
    const before = steps[at - 1];
    return before === undefined || addDays(before.date, step.days) === step.date;
  });
  return isChained && steps[steps.length - 1]?.date === date;
}

/** Order in which a word may follow another while nothing happens; blocked and held may give way to any later word. */
const rank: Readonly<Record<ClinicalStatus, number>> = {
  not_applicable: 0,
  waived: 0,
  signed_off: 0,
  awaiting_sign_off: 0,
  transferred: 0,
  not_started: 0,
  held: 0,
  upcoming: 1,
  window_open: 2,
  due: 3,
  blocked: 3,
  closing: 4,
  overdue: 5,
};

/** What of the facts had happened by a day, so that nothing new happens after it. */
function happenedBy(facts: PathwayFacts, on: string): PathwayFacts {
  const before = <T extends { readonly on: string }>(entries: readonly T[]): T[] =>
    entries.filter((one) => one.on <= on);
  return {
    ...facts,
    teamStart: facts.teamStart !== null && facts.teamStart <= on ? facts.teamStart : null,
    completions: before(facts.completions),
    waivers: before(facts.waivers),
    findings: before(facts.findings),
    roots: before(facts.roots),
  };
}

const byKey = (plan: PathwayPlan): Map<string, PlannedMilestone> =>
  new Map(plan.milestones.map((one) => [one.key, one]));

describe('laws of the planner', () => {
  it('every date has a chain of reasons that adds up', () => {
    fc.assert(
      fc.property(child, anyDay, (facts, today) => {
        for (const { window, reasons, key } of planPathway(defaultProtocol, facts, today).milestones) {
          if (window === null) continue;
          const chains = [
            addsUp(reasons.earliest, window.earliest),
            addsUp(reasons.target, window.target),
            addsUp(reasons.latest, window.latest),
          ];
          expect([key, ...chains]).toEqual([key, true, true, true]);
        }
      }),
      runs,
    );
  });

  it('while nothing happens dates stay and words only move on', () => {
    fc.assert(
      fc.property(child, anyDay, fc.integer({ min: 1, max: 400 }), (facts, today, days) => {
        const settled = happenedBy(facts, today);
        const now = planPathway(defaultProtocol, settled, today, { reasons: false });
        const later = byKey(planPathway(defaultProtocol, settled, addDays(today, days), { reasons: false }));
        for (const one of now.milestones) {
          const then = later.get(one.key);
          expect([one.key, then?.window]).toEqual([one.key, one.window]);
          const isBlockedNow =
            one.clinical === 'upcoming' || one.clinical === 'window_open' || then?.clinical !== 'blocked';
          if (isBlockedNow)
            expect([one.key, rank[then?.clinical ?? 'upcoming'] >= rank[one.clinical]]).toEqual([one.key, true]);
        }
      }),
      runs,
    );
  });

  it('nothing changes by itself before the foretold day, and on it something does', () => {
    fc.assert(
      fc.property(child, anyDay, (facts, today) => {
        const settled = happenedBy(facts, today);
        const plan = planPathway(defaultProtocol, settled, today, { reasons: false });
        const next = nextChange(plan);
        const words = (on: typeof today): string =>
          planPathway(defaultProtocol, settled, on, { reasons: false })
            .milestones.map((one) => `${one.key} ${one.clinical} ${String(one.isLapsed)}`)
            .join('\n');
        if (next === null) return;
        if (daysBetween(today, next) > 1) expect(words(addDays(next, -1))).toBe(words(today));
        expect(words(next)).not.toBe(words(today));
      }),
      runs,
    );
  });

  it('a signed milestone keeps its dates when something is signed later', () => {
    fc.assert(
      fc.property(child, completion, (facts, extra) => {
        const today = addDays(born, 7001);
        const sameId = (key: string): string => key.split(':')[0] ?? key;
        const before = planPathway(defaultProtocol, facts, today, { reasons: false });
        const after = byKey(
          planPathway(defaultProtocol, { ...facts, completions: [...facts.completions, extra] }, today, {
            reasons: false,
          }),
        );
        for (const one of before.milestones) {
          const own = facts.completions.filter((done) => sameId(done.milestone) === one.id);
          if (one.state !== 'signed' || sameId(extra.milestone) === one.id) continue;
          if (own.some((done) => done.on >= extra.on)) continue;
          const then = after.get(one.key);
          if (then?.state === 'signed') expect([one.key, then.window]).toEqual([one.key, one.window]);
        }
      }),
      runs,
    );
  });

  it('the order in which facts are written down does not matter', () => {
    fc.assert(
      fc.property(child, anyDay, (facts, today) => {
        const turned = {
          ...facts,
          completions: [...facts.completions].reverse(),
          waivers: [...facts.waivers].reverse(),
          findings: [...facts.findings].reverse(),
          roots: [...facts.roots].reverse(),
        };
        expect(planPathway(defaultProtocol, turned, today)).toEqual(planPathway(defaultProtocol, facts, today));
      }),
      runs,
    );
  });

  it('equal inputs give equal answers, with reasons or without', () => {
    fc.assert(
      fc.property(child, anyDay, (facts, today) => {
        const whole = planPathway(defaultProtocol, facts, today);
        expect(planPathway(defaultProtocol, structuredClone(facts), today)).toEqual(whole);
        const bare = planPathway(defaultProtocol, facts, today, { reasons: false });
        expect(
          bare.milestones.map(({ key, clinical, window, occurrence }) => [key, clinical, window, occurrence]),
        ).toEqual(whole.milestones.map(({ key, clinical, window, occurrence }) => [key, clinical, window, occurrence]));
      }),
      runs,
    );
  });

  it('facts dated after today have not happened', () => {
    fc.assert(
      fc.property(child, anyDay, (facts, today) => {
        expect(planPathway(defaultProtocol, happenedBy(facts, today), today)).toEqual(
          planPathway(defaultProtocol, facts, today),
        );
        expect(toEpochDay(today)).toBeGreaterThanOrEqual(toEpochDay(born));
      }),
      runs,
    );
  });
});
