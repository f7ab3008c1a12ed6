/**
 * Plays a child's life forward with the planner itself: what is due is done near its target by the discipline that
 * signs it, until the day of the seed. So every date of the demo obeys the rules that the product shows.
 */
import { addDays, daysBetween, laterOf, plainDate } from '@weftway/calendar/plain-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import { ageInMonths } from '@weftway/calendar/age';
import type { ChildFields } from '@weftway/contract/child';
import type { Evidence } from '@weftway/contract/pathway';
import type { Completion, Finding, PathwayFacts, RootReading } from '@weftway/pathway/pathway-facts';
import type { PathwayPlan, PlannedMilestone } from '@weftway/pathway/pathway-plan';
import { findingsFromCompletion } from '@weftway/pathway/findings-from-completion';
import { planPathway } from '@weftway/pathway/plan-pathway';
import type { MilestoneRule, Protocol } from '@weftway/pathway/protocol';
import { chance, oneOf } from './chance.ts';
import { evidenceFor } from './evidence-values.ts';
import type { EvidenceSetting } from './evidence-values.ts';
import { membersWith, sampleMembers } from './members.ts';
import type { SampleAct } from './sample-acts.ts';

export interface LifeSetting {
  readonly id: string;
  readonly fields: ChildFields;
  readonly protocol: Protocol;
  readonly today: PlainDate;
  /** Nothing is done from this day on (lost to follow-up); null: care goes on. */
  readonly silentFrom: PlainDate | null;
  /** Extra days by which a milestone is done late, by id. */
  readonly delays: Readonly<Record<string, number>>;
  /** Milestones that are never done. */
  readonly neverDone: readonly string[];
  readonly imported: readonly {
    readonly milestone: string;
    readonly on: PlainDate;
    readonly precision: 'day' | 'month' | 'year';
    readonly isUnverified: boolean;
  }[];
  readonly takesMolding: boolean;
  readonly toothShift: number;
}

/** A life so far: the acts, and the plan that stands at the end. */
export interface Life {
  readonly acts: readonly SampleAct[];
  readonly plan: PathwayPlan;
  readonly facts: PathwayFacts;
}

interface Growing {
  readonly setting: LifeSetting;
  readonly rules: ReadonlyMap<string, MilestoneRule>;
  readonly acts: SampleAct[];
  readonly completions: Completion[];
  readonly findings: Finding[];
  readonly roots: RootReading[];
  readonly bookings: { milestone: string; on: PlainDate }[];
  readonly flags: string[];
  day: PlainDate;
}

const recentDays = 110;
const missShare = 0.1;
const stillOpenShare = 0.4;
/** Hardly ever missed. */
const firstDays: readonly string[] = ['TEAM-02', 'TEAM-03', 'TEAM-04', 'CARE-01', 'CARE-05', 'MOLD-02'];

const factsOf = (life: Growing): PathwayFacts => {
  const { fields } = life.setting;
  return {
    birth: fields.bornOn,
    due: fields.dueOn,
    isBirthEstimated: fields.isBirthEstimated,
    gestation: fields.gestation,
    sex: fields.sex,
    cleft: fields.cleft,
    flags: life.flags,
    teamStart: fields.teamStartOn,
    transferredOn: null,
    findings: life.findings,
    completions: life.completions,
    parts: [],
    waivers: [],
    holds: [],
    bookings: life.bookings,
    roots: life.roots,
  };
};

/** Mornings of the team: a time of day that belongs to the act. */
const instantOn = (day: PlainDate, seed: string, hours = 9): string => {
  const minutes = Math.floor(chance(`${seed}clock`) * 400);
  return new Date(Date.parse(`${day}T00:00:00.000Z`) + (hours * 60 + minutes) * 60_000).toISOString();
};

const wholeBase = (life: Growing): PlainDate =>
  life.setting.fields.bornOn ?? life.setting.fields.dueOn ?? life.setting.today;

/** The day on which a milestone is done, or null when it is not done by the day of the seed. */
const doneOn = (life: Growing, planned: PlannedMilestone): PlainDate | null => {
  const { setting } = life;
  if (planned.window === null || setting.neverDone.includes(planned.id)) return null;
  if (planned.waitsFor.some((wait) => wait.type === 'gate' && !wait.isMet)) return null;
  const seed = `${setting.id}${planned.key}#${planned.occurrence}`;
  const { earliest, target, latest } = planned.window;
  const room = Math.max(1, daysBetween(target, latest));
  const before = Math.max(0, daysBetween(earliest, target));
  const spread =
    chance(seed) < 0.5
      ? -Math.floor(chance(`${seed}early`) * before * 0.35)
      : Math.floor(chance(`${seed}late`) * room * 0.55);
  const late = setting.delays[planned.id] ?? 0;
  const day = laterOf(laterOf(earliest, addDays(target, spread + late)), life.day);
  const isRecent = daysBetween(latest, setting.today) < recentDays && latest <= setting.today;
  if (isRecent && !firstDays.includes(planned.id) && chance(`${seed}missed`) < missShare) return null;
  // Some of what could have been done by now is still to do.
  const isRunning = earliest <= setting.today && setting.today <= latest;
  if (isRunning && chance(`${seed}still`) < stillOpenShare) return null;
  if (setting.silentFrom !== null && day >= setting.silentFrom) return null;
  return day;
};

