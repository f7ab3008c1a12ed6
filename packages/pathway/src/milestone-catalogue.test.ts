import { plainDate } from '@weftway/calendar/plain-date';
import { describe, expect, it } from 'vitest';
import { defaultProtocol } from './default-protocol.ts';
import { milestoneCatalogue, ownMilestone } from './milestone-catalogue.ts';
import { readProtocol } from './protocol-faults.ts';

const template = milestoneCatalogue[0];
const days = {
  number: 7,
  title: 'Close the hole behind the teeth',
  addedOn: plainDate('2026-12-01'),
  earliest: plainDate('2026-11-20'),
  target: plainDate('2027-01-01'),
  latest: plainDate('2027-01-11'),
};

describe('the catalogue of milestones outside the protocol', () => {
  it('fits into the default protocol without a fault', () => {
    const reading = readProtocol({
      ...defaultProtocol,
      milestones: [...defaultProtocol.milestones, ...milestoneCatalogue],
    });
    expect(reading.ok ? [] : reading.faults).toEqual([]);
  });

  it('numbers its templates and keeps short titles short', () => {
    expect(milestoneCatalogue.map((rule) => rule.id).slice(0, 2)).toEqual(['OWN-01', 'OWN-02']);
    expect(milestoneCatalogue.filter((rule) => rule.shortTitle.length > 24)).toEqual([]);
  });

  it('asks for fitness before every operation', () => {
    const operations = milestoneCatalogue.filter((rule) => rule.isOperation);
    expect(operations.length).toBeGreaterThan(4);
    expect(operations.every((rule) => rule.prerequisites.some((need) => need.milestone === 'CARE-04'))).toBe(true);
  });
});

describe('a milestone added for one child', () => {
  it('counts the given days from the day of adding', () => {
    if (!template) throw new Error('The catalogue is empty.');
    const { rule, finding } = ownMilestone(template, days);
    expect(rule).toMatchObject({
      id: 'OWN-07',
      title: 'Close the hole behind the teeth',
      clock: { from: 'finding', finding: 'added_own_07' },
      window: { earliest: '-11d', target: '31d', latest: '41d' },
      closingDays: 52,
      isOperation: true,
    });
    expect(finding).toEqual({ name: 'added_own_07', on: '2026-12-01' });
    expect(readProtocol({ ...defaultProtocol, milestones: [...defaultProtocol.milestones, rule] }).ok).toBe(true);
  });

  it('is refused with days out of order', () => {
    if (!template) throw new Error('The catalogue is empty.');
    expect(() => ownMilestone(template, { ...days, target: plainDate('2028-01-01') })).toThrow('in order');
  });
});
