/**
 * The timing table of the default protocol, written a second time: a slip of the pen in the data fails here.
 *
 * Ages come from the publications whose numbers stand at the end of a row (the list is `defaultProtocol.sources`;
 * for palate repair for example Lewis 2017 [1], the Dutch guideline of 2021 [5] and the TOPS trial of 2023 [18]).
 * Closing days, catch-up days, gaps, freshness and every row without a number are common practice.
 */
import { describe, expect, it } from 'vitest';
import { defaultProtocol } from '../../packages/pathway/src/default-protocol.ts';
import type { MilestoneRule } from '../../packages/pathway/src/protocol.ts';

type Row = readonly [
  id: string,
  kind: string,
  clock: string,
  window: string,
  closingDays: number,
  prerequisites: string,
  repeats: string,
  variants: string,
  catchUp: string,
  sources: string,
];

// prettier-ignore
const timings: readonly Row[] = [
  ['TEAM-01', 'conditional', 'prenatal-referral', '0d 7d 21d', 7, '', '', '', '', '2 6 7 46'],
  ['TEAM-02', 'core', 'referral', '0d 1d 2d', 1, '', '', '', '', '6 7'],
  ['TEAM-03', 'core', 'birth', '0d 7d 28d', 7, '', '', '', '14 30', '12 13 94 96 98 99'],
  ['TEAM-04', 'core', 'birth', '0d 4w 6w', 7, 'soft TEAM-03', '', '', '14 30', '2 7 11'],
  ['TEAM-05', 'core', 'birth', '3m 6m 12m', 30, '', '10m 12m 14m', '', '30 60', '3 77 78 84 88'],
  ['CARE-01', 'core', 'birth', '0d 1d 3d', 1, '', '', '', '14 30', '6 7 102'],
  ['CARE-02', 'core', 'birth', '5d 7d 10d', 2, 'soft CARE-01', '5d 7d 10d; 21d 28d 35d', '', '', '3 102'],
  ['CARE-03', 'core', 'birth', '0d 14d 28d', 7, '', '', '0d 2d 7d', '21 42', '26 27 28'],
  ['CARE-04', 'core', 'operation-booked', '-30d -14d -3d', 7, '', '', '', '', '32 33'],
  ['CARE-05', 'core', 'operation-done', '5d 10d 21d', 4, '', '', '5d 14d 30d', '', '18 44 45'],
  ['GEN-01', 'core', 'birth', '0d 3m 6m', 30, 'soft TEAM-03', '', '', '60 120', '5 10 29 31'],
  ['GEN-02', 'conditional', 'birth', '3m 6m 12m', 30, '', '10m 12m 14m', '', '30 90', '29'],
  ['MOLD-01', 'conditional', 'birth', '0d 10d 21d', 7, 'gate TEAM-03', '', '', '', '5 34 36 39'],
  ['MOLD-02', 'conditional', 'birth', '3d 14d 28d', 7, 'gate MOLD-01; gate CARE-03', '', '', '', '34 35'],
  ['MOLD-03', 'conditional', 'event MOLD-02', '2d 7d 14d', 3, 'gate MOLD-02', '', '', '', '34 40'],
  ['MOLD-04', 'conditional', 'event MOLD-03', '5d 7d 10d', 2, 'gate MOLD-03', '5d 7d 10d', '', '', '35 36 37 38 39'],
  ['MOLD-05', 'conditional', 'finding gap_le_5mm', '0d 7d 14d', 4, 'gate MOLD-03', '', '', '', '34 41'],
  ['MOLD-06', 'conditional', 'birth', '10w 14w 20w', 14, 'soft MOLD-03 +6w', '', '', '', '34 35'],
  ['SURG-01', 'core', 'corrected', '10w 3m 6m', 28, 'gate MOLD-06; check CARE-04 fresh 30d; soft GEN-01', '', '', '60 120', '1 2 7 9 11 23 24'],
  ['SURG-02', 'core', 'event SURG-01', '4w 6w 10w', 14, 'gate SURG-01 +4w', '', '', '', '7 45'],
  ['SURG-03', 'core', 'corrected', '9m 11m 13m', 45, 'gate SURG-01 +12w; gate CARE-03 fresh 56d; check CARE-03 fresh 56d; check CARE-04 fresh 30d; check EAR-03 fresh 3m; soft GEN-01', '', '9m 12m 18m; 6m 10m 13m', '42 90', '1 2 5 9 18 19 20 21 23 24 26'],
  ['SURG-04', 'core', 'event SURG-03', '8w 3m 6m', 28, 'gate SURG-03 +8w', '', '', '30 90', '18 42 43'],
  ['SURG-05', 'elective', 'birth', '4y 5y 6y', 60, '', 'at 9y 9y6m 11y', '', '60 180', '11'],
  ['SURG-06', 'conditional', 'finding fistula_symptomatic', '0d 6m 12m', 60, 'gate SURG-03 +6m; check CARE-04 fresh 30d', '', '', '90 180', '42 43'],
  ['EAR-01', 'core', 'birth', '0d 7d 1m', 7, '', '', '', '', '49 52 55'],
  ['EAR-02', 'core', 'birth', '4w 10w 3m', 14, 'soft EAR-01', '', '', '', '49 50 52 54 55'],
  ['EAR-03', 'core', 'corrected', '7m 9m 10m', 21, '', '', '', '30 60', '2 11 51'],
  ['EAR-04', 'core', 'corrected', '6m 9m 12m', 30, 'soft EAR-03', '', '', '30 90', '5 50 53'],
  ['EAR-05', 'core', 'event SURG-03', '4w 8w 3m', 14, 'gate SURG-03 +4w', '', '', '', '5 51'],
  ['EAR-06', 'core', 'birth', '17m 18m 20m', 30, '', '5m 6m 8m; 10m 12m 14m; at 11y9m 12y 13y; at 14y9m 15y 16y', '', '30 60', '5 51 54'],
  ['EAR-07', 'conditional', 'finding tubes_decided', '0d 6w 3m', 21, 'gate EAR-04', '', '', '', '5 53 58'],
  ['SPCH-01', 'core', 'corrected', '6m 9m 12m', 30, '', '', '', '', '2 11 59'],
  ['SPCH-02', 'core', 'corrected', '15m 18m 21m', 30, 'soft SURG-03 +8w', '', '', '30 60', '2 9 59'],
  ['SPCH-03', 'core', 'birth', '2y6m 3y 3y6m', 45, '', 'at 3y9m 4y 4y6m', '', '30 60', '7 10 11 59'],
  ['SPCH-04', 'core', 'birth', '5y 5y3m 6y', 90, '', '', '', '', '56 57 58'],
  ['SPCH-05', 'conditional', 'finding vpi_suspected', '0d 3m 6m', 30, '', '', '', '', '5 47'],
  ['SPCH-06', 'conditional', 'event SPCH-05', '4w 3m 6m', 45, 'gate SPCH-05 +4w fresh 12m; check CARE-03 fresh 6m; check CARE-04 fresh 30d', '', '', '', '5 30 47'],
  ['SPCH-07', 'conditional', 'event SPCH-06', '6w 3m 6m', 21, 'gate SPCH-06 +6w', '10m 12m 14m', '', '', '47'],
  ['SPCH-08', 'conditional', 'event SPCH-06', '9m 12m 15m', 30, 'gate SPCH-06 +9m', '', '', '', '5'],
  ['DENT-01', 'core', 'birth', '6m 12m 15m', 30, '', '', '', '30 90', '5 7 11'],
  ['DENT-02', 'core', 'event DENT-01', '5m 6m 8m', 21, 'soft DENT-01 +5m', '5m 6m 8m', '', '30 60', '5 58 79'],
  ['ORTH-01', 'core', 'birth', '6y 7y 8y', 90, '', '', '', '30 90', '7 11 61'],
  ['ORTH-02', 'core', 'birth', '7y 7y6m 8y3m', 60, 'soft ORTH-01', '10m 12m 14m; 5m 6m 8m', '', '30 60', '60 61 62 63 64'],
  ['ORTH-03', 'conditional', 'birth', '7y 8y 9y6m', 90, 'gate ORTH-01', '', '', '60 180', '61 69'],
  ['ORTH-04', 'core', 'finding root_low', '0d 60d 4m', 30, 'gate ORTH-02 fresh 6m; gate DENT-02 fresh 8m; gate ORTH-03', '', '', '', '5 64 69'],
  ['ORTH-05', 'core', 'birth', '8y 9y 11y', 60, 'gate ORTH-04 fresh 6m; check CARE-04 fresh 30d', '', '5y 6y 7y', '60 180', '1 5 7 9 60 61 62 63 64 65 66 71'],
  ['ORTH-06', 'core', 'event ORTH-05', '3m 6m 9m', 30, 'gate ORTH-05 +3m', '', '', '30 90', '64 67 69'],
  ['ORTH-07', 'core', 'event ORTH-05', '10m 12m 14m', 30, 'soft ORTH-05 +6m', '5m 6m 8m', '', '60 120', '63 68'],
  ['ORTH-08', 'core', 'birth', '11y 12y6m 15y', 180, 'soft ORTH-06', '', '', '90 180', '8 11'],
  ['ORTH-09', 'core', 'event ORTH-08', '18m 24m 36m', 90, 'soft ORTH-08 +12m', '20m 24m 26m', '', '', '5'],
  ['GROW-01', 'conditional', 'birth', '14y 16y 17y6m', 180, '', '', '16y 17y6m 19y', '60 180', '72 73 74'],
  ['GROW-02', 'conditional', 'booking GROW-03', '-6m -3m -30d', 30, '', '', '', '', '48'],
  ['GROW-03', 'conditional', 'event GROW-01', '0d 6m 18m', 90, 'gate GROW-01; check GROW-02 fresh 6m; soft ORTH-05 +6m; check CARE-04 fresh 30d', '', '', '', '8 48 73'],
  ['GROW-04', 'elective', 'birth', '16y 16y6m 21y', 180, 'gate GROW-03 +6m', '', '17y 17y6m 21y', '90 180', '5 8 72'],
  ['GROW-05', 'conditional', 'birth', '11y 13y 15y', 90, 'soft ORTH-06', '', '', '90 180', '70'],
  ['GROW-06', 'conditional', 'birth', '17y 18y6m 21y', 180, 'gate GROW-05; soft ORTH-09 +3m; gate GROW-03 +6m', '', '', '90 365', '69'],
  ['PSY-01', 'core', 'birth', '4w 8w 4m', 21, '', '', '', '30 60', '76'],
  ['PSY-02', 'core', 'birth', '4y 5y 6y', 60, '', 'at 8y 9y 10y6m; at 10y6m 11y6m 13y; at 14y6m 15y 16y6m', '', '30 90', '5 58'],
  ['REC-01', 'core', 'birth', '5y 5y3m 6y', 90, '', '', '', '', '7 8 9 56 58'],
  ['REC-02', 'core', 'birth', '9y6m 10y 11y', 90, '', '', '', '', '8 9 15 16'],
  ['REC-03', 'core', 'birth', '11y9m 12y 13y', 90, '', '', '', '', '10 15'],
  ['REC-04', 'core', 'birth', '14y9m 15y 16y', 90, '', '', '', '', '8 9 10'],
  ['REC-05', 'core', 'birth', '18y 19y 22y', 180, '', '', '', '', '5 8 9 10'],
  ['ADLT-01', 'core', 'birth', '12y 13y 14y', 60, '', '', '', '60 120', '75'],
  ['ADLT-02', 'core', 'birth', '14y 14y6m 15y6m', 60, 'soft ADLT-01', '10m 12m 14m', '', '60 120', '75'],
  ['ADLT-03', 'core', 'birth', '18y 20y 22y', 180, 'soft REC-05; soft ADLT-02', '', '', '90 365', '5 8 75 78'],
];

