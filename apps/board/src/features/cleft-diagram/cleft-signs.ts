/** Signs of the code to severities of the seven places and back, lenient towards half-typed codes. */
import { cleftPlaces, severities, type CleftCode, type Severity } from '@weftway/pathway/cleft-code';

const signOf = (place: number, severity: Severity): string => {
  const letter = cleftPlaces[place]?.letter ?? '•';
  return { none: '•', microform: '*', incomplete: letter.toLowerCase(), complete: letter }[severity];
};

/** What each place shows for any text, readable as a code or not: places that cannot be read are whole. */
export const severitiesIn = (text: string): readonly Severity[] => {
  const signs = [...text.replace(/[[\]\s]/g, '')];
  return cleftPlaces.map(
    (_place, index) =>
      severities.find((severity) => severity !== 'none' && signs[index] === signOf(index, severity)) ?? 'none',
  );
};

/** Every place is written from its own list of signs, so the text is a code. */
export const codeFrom = (shown: readonly Severity[]): CleftCode =>
  cleftPlaces.map((_place, index) => signOf(index, shown[index] ?? 'none')).join('') as CleftCode;

export const withSeverity = (shown: readonly Severity[], place: number, severity: Severity): CleftCode =>
  codeFrom(shown.map((one, index) => (index === place ? severity : one)));

export const severityAfter = (severity: Severity): Severity =>
  severities[(severities.indexOf(severity) + 1) % severities.length] ?? 'none';

/** One step more or less; stays at the ends. */
export const severityBy = (severity: Severity, step: 1 | -1): Severity =>
  severities[Math.min(Math.max(severities.indexOf(severity) + step, 0), severities.length - 1)] ?? 'none';
