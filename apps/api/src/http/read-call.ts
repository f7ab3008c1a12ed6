/** Reads a call as its operation declares it: path, query, body, version and key; refuses what cannot be read. */
import { createHash } from 'node:crypto';
import type { Request } from 'express';
import { canonicalText } from '../trail/trail-chain.ts';
import type { AnyEndpoint } from './endpoint.ts';
import { refused } from './outcome.ts';
import type { Refused } from './outcome.ts';
import { faultsOf } from './problem-answer.ts';

const parsePart = (schema: { safeParse: (value: unknown) => { success: boolean } }, value: unknown) =>
  schema.safeParse(value) as ReturnType<import('zod').ZodType['safeParse']>; // any zod schema

/** The version in `If-Match: "12"`; null when missing, NaN when unreadable. */
export const versionIn = (header: string | undefined): number | null => {
  if (header === undefined) return null;
  // A weak tag never matches here: the version must be exactly the one that was read.
  const match = /^"(\d{1,15})"$/.exec(header.trim());
  return match?.[1] === undefined ? Number.NaN : Number(match[1]);
};

export interface Parsed {
  readonly params: unknown;
  readonly query: unknown;
  readonly body: unknown;
}

/** What makes two calls the same: whom they are about and what they say. The password only proves who is calling. */
export const callHashOf = ({ params, query, body }: Parsed): string => {
  const { password: _password, ...rest } = (typeof body === 'object' && body !== null ? body : {}) as {
    password?: unknown;
  }; // only the secret is taken out
  return createHash('sha256')
    .update(canonicalText({ params, query, body: rest }))
    .digest('hex');
};

export const parseAll = (endpoint: AnyEndpoint, request: Request): Parsed | Refused => {
  const { operation } = endpoint;
  const params = parsePart(operation.params, request.params);
  if (!params.success) return refused('not-found');
  const query = parsePart(operation.query, request.query);
  const body = parsePart(operation.body, request.body ?? {});
  const errors = [...(query.success ? [] : faultsOf(query.error)), ...(body.success ? [] : faultsOf(body.error))];
  if (!query.success || !body.success) return refused('bad-input', { errors });
  return { params: params.data, query: query.data, body: body.data };
};

export const preconditionRefusal = (endpoint: AnyEndpoint, version: number | null): Refused | null => {
  if (endpoint.operation.ifMatch !== 'required') return null;
  if (version === null) return refused('version-needed', { detail: 'Send If-Match with the version that was read.' });
  return Number.isNaN(version)
    ? refused('bad-input', { detail: 'If-Match holds a version in quotes, such as "12".' })
    : null;
};

export const idempotencyKeyOf = (endpoint: AnyEndpoint, request: Request): string | null | Refused => {
  const key = request.get('idempotency-key');
  if (key === undefined || !endpoint.operation.isRepeatable) return null;
  return /^[\x21-\x7e]{8,100}$/.test(key)
    ? key
    : refused('bad-input', { detail: 'An Idempotency-Key has 8 to 100 plain characters.' });
};
