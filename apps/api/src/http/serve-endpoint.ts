/** Turns an endpoint into an Express handler. The order of work is fixed here and nowhere else. */
import type { Request, RequestHandler } from 'express';
import type { Knex } from 'knex';
import { abilityFor, canSome } from '@weftway/abilities/ability-for';
import { permissionTable } from '@weftway/abilities/permission-table';
import { projectChildren } from '../pathways/project-children.ts';
import { isPasswordOf } from '../sign-in/prove-password.ts';
import { refusedSuffix } from '../trail/access-log.ts';
import { appendEvents } from '../trail/append-events.ts';
import type { TrailEvent } from '../trail/trail-event.ts';
import { findAnswered, keepAnswer } from './idempotency.ts';
import type { Actor, AnyEndpoint } from './endpoint.ts';
import type { Done, Ready, Refused } from './outcome.ts';
import { refused } from './outcome.ts';
import { sendProblem } from './problem-answer.ts';
import { callHashOf, idempotencyKeyOf, parseAll, preconditionRefusal, versionIn } from './read-call.ts';
import type { Parsed } from './read-call.ts';
import { roleTextOf } from './role-text.ts';
import { sendDone, sendReady } from './send-answer.ts';
import type { Services } from './services.ts';

const isChange = (endpoint: AnyEndpoint): boolean =>
  endpoint.operation.method !== 'GET' && endpoint.inTransaction !== false && endpoint.can !== 'anyone';

const outsideTheTeam: readonly string[] = ['guardian', 'young-person', 'referrer'];

const permissionRefusal = (endpoint: AnyEndpoint, actor: Actor | null): Refused | null => {
  if (endpoint.can === 'anyone') return null;
  if (actor === null) return refused('not-signed-in');
  if (endpoint.can === 'signed-in') return null;
  // Families and outside clinicians do not learn what there is.
  if (outsideTheTeam.includes(actor.standing)) return refused('not-found');
  return canSome(abilityFor(actor), endpoint.can.action, endpoint.can.subject) ? null : refused('not-allowed');
};

class RolledBack extends Error {
  constructor(readonly refusal: Refused) {
    super(refusal.problem);
  }
}

type Outcome = Done<unknown> | Refused | Ready;

interface Work {
  readonly endpoint: AnyEndpoint;
  readonly actor: Actor | null;
  readonly ask: Record<string, unknown>;
  readonly services: Services;
  readonly today: string;
  readonly now: string;
  readonly requestId: string;
}

interface Performed {
  readonly outcome: Outcome;
  readonly answer: unknown;
  /** Version of the board, when that moved. */
  readonly boardVersion: number | null;
}

/** A writing transaction starts with a write, so that it never has to be upgraded half-way. */
const openingWrite = 'update board_counter set id = id';

/** Writes what happened; answers the version of the board when that moved. */
const writeEvents = async (
  { actor, now, requestId, today }: Pick<Work, 'actor' | 'now' | 'requestId' | 'today'>,
  trx: Knex,
  events: readonly TrailEvent[],
): Promise<number | null> => {
  if (events.length === 0) return null;
  const author = {
    at: now,
    actorId: actor?.id ?? null,
    actorName: actor?.name ?? 'Nobody signed in',
    actorRole: actor === null ? '' : roleTextOf(actor),
    requestId,
  };
  await appendEvents(trx, events, author);
  const children = [...new Set(events.flatMap((event) => (event.childId === undefined ? [] : [event.childId])))];
  return children.length > 0 ? projectChildren(trx, children, today) : null;
};

/** What is kept of a refused attempt. */
const writeAlone = (work: Work, events: readonly TrailEvent[]): Promise<unknown> =>
  work.services.db.transaction(async (trx) => {
    await trx.raw(openingWrite);
    return writeEvents(work, trx, events);
  });

