import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cleftCode, cleftPlaces } from './cleft-code.ts';
import type { CleftCode } from './cleft-code.ts';
import { cleftFacts, cleftLabel } from './cleft-facts.ts';
import { icd10Of } from './cleft-icd10.ts';
import { cleftForClinicians, cleftForFamilies } from './cleft-words.ts';

const anyCode = fc
  .tuple(...cleftPlaces.map(({ letter }) => fc.constantFrom(letter, letter.toLowerCase(), '*', '•')))
  .map((signs) => cleftCode(signs.join('')));
const mirrored = (code: CleftCode): CleftCode => cleftCode([...code].toReversed().join(''));

describe('what a code says', () => {
  it.each([
    ['LAHS•••', 'UCLP', 'right', 'III'],
    ['•••SHAL', 'UCLP', 'left', 'III'],
    ['LAHSHAL', 'BCLP', 'both', 'IV'],
    ['laHSHAl', 'BCLP', 'both', 'III'],
    ['••HSH••', 'CP', null, 'II'],
    ['•••S•••', 'CP', null, 'I'],
    ['L••••••', 'CL', 'right', null],
    ['•••••al', 'CLA', 'left', null],
    ['•A•••••', 'CA', 'right', null],
    ['•••••••', 'NONE', null, null],
  ])('%s is %s, side %s, Veau %s', (code, type, side, veau) => {
    expect(cleftFacts(cleftCode(code))).toMatchObject({ type, side, veau });
  });

  it('gives the sides of a graft only where the gum is open, not where it is notched', () => {
    expect(cleftFacts(cleftCode('l*HSHAL')).graftSides).toEqual(['L']);
    expect(cleftFacts(cleftCode('LaHSHAL')).graftSides).toEqual(['R', 'L']);
    expect(cleftFacts(cleftCode('l*HSHAL')).hasGum).toBe(true);
  });

  it('calls lip and palate joined only through an open gum', () => {
    expect(cleftFacts(cleftCode('LAHS•••')).isContiguous).toBe(true);
    expect(cleftFacts(cleftCode('L••S•••')).isContiguous).toBe(false);
    expect(cleftFacts(cleftCode('l*HS•••')).isContiguous).toBe(false);
    expect(cleftFacts(cleftCode('L••••••')).isContiguous).toBeNull();
  });

  it('offers molding by a lip that is complete on one side at least', () => {
    expect(cleftFacts(cleftCode('l*HSHAL')).isLipComplete).toBe(true);
    expect(cleftFacts(cleftCode('laHSHal')).isLipComplete).toBe(false);
  });

  it('swaps right and left and nothing else in the mirror', () => {
    const swapped = { right: 'left', left: 'right', both: 'both' } as const;
    fc.assert(
      fc.property(anyCode, (code) => {
        const [one, other] = [cleftFacts(code), cleftFacts(mirrored(code))];
        expect(other.type).toBe(one.type);
        expect(other.veau).toBe(one.veau);
        expect(other.side).toBe(one.side === null ? null : swapped[one.side]);
        expect(icd10Of(mirrored(code))).toEqual(icd10Of(code));
      }),
    );
  });
});

describe('labels', () => {
  it.each([
    ['LAHS•••', 'UCLP right, complete'],
    ['•••SHAL', 'UCLP left, complete'],
    ['•••SHal', 'UCLP left, incomplete lip'],
    ['laHS•••', 'UCLP right, incomplete lip'],
    ['LaHS•••', 'UCLP right, incomplete gum'],
    ['LAhS•••', 'UCLP right, incomplete palate'],
    ['LAHSHAL', 'BCLP complete'],
    ['laHSHal', 'BCLP, incomplete'],
    ['l*HSH*L', 'BCLP, asymmetric'],
    ['••HSH••', 'CP (isolated)'],
    ['••hSh••', 'CP (isolated), partial hard'],
    ['••H••••', 'CP hard'],
    ['•••S•••', 'CP soft'],
    ['•••s•••', 'CP soft, incomplete'],
    ['L••••••', 'CL right'],
    ['la•••••', 'CL+A right'],
    ['*••••••', 'CL microform'],
    ['L••S•••', 'CL + CP (not joined)'],
    ['•A•••••', 'CA right'],
    ['•••••••', 'No cleft'],
  ])('%s is %s', (code, label) => {
    expect(cleftLabel(cleftCode(code))).toBe(label);
  });
});

