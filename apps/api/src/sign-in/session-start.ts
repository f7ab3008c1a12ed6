/** Starts, renews and ends the session of a request; the id changes each time. */
import type { NextFunction, Request, Response } from 'express';
import type { Actor } from '../http/endpoint.ts';
import type { Checked } from './local-strategy.ts';
import type { Passport } from './session-middleware.ts';

const deviceMost = 120;

/** What the browser says of itself, without anything that could act on a terminal or a page. */
const deviceOf = (request: Request): string =>
  (request.get('user-agent') ?? '').replace(/[^\x20-\x7e]/g, ' ').slice(0, deviceMost);

/** Asks the local strategy; of a refused attempt it tells whose account was tried, for the trail alone. */
export const authenticate = (request: Request, response: Response): Promise<Checked> => {
  const passport = request.app.get('passport') as Passport; // put there when the app is made
  return new Promise((resolve, reject) => {
    const take = (error: unknown, actor: Actor | false | null | undefined, info: unknown): void => {
      if (error !== null && error !== undefined) return reject(error as Error);
      const { memberId = null } = (info ?? {}) as Partial<Checked>; // what the strategy handed on
      resolve({ actor: actor === false || actor === undefined ? null : actor, memberId });
    };
    const next: NextFunction = (error?: unknown) =>
      error === undefined ? resolve({ actor: null, memberId: null }) : reject(error as Error);
    passport.authenticate('local', take)(request, response, next);
  });
};

/** A new id; whatever was known of the browser before is gone. */
export const startSession = async (request: Request, actor: Actor, startedAt: string, now: string): Promise<void> => {
  await new Promise<void>((resolve, reject) => {
    request.logIn(actor, (error: unknown) =>
      error === undefined || error === null ? resolve() : reject(error as Error),
    );
  });
  request.session.startedAt = startedAt;
  request.session.activeAt = now;
  request.session.device = deviceOf(request);
};

export const leaveSession = (request: Request): Promise<void> =>
  new Promise((resolve, reject) => {
    request.session.regenerate((error: unknown) =>
      error === undefined || error === null ? resolve() : reject(error as Error),
    );
  });
