import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cleftCode, cleftPlaces, cleftWarnings, formatCleftCode, parseCleftCode, severitiesOf } from './cleft-code.ts';

/** Any code that can be written. */
const anyCode = fc
  .tuple(...cleftPlaces.map(({ letter }) => fc.constantFrom(letter, letter.toLowerCase(), '*', '•')))
  .map((signs) => signs.join(''));

const messageOf = (text: string) => {
  const reading = parseCleftCode(text);
  return reading.ok ? null : reading.message;
};

describe('reading a cleft code', () => {
  it('gives back what was written, for every code there is', () => {
    fc.assert(
      fc.property(anyCode, (code) => {
        const reading = parseCleftCode(formatCleftCode(cleftCode(code)));
        expect(reading).toEqual({ ok: true, code });
      }),
    );
  });

  it('accepts blanks, brackets and every sign for no cleft, and stores one', () => {
    fc.assert(
      fc.property(
        anyCode,
        fc.array(fc.constantFrom('.', '-', '_', '·', '•'), { minLength: 7, maxLength: 7 }),
        (code, nones) => {
          const typed = [...code].map((sign, place) => (sign === '•' ? nones[place] : sign)).join(' ');
          expect(parseCleftCode(` [${typed}] `)).toEqual({ ok: true, code });
        },
      ),
    );
  });

  it('never changes the case', () => {
    expect(cleftCode('lahSHAL')).toBe('lahSHAL');
    expect(cleftCode('lahshal')).not.toBe(cleftCode('LAHSHAL'));
  });

  it('names the place that is wrong', () => {
    expect(messageOf('LXHSHAL')).toBe('Place 2 is the right gum: A, a, * or •, not X.');
    expect(messageOf('HAL....')).toBe('Place 1 is the right lip: L, l, * or •, not H.');
    expect(parseCleftCode('LAHSHAX')).toMatchObject({ fault: 'wrong-sign', place: 7 });
  });

  it('says how many places there are when there are not seven', () => {
    expect(messageOf('LAHSHALX')).toBe('A code has seven places, this one has 8.');
    expect(messageOf('LAH')).toBe('A code has seven places, this one has 3.');
    expect(messageOf(' [] ')).toBe('There is no code; write seven places.');
  });

  it('takes the six-place form only with the side of its H', () => {
    expect(messageOf('LAHSAL')).toBe(
      'Six places: this is the form with one H. Say on which side the hard palate is open.',
    );
    expect(parseCleftCode('LAHSAL', { hardSide: 'both' })).toEqual({ ok: true, code: 'LAHSHAL' });
    expect(parseCleftCode('LAHS--', { hardSide: 'R' })).toEqual({ ok: true, code: 'LAHS•••' });
    expect(parseCleftCode('--hSAL', { hardSide: 'L' })).toEqual({ ok: true, code: '•••ShAL' });
    expect(parseCleftCode('L----L')).toEqual({ ok: true, code: 'L•••••L' });
  });

  it('throws on a literal that is not a code', () => {
    expect(() => cleftCode('LAHSHA?')).toThrow('Place 7 is the left lip');
  });

  it('reads how far each place is open', () => {
    expect(severitiesOf(cleftCode('l*HSh•L'))).toEqual([
      'incomplete',
      'microform',
      'complete',
      'complete',
      'incomplete',
      'none',
      'complete',
    ]);
  });
});

describe('warnings', () => {
  it.each([
    ['•AHS•••', 'The right gum is cleft and the right lip whole: this is rare, look again.'],
    ['•••SHA•', 'The left gum is cleft and the left lip whole: this is rare, look again.'],
    ['••H••••', 'The hard palate is cleft and the soft palate whole: this is rare, look again.'],
    ['l*HS•••', 'The gum is notched only: the orthodontist decides whether it needs a graft.'],
  ])('%s: %s', (code, warning) => {
    expect(cleftWarnings(cleftCode(code))).toEqual([warning]);
  });

  it('are not given for the usual patterns', () => {
    for (const code of ['LAHSHAL', '•••SHAL', 'LAHS•••', '••HSH••', '•••s•••', 'L••••••', 'la•••••', '•••••••']) {
      expect(cleftWarnings(cleftCode(code))).toEqual([]);
    }
  });
});
