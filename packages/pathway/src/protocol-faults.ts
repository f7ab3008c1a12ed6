/**
 * Reads a protocol that somebody wrote by hand: its shape first, then everything that a shape cannot say.
 * All faults are named at once, in plain words, each with its place (JSON Pointer, RFC 6901) and milestone.
 */
import type { z } from 'zod';
import { evidenceFaultsOf } from './protocol-faults-evidence.ts';
import { linkFaults } from './protocol-faults-links.ts';
import { repeatFaults } from './protocol-faults-repeats.ts';
import { windowFaults } from './protocol-faults-windows.ts';
import { protocolSchema } from './protocol.ts';
import type { Protocol } from './protocol.ts';

export interface ProtocolFault {
  /** JSON Pointer into the protocol, `/milestones/3/window`. */
  readonly pointer: string;
  readonly milestone?: string;
  readonly message: string;
}

export type ProtocolReading =
  | { readonly ok: true; readonly protocol: Protocol }
  | { readonly ok: false; readonly faults: readonly ProtocolFault[] };

/**
 * Reads a protocol from parsed JSON. Never throws. When the shape itself is wrong only faults of shape are listed,
 * because the rest cannot be judged yet.
 */
export function readProtocol(input: unknown): ProtocolReading {
  const shape = protocolSchema.safeParse(input, { reportInput: true });
  if (!shape.success) return { ok: false, faults: shape.error.issues.map((issue) => shapeFault(issue, input)) };
  const faults = [
    ...linkFaults(shape.data),
    ...windowFaults(shape.data),
    ...repeatFaults(shape.data),
    ...evidenceFaultsOf(shape.data),
  ];
  return faults.length === 0 ? { ok: true, protocol: shape.data } : { ok: false, faults };
}

type Issue = z.core.$ZodIssue;

function shapeFault(issue: Issue, input: unknown): ProtocolFault {
  const milestone = milestoneAt(input, issue.path);
  return {
    pointer: issue.path.map((step) => `/${String(step).replaceAll('~', '~0').replaceAll('/', '~1')}`).join(''),
    ...(milestone === undefined ? {} : { milestone }),
    message: shapeMessage(issue),
  };
}

function shapeMessage(issue: Issue): string {
  switch (issue.code) {
    case 'invalid_type':
      return issue.input === undefined ? 'This is missing.' : `This must be ${article(issue.expected)}.`;
    case 'invalid_value':
      return `${quoted(issue.input)} is not one of: ${issue.values.map(String).join(', ')}.`;
    case 'unrecognized_keys':
      return `A protocol has no field ${issue.keys.map((key) => quoted(key)).join(', ')} here.`;
    case 'invalid_format':
      return `${quoted(issue.input)} cannot be read. ${issue.message}`;
    case 'too_small':
      return issue.origin === 'number' || issue.origin === 'int'
        ? `This must be at least ${String(issue.minimum)}.`
        : 'This must not be empty.';
    case 'too_big':
      return `This is too long or too large; the most is ${String(issue.maximum)}.`;
    case 'invalid_union':
      return 'This has none of the forms that are known here.';
    default:
      return issue.message;
  }
}

function article(expected: string): string {
  const words: Readonly<Record<string, string>> = {
    string: 'a text',
    number: 'a number',
    int: 'a whole number',
    boolean: 'true or false',
    array: 'a list',
    tuple: 'a pair',
    object: 'an object',
    record: 'an object',
  };
  return words[expected] ?? expected;
}

const quoted = (value: unknown): string =>
  `“${typeof value === 'string' ? value : (JSON.stringify(value) ?? 'nothing')}”`;

function milestoneAt(input: unknown, path: readonly PropertyKey[]): string | undefined {
  if (path[0] !== 'milestones' || typeof path[1] !== 'number') return undefined;
  const list = field(input, 'milestones');
  const id = Array.isArray(list) ? field(list[path[1]], 'id') : undefined;
  return typeof id === 'string' ? id : undefined;
}

const field = (value: unknown, name: string): unknown =>
  typeof value === 'object' && value !== null ? Object.entries(value).find(([key]) => key === name)?.[1] : undefined;
