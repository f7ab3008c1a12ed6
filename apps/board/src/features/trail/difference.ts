/** What a line of the trail changed, as rows of words: one row for each thing that differs. */
import { formatDate } from '@weftway/calendar/format-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import { disciplineNames } from '@weftway/team/disciplines';
import { fieldWords, trailWords, valueNames } from '../../words/trail.ts';

export interface DifferenceRow {
  readonly label: string;
  /** Null where the line says nothing of a before. */
  readonly before: string | null;
  readonly after: string;
}

type Json = Readonly<Record<string, unknown>>;
/** Name of a member by id; undefined for anything else. */
export type NameOf = (id: string) => string | undefined;

const isObject = (value: unknown): value is Json =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

/** Ids and digests that say nothing to a reader. */
const silent: readonly string[] = [
  'id',
  'digest',
  'previousDigest',
  'signedText',
  'milestone',
  'signerId',
  'signedAt',
  'signedOn',
  'importId',
  'draftedById',
];

const names: Readonly<Record<string, string>> = disciplineNames;

const valueWords = (value: unknown, nameOf: NameOf): string => {
  if (value === null || value === undefined || value === '') return trailWords.nothing;
  if (typeof value === 'boolean') return value ? trailWords.yes : trailWords.no;
  if (Array.isArray(value))
    return value.length === 0 ? trailWords.nothing : value.map((one: unknown) => valueWords(one, nameOf)).join(', ');
  if (typeof value !== 'string') return String(value);
  if (/^\d{4}-\d{2}-\d{2}$/.test(value)) return formatDate(value as PlainDate); // the shape was just checked
  return nameOf(value) ?? names[value] ?? value;
};

/** `{ value, emptyBecause }` of evidence is one value. */
const evidenceWords = (value: Json, nameOf: NameOf): string =>
  value['value'] === null && typeof value['emptyBecause'] === 'string'
    ? `${trailWords.nothing}, ${fieldWords('emptyBecause')} ${value['emptyBecause']}`
    : valueWords(value['value'], nameOf);

const isEvidence = (value: Json): boolean =>
  'value' in value && Object.keys(value).every((key) => ['value', 'emptyBecause', 'isConfirmed'].includes(key));

/** Wrappers whose own name adds nothing. */
const transparent: readonly string[] = ['fields', 'signature', 'values', 'results', 'cover'];

/** Every value with its words, by label. */
const flat = (payload: unknown, nameOf: NameOf, path: readonly string[] = []): [string, string][] => {
  if (isObject(payload) && isEvidence(payload)) return [[path.join(', '), evidenceWords(payload, nameOf)]];
  const isListOfObjects = Array.isArray(payload) && payload.some(isObject);
  if (!isObject(payload) && !isListOfObjects)
    return path.length === 0 ? [] : [[path.join(', '), valueWords(payload, nameOf)]];
  return Object.entries(payload as object)
    .filter(([name]) => !silent.includes(name))
    .map(([name, value]): [string, unknown] => [
      name,
      name === 'because' ? (valueNames[String(value)] ?? value) : value,
    ])
    .flatMap(([name, value]) =>
      flat(
        value,
        nameOf,
        transparent.includes(name) && (isObject(value) || value === null) && path.length < 2
          ? value === null
            ? [...path, fieldWords(name)]
            : path
          : [...path, fieldWords(name)],
      ),
    );
};

/** Rows that differ; everything that the line wrote when it says nothing of a before. */
export const differenceRows = (before: unknown, after: unknown, nameOf: NameOf): DifferenceRow[] => {
  const now = flat(after, nameOf);
  // What was left empty without a word is not worth a row.
  if (before === null || before === undefined)
    return now
      .filter(([, text]) => text !== trailWords.nothing)
      .map(([label, text]) => ({ label, before: null, after: text }));
  const old = new Map(flat(before, nameOf));
  const current = new Map(now);
  const labels = [...new Set([...old.keys(), ...current.keys()])];
  return (
    labels
      .filter((label) => old.get(label) !== current.get(label))
      // What only the new state speaks of, such as a reason, has no before.
      .map((label) => ({
        label,
        before: old.get(label) ?? trailWords.nothing,
        after: current.get(label) ?? trailWords.nothing,
      }))
  );
};
