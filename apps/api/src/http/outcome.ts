/** What an operation answers: done, with what happened; or refused, by a problem of the closed list. */
import type { Knex } from 'knex';
import type { FieldFault, ProblemName } from '@weftway/contract/problems';
import type { Actor } from './endpoint.ts';
import type { TrailEvent } from '../trail/trail-event.ts';

export interface Refused {
  readonly kind: 'refused';
  readonly problem: ProblemName;
  readonly detail?: string;
  readonly errors?: readonly FieldFault[];
  /** Further members of the problem document, such as `current`. */
  readonly extra?: Readonly<Record<string, unknown>>;
  /** What the trail keeps of the attempt, in a transaction of its own; only for work done outside of one. */
  readonly events?: readonly TrailEvent[];
}

export interface Done<Answer> {
  readonly kind: 'done';
  readonly events: readonly TrailEvent[];
  /** Who did it, where the call itself made that known: signing in. */
  readonly by?: Actor;
  /** Runs after the events were applied, in the same transaction; after its end when the work ran outside of one. */
  readonly answer: () => Promise<Answer>;
  /**
   * For work done outside a transaction, such as hashing: writes secrets in the transaction of the events, before them.
   * May still refuse, when something changed since it was looked at.
   */
  readonly secrets?: (trx: Knex) => Promise<Refused | null>;
  /** Children whose record was read, for the log of reads. */
  readonly readsChild?: string;
}

/** Bytes made ready elsewhere (the cached board). */
export interface Ready {
  readonly kind: 'ready';
  readonly etag: string;
  readonly isSame: boolean;
  readonly encoding: 'gzip' | 'identity';
  readonly body: Buffer;
}

export const refused = (problem: ProblemName, more: Omit<Refused, 'kind' | 'problem'> = {}): Refused => ({
  kind: 'refused',
  problem,
  ...more,
});

export const fieldRefused = (pointer: string, detail: string): Refused =>
  refused('bad-input', { errors: [{ pointer, detail }] });

export const done = <Answer>(events: readonly TrailEvent[], answer: () => Promise<Answer>): Done<Answer> => ({
  kind: 'done',
  events,
  answer,
});

export const answered = <Answer>(answer: Answer, readsChild?: string): Done<Answer> => ({
  kind: 'done',
  events: [],
  answer: async () => answer,
  ...(readsChild === undefined ? {} : { readsChild }),
});
