/** Changes come only from our own screens: same origin, and the token of the session. */
import { csrfSync } from 'csrf-sync';
import type { RequestHandler } from 'express';
import { refused } from './outcome.ts';
import { sendProblem } from './problem-answer.ts';

const csrf = csrfSync({ getTokenFromRequest: (request) => request.get('x-csrf-token') });

/** The token to send along; making one starts a session. */
export const csrfTokenOf = csrf.generateToken;

export const requireToken = csrf.csrfSynchronisedProtection;

const safeMethods: readonly string[] = ['GET', 'HEAD', 'OPTIONS'];

/** Refuses foreign origins by what the browser says of itself; tools that say neither pass on to the token check. */
export const requireSameOrigin: RequestHandler = (request, response, next) => {
  if (safeMethods.includes(request.method)) return next();
  const site = request.get('sec-fetch-site');
  if (site !== undefined && site !== 'same-origin' && site !== 'none')
    return sendProblem(response, refused('forged-request'));
  const origin = request.get('origin');
  const host = request.get('host');
  if (origin !== undefined && host !== undefined && !URL.canParse(origin))
    return sendProblem(response, refused('forged-request'));
  if (origin !== undefined && new URL(origin).host !== host) return sendProblem(response, refused('forged-request'));
  next();
};
