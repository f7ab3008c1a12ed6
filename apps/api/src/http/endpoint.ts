/**
 * One operation served: parse, permission, transaction, events, answer. `can` has no default, so a permission cannot be
 * forgotten; events are the only way to change anything, so the trail cannot be forgotten either.
 */
import type { Request, Response } from 'express';
import type { Knex } from 'knex';
import type { WeftwayAbility } from '@weftway/abilities/ability-for';
import type { Action, SubjectName } from '@weftway/abilities/permission-table';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { AnswerOf, BodyOf, Operation, ParamsOf, QueryOf } from '@weftway/contract/operation';
import type { Discipline } from '@weftway/team/disciplines';
import type { Standing } from '@weftway/team/standings';
import type { Done, Ready, Refused } from './outcome.ts';
import type { Services } from './services.ts';

export interface Actor {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly standing: Standing;
  readonly disciplines: readonly Discipline[];
  readonly supervisorId: string | null;
}

export interface Ask<O extends Operation> {
  readonly trx: Knex;
  readonly params: ParamsOf<O>;
  readonly query: QueryOf<O>;
  readonly body: BodyOf<O>;
  readonly ability: WeftwayAbility;
  /** The team's local date. */
  readonly today: PlainDate;
  /** UTC instant of the request, ISO text. */
  readonly now: string;
  readonly requestId: string;
  /** Version named by `If-Match`; null when the operation does not ask for one. */
  readonly ifMatch: number | null;
  readonly ifNoneMatch: string | null;
  readonly acceptsGzip: boolean;
  readonly session: { readonly id: string } | null;
  readonly services: Services;
  /** For sign-in and streams alone. */
  readonly request: Request;
  readonly response: Response;
}

export interface AskOfActor<O extends Operation> extends Ask<O> {
  readonly actor: Actor;
}

type Answered<O extends Operation> = Promise<Done<AnswerOf<O>> | Refused | Ready>;

interface EndpointShape<O extends Operation> {
  readonly operation: O;
  /** Version for the ETag, where the answer is something that two people can edit. */
  readonly version?: (answer: AnswerOf<O>) => number;
  /** The body's `password` is proved before the transaction opens. */
  readonly confirmsPassword?: boolean;
  /** Larger or smaller than the usual JSON limit, bytes. */
  readonly bodyLimit?: number;
}

export interface OpenEndpoint<O extends Operation> extends EndpointShape<O> {
  readonly can: 'anyone';
  /** Runs before any transaction, for slow work such as hashing; writes nothing. */
  readonly handle: (ask: Ask<O> & { readonly actor: Actor | null }) => Answered<O>;
  readonly inTransaction?: false;
}

export interface GuardedEndpoint<O extends Operation> extends EndpointShape<O> {
  readonly can: 'signed-in' | { readonly action: Action; readonly subject: SubjectName };
  readonly handle: (ask: AskOfActor<O>) => Answered<O>;
  readonly inTransaction?: boolean;
}

/** An endpoint of any operation, as the router holds it. */
export interface AnyEndpoint {
  readonly operation: Operation;
  readonly can: 'anyone' | 'signed-in' | { readonly action: Action; readonly subject: SubjectName };
  readonly version?: (answer: never) => number;
  readonly confirmsPassword?: boolean;
  readonly bodyLimit?: number;
  readonly inTransaction?: boolean;
  readonly handle: (ask: never) => Promise<Done<unknown> | Refused | Ready>;
}

/** Reads run on the plain connection, everything else in a transaction unless `inTransaction` is false. */
export const endpoint: {
  // Two signatures, so that the compiler knows from `can` whether the asker has an actor.
  <O extends Operation>(value: GuardedEndpoint<O>): AnyEndpoint;
  // eslint-disable-next-line @typescript-eslint/unified-signatures -- one signature with a union cannot infer the handler
  <O extends Operation>(value: OpenEndpoint<O>): AnyEndpoint;
} = <O extends Operation>(value: OpenEndpoint<O> | GuardedEndpoint<O>): AnyEndpoint => value;
