/**
 * Cleft codes and their ICD-10 codes, case by case, with the source of each.
 *
 * "ICD-10-GM 2014": code list of the German modification 2014, chapter Q35 to Q37, which prints a LAHSHAL pattern beside
 * each code. "by rule from the ICD-10 titles": the pattern was not seen in print; the WHO title decides.
 */
import { describe, expect, it } from 'vitest';
import { cleftCode, parseCleftCode } from '../../packages/pathway/src/cleft-code.ts';
import { icd10Of, icd10Titles } from '../../packages/pathway/src/cleft-icd10.ts';

const cases: readonly (readonly [code: string, icd10: keyof typeof icd10Titles | null, source: string])[] = [
  ['••H••••', 'Q35.1', 'ICD-10-GM 2014'],
  ['••••H••', 'Q35.1', 'ICD-10-GM 2014'],
  ['••H•H••', 'Q35.1', 'ICD-10-GM 2014'],
  ['•••S•••', 'Q35.3', 'ICD-10-GM 2014'],
  ['••HSH••', 'Q35.5', 'ICD-10-GM 2014'],
  ['L•••••L', 'Q36.0', 'ICD-10-GM 2014'],
  ['L••••••', 'Q36.9', 'ICD-10-GM 2014'],
  ['••••••L', 'Q36.9', 'ICD-10-GM 2014'],
  ['•••*•••', 'Q35.7', 'by rule from the ICD-10 titles'],
  ['•••s•••', 'Q35.3', 'by rule from the ICD-10 titles'],
  ['LA•••••', 'Q36.9', 'by rule from the ICD-10 titles'],
  ['LA•••AL', 'Q36.0', 'by rule from the ICD-10 titles'],
  ['l••••••', 'Q36.9', 'by rule from the ICD-10 titles'],
  ['*•••••L', 'Q36.0', 'by rule from the ICD-10 titles'],
  ['LAHSHAL', 'Q37.4', 'by rule from the ICD-10 titles'],
  ['LAHS•••', 'Q37.5', 'by rule from the ICD-10 titles'],
  ['•••SHAL', 'Q37.5', 'by rule from the ICD-10 titles'],
  ['LAH••••', 'Q37.1', 'by rule from the ICD-10 titles'],
  ['LAH•HAL', 'Q37.0', 'by rule from the ICD-10 titles'],
  ['L••S•••', 'Q37.3', 'by rule from the ICD-10 titles'],
  ['L••S••L', 'Q37.2', 'by rule from the ICD-10 titles'],
  ['laHSh••', 'Q37.5', 'by rule from the ICD-10 titles'],
  ['lahSHAL', 'Q37.4', 'by rule from the ICD-10 titles'],
  ['•AHS•••', 'Q35.5', 'by rule from the ICD-10 titles'],
  ['•A•••••', null, 'by rule from the ICD-10 titles'],
  ['•••••••', null, 'by rule from the ICD-10 titles'],
];

describe('ICD-10 codes of clefts', () => {
  it.each(cases)('%s is %s (%s)', (code, icd10) => {
    const found = icd10Of(cleftCode(code));
    expect(found?.code ?? null).toBe(icd10);
    if (found) expect(found.title).toBe(icd10Titles[found.code]);
  });

  it.each([
    ['- - H S H - -', '••HSH••'],
    ['L A H S - - -', 'LAHS•••'],
    ['lahshal', 'lahshal'],
    ['___S___', '•••S•••'],
    ['LAHS HAL', 'LAHSHAL'],
  ])('%s is read as %s', (typed, stored) => {
    expect(parseCleftCode(typed)).toEqual({ ok: true, code: stored });
  });

  it.each([
    ['LAHSAL', 'six-places'],
    ['LAHSHALX', 'wrong-length'],
    ['LXHSHAL', 'wrong-sign'],
    ['HAL....', 'wrong-sign'],
    ['', 'empty'],
  ])('“%s” is refused: %s', (typed, fault) => {
    expect(parseCleftCode(typed)).toMatchObject({ ok: false, fault });
  });
});