const memberFor = (life: Growing, disciplines: readonly string[], lane: string, day: PlainDate): string => {
  const lead = life.setting.fields.leadClinicianId ?? 'm-obed-nkansah';
  if (disciplines.includes('lead-clinician')) {
    const isHere = sampleMembers.some((member) => member.id === lead);
    return isHere ? lead : 'm-obed-nkansah';
  }
  const able = membersWith(disciplines, daysBetween(day, life.setting.today));
  return oneOf(able, `${life.setting.id}${lane}`).id;
};

const evidenceSettingOf = (
  life: Growing,
  planned: PlannedMilestone,
  day: PlainDate,
  signerName: string,
): EvidenceSetting => {
  const plate = life.completions.find((completion) => completion.milestone === 'MOLD-03');
  return {
    seed: `${life.setting.id}#${planned.key}#${planned.occurrence}`,
    on: day,
    ageMonths: Math.max(0, day < wholeBase(life) ? 0 : ageInMonths(wholeBase(life), day)),
    cleft: life.setting.fields.cleft,
    toothShift: life.setting.toothShift,
    moldingWeeks: plate === undefined ? 0 : Math.max(0, Math.floor(daysBetween(plate.on, day) / 7)),
    isRobin: life.setting.fields.flags.includes('robin'),
    takesMolding: life.setting.takesMolding,
    signerName,
  };
};

const nameOf = (memberId: string): string => sampleMembers.find((member) => member.id === memberId)?.name ?? '';

/** What a signed record tells the rest of the path. */
const learn = (life: Growing, rule: MilestoneRule, key: string, day: PlainDate, values: Evidence): void => {
  const results: Record<string, string> = {};
  for (const [name, { value }] of Object.entries(values)) if (value !== null && value !== '') results[name] = value;
  const completion: Completion = { milestone: key, on: day, results };
  life.completions.push(completion);
  for (const finding of findingsFromCompletion(rule, completion)) {
    if (!life.findings.some((known) => known.name === finding.name)) life.findings.push(finding);
  }
  for (const field of rule.evidence.filter((one) => one.kind === 'root-stage')) {
    const side = field.name.endsWith('_right') ? 'R' : field.name.endsWith('_left') ? 'L' : null;
    const stage = results[field.name];
    if (side !== null && stage !== undefined) life.roots.push({ on: day, stage, side });
  }
};

const signAll = (life: Growing, planned: PlannedMilestone, rule: MilestoneRule, day: PlainDate): void => {
  const all: Evidence = {};
  rule.signatures.forEach(({ part, disciplines }, index) => {
    const used = life.acts.at(-1);
    let signerId = memberFor(life, disciplines, rule.lane, day);
    // Two signatures are two people.
    if (index > 0 && used?.kind === 'sign' && used.signerId === signerId)
      signerId = disciplines.includes('lead-clinician') ? 'm-wen-zhao' : signerId;
    const values = evidenceFor(rule, part, evidenceSettingOf(life, planned, day, nameOf(signerId)));
    Object.assign(all, values);
    life.acts.push({
      kind: 'sign',
      at: instantOn(day, `${life.setting.id}${planned.key}${planned.occurrence}`, 9 + index * 2),
      byId: signerId,
      milestone: planned.key,
      part,
      occurrence: planned.occurrence,
      performedOn: day,
      values,
      signerId,
      draftedById: null,
    });
  });
  learn(life, rule, planned.key, day, all);
};

const plan = (life: Growing): PathwayPlan =>
  planPathway(life.setting.protocol, factsOf(life), life.day, { reasons: false });

/** An operation is booked some weeks before; its fitness check is signed in the fortnight before it. */
const bookAndCheck = (life: Growing, planned: PlannedMilestone, day: PlainDate): void => {
  const wanted = laterOf(addDays(day, -40), life.day);
  const bookedAt = wanted > life.setting.today ? life.setting.today : wanted;
  life.acts.push({
    kind: 'book',
    at: instantOn(bookedAt, `${life.setting.id}book${planned.key}`, 0),
    byId: 'm-ruth-alder',
    milestone: planned.key,
    on: day,
  });
  life.bookings.push({ milestone: planned.key, on: day });
  const checkDay = laterOf(addDays(day, -10), life.day);
  if (checkDay > life.setting.today) return;
  const before = life.day;
  life.day = checkDay;
  const check = plan(life).milestones.find(
    (one) =>
      one.id === 'CARE-04' && (one.forOperation === planned.key || one.forOperation === null) && one.state !== 'signed',
  );
  const rule = life.rules.get('CARE-04');
  if (check !== undefined && rule !== undefined) signAll(life, check, rule, checkDay);
  else life.day = before;
};