describe('in words', () => {
  it.each([
    ['•••SHAL', 'Left cleft of lip, gum and palate, complete'],
    ['LAHSHAL', 'Both-sided cleft of lip, gum and palate, complete'],
    [
      'l*HSH*L',
      'Both-sided cleft of lip, gum and palate, right lip incomplete, left lip complete, gum microform, hard palate complete, soft palate complete',
    ],
    [
      'laHS•••',
      'Right cleft of lip, gum and palate, lip incomplete, gum incomplete, hard palate complete, soft palate complete',
    ],
    ['••HSH••', 'Cleft of palate, complete'],
    ['•••s•••', 'Cleft of soft palate, incomplete'],
    ['••H••••', 'Cleft of hard palate, complete'],
    ['L••S•••', 'Right cleft of lip and soft palate, not joined, complete'],
    ['*••••••', 'Right cleft of lip, microform'],
    ['•••••••', 'No cleft'],
  ])('%s reads to clinicians: %s', (code, sentence) => {
    expect(cleftForClinicians(cleftCode(code))).toBe(sentence);
  });

  it.each([
    ['•••SHAL', 'Your child has an opening in the lip and the gum on the left side and in the roof of the mouth.'],
    ['L•••••l', 'Your child has an opening in the lip on both sides.'],
    ['•••S•••', 'Your child has an opening in the soft back part of the roof of the mouth.'],
    ['••H••••', 'Your child has an opening in the hard front part of the roof of the mouth.'],
    ['*••••••', 'Your child has a small notch in the lip on the right side.'],
    ['•••••••', 'No cleft has been found.'],
  ])('%s reads to families: %s', (code, sentence) => {
    expect(cleftForFamilies(cleftCode(code))).toBe(sentence);
  });

  it('always end in something that can be read aloud', () => {
    fc.assert(
      fc.property(anyCode, (code) => !/undefined|null|none|•/.test(cleftForClinicians(code) + cleftForFamilies(code))),
    );
  });
});

describe('ICD-10 flags', () => {
  it('tells a split uvula from a cleft of the soft palate', () => {
    expect(icd10Of(cleftCode('•••s•••'))?.code).toBe('Q35.3');
    expect(icd10Of(cleftCode('•••s•••'), { isUvulaOnly: true })?.code).toBe('Q35.7');
    expect(icd10Of(cleftCode('•••••••'), { isUvulaOnly: true })?.code).toBe('Q35.7');
  });

  it('codes a cleft in the middle of the lip, which the seven places cannot write', () => {
    expect(icd10Of(cleftCode('•••••••'), { isMidlineLip: true })).toEqual({
      code: 'Q36.1',
      title: 'Cleft lip, median',
    });
    expect(icd10Of(cleftCode('L•••••L'), { isMidlineLip: true })?.code).toBe('Q36.0');
    expect(icd10Of(cleftCode('••HSH••'), { isMidlineLip: true })?.code).toBe('Q37.5');
  });

  it('puts a submucous cleft under the unspecified code', () => {
    expect(icd10Of(cleftCode('•••••••'), { isSubmucous: true })?.code).toBe('Q35.9');
    expect(icd10Of(cleftCode('L•••••L'), { isSubmucous: true })?.code).toBe('Q37.8');
    expect(icd10Of(cleftCode('••HSH••'), { isSubmucous: true })?.code).toBe('Q35.5');
  });
});
