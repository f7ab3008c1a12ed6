import type { AnyEndpoint } from '../http/endpoint.ts';
import { readTrailEndpoint } from './read-trail.ts';
import { verifyTrailEndpoint } from './verify-trail.ts';

export const trailEndpoints: readonly AnyEndpoint[] = [readTrailEndpoint, verifyTrailEndpoint];
