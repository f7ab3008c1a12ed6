import { describe, expect, it } from 'vitest';
import { defaultProtocol } from './default-protocol.ts';
import { childFacts, day, done } from './testing/child-facts.ts';
import { whatIf } from './what-if.ts';

const today = day('2026-05-01');
const find = (differences: ReturnType<typeof whatIf>, key: string) => differences.find((one) => one.key === key);

describe('what would move', () => {
  it('a lip operation that slips sixteen weeks moves the opening of the palate repair, not its latest date', () => {
    const facts = childFacts({ bookings: [{ milestone: 'SURG-01', on: day('2026-05-12') }] });
    const differences = whatIf(defaultProtocol, facts, today, { kind: 'slip', milestone: 'SURG-01', weeks: 16 });
    expect(find(differences, 'SURG-03')?.daysMoved).toEqual({ earliest: 40, target: 0, latest: 0 });
    expect(find(differences, 'SURG-02')?.daysMoved).toEqual({ earliest: 112, target: 112, latest: 112 });
    expect(find(differences, 'EAR-02')).toBeUndefined();
  });

  it('a waived molding end opens the lip repair', () => {
    const facts = childFacts({ completions: done({ 'MOLD-03': ['2026-02-09'] }) });
    const differences = whatIf(defaultProtocol, facts, today, { kind: 'waive', milestone: 'MOLD-06' });
    const lip = find(differences, 'SURG-01');
    expect([lip?.before.state, lip?.after.state]).toEqual(['waiting', 'open']);
    expect(lip?.daysMoved).toEqual({ earliest: 0, target: 0, latest: 0 });
  });

  it('a booking brings the fitness check', () => {
    const differences = whatIf(defaultProtocol, childFacts(), today, {
      kind: 'book',
      milestone: 'SURG-01',
      on: day('2026-06-12'),
    });
    expect(find(differences, 'CARE-04:SURG-01')?.after.window?.latest).toBe('2026-06-09');
  });

  it('writes nothing: the facts are as before', () => {
    const facts = childFacts({ completions: done({ 'SURG-01': ['2026-04-20'] }) });
    const before = structuredClone(facts);
    whatIf(defaultProtocol, facts, today, { kind: 'slip', milestone: 'SURG-01', weeks: 4 });
    expect(facts).toEqual(before);
  });

  it('a milestone without a date to slip from changes nothing', () => {
    expect(whatIf(defaultProtocol, childFacts(), today, { kind: 'slip', milestone: 'SURG-02', weeks: 4 })).toEqual([]);
  });
});
