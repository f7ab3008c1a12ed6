/**
 * Correction for prematurity: the base from which corrected ages are counted.
 * American Academy of Pediatrics, "Age terminology during the perinatal period", Pediatrics 2004;114:1362-4: a child
 * born before 37 weeks is counted from the expected date of birth, 280 days after the start of the pregnancy.
 */
import { addDays, type PlainDate } from './plain-date.ts';

export interface Gestation {
  readonly weeks: number;
  readonly days: number;
}

const fullTermDays = 280;
const pretermBelowDays = 37 * 7;

/** Days between birth and the expected date when born before 37 weeks 0 days; else 0. Unknown gestation: 0. */
export function correctionDays(gestation: Gestation | null): number {
  if (!gestation) return 0;
  const atBirth = gestation.weeks * 7 + gestation.days;
  return atBirth < pretermBelowDays ? fullTermDays - atBirth : 0;
}

/** Date from which corrected ages count. */
export function correctedBase(birth: PlainDate, gestation: Gestation | null): PlainDate {
  return addDays(birth, correctionDays(gestation));
}
