/** Middleware in its order; every route comes from the list of endpoints. */
import express from 'express';
import type { Express } from 'express';
import { rateLimit } from 'express-rate-limit';
import passportModule from 'passport';
import { apiPrefix } from '@weftway/contract/operation';
import { serveBoardStream } from './board/board-stream.ts';
import { endpoints } from './endpoints.ts';
import { requireShape } from './http/body-shape.ts';
import { requireSameOrigin, requireToken } from './http/csrf.ts';
import type { AnyEndpoint } from './http/endpoint.ts';
import { refused } from './http/outcome.ts';
import { serveAssets, servePages } from './http/page-files.ts';
import { problemDoor, sendProblem } from './http/problem-answer.ts';
import { identifyRequest, logRequests } from './http/request-log.ts';
import { apiHeaders, nonceFor, pageHeaders } from './http/security-headers.ts';
import { serveEndpoint } from './http/serve-endpoint.ts';
import type { Services } from './http/services.ts';
import { limits } from './limits.ts';
import { guessedPaths, limitGuesses } from './sign-in/address-limit.ts';
import { useLocalStrategy } from './sign-in/local-strategy.ts';
import { useSessions } from './sign-in/session-middleware.ts';

export interface AppOptions {
  readonly sessionSecret: string;
  readonly isSecure: boolean;
  /** Milliseconds between clearing out old sessions; 0 never, for tests. */
  readonly sessionCleanupInterval: number;
  /** Off in tests that send many requests. */
  readonly limitsRate: boolean;
}

const mount = (app: Express, endpoint: AnyEndpoint, services: Services): void => {
  const { operation, bodyLimit } = endpoint;
  const method = operation.method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete'; // the five methods of the contract
  app[method](
    apiPrefix + operation.path,
    (_request, response, next) => {
      response.locals['operation'] = operation.name;
      next();
    },
    express.json({ limit: bodyLimit ?? limits.jsonBytes, strict: true, type: 'application/json' }),
    requireShape(bodyLimit === undefined ? limits.jsonNodes : limits.jsonNodes * 20),
    serveEndpoint(endpoint, services),
  );
};

/** A change must be JSON; an empty body is fine. */
const requireJson: express.RequestHandler = (request, response, next) => {
  const length = request.get('content-length');
  const hasBody = (length !== undefined && length !== '0') || request.get('transfer-encoding') !== undefined;
  if (hasBody && !request.is('application/json'))
    return sendProblem(response, refused('wrong-type', { detail: 'Send application/json.' }));
  next();
};

export const createApp = (services: Services, options: AppOptions): Express => {
  const app = express();
  app.disable('x-powered-by');
  app.set('etag', false);
  app.set('query parser', 'simple');
  const passport = new passportModule.Passport();
  app.use(identifyRequest(services.newId), logRequests(services.log), nonceFor, pageHeaders(options.isSecure));
  app.get('/ready', (_request, response) => void response.type('text/plain').send('ready'));
  serveAssets(app, services.env.staticFolder);
  app.use(apiPrefix, apiHeaders);
  useSessions(app, passport, services, {
    secret: options.sessionSecret,
    isSecure: options.isSecure,
    cleanupInterval: options.sessionCleanupInterval,
  });
  useLocalStrategy(passport, services);
  app.set('passport', passport);
  if (options.limitsRate) {
    app.use(
      apiPrefix,
      rateLimit({
        windowMs: 60_000,
        limit: (request) => (request.method === 'GET' ? limits.readsPerMinute : limits.writesPerMinute),
        keyGenerator: (request, response) =>
          `${request.method === 'GET' ? 'r' : 'w'}:${(response.locals['actor'] as { id?: string } | undefined)?.id ?? request.ip ?? ''}`, // the actor, else the address
        validate: false,
        standardHeaders: 'draft-8',
        legacyHeaders: false,
        handler: (_request, response) => sendProblem(response, refused('too-many')),
      }),
    );
  }
  if (options.limitsRate)
    app.post(
      guessedPaths.map((path) => apiPrefix + path),
      limitGuesses(),
    );
  app.use(apiPrefix, requireSameOrigin, requireJson);
  app.use(apiPrefix, (request, response, next) =>
    ['GET', 'HEAD', 'OPTIONS'].includes(request.method) ? next() : requireToken(request, response, next),
  );
  serveBoardStream(app, services);
  for (const endpoint of endpoints) mount(app, endpoint, services);
  app.use('/api', (_request, response) => sendProblem(response, refused('not-found')));
  servePages(app, services.env.staticFolder);
  app.use(problemDoor(services.log));
  return app;
};
