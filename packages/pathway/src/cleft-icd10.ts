/**
 * ICD-10 (WHO) code of a cleft, chapter XVII, Q35 to Q37. The classification knows neither the gum, nor how far a cleft
 * goes, nor left from right; so it is derived for registries and never the working code. National editions differ.
 */
import type { CleftCode } from './cleft-code.ts';
import { cleftFacts } from './cleft-facts.ts';
import type { CleftFacts } from './cleft-facts.ts';

/** Titles of the WHO edition. */
export const icd10Titles = {
  'Q35.1': 'Cleft hard palate',
  'Q35.3': 'Cleft soft palate',
  'Q35.5': 'Cleft hard palate with cleft soft palate',
  'Q35.7': 'Cleft uvula',
  'Q35.9': 'Cleft palate, unspecified',
  'Q36.0': 'Cleft lip, bilateral',
  'Q36.1': 'Cleft lip, median',
  'Q36.9': 'Cleft lip, unilateral',
  'Q37.0': 'Cleft hard palate with bilateral cleft lip',
  'Q37.1': 'Cleft hard palate with unilateral cleft lip',
  'Q37.2': 'Cleft soft palate with bilateral cleft lip',
  'Q37.3': 'Cleft soft palate with unilateral cleft lip',
  'Q37.4': 'Cleft hard and soft palate with bilateral cleft lip',
  'Q37.5': 'Cleft hard and soft palate with unilateral cleft lip',
  'Q37.8': 'Unspecified cleft palate with bilateral cleft lip',
  'Q37.9': 'Unspecified cleft palate with unilateral cleft lip',
} as const;

export type Icd10Code = keyof typeof icd10Titles;

/** What the seven places cannot say. */
export interface CleftFlags {
  /** Only the uvula is split. A soft palate marked `*` says the same. */
  readonly isUvulaOnly?: boolean;
  /** A cleft in the middle of the lip. */
  readonly isMidlineLip?: boolean;
  /** The skin of the palate is whole, the muscle beneath is not: Q35.9 by common practice. */
  readonly isSubmucous?: boolean;
}

type Palate = 'hard-and-soft' | 'hard' | 'soft' | 'unknown' | 'none';

const withLip: Readonly<Record<Exclude<Palate, 'none'>, readonly [bilateral: Icd10Code, unilateral: Icd10Code]>> = {
  'hard-and-soft': ['Q37.4', 'Q37.5'],
  hard: ['Q37.0', 'Q37.1'],
  soft: ['Q37.2', 'Q37.3'],
  unknown: ['Q37.8', 'Q37.9'],
};

/** The code and its title; null when no code of Q35 to Q37 fits (no cleft, or the gum alone: a person decides). */
export function icd10Of(code: CleftCode, flags: CleftFlags = {}): { code: Icd10Code; title: string } | null {
  const found = codeOf(cleftFacts(code), flags);
  return found === null ? null : { code: found, title: icd10Titles[found] };
}

function codeOf(facts: CleftFacts, flags: CleftFlags): Icd10Code | null {
  const palate = palateOf(facts, flags);
  const isBilateral = facts.hasLip && facts.side === 'both';
  if (facts.hasLip || flags.isMidlineLip === true) {
    if (palate !== 'none') return withLip[palate][isBilateral ? 0 : 1];
    if (isBilateral) return 'Q36.0';
    return flags.isMidlineLip === true ? 'Q36.1' : 'Q36.9';
  }
  switch (palate) {
    case 'hard-and-soft':
      return 'Q35.5';
    case 'hard':
      return 'Q35.1';
    case 'soft':
      return flags.isUvulaOnly === true || facts.soft === 'microform' ? 'Q35.7' : 'Q35.3';
    case 'unknown':
      return 'Q35.9';
    case 'none':
      return null;
  }
}

function palateOf({ hard, soft }: CleftFacts, flags: CleftFlags): Palate {
  const isHard = hard.R !== 'none' || hard.L !== 'none';
  if (soft !== 'none') return isHard ? 'hard-and-soft' : 'soft';
  if (isHard) return 'hard';
  if (flags.isUvulaOnly === true) return 'soft';
  return flags.isSubmucous === true ? 'unknown' : 'none';
}