/** Runs the operation on the open transaction and writes its events. */
const perform = async (work: Work, trx: Knex): Promise<Performed> => {
  const outcome = await work.endpoint.handle({ ...work.ask, trx } as never); // the ask fits the operation that made the endpoint
  if (outcome.kind !== 'done') return { outcome, answer: null, boardVersion: null };
  const boardVersion = await writeEvents(work, trx, outcome.events);
  return { outcome, answer: await outcome.answer(), boardVersion };
};

/** Reads, and slow work such as hashing: the transaction opens only when there is something to write. */
const performOutside = async (work: Work): Promise<Performed> => {
  const { endpoint, ask, services } = work;
  const outcome = await endpoint.handle({ ...ask, trx: services.db } as never); // the ask fits the operation that made the endpoint
  if (outcome.kind === 'refused' && outcome.events !== undefined) await writeAlone(work, outcome.events);
  if (outcome.kind !== 'done') return { outcome, answer: null, boardVersion: null };
  if (outcome.events.length === 0 && outcome.secrets === undefined)
    return { outcome, answer: await outcome.answer(), boardVersion: null };
  const author = outcome.by === undefined ? work : { ...work, actor: outcome.by };
  const written = await services.db
    .transaction(async (trx) => {
      await trx.raw(openingWrite);
      const refusal = await outcome.secrets?.(trx);
      if (refusal) throw new RolledBack(refusal);
      return writeEvents(author, trx, outcome.events);
    })
    .catch((error: unknown) => {
      if (error instanceof RolledBack) return error.refusal;
      throw error;
    });
  if (typeof written === 'object' && written !== null) return { outcome: written, answer: null, boardVersion: null };
  return { outcome, answer: await outcome.answer(), boardVersion: written };
};

const performChange = async (work: Work, key: string | null, bodyHash: string): Promise<Performed> => {
  const { endpoint, actor, services, now } = work;
  try {
    return await services.db.transaction(async (trx) => {
      await trx.raw(openingWrite);
      if (key !== null && actor !== null) {
        const found = await findAnswered(trx, {
          actorId: actor.id,
          key,
          operation: endpoint.operation.name,
          bodyHash,
          now,
        });
        if (found.kind === 'other') throw new RolledBack(refused('same-key-other-body'));
        if (found.kind === 'same')
          return {
            outcome: { kind: 'done' as const, events: [], answer: async () => found.answer },
            answer: found.answer,
            boardVersion: null,
          };
      }
      const result = await perform(work, trx);
      if (result.outcome.kind === 'refused') throw new RolledBack(result.outcome);
      if (key !== null && actor !== null)
        await keepAnswer(trx, {
          actorId: actor.id,
          key,
          operation: endpoint.operation.name,
          bodyHash,
          status: endpoint.operation.status,
          answer: result.answer,
          at: now,
        });
      return result;
    });
  } catch (error) {
    if (error instanceof RolledBack) return { outcome: error.refusal, answer: null, boardVersion: null };
    throw error;
  }
};

/** Throws while the server starts when an operation says nothing, or something unknown, about who may call it. */
const requirePermission = ({ operation, can }: AnyEndpoint): void => {
  // The types ask for it already; this holds when they were got round.
  const stated: unknown = can;
  if (stated === 'anyone' || stated === 'signed-in') return;
  const { action, subject } = (stated ?? {}) as { action?: unknown; subject?: unknown }; // whatever was written there
  const isInTable = permissionTable.some((row) => row.action === action && row.subject === subject);
  if (!isInTable) throw new Error(`${operation.name} does not say who may call it.`);
};

interface Allowed extends Parsed {
  readonly kind: 'allowed';
  readonly ifMatch: number | null;
  readonly key: string | null;
}

