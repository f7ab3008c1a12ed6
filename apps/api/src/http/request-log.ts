/** One JSON line a request: operation, status, milliseconds, who. Never names, texts or values. */
import type { RequestHandler } from 'express';
import { pino } from 'pino';
import type { Logger } from 'pino';
import type { Actor } from './endpoint.ts';

export const createLog = (level: 'silent' | 'info' | 'debug'): Logger => pino({ level, base: null });

export const identifyRequest =
  (newId: () => string): RequestHandler =>
  (_request, response, next) => {
    const requestId = newId();
    response.locals['requestId'] = requestId;
    response.setHeader('X-Request-Id', requestId);
    next();
  };

export const logRequests =
  (log: Logger): RequestHandler =>
  (request, response, next) => {
    const started = performance.now();
    response.on('finish', () => {
      const actor = (response.locals['actor'] ?? null) as Actor | null; // set by the session middleware
      log.info({
        requestId: response.locals['requestId'],
        operation: response.locals['operation'] ?? request.method,
        status: response.statusCode,
        ms: Math.round(performance.now() - started),
        actorId: actor?.id ?? null,
        standing: actor?.standing ?? null,
      });
    });
    next();
  };
