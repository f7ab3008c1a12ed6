/** The one error door: every failure becomes an RFC 9457 problem document. */
import type { ErrorRequestHandler, Response } from 'express';
import type { ZodError } from 'zod';
import { problems } from '@weftway/contract/problems';
import type { FieldFault } from '@weftway/contract/problems';
import type { Refused } from './outcome.ts';
import { refused } from './outcome.ts';

/** Sends the problem; `instance` carries the request id that the log carries too. */
export const sendProblem = (response: Response, refusal: Refused): void => {
  const { status, title } = problems[refusal.problem];
  response
    .status(status)
    .type('application/problem+json')
    .send(
      JSON.stringify({
        type: refusal.problem === 'surprise' ? 'about:blank' : `/problems/${refusal.problem}`,
        title,
        status,
        ...(refusal.detail === undefined ? {} : { detail: refusal.detail }),
        instance: `/requests/${String(response.locals['requestId'] ?? 'unknown')}`,
        ...(refusal.errors === undefined ? {} : { errors: refusal.errors }),
        ...refusal.extra,
      }),
    );
};

const escapePointer = (part: PropertyKey): string => String(part).replaceAll('~', '~0').replaceAll('/', '~1');

/** Every issue of a failed parse, pointed at. */
export const faultsOf = (error: ZodError): FieldFault[] =>
  error.issues.flatMap((issue) =>
    issue.code === 'unrecognized_keys'
      ? issue.keys.map((key) => ({
          pointer: `/${[...issue.path, key].map(escapePointer).join('/')}`,
          detail: 'This field is not known here.',
        }))
      : [
          {
            pointer: issue.path.length === 0 ? '' : `/${issue.path.map(escapePointer).join('/')}`,
            detail: issue.message,
          },
        ],
  );

interface HttpFault {
  readonly status?: number;
  readonly type?: string;
  readonly code?: string;
}

const refusalOf = (error: HttpFault): Refused => {
  if (error.type === 'entity.too.large') return refused('too-large');
  if (error.type === 'entity.parse.failed') return refused('bad-input', { detail: 'The body is not readable JSON.' });
  if (error.type?.startsWith('charset') === true || error.type?.startsWith('encoding') === true)
    return refused('wrong-type');
  if (error.code === 'HASHING_BUSY')
    return refused('too-many', { detail: 'Many people are signing in at this moment. Try again in a few seconds.' });
  if (error.code === 'EBADCSRFTOKEN') return refused('forged-request');
  if (error.status === 400) return refused('bad-input');
  return refused('surprise');
};

/** Logs surprises whole and answers them without detail. */
export const problemDoor =
  (log: { error: (fields: object, text: string) => void }): ErrorRequestHandler =>
  (error: unknown, _request, response, next) => {
    if (response.headersSent) {
      next(error);
      return;
    }
    const refusal = refusalOf((error ?? {}) as HttpFault); // thrown values have no type; only optional fields are read
    if (refusal.problem === 'surprise') log.error({ err: error, requestId: response.locals['requestId'] }, 'surprise');
    sendProblem(response, refusal);
  };
