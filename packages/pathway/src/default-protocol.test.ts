import { lanes } from '@weftway/team/lanes';
import { describe, expect, it } from 'vitest';
import { defaultProtocol } from './default-protocol.ts';
import type { MilestoneRule } from './protocol.ts';

const rule = (id: string): MilestoneRule => {
  const found = defaultProtocol.milestones.find((candidate) => candidate.id === id);
  if (!found) throw new Error(`No milestone ${id}.`);
  return found;
};

/** `SPCH-03 vpi_suspected=yes`, for each way in which a finding is raised. */
const raisedBy = (finding: string): string[] =>
  defaultProtocol.milestones.flatMap((milestone) =>
    milestone.raises
      .filter((raise) => raise.finding === finding)
      .map((raise) => `${milestone.id} ${raise.field}=${raise.oneOf.join('|')}`),
  );

describe('the default protocol', () => {
  it('has 66 milestones: 44 core, 20 conditional, 2 elective', () => {
    const count = (kind: string) => defaultProtocol.milestones.filter((milestone) => milestone.kind === kind).length;
    expect([count('core'), count('conditional'), count('elective')]).toEqual([44, 20, 2]);
  });

  it('fills all thirteen lanes, in the order in which they are drawn', () => {
    expect([...new Set(defaultProtocol.milestones.map((milestone) => milestone.lane))]).toEqual(lanes);
  });

  it('keeps short titles within 24 characters, and every title its own', () => {
    expect(defaultProtocol.milestones.filter((milestone) => milestone.shortTitle.length > 24)).toEqual([]);
    for (const text of ['title', 'shortTitle', 'plain'] as const) {
      expect(new Set(defaultProtocol.milestones.map((milestone) => milestone[text])).size).toBe(66);
    }
  });

  it('tells families each milestone in one sentence', () => {
    for (const { plain } of defaultProtocol.milestones) expect(plain).toMatch(/^[A-Z][^.]{20,130}\.$/u);
  });

  it.each([
    ['plate_chosen', ['MOLD-01 option_chosen=plate with nose stent|plate']],
    ['stent_chosen', ['MOLD-01 option_chosen=plate with nose stent']],
    ['gap_le_5mm', ['MOLD-03 gap_at_or_below_5mm=yes', 'MOLD-04 gap_at_or_below_5mm=yes']],
    ['fistula_symptomatic', ['SURG-04 symptomatic=yes']],
    ['screen_failed', ['EAR-01 result_right=refer', 'EAR-01 result_left=refer']],
    ['tubes_decided', ['EAR-04 tubes=with palate repair|separately']],
    ['vpi_suspected', ['SPCH-03 vpi_suspected=yes', 'SPCH-04 vpi_suspected=yes']],
    ['vpi_surgery_decided', ['SPCH-05 decision=surgery']],
    ['expansion_needed', ['ORTH-01 expansion_needed=yes']],
    ['expansion_started', ['ORTH-03 started=yes']],
    ['early_incisor_track', ['ORTH-01 graft_track=early incisor']],
    ['treatment_need', ['ORTH-01 treatment_need=yes', 'REC-03 braces_needed=yes']],
    ['canine_in_arch', ['ORTH-07 status=erupted|in the arch']],
    ['jaw_mismatch', ['ORTH-08 jaw_plan=wait for surgery', 'REC-04 jaw_mismatch=yes']],
    ['jaw_surgery_planned', ['ORTH-08 jaw_plan=wait for surgery', 'REC-04 jaw_surgery_planned=yes']],
    ['replacement_planned', ['GROW-05 plan=bridge|implant|denture']],
  ])('raises %s', (finding, ways) => {
    expect(raisedBy(finding)).toEqual(ways);
  });

  it('asks two different things of the airway screen', () => {
    const asked = (id: string) =>
      rule(id).prerequisites.find((need) => need.milestone === 'CARE-03' && need.result)?.result;
    expect(asked('MOLD-02')).toEqual({ field: 'safe_for_plate', oneOf: ['yes'] });
    expect(asked('SURG-03')).toEqual({ field: 'safe_for_anaesthesia', oneOf: ['yes', 'with plan'] });
  });

  it('screens every child with an airway problem before a plate', () => {
    expect(rule('CARE-03').applies).toEqual({ any: ['palate', 'smcp', 'robin', 'syndrome', 'airway'] });
    expect(rule('MOLD-02').prerequisites.find((need) => need.milestone === 'CARE-03')?.when).toEqual({
      any: ['palate', 'robin', 'syndrome', 'airway'],
    });
  });

  it('looks at speech again after jaw surgery, counted from the operation', () => {
    expect(rule('GROW-02').repeats[0]?.clock).toEqual({ from: 'event', milestone: 'GROW-03' });
  });

  it('lets no graft be planned over untreated decay', () => {
    expect(rule('ORTH-04').prerequisites).toContainEqual(
      expect.objectContaining({ milestone: 'DENT-02', result: { field: 'untreated_decay', oneOf: ['no'] } }),
    );
  });

  it('knows which milestones are operations', () => {
    expect(
      defaultProtocol.milestones.filter((milestone) => milestone.isOperation).map((milestone) => milestone.id),
    ).toEqual(['SURG-01', 'SURG-03', 'SURG-06', 'EAR-07', 'SPCH-06', 'ORTH-05', 'GROW-03', 'GROW-04']);
  });

  it('lets two decide on waiving palate repair', () => {
    const needing = defaultProtocol.milestones.filter((milestone) => milestone.waiverNeeds);
    expect(needing.map((milestone) => milestone.id)).toEqual(['SURG-03']);
    expect(rule('SURG-03').waiverNeeds).toEqual([['surgeon'], ['paediatrician', 'ent']]);
  });
});
