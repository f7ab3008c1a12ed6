/**
 * The one fetch. Answers the parsed answer of an operation, or throws the problem that the API described.
 */
import { apiPrefix } from '@weftway/contract/operation';
import type { AnswerOf, Method, Operation } from '@weftway/contract/operation';
import type { z } from 'zod';

/** A failed call, as the API described it (RFC 9457). */
export interface ProblemDocument {
  readonly type: string;
  readonly title: string;
  readonly status: number;
  readonly detail?: string;
  readonly instance?: string;
  readonly errors?: readonly { readonly pointer: string; readonly detail: string }[];
  readonly current?: unknown;
  readonly [member: string]: unknown;
}

export class ApiProblem extends Error {
  constructor(readonly problem: ProblemDocument) {
    super(problem.title);
  }

  /** `milestone-already-claimed` of `/problems/milestone-already-claimed`. */
  get kind(): string {
    return this.problem.type.replace(/^.*\//, '');
  }
}

/** Is this the named problem? */
export const isProblem = (error: unknown, name: string): error is ApiProblem =>
  error instanceof ApiProblem && error.problem.type === `/problems/${name}`;

let csrfToken: string | null = null;

/** The session answer brings the token that every change must carry. */
export const rememberToken = (token: string): void => {
  csrfToken = token;
};

type InputOf<S> = S extends z.ZodType ? z.input<S> : never;
type Empty = Record<string, never>;
type Part<Name extends string, T> = T extends Empty ? { readonly [K in Name]?: T } : { readonly [K in Name]: T };

export type CallInput<O extends Operation> = Part<'params', InputOf<O['params']>> & {
  readonly query?: InputOf<O['query']>;
} & Part<'body', InputOf<O['body']>> & {
    /** Version that was read, for operations that two people can do at once. */
    readonly ifMatch?: number;
    /** The same key for every retry of one intent. */
    readonly idempotencyKey?: string;
    /** A poll; it is not activity. */
    readonly isBackground?: boolean;
    readonly signal?: AbortSignal;
  };

interface LooseInput {
  readonly params?: Readonly<Record<string, unknown>>;
  readonly query?: Readonly<Record<string, unknown>>;
  readonly body?: unknown;
  readonly ifMatch?: number;
  readonly idempotencyKey?: string;
  readonly isBackground?: boolean;
  readonly signal?: AbortSignal;
}

const urlOf = (operation: { readonly path: string }, input: LooseInput): string => {
  const path = operation.path.replace(/:([A-Za-z]+)/g, (_whole, name: string) =>
    encodeURIComponent(String(input.params?.[name] ?? '')),
  );
  const query = new URLSearchParams();
  for (const [name, value] of Object.entries(input.query ?? {}))
    if (value !== undefined && value !== null && value !== '') query.set(name, String(value));
  const text = query.toString();
  return apiPrefix + path + (text === '' ? '' : `?${text}`);
};

const headersOf = (method: Method, input: LooseInput): Headers => {
  const headers = new Headers({ accept: 'application/json' });
  if (method !== 'GET' && csrfToken !== null) headers.set('x-csrf-token', csrfToken);
  if (method !== 'GET') headers.set('content-type', 'application/json');
  if (input.ifMatch !== undefined) headers.set('if-match', `"${input.ifMatch}"`);
  if (input.idempotencyKey !== undefined) headers.set('idempotency-key', input.idempotencyKey);
  if (input.isBackground === true) headers.set('x-background', '1');
  return headers;
};

const surprise = (status: number): ProblemDocument => ({
  type: 'about:blank',
  title: 'Something went wrong on our side',
  status,
});

const problemOf = async (response: Response): Promise<ProblemDocument> => {
  const isProblemDocument = response.headers.get('content-type')?.includes('problem+json') === true;
  return isProblemDocument ? ((await response.json()) as ProblemDocument) : surprise(response.status); // RFC 9457 shape, by its content type
};

const send = async (
  operation: { readonly path: string; readonly method: Method },
  input: LooseInput,
): Promise<Response> =>
  fetch(urlOf(operation, input), {
    method: operation.method,
    headers: headersOf(operation.method, input),
    credentials: 'same-origin',
    cache: 'no-store',
    ...(operation.method === 'GET' ? {} : { body: JSON.stringify(input.body ?? {}) }),
    ...(input.signal === undefined ? {} : { signal: input.signal }),
  });

/** The token dies with its session; a fresh one is fetched once and the call repeated. */
const renewToken = async (): Promise<void> => {
  const response = await fetch(`${apiPrefix}/session`, {
    credentials: 'same-origin',
    cache: 'no-store',
    headers: { 'x-background': '1' },
  });
  if (response.ok) rememberToken(((await response.json()) as { csrfToken: string }).csrfToken); // contract of readSession
};

/** Calls an operation of the contract. Throws `ApiProblem`. */
export const call = async <O extends Operation>(operation: O, input: CallInput<O>): Promise<AnswerOf<O>> => {
  const loose: LooseInput = input as LooseInput; // the same fields, without the operation's own types
  let response = await send(operation, loose);
  if (response.status === 403 && operation.method !== 'GET') {
    const problem = await problemOf(response.clone());
    if (problem.type === '/problems/forged-request') {
      await renewToken();
      response = await send(operation, loose);
    }
  }
  if (!response.ok) throw new ApiProblem(await problemOf(response));
  return (await response.json()) as AnswerOf<O>; // both sides are built from the same contract and shipped together
};

/** A new key for a creating call. */
export const newIdempotencyKey = (): string => crypto.randomUUID();
