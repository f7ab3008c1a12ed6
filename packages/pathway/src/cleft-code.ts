/**
 * The cleft code LAHSHAL: seven places, read like a face seen from the front, the patient's right on the left
 * (Kriens 1989; page of the Bristol dental hospital). A capital is a complete cleft, a small letter an incomplete one,
 * `*` a microform and `•` no cleft. Case carries meaning and is never changed.
 */
import type { Side } from './pathway-facts.ts';

/** Seven places, `•` for no cleft: `•••SHAL`. */
export type CleftCode = string & { readonly __brand: 'CleftCode' };

export const severities = ['none', 'microform', 'incomplete', 'complete'] as const;
export type Severity = (typeof severities)[number];

export const cleftPlaces = [
  { name: 'right lip', letter: 'L' },
  { name: 'right gum', letter: 'A' },
  { name: 'right hard palate', letter: 'H' },
  { name: 'soft palate', letter: 'S' },
  { name: 'left hard palate', letter: 'H' },
  { name: 'left gum', letter: 'A' },
  { name: 'left lip', letter: 'L' },
] as const;

export type CleftFaultCode = 'empty' | 'six-places' | 'wrong-length' | 'wrong-sign';

export type CleftReading =
  | { readonly ok: true; readonly code: CleftCode }
  | { readonly ok: false; readonly fault: CleftFaultCode; readonly place: number | null; readonly message: string };

const signsOfNone = '.-_·•';
const noCleft = '•';

/**
 * Reads a code as typed. Blanks are stripped, brackets around it and `. - _ ·` for "no cleft" are accepted.
 * The six-place form with a single H is accepted only with the side of that H. Refusals name the place, counted from 1.
 */
export function parseCleftCode(text: string, options: { readonly hardSide?: Side | 'both' } = {}): CleftReading {
  const stripped = text.replace(/\s/gu, '').replace(/^\[/u, '').replace(/\]$/u, '');
  const signs = [...stripped].map((sign) => (signsOfNone.includes(sign) ? noCleft : sign));
  if (signs.length === 0) return refusal('empty', null, 'There is no code; write seven places.');
  if (signs.length === 6) return parseSixPlaces(signs, options.hardSide);
  return parseSevenPlaces(signs);
}

function parseSevenPlaces(signs: readonly string[]): CleftReading {
  for (const [index, place] of cleftPlaces.entries()) {
    const sign = signs[index];
    if (sign === undefined) break;
    const allowed = [place.letter, place.letter.toLowerCase(), '*', noCleft];
    if (!allowed.includes(sign)) {
      const list = `${allowed.slice(0, 3).join(', ')} or ${noCleft}`;
      const message = `Place ${String(index + 1)} is the ${place.name}: ${list}, not ${sign}.`;
      return refusal('wrong-sign', index + 1, message);
    }
  }
  if (signs.length !== cleftPlaces.length) {
    return refusal('wrong-length', null, `A code has seven places, this one has ${String(signs.length)}.`);
  }
  // Every place has just been checked.
  return { ok: true, code: signs.join('') as CleftCode };
}

function parseSixPlaces(signs: readonly string[], hardSide: Side | 'both' | undefined): CleftReading {
  const hard = signs[2] ?? noCleft;
  if (hardSide === undefined && hard !== noCleft) {
    return refusal(
      'six-places',
      3,
      'Six places: this is the form with one H. Say on which side the hard palate is open.',
    );
  }
  const right = hardSide === 'L' ? noCleft : hard;
  const left = hardSide === 'R' ? noCleft : hard;
  return parseSevenPlaces([...signs.slice(0, 2), right, ...signs.slice(3, 4), left, ...signs.slice(4)]);
}

const refusal = (fault: CleftFaultCode, place: number | null, message: string): CleftReading => ({
  ok: false,
  fault,
  place,
  message,
});

/** A code that is known to be good, such as a literal. Throws a RangeError with the refusal when it is not. */
export function cleftCode(text: string): CleftCode {
  const reading = parseCleftCode(text);
  if (!reading.ok) throw new RangeError(reading.message);
  return reading.code;
}

/** The code as it is printed, in brackets: `[•••SHAL]`. */
export const formatCleftCode = (code: CleftCode): string => `[${code}]`;

/** How far each of the seven places is cleft, in the order of the code. */
export function severitiesOf(code: CleftCode): readonly Severity[] {
  return [...code].map((sign) => {
    if (sign === noCleft) return 'none';
    if (sign === '*') return 'microform';
    return sign === sign.toUpperCase() ? 'complete' : 'incomplete';
  });
}

/** Patterns that are rare enough to ask again; they never stop a code from being stored. */
export function cleftWarnings(code: CleftCode): string[] {
  const at = [...code].map((sign) => sign !== noCleft);
  const warnings: string[] = [];
  if (at[1] && !at[0]) warnings.push('The right gum is cleft and the right lip whole: this is rare, look again.');
  if (at[5] && !at[6]) warnings.push('The left gum is cleft and the left lip whole: this is rare, look again.');
  if ((at[2] || at[4]) && !at[3])
    warnings.push('The hard palate is cleft and the soft palate whole: this is rare, look again.');
  if (code.charAt(1) === '*' || code.charAt(5) === '*') {
    warnings.push('The gum is notched only: the orthodontist decides whether it needs a graft.');
  }
  return warnings;
}
