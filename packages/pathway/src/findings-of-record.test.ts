import { plainDate } from '@weftway/calendar/plain-date';
import { describe, expect, it } from 'vitest';
import { defaultProtocol } from './default-protocol.ts';
import { findingsFromCompletion } from './findings-from-completion.ts';
import type { EvidenceValues } from './sign-off-evidence.ts';

const on = plainDate('2026-12-01');
/** Empty fields leave no result. */
const given = (values: EvidenceValues): Record<string, string> =>
  Object.fromEntries(
    Object.entries(values).flatMap(([name, { value }]) => (value === null ? [] : [[name, value] as const])),
  );

const raised = (id: string, values: EvidenceValues) =>
  defaultProtocol.milestones
    .filter((rule) => rule.id === id)
    .flatMap((rule) => findingsFromCompletion(rule, { milestone: id, on, results: given(values) }));

describe('the findings of a record', () => {
  it('are raised by the values that the protocol names, on the day of the record', () => {
    expect(raised('SPCH-03', { vpi_suspected: { value: 'yes' } })).toEqual([{ name: 'vpi_suspected', on }]);
    expect(raised('SPCH-03', { vpi_suspected: { value: 'no' } })).toEqual([]);
  });

  it('are not raised by a field that is empty or left out', () => {
    expect(raised('SPCH-03', { vpi_suspected: { value: null, emptyBecause: 'Did not speak' } })).toEqual([]);
    expect(raised('SPCH-03', {})).toEqual([]);
  });

  it('can be several from one value, and each comes once', () => {
    const names = (id: string, values: EvidenceValues) => raised(id, values).map((finding) => finding.name);
    expect(names('MOLD-01', { option_chosen: { value: 'plate with nose stent' } })).toEqual([
      'plate_chosen',
      'stent_chosen',
    ]);
    expect(names('MOLD-01', { option_chosen: { value: 'plate' } })).toEqual(['plate_chosen']);
    const refer = { value: 'refer' };
    expect(names('EAR-01', { result_right: refer, result_left: refer })).toEqual(['screen_failed']);
  });
});
