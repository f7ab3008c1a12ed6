import { describe, expect, it } from 'vitest';
import { defaultProtocol } from './default-protocol.ts';
import type { Completion } from './pathway-facts.ts';
import { readinessOn } from './readiness.ts';
import { childFacts, day, done } from './testing/child-facts.ts';

const screen = (on: string): Completion => ({
  milestone: 'CARE-03',
  on: day(on),
  results: { safe_for_anaesthesia: 'with plan', safe_for_plate: 'yes' },
});
const fit = (milestone: string, on: string): Completion => ({ milestone, on: day(on), results: { fit: 'yes' } });

/** Small jaw and palate cleft, the palate repair booked for 14 September 2026 (third worked example). */
function cardWith(completions: readonly Completion[]) {
  const facts = childFacts({ birth: day('2025-05-20'), cleft: '••hSh••', flags: ['robin'], completions });
  const card = readinessOn(defaultProtocol, facts, day('2026-08-20'), { milestone: 'SURG-03', on: day('2026-09-14') });
  return (milestone: string, type = 'check') =>
    card.find((wait) => wait.milestone === milestone && wait.type === type)?.cause;
}

describe('a readiness card judges on the booked day', () => {
  it('takes a screen of 20 July, not one of the day before', () => {
    expect(cardWith([screen('2026-07-20')])('CARE-03', 'gate')).toBe('met');
    expect(cardWith([screen('2026-07-19')])('CARE-03', 'gate')).toBe('stale');
  });

  it('takes a hearing test of 14 June, not one of the day before', () => {
    expect(cardWith(done({ 'EAR-03': ['2026-06-14'] }))('EAR-03')).toBe('met');
    expect(cardWith(done({ 'EAR-03': ['2026-06-13'] }))('EAR-03')).toBe('stale');
  });

  it('takes the fitness check of this operation, not that of another', () => {
    expect(cardWith([fit('CARE-04:SURG-03', '2026-08-15')])('CARE-04:SURG-03')).toBe('met');
    expect(cardWith([fit('CARE-04:SURG-03', '2026-08-14')])('CARE-04:SURG-03')).toBe('stale');
    expect(cardWith([fit('CARE-04:SURG-01', '2026-08-15')])('CARE-04:SURG-03')).toBe('not-signed');
  });

  it('a milestone that is not on the path has no card', () => {
    const card = readinessOn(defaultProtocol, childFacts({ cleft: '••HSH••' }), day('2026-08-20'), {
      milestone: 'SURG-01',
      on: day('2026-09-14'),
    });
    expect(card).toEqual([]);
  });
});
