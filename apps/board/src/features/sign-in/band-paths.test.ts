import { describe, expect, it } from 'vitest';
import { ageX, bandView, fitsInView, knots, weftPaths } from './band-paths.ts';

describe('the woven band', () => {
  it('has eleven threads, one of them in indigo', () => {
    expect(weftPaths).toHaveLength(11);
    expect(weftPaths.filter(({ look }) => look === 'own')).toHaveLength(1);
  });

  it('what is tied lies left of what is open, which lies left of what is ahead', () => {
    const xs = (kind: string): number[] => knots.filter((knot) => knot.kind === kind).map(({ x }) => x);
    expect(Math.max(...xs('signed'))).toBeLessThan(Math.min(...xs('open')));
    expect(Math.max(...xs('open'))).toBeLessThan(Math.min(...xs('ahead')));
  });

  it.each([320, 390, 640, 900, 1440, 1920])('at %i pixels it fills the screen and shows birth', (screen) => {
    const view = bandView(screen);
    expect(view.width * view.scale).toBeCloseTo(screen, 6);
    expect(fitsInView(view, ageX(0))).toBe(true);
  });

  it('drops a label that would be cut', () => {
    expect(fitsInView(bandView(390), ageX(144))).toBe(false);
  });
});
