/** Invented children for the measurements: the same ones at every run. */
import { addDays } from '@weftway/calendar/plain-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { PathwayFacts } from '@weftway/pathway/pathway-facts';

export const benchToday = '2026-12-01' as PlainDate; // a date that exists

const clefts = ['•••SHAL', 'LAHS•••', 'LAHSHAL', '•••SH••', '••HSH••', 'L•••••L', '•••S•••', 'LA•••••'];

/** Numbers below `below`, the same at every run. */
export const numbers = (seed: number): ((below: number) => number) => {
  let state = seed;
  return (below) => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return Math.floor((state / 4_294_967_296) * below);
  };
};

export interface SampleChild {
  readonly birth: PlainDate;
  readonly cleft: string;
  readonly facts: PathwayFacts;
}

const doneByAge: readonly (readonly [string, number])[] = [
  ['TEAM-02', 3],
  ['TEAM-03', 14],
  ['EAR-01', 25],
  ['CARE-01', 4],
  ['SURG-01', 110],
  ['SURG-02', 200],
  ['EAR-02', 85],
  ['EAR-03', 250],
  ['SURG-03', 320],
  ['EAR-05', 450],
  ['SPCH-01', 400],
  ['SPCH-02', 560],
  ['DENT-01', 380],
  ['SPCH-04', 1840],
  ['ORTH-01', 2500],
];

export const sampleChildren = (count: number): SampleChild[] => {
  const next = numbers(20_261_201);
  return Array.from({ length: count }, () => {
    const ageDays = next(20 * 365);
    const birth = addDays(benchToday, -ageDays);
    const cleft = clefts[next(clefts.length)] ?? 'LAHSHAL';
    const completions = doneByAge
      .filter(([, day]) => day < ageDays - 20)
      .map(([milestone, day]) => ({ milestone, on: addDays(birth, day + next(15)) }));
    return {
      birth,
      cleft,
      facts: {
        birth,
        due: null,
        isBirthEstimated: false,
        gestation: { weeks: 37 + next(4), days: next(7) },
        sex: next(2) === 0 ? 'female' : 'male',
        cleft,
        flags: [],
        teamStart: null,
        transferredOn: null,
        findings: [],
        completions,
        parts: [],
        waivers: [],
        holds: [],
        bookings: [],
        roots: [],
      },
    };
  });
};
