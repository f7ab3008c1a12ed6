/** What single cells may say, in the words people use for it. Every reader answers null for what it cannot read. */
import { alertKinds, childFlags } from '@weftway/contract/child';
import type { ChildFields, ChildFlag, Contact } from '@weftway/contract/child';

type Alert = ChildFields['alerts'][number];

const sexWords: ReadonlyMap<string, ChildFields['sex']> = new Map([
  ...(['f', 'female', 'girl'] as const).map((word) => [word, 'female'] as const),
  ...(['m', 'male', 'boy'] as const).map((word) => [word, 'male'] as const),
  ...(['u', 'unknown', 'not known', 'indeterminate', '?'] as const).map((word) => [word, 'unknown'] as const),
]);
export const sexOf = (cell: string): ChildFields['sex'] | null => sexWords.get(cell.toLowerCase()) ?? null;

const relationWords: ReadonlyMap<string, Contact['relation']> = new Map([
  ['mother', 'mother'],
  ['mum', 'mother'],
  ['father', 'father'],
  ['dad', 'father'],
  ['parent', 'parent'],
  ['foster carer', 'foster-carer'],
  ['foster-carer', 'foster-carer'],
  ['guardian', 'guardian'],
  ['other', 'other'],
  ['grandmother', 'other'],
  ['grandfather', 'other'],
  ['aunt', 'other'],
  ['uncle', 'other'],
]);
export const relationOf = (cell: string): Contact['relation'] | null => relationWords.get(cell.toLowerCase()) ?? null;

export const yesOrNoOf = (cell: string): boolean | null => {
  const word = cell.toLowerCase();
  if (['yes', 'y', '1', 'true', 'x'].includes(word)) return true;
  return ['no', 'n', '0', 'false', '-'].includes(word) ? false : null;
};

/** `38`, `38+4`, `38w4d`, `38 weeks 4 days`, `38/40`. */
export const gestationOf = (cell: string): { readonly weeks: number; readonly days: number } | null => {
  const match = /^(\d{1,2})(?:\s*\/\s*40|\s*(?:w|wk|weeks?))?(?:\s*\+?\s*(\d)\s*(?:\/\s*7|d|days?)?)?$/i.exec(cell);
  if (match === null) return null;
  const days = Number(match[2] ?? 0);
  return days > 6 ? null : { weeks: Number(match[1]), days };
};

const listOf = (cell: string, signs: RegExp): string[] =>
  cell
    .split(signs)
    .map((part) => part.trim())
    .filter((part) => part !== '');

export const flagsOf = (cell: string): { readonly flags: ChildFlag[]; readonly unknown: string[] } => {
  const flags = new Set<ChildFlag>();
  const unknown: string[] = [];
  for (const word of listOf(cell, /[;,|]/)) {
    const flag = childFlags.find((one) => one === word.toLowerCase().replace(/[\s-]+/g, '_'));
    if (flag === undefined) unknown.push(word);
    else flags.add(flag);
  }
  return { flags: childFlags.filter((flag) => flags.has(flag)), unknown };
};

export const syndromesOf = (cell: string): string[] => listOf(cell, /[;|]/);

/** `allergy: penicillin; latex` */
export const alertsOf = (cell: string): Alert[] =>
  listOf(cell, /[;|]/).map((part) => {
    const [, word = '', rest = ''] = /^([a-z]+)\s*:\s*(.+)$/i.exec(part) ?? [];
    const kind =
      alertKinds.find((one) => one === word.toLowerCase()) ?? alertKinds.find((one) => one === part.toLowerCase());
    return { kind: kind ?? 'other', text: kind !== undefined && rest !== '' ? rest : part };
  });

export const looksLikePhone = (cell: string): boolean =>
  /^[+(]?[\d\s()./-]{4,}(?:\s?(?:x|ext\.?)\s?\d+)?$/i.test(cell) && cell.replace(/\D/g, '').length >= 5;

/** UTF-8 text that was read as if it were a Windows code page: `Ã©` for `é`, `Å‚` for `ł`. */
export const looksMisread = (cell: string): boolean =>
  /Ã[\u0080-\u00BF\u0152-\u02DC\u2013-\u2122]|Å[\u0080-\u00BF\u201A-\u203A]|Â[\u00A0-\u00BF]|â€/.test(cell);

export const looksLikeFormula = (cell: string): boolean => /^\s*[=@\uFF1D\uFF20]|^\s*[+-](?![\d\s(])/.test(cell);
