/**
 * How long the planner takes for a registry, against a bare loop over calendar months.
 * The caller brings the clock; the children are made up by a fixed rule, so every run measures the same work.
 */
import { addMonthsToDay, fromEpochDay, plainDate } from '@weftway/calendar/plain-date';
import { defaultProtocol } from '../src/default-protocol.ts';
import type { Completion, PathwayFacts } from '../src/pathway-facts.ts';
import { planPathway } from '../src/plan-pathway.ts';
import { planRows } from '../src/plan-rows.ts';
import { clinicalStatus, nextChangeDay } from '../src/state-of-milestone.ts';

export interface PlannerSpeed {
  readonly children: number;
  readonly rows: number;
  /** Nanoseconds a milestone: three additions of months; rows with word and next change; dressed plans; with reasons. */
  readonly bareNs: number;
  readonly rowsNs: number;
  readonly planNs: number;
  readonly reasonsNs: number;
}

const codes = ['•••SHAL', 'LAHS•••', 'LAHSHAL', '••HSH••', 'L••••••', '••HSH••', '•••S•••', 'LA•••••'];
const today = plainDate('2026-12-01');
const todayNumber = 20_788;
/** Milestone and age in days at which every made-up child had it signed. */
const history: readonly (readonly [string, number])[] = [
  ['TEAM-02', 1],
  ['TEAM-03', 5],
  ['TEAM-04', 28],
  ['CARE-01', 1],
  ['CARE-03', 12],
  ['EAR-01', 6],
  ['EAR-02', 70],
  ['GEN-01', 90],
  ['SURG-01', 100],
  ['SURG-02', 140],
  ['SURG-03', 330],
  ['SURG-04', 420],
  ['EAR-03', 270],
  ['DENT-01', 360],
];
const yearly = ['TEAM-05', 'DENT-02', 'EAR-06'];

function madeUpChild(number: number): PathwayFacts {
  const born = 14_000 + ((number * 7919) % 6_700);
  const birth = fromEpochDay(born);
  const completions: Completion[] = [];
  const add = (milestone: string, age: number): void => {
    if (born + age < todayNumber) completions.push({ milestone, on: fromEpochDay(born + age) });
  };
  for (const [milestone, age] of history) add(milestone, age);
  for (let year = 1; year < 18; year += 1) for (const milestone of yearly) add(milestone, year * 365);
  return {
    birth,
    due: null,
    isBirthEstimated: false,
    gestation: { weeks: 35 + (number % 6), days: 0 },
    sex: number % 2 === 0 ? 'female' : 'male',
    cleft: codes[number % codes.length] ?? 'LAHSHAL',
    flags: [],
    teamStart: null,
    transferredOn: null,
    findings: [{ name: 'birth_referral', on: birth }],
    completions,
    parts: [],
    waivers: [],
    holds: [],
    bookings: [],
    roots: [],
  };
}

/** Measures the planner over made-up children; `nowMs` is the caller's clock. Reasons are measured on a tenth of them. */
export function measurePlanner(children: number, nowMs: () => number): PlannerSpeed {
  const facts = Array.from({ length: children }, (_, number) => madeUpChild(number));
  const rows = children * defaultProtocol.milestones.length;
  const tenth = facts.slice(0, Math.max(1, Math.floor(children / 10)));
  const perRow = (of: number, work: () => void): number => {
    work();
    const start = nowMs();
    work();
    return ((nowMs() - start) * 1e6) / of;
  };
  return {
    children,
    rows,
    bareNs: perRow(rows, () => bareLoop(rows)),
    rowsNs: perRow(rows, () => {
      for (const child of facts) sumOfRows(child);
    }),
    planNs: perRow(rows, () => {
      for (const child of facts) planPathway(defaultProtocol, child, today, { reasons: false });
    }),
    reasonsNs: perRow(tenth.length * defaultProtocol.milestones.length, () => {
      for (const child of tenth) planPathway(defaultProtocol, child, today);
    }),
  };
}

function bareLoop(rows: number): number {
  const dates = new Int32Array(rows * 3);
  for (let row = 0; row < rows; row += 1) {
    const born = 14_000 + (row % 6_700);
    dates[row * 3] = addMonthsToDay(born, 9);
    dates[row * 3 + 1] = addMonthsToDay(born, 11);
    dates[row * 3 + 2] = addMonthsToDay(born, 13);
  }
  return dates[rows] ?? 0;
}

function sumOfRows(child: PathwayFacts): number {
  const { planning, rows } = planRows(defaultProtocol, child, today, { reasons: false });
  let sum = 0;
  for (const row of rows) {
    sum +=
      clinicalStatus(planning, row, planning.child.today).length + nextChangeDay(planning, row, planning.child.today);
  }
  return sum;
}
