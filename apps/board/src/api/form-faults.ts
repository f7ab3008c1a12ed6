/** Puts what the server found wrong at the fields of a form. */
import { ApiProblem } from './api-client.ts';
import type { ProblemDocument } from './api-client.ts';

interface Faulty {
  readonly setFault: (name: string, message: string) => void;
  /** Names of the form's fields; a pointer to anything else stays with the problem. */
  readonly names: readonly string[];
}

/** `/contacts/0/phone` is the field `contacts.0.phone`. */
const fieldName = (pointer: string): string => pointer.slice(1).replaceAll('/', '.');

const belongsTo = (name: string, names: readonly string[]): boolean =>
  names.some((field) => name === field || name.startsWith(`${field}.`));

/**
 * Answers the problem to show beside the button: null when every fault found its field. Anything but a problem of the
 * API (no answer at all) becomes a problem too, so that nothing fails silently.
 */
export const placeFaults = (error: unknown, { setFault, names }: Faulty): ProblemDocument | null => {
  if (error === null || error === undefined) return null;
  if (!(error instanceof ApiProblem))
    return {
      type: 'about:blank',
      title: 'No answer came back',
      status: 0,
      detail: 'The line may be down. What you typed is still here; try again.',
    };
  const { problem } = error;
  const faults = problem.errors ?? [];
  const rest = faults.filter((fault) => !belongsTo(fieldName(fault.pointer), names));
  for (const fault of faults)
    if (belongsTo(fieldName(fault.pointer), names)) setFault(fieldName(fault.pointer), fault.detail);
  return faults.length > 0 && rest.length === 0 ? null : { ...problem, errors: rest };
};

/** The problem of a failed call, for showing beside a button. */
export const problemOf = (error: unknown): ProblemDocument | null =>
  placeFaults(error, { setFault: () => undefined, names: [] });
