/**
 * Turns the conditions of a protocol into functions over a table of facts that hold for one child.
 * Each name of a fact gets a number; a name that nobody recorded counts as false.
 */
import type { Condition } from './condition.ts';

/** `truth[number of the name]` is 1 where the fact holds. */
export type FactTest = (truth: Uint8Array) => boolean;

const anatomyNames: readonly string[] = ['lip', 'gum', 'palate', 'lip_complete', 'gum_notched', 'two_sided'];

/** Stored facts of the examination and trigger findings: unstated they are false, also where conditions are taken as given. */
const statedNames: readonly string[] = [
  ...anatomyNames,
  ...['smcp', 'robin', 'airway', 'syndrome'],
  ...['gap_le_5mm', 'fistula_symptomatic', 'tubes_decided', 'vpi_suspected', 'root_low'],
  ...['sex_male', 'sex_unknown', 'operation_is_palate'],
];

/** The number of each name that some rule reads. */
export type FactNames = Map<string, number>;

/** The number of a name, a new one at the first asking. */
export function numberOfFact(names: FactNames, name: string): number {
  const known = names.get(name);
  if (known !== undefined) return known;
  names.set(name, names.size);
  return names.size - 1;
}

/**
 * The test of a condition. Names in `never` are false whatever is recorded.
 * With `given`, names that are neither anatomy nor a stored finding hold.
 */
export function compileCondition(
  condition: Condition,
  names: FactNames,
  options: { readonly given?: boolean; readonly never?: readonly string[] } = {},
): FactTest {
  if (typeof condition === 'string') return compileName(condition, names, options);
  if ('not' in condition) {
    // What is denied is never taken as given.
    const test = compileCondition(condition.not, names, { ...options, given: false });
    return (truth) => !test(truth);
  }
  if ('all' in condition) {
    const tests = condition.all.map((part) => compileCondition(part, names, options));
    return (truth) => tests.every((test) => test(truth));
  }
  const tests = condition.any.map((part) => compileCondition(part, names, options));
  return (truth) => tests.some((test) => test(truth));
}

function compileName(
  name: string,
  names: FactNames,
  options: { readonly given?: boolean; readonly never?: readonly string[] },
): FactTest {
  if (options.never?.includes(name)) return () => false;
  if (options.given && !statedNames.includes(name)) return () => true;
  const number = numberOfFact(names, name);
  return (truth) => truth[number] === 1;
}
