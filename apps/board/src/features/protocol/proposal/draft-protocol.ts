/** Changes to a copy of a version: one value at a place, or one milestone back to what it was. */
import type { Protocol } from '@weftway/pathway/protocol';
import type { ProtocolFault } from '@weftway/pathway/protocol-faults';

type Step = string | number;

const put = (value: unknown, path: readonly Step[], next: unknown): unknown => {
  const [step, ...rest] = path;
  if (step === undefined) return next;
  if (Array.isArray(value)) return value.map((item: unknown, index) => (index === step ? put(item, rest, next) : item));
  const object = (typeof value === 'object' && value !== null ? value : {}) as Readonly<Record<string, unknown>>; // a JSON object
  if (rest.length === 0 && next === undefined)
    return Object.fromEntries(Object.entries(object).filter(([name]) => name !== step));
  return { ...object, [step]: put(object[step], rest, next) };
};

/** A copy with another value at a place; `undefined` takes the value away. */
export const withValue = (protocol: Protocol, path: readonly Step[], next: unknown): Protocol =>
  put(protocol, path, next) as Protocol; // checked for faults afterwards

/** The milestone, or with null everything but the milestones, as it was in the version that the proposal starts from. */
export const takenBack = (draft: Protocol, from: Protocol, id: string | null): Protocol => {
  if (id === null) return { ...from, milestones: draft.milestones };
  const before = from.milestones.find((rule) => rule.id === id);
  if (before === undefined) return { ...draft, milestones: draft.milestones.filter((rule) => rule.id !== id) };
  const isThere = draft.milestones.some((rule) => rule.id === id);
  return {
    ...draft,
    milestones: isThere
      ? draft.milestones.map((rule) => (rule.id === id ? before : rule))
      : [...draft.milestones, before],
  };
};

/** Faults that say which of the dates of a window is meant stand at that date. */
const meant = (pointer: string, message: string): string => {
  if (!/\/window$/.test(pointer)) return pointer;
  if (message.startsWith('Closing takes'))
    return /^(\/milestones\/\d+)/.exec(pointer)?.[1]?.concat('/closingDays') ?? pointer;
  return `${pointer}/${message.startsWith('The latest') ? 'latest' : 'target'}`;
};

/** The message of each place that has one, by its pointer. */
export const faultsByPlace = (faults: readonly ProtocolFault[]): ReadonlyMap<string, string> => {
  const byPlace = new Map<string, string>();
  for (const { pointer, message } of faults) {
    const place = meant(pointer, message);
    byPlace.set(place, byPlace.has(place) ? `${byPlace.get(place) ?? ''} ${message}` : message);
  }
  return byPlace;
};

export const pointerOf = (path: readonly Step[]): string => path.map((step) => `/${String(step)}`).join('');
