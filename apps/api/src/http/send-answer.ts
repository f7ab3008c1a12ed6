/** Sends what an operation answered, with its version as tag; an unchanged answer is only named. */
import type { Response } from 'express';
import type { AnyEndpoint } from './endpoint.ts';
import type { Ready } from './outcome.ts';

export const sendDone = (
  response: Response,
  endpoint: AnyEndpoint,
  answer: unknown,
  ifNoneMatch: string | null,
): void => {
  if (endpoint.version !== undefined) {
    const etag = `"${endpoint.version(answer as never)}"`; // the endpoint's own answer
    response.setHeader('ETag', etag);
    if (ifNoneMatch === etag) {
      response.status(304).end();
      return;
    }
  }
  response.status(endpoint.operation.status).json(answer);
};

export const sendReady = (response: Response, ready: Ready): void => {
  response.setHeader('ETag', ready.etag);
  if (ready.isSame) {
    response.status(304).end();
    return;
  }
  if (ready.encoding === 'gzip') response.setHeader('Content-Encoding', 'gzip');
  response.setHeader('Content-Type', 'application/json; charset=utf-8');
  response.setHeader('Vary', 'Accept-Encoding');
  response.status(200).end(ready.body);
};