/** Where the default protocol departs from the table on purpose. */
const additions: Readonly<Record<string, { repeats: string; why: string }>> = {
  'CARE-02': {
    repeats: '5d 7d 10d; 21d 28d 35d; 21d 28d 35d; 21d 28d 35d',
    why: 'the second rhythm stands once for each operation that ends it, and once for a child without one',
  },
  'GROW-02': { repeats: '3m 6m 12m', why: 'speech and sleep are looked at again after jaw surgery' },
  'ORTH-04': { repeats: '4m 5m 6m', why: 'readiness is valid for six months and then renewed' },
};

type Spans = MilestoneRule['window'];
const spans = (window: Spans) => `${window.earliest} ${window.target} ${window.latest}`;

const clockText = (clock: MilestoneRule['clock']): string => {
  if (clock.from === 'event' || clock.from === 'booking') return `${clock.from} ${clock.milestone}`;
  if (clock.from === 'finding') return `finding ${clock.finding}`;
  return clock.from;
};

const prerequisiteText = (prerequisite: MilestoneRule['prerequisites'][number]): string =>
  [
    prerequisite.type,
    prerequisite.milestone,
    prerequisite.gap === undefined ? '' : `+${prerequisite.gap}`,
    prerequisite.freshFor === undefined ? '' : `fresh ${prerequisite.freshFor}`,
  ]
    .filter((part) => part !== '')
    .join(' ');

