/** A cleft code in one plain sentence, once for clinicians and once for families. Right and left are the patient's own. */
import type { CleftCode, Severity } from './cleft-code.ts';
import { cleftFacts } from './cleft-facts.ts';
import type { BySide, CleftFacts } from './cleft-facts.ts';

/** `Left cleft of lip, gum and palate, complete`. */
export function cleftForClinicians(code: CleftCode): string {
  const facts = cleftFacts(code);
  if (facts.type === 'NONE') return 'No cleft';
  const side = facts.side === null ? '' : { right: 'right ', left: 'left ', both: 'both-sided ' }[facts.side];
  return capitalised(`${side}cleft of ${structuresOf(facts)}${joinOf(facts)}, ${extentOf(facts)}`);
}

function structuresOf(facts: CleftFacts): string {
  return listed([
    ...(facts.hasLip ? ['lip'] : []),
    ...(facts.hasGum ? ['gum'] : []),
    ...(facts.hasPalate ? [palateName(facts)] : []),
  ]);
}

function palateName({ hard, soft }: CleftFacts): string {
  const isHard = hard.R !== 'none' || hard.L !== 'none';
  if (isHard && soft !== 'none') return 'palate';
  return isHard ? 'hard palate' : 'soft palate';
}

const joinOf = (facts: CleftFacts): string =>
  facts.type === 'UCLP' && facts.isContiguous === false ? ', not joined' : '';

function extentOf(facts: CleftFacts): string {
  const parts = [
    ...pairExtents('lip', facts.lip),
    ...pairExtents('gum', facts.gum),
    ...pairExtents('hard palate', facts.hard),
    ...(facts.soft === 'none' ? [] : [{ name: 'soft palate', severity: facts.soft }]),
  ];
  const [first] = parts;
  if (first && parts.every((part) => part.severity === first.severity)) return first.severity;
  return parts.map((part) => `${part.name} ${part.severity}`).join(', ');
}

function pairExtents(name: string, { R, L }: BySide): { name: string; severity: Severity }[] {
  if (R !== 'none' && L !== 'none' && R !== L) {
    return [
      { name: `right ${name}`, severity: R },
      { name: `left ${name}`, severity: L },
    ];
  }
  const severity = R === 'none' ? L : R;
  return severity === 'none' ? [] : [{ name, severity }];
}

/** `Your child has an opening in the lip and the gum on the left side and in the roof of the mouth.` */
export function cleftForFamilies(code: CleftCode): string {
  const facts = cleftFacts(code);
  if (facts.type === 'NONE') return 'No cleft has been found.';
  const front = listed([...(facts.hasLip ? ['the lip'] : []), ...(facts.hasGum ? ['the gum'] : [])]);
  const side = facts.side === 'both' ? 'on both sides' : `on the ${String(facts.side)} side`;
  const places = [
    ...(front === '' ? [] : [`in ${front} ${side}`]),
    ...(facts.hasPalate ? [`in ${roofOf(facts)}`] : []),
  ];
  const what = isSmall(facts) ? 'a small notch' : 'an opening';
  return `Your child has ${what} ${places.join(' and ')}.`;
}

function roofOf(facts: CleftFacts): string {
  const name = palateName(facts);
  if (name === 'palate') return 'the roof of the mouth';
  return name === 'hard palate'
    ? 'the hard front part of the roof of the mouth'
    : 'the soft back part of the roof of the mouth';
}

const isSmall = ({ lip, gum, hard, soft }: CleftFacts): boolean =>
  [lip.R, lip.L, gum.R, gum.L, hard.R, hard.L, soft].every(
    (severity) => severity === 'none' || severity === 'microform',
  );

function listed(words: readonly string[]): string {
  if (words.length < 2) return words.join('');
  return `${words.slice(0, -1).join(', ')} and ${String(words.at(-1))}`;
}

const capitalised = (sentence: string): string => sentence.charAt(0).toUpperCase() + sentence.slice(1);
