/** What links in letters start with. A host that the asker made up must never get into somebody's letter. */
import type { Request } from 'express';
import type { Env } from '../env.ts';

const loopback = /^(localhost|127\.0\.0\.1|\[::1\])(:\d{1,5})?$/;

export const originOf = (env: Env, request: Request): string => {
  if (env.origin !== null) return env.origin;
  const host = request.get('host') ?? '';
  return loopback.test(host) ? `http://${host}` : `http://127.0.0.1:${env.port}`;
};