const asRow = (rule: MilestoneRule): Row => [
  rule.id,
  rule.kind,
  clockText(rule.clock),
  spans(rule.window),
  rule.closingDays,
  rule.prerequisites.map(prerequisiteText).toSorted().join('; '),
  rule.repeats.map((repeat) => (repeat.byAge === true ? 'at ' : '') + spans(repeat.window)).join('; '),
  rule.variants.map((variant) => spans(variant.window)).join('; '),
  rule.catchUp?.join(' ') ?? '',
  rule.sources.join(' '),
];

describe('the timing table', () => {
  it('names every milestone once, in the order of the protocol', () => {
    expect(defaultProtocol.milestones.map((rule) => rule.id)).toEqual(timings.map((row) => row[0]));
  });

  it.each(timings)('%s is timed as published', (...row) => {
    const rule = defaultProtocol.milestones.find((candidate) => candidate.id === row[0]);
    const [id, kind, clock, window, closingDays, prerequisites, repeats, variants, catchUp, sources] = row;
    expect(rule && asRow(rule)).toEqual([
      id,
      kind,
      clock,
      window,
      closingDays,
      prerequisites.split('; ').toSorted().join('; '),
      additions[id]?.repeats ?? repeats,
      variants,
      catchUp,
      sources,
    ]);
  });

  it('quotes only publications that the protocol lists', () => {
    const quoted = timings.flatMap((row) => row[9].split(' ')).filter((number) => number !== '');
    expect(quoted.filter((number) => !(number in defaultProtocol.sources))).toEqual([]);
  });

  it('lapses only what has no second chance', () => {
    const lapsing = defaultProtocol.milestones.flatMap((rule) =>
      rule.lapse ? [`${rule.id} ${rule.lapse.after}`] : [],
    );
    expect(lapsing).toEqual(['TEAM-01 birth', 'MOLD-01 56d', 'MOLD-02 56d']);
  });

  it('follows the canine root in three milestones and counts four for each side', () => {
    const following = defaultProtocol.milestones.flatMap((rule) =>
      rule.followsRoot ? [`${rule.id} ${rule.followsRoot}`] : [],
    );
    const perSide = defaultProtocol.milestones.filter((rule) => rule.perSide).map((rule) => rule.id);
    expect(following).toEqual(['ORTH-02 tracking', 'ORTH-04 readiness', 'ORTH-05 graft']);
    expect(perSide).toEqual(['ORTH-04', 'ORTH-05', 'ORTH-06', 'ORTH-07']);
  });
});