const finished: readonly string[] = ['signed', 'waived', 'transferred'];
const bookingHorizonDays = 45;

const nextDone = (life: Growing, standing: PathwayPlan): { planned: PlannedMilestone; day: PlainDate } | null => {
  let best: { planned: PlannedMilestone; day: PlainDate } | null = null;
  for (const planned of standing.milestones) {
    if (finished.includes(planned.state) || planned.state === 'partly-signed') continue;
    const day = doneOn(life, planned);
    if (day !== null && (best === null || day < best.day)) best = { planned, day };
  }
  return best;
};

const bookAhead = (life: Growing, standing: PathwayPlan): void => {
  for (const planned of standing.milestones) {
    const rule = life.rules.get(planned.id);
    if (
      rule?.isOperation !== true ||
      finished.includes(planned.state) ||
      life.bookings.some((booking) => booking.milestone === planned.key)
    )
      continue;
    const day = doneOn(life, planned);
    if (day !== null && day > life.setting.today && daysBetween(life.setting.today, day) <= bookingHorizonDays)
      bookAndCheck(life, planned, day);
  }
};

/** An airway screen that has gone stale is done again before the palate is repaired. */
const renewScreen = (life: Growing, standing: PathwayPlan): boolean => {
  const palate = standing.milestones.find((one) => one.id === 'SURG-03');
  const isStale =
    palate?.waitsFor.some((wait) => wait.milestone === 'CARE-03' && wait.type === 'gate' && wait.cause === 'stale') ===
    true;
  const screen = standing.milestones.find((one) => one.id === 'CARE-03');
  const rule = life.rules.get('CARE-03');
  if (!isStale || palate?.window === null || palate === undefined || screen === undefined || rule === undefined)
    return false;
  if (chance(`${life.setting.id}screen`) < 0.3 && daysBetween(palate.window.target, life.setting.today) < 200)
    return false;
  const day = laterOf(life.day, addDays(palate.window.target, -20));
  if (day > life.setting.today) return false;
  life.day = day;
  const times = life.completions.filter((one) => one.milestone === 'CARE-03').length;
  signAll(life, { ...screen, occurrence: times + 1 }, rule, day);
  return true;
};

const mostSteps = 400;

export const playLife = (setting: LifeSetting): Life => {
  const { fields, today } = setting;
  const life: Growing = {
    setting,
    rules: new Map(setting.protocol.milestones.map((rule) => [rule.id, rule])),
    acts: [],
    completions: setting.imported.map((one) => ({
      milestone: one.milestone,
      on: one.on,
      isUnverified: one.isUnverified,
      precision: one.precision,
    })),
    findings: [
      ...(fields.referredOn === null ? [] : [{ name: 'birth_referral', on: fields.referredOn }]),
      ...(fields.prenatalReferralOn === null ? [] : [{ name: 'prenatal_referral', on: fields.prenatalReferralOn }]),
    ],
    roots: [],
    bookings: [],
    flags: [...fields.flags, ...(fields.syndromes.length > 0 ? ['syndrome'] : [])],
    day: fields.teamStartOn ?? fields.bornOn ?? fields.prenatalReferralOn ?? today,
  };
  if (life.day > today) life.day = today;
  for (const one of setting.imported) {
    life.acts.push({
      kind: 'import',
      at: instantOn(life.day, `${setting.id}import${one.milestone}`, 7),
      byId: 'm-ruth-alder',
      milestone: one.milestone,
      performedOn: one.on,
      precision: one.precision,
      isUnverified: one.isUnverified,
    });
  }
  for (let step = 0; step < mostSteps; step += 1) {
    const standing = plan(life);
    const next = nextDone(life, standing);
    if (next === null || next.day > today) {
      if (renewScreen(life, standing)) continue;
      // Something may become possible by itself before the day of the seed.
      const change = standing.milestones
        .map((one) => one.changesOn)
        .filter((day) => day !== null && day > life.day)
        .sort()[0];
      if (next === null && change !== undefined && change !== null && change <= today) {
        life.day = change;
        continue;
      }
      break;
    }
    const rule = life.rules.get(next.planned.id);
    if (rule === undefined) break;
    if (rule.isOperation) bookAndCheck(life, next.planned, next.day);
    life.day = laterOf(life.day, next.day);
    signAll(life, next.planned, rule, next.day);
  }
  life.day = today;
  bookAhead(life, plan(life));
  const facts = factsOf(life);
  return { acts: life.acts, plan: planPathway(setting.protocol, facts, today, { reasons: false }), facts };
};

export const instantFor = instantOn;
export const dayBefore = (today: PlainDate, days: number): PlainDate => addDays(today, -days);
export const checkedDate = plainDate;