/** Everything that can refuse a call before the operation runs: permission, shape, version, key, password. */
const refuseEarly = async (
  endpoint: AnyEndpoint,
  services: Services,
  request: Request,
  actor: Actor | null,
): Promise<Allowed | Refused> => {
  const permission = permissionRefusal(endpoint, actor);
  if (permission !== null) return permission;
  const parsed = parseAll(endpoint, request);
  if ('kind' in parsed) return parsed;
  const ifMatch = versionIn(request.get('if-match'));
  const precondition = preconditionRefusal(endpoint, ifMatch);
  if (precondition !== null) return precondition;
  const key = idempotencyKeyOf(endpoint, request);
  if (typeof key === 'object' && key !== null) return key;
  if (endpoint.confirmsPassword === true && actor !== null) {
    const proof = await isPasswordOf(services, actor, (parsed.body as { password: string }).password); // confirmsPassword operations have it
    if (proof !== null) return proof;
  }
  return { kind: 'allowed', ...parsed, ifMatch, key };
};

interface Noted {
  readonly endpoint: AnyEndpoint;
  readonly actor: Actor | null;
  readonly services: Services;
  readonly requestId: string;
}

/** One line in the log of reads. */
const note = ({ endpoint, actor, services, requestId }: Noted, suffix: string, childId: string): void => {
  if (actor === null) return;
  services.accessLog.append({
    at: services.now().toISOString(),
    actorId: actor.id,
    actorName: actor.name,
    actorRole: roleTextOf(actor),
    operation: endpoint.operation.name + suffix,
    childId,
    requestId,
  });
};

/** Notes a look at a record; false when looks cannot be noted, and then nobody may look. */
const noteLook = (work: Work, outcome: Done<unknown>): boolean => {
  if (outcome.readsChild === undefined || work.actor === null) return true;
  if (!work.services.accessLog.isWorking) return false;
  note(work, '', outcome.readsChild);
  return true;
};

/** Notes that somebody signed in tried what they may not do, or a child that is not there for them. */
const noteRefusal = (noted: Noted, refusal: Refused, params: Readonly<Record<string, unknown>>): void => {
  const named = params['childId'];
  const childId = typeof named === 'string' && /^[A-Za-z0-9-]{1,64}$/.test(named) ? named : '';
  const isDenied =
    refusal.problem === 'not-allowed' ||
    refusal.problem === 'wrong-password' ||
    (refusal.problem === 'not-found' && named !== undefined);
  if (isDenied) note(noted, refusedSuffix, childId);
};

/** The Express handler of an endpoint. */
export const serveEndpoint = (endpoint: AnyEndpoint, services: Services): RequestHandler => {
  requirePermission(endpoint);
  return async (request, response) => {
    const actor = (response.locals['actor'] ?? null) as Actor | null; // set by the session middleware
    const requestId = String(response.locals['requestId']);
    const allowed = await refuseEarly(endpoint, services, request, actor);
    if (allowed.kind === 'refused') {
      noteRefusal({ endpoint, actor, services, requestId }, allowed, request.params);
      return sendProblem(response, allowed);
    }
    const { params, query, body, ifMatch, key } = allowed;
    const ifNoneMatch = request.get('if-none-match') ?? null;
    const now = services.now().toISOString();
    const today = services.today();
    const ask = {
      params,
      query,
      body,
      ability: abilityFor(actor),
      actor,
      today,
      now,
      requestId,
      ifMatch,
      ifNoneMatch,
      services,
      acceptsGzip: request.acceptsEncodings('gzip') === 'gzip',
      session: request.session.id === undefined ? null : { id: request.session.id },
      request,
      response,
    };
    const work: Work = { endpoint, actor, ask, services, today, now, requestId };
    const { outcome, answer, boardVersion } = isChange(endpoint)
      ? await performChange(work, key, callHashOf(allowed))
      : await performOutside(work);
    if (boardVersion !== null) services.liveView.changed(boardVersion);
    if (outcome.kind === 'refused') {
      noteRefusal(work, outcome, request.params);
      return sendProblem(response, outcome);
    }
    if (outcome.kind === 'ready') return sendReady(response, outcome);
    if (!noteLook(work, outcome)) return sendProblem(response, refused('surprise'));
    sendDone(response, endpoint, answer, ifNoneMatch);
  };
};
