import { describe, expect, it } from 'vitest';
import { phaseAt, warnSeconds } from './session-clock.ts';

const clock = { activeAt: 0, idleSeconds: 900, endsAt: 36_000_000 };

describe('the clock of a session', () => {
  it('warns two minutes before the quiet end', () => {
    expect(warnSeconds).toBe(120);
    expect(phaseAt(779_000, clock)).toEqual({ kind: 'in' });
    expect(phaseAt(780_000, clock)).toEqual({ kind: 'warning', because: 'quiet', secondsLeft: 120 });
  });

  it('is over at the limit and not a second before', () => {
    expect(phaseAt(899_000, clock)).toEqual({ kind: 'warning', because: 'quiet', secondsLeft: 1 });
    expect(phaseAt(900_000, clock)).toEqual({ kind: 'over' });
  });

  it('warns before the end of the day although somebody is active', () => {
    expect(phaseAt(35_900_000, { ...clock, activeAt: 35_890_000 })).toEqual({
      kind: 'warning',
      because: 'day',
      secondsLeft: 100,
    });
  });

  it('counts quiet minutes alone when the end of the day is not known', () => {
    expect(phaseAt(36_000_001, { ...clock, activeAt: 36_000_000, endsAt: null })).toEqual({ kind: 'in' });
  });
});
