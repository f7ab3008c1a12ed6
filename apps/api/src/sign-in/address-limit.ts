/** Guesses at passwords and links from one network address, whoever they are aimed at. */
import type { RequestHandler } from 'express';
import { rateLimit } from 'express-rate-limit';
import { refused } from '../http/outcome.ts';
import { sendProblem } from '../http/problem-answer.ts';
import { limits } from '../limits.ts';

/** Paths below the API's prefix that anybody may post a guess to. */
export const guessedPaths = [
  '/session',
  '/password-reset-requests',
  '/password-resets',
  '/invitation-views',
  '/invitation-acceptances',
] as const;

export const limitGuesses = (): RequestHandler =>
  rateLimit({
    windowMs: 60_000,
    limit: limits.guessesPerAddressPerMinute,
    // Getting in is no guess: a whole clinic may share one address in the morning.
    skipSuccessfulRequests: true,
    requestWasSuccessful: (request, response) => request.path.endsWith('/session') && response.statusCode < 400,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    validate: false,
    handler: (_request, response) =>
      sendProblem(
        response,
        refused('too-many', { detail: 'Too many tries from this address. Wait a minute, then try again.' }),
      ),
  });
