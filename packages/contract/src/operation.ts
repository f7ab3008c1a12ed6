/**
 * One thing that can be asked of the API, as a value that the server serves and the board calls.
 * Types are inferred from the schemas; nothing is declared beside them.
 */
import type { z } from 'zod';
import type { ProblemName } from './problems.ts';

export type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

export interface Operation<
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Answer extends z.ZodType = z.ZodType,
> {
  /** Verb and noun, the same in contract, API file and mutation. */
  readonly name: string;
  readonly summary: string;
  /** Noun under which the reference lists it. */
  readonly group: string;
  readonly method: Method;
  /** Below `/api/v1`, Express style: `/children/:childId`. */
  readonly path: string;
  readonly params: Params;
  readonly query: Query;
  readonly body: Body;
  readonly answer: Answer;
  readonly status: 200 | 201 | 202 | 204;
  readonly problems: readonly ProblemName[];
  /** `required`: two people can edit this; the caller names the version it read. */
  readonly ifMatch: 'required' | 'none';
  /** A creating call that may be repeated safely with the same `Idempotency-Key`. */
  readonly isRepeatable: boolean;
}

export const operation = <P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, A extends z.ZodType>(
  value: Operation<P, Q, B, A>,
): Operation<P, Q, B, A> => value;

export type ParamsOf<O> = O extends Operation<infer P, z.ZodType, z.ZodType, z.ZodType> ? z.output<P> : never;
export type QueryOf<O> = O extends Operation<z.ZodType, infer Q, z.ZodType, z.ZodType> ? z.output<Q> : never;
export type BodyOf<O> = O extends Operation<z.ZodType, z.ZodType, infer B, z.ZodType> ? z.output<B> : never;
export type AnswerOf<O> = O extends Operation<z.ZodType, z.ZodType, z.ZodType, infer A> ? z.output<A> : never;

export const apiPrefix = '/api/v1';
