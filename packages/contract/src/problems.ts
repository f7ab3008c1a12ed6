/**
 * Every problem that the API can answer with (RFC 9457), with its fixed title and status.
 * The identity of a problem is `/problems/<name>`.
 */
import { z } from 'zod';

export const problems = {
  'bad-input': { status: 400, title: 'Something in what was sent cannot be used' },
  'not-signed-in': { status: 401, title: 'You are not signed in' },
  'wrong-credentials': { status: 401, title: 'The e-mail or the password does not match' },
  'wrong-password': { status: 403, title: 'That is not your password' },
  'not-allowed': { status: 403, title: 'This is for somebody else on the team to do' },
  'forged-request': { status: 403, title: 'This request did not come from your own screen' },
  'not-found': { status: 404, title: 'There is nothing here that you can open' },
  'milestone-already-claimed': { status: 409, title: 'Somebody already holds this milestone' },
  'milestone-not-yours': { status: 409, title: 'Somebody else holds this milestone' },
  'milestone-already-signed': { status: 409, title: 'This is signed already' },
  'milestone-not-ready': { status: 409, title: 'This cannot be signed yet' },
  'milestone-state-refuses': { status: 409, title: 'The milestone is not in a state that allows this' },
  'signed-content-changed': { status: 409, title: 'What you were about to sign has changed' },
  'work-left-unowned': { status: 409, title: 'Some open work would be left with nobody' },
  'duplicate-record': { status: 409, title: 'A record like this exists already' },
  'import-has-faults': { status: 409, title: 'The import still has faults; nothing was written' },
  'already-done': { status: 409, title: 'This has been done already' },
  'link-not-valid': { status: 410, title: 'This link has been used or has run out' },
  'changed-meanwhile': { status: 412, title: 'Somebody changed this while you were working on it' },
  'too-large': { status: 413, title: 'That is more than can be taken in one go' },
  'wrong-type': { status: 415, title: 'The content is not of a type that can be read' },
  'same-key-other-body': { status: 422, title: 'This request key was used for something else' },
  'protocol-has-faults': { status: 422, title: 'The protocol has faults' },
  'version-needed': { status: 428, title: 'The version you are changing was not named' },
  'too-many': { status: 429, title: 'Too many attempts; wait a little' },
  surprise: { status: 500, title: 'Something went wrong on our side' },
} as const;

export type ProblemName = keyof typeof problems;
export const problemNames = Object.keys(problems) as readonly ProblemName[]; // keys of a frozen literal

export const fieldFaultSchema = z.object({
  /** JSON Pointer into the body, `/contacts/0/phone`. */
  pointer: z.string(),
  detail: z.string(),
});
export type FieldFault = z.infer<typeof fieldFaultSchema>;

export const problemSchema = z.looseObject({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string().optional(),
  instance: z.string().optional(),
  errors: z.array(fieldFaultSchema).optional(),
  /** The record as it stands now, where somebody else was faster. */
  current: z.unknown().optional(),
});
export type Problem = z.infer<typeof problemSchema>;
