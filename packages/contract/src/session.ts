/** Signing in and out, invitations, passwords. */
import { z } from 'zod';
import { disciplines } from '@weftway/team/disciplines';
import { standings } from '@weftway/team/standings';
import { operation } from './operation.ts';
import { newPasswordSchema, typedPasswordSchema } from './passwords.ts';
import { emailSchema, idSchema, instantSchema, noneSchema, plainDateSchema } from './text-fields.ts';

export const meSchema = z.object({
  id: idSchema,
  name: z.string(),
  email: z.string(),
  standing: z.enum(standings),
  disciplines: z.array(z.enum(disciplines)),
  supervisorId: idSchema.nullable(),
});
export type Me = z.infer<typeof meSchema>;

export const sessionSchema = z.object({
  me: meSchema.nullable(),
  /** Send as `x-csrf-token` with every change. */
  csrfToken: z.string(),
  /** The team's local date. */
  today: plainDateSchema,
  team: z.object({ name: z.string(), zone: z.string() }),
  /** Demo mode: the local inbox can be read, demo accounts are listed at sign-in. */
  isDemo: z.boolean(),
  demoAccounts: z.array(z.object({ email: z.string(), name: z.string(), role: z.string(), password: z.string() })),
  /** Seconds without activity after which the session ends; null when signed out. */
  idleSeconds: z.int().nullable(),
  /** Seconds of that which are left, as the server counts them. */
  idleSecondsLeft: z.int().nullable(),
  endsAt: instantSchema.nullable(),
});
export type Session = z.infer<typeof sessionSchema>;

const group = 'Sign-in';
const plain = { params: noneSchema, query: noneSchema, ifMatch: 'none', isRepeatable: false } as const;

export const readSession = operation({
  ...plain,
  name: 'readSession',
  group,
  summary: 'Who is signed in, or nobody',
  method: 'GET',
  path: '/session',
  body: noneSchema,
  answer: sessionSchema,
  status: 200,
  problems: [],
});

export const signIn = operation({
  ...plain,
  name: 'signIn',
  group,
  summary: 'Sign in with e-mail and password',
  method: 'POST',
  path: '/session',
  body: z.strictObject({ email: z.string().min(1, 'Write your e-mail.').max(254), password: typedPasswordSchema }),
  answer: sessionSchema,
  status: 200,
  problems: ['bad-input', 'wrong-credentials', 'too-many', 'forged-request'],
});

export const signOut = operation({
  ...plain,
  name: 'signOut',
  group,
  summary: 'Sign out',
  method: 'DELETE',
  path: '/session',
  body: noneSchema,
  answer: sessionSchema,
  status: 200,
  problems: ['forged-request'],
});

/** Activity of a person, so that an open but idle screen is not activity. */
export const stayedActive = operation({
  ...plain,
  name: 'stayedActive',
  group,
  summary: 'Tell that the person is still there',
  method: 'POST',
  path: '/session/activity',
  body: noneSchema,
  answer: sessionSchema,
  status: 200,
  problems: ['not-signed-in', 'forged-request'],
});

export const askPasswordReset = operation({
  ...plain,
  name: 'askPasswordReset',
  group,
  summary: 'Ask for a link to set a new password',
  method: 'POST',
  path: '/password-reset-requests',
  body: z.strictObject({ email: emailSchema }),
  answer: z.object({ sent: z.literal(true) }),
  status: 202,
  problems: ['bad-input', 'too-many', 'forged-request'],
});

export const resetPassword = operation({
  ...plain,
  name: 'resetPassword',
  group,
  summary: 'Set a new password from a mailed link',
  method: 'POST',
  path: '/password-resets',
  body: z.strictObject({ token: z.string().min(20).max(200), password: newPasswordSchema }),
  answer: z.object({ done: z.literal(true) }),
  status: 200,
  problems: ['bad-input', 'link-not-valid', 'too-many', 'forged-request'],
});

export const openInvitation = operation({
  ...plain,
  name: 'openInvitation',
  group,
  summary: 'Whom an invitation link is for',
  method: 'POST',
  path: '/invitation-views',
  body: z.strictObject({ token: z.string().min(20).max(200) }),
  answer: z.object({ name: z.string(), email: z.string(), team: z.string(), invitedBy: z.string() }),
  status: 200,
  problems: ['bad-input', 'link-not-valid', 'too-many', 'forged-request'],
});

export const acceptInvitation = operation({
  ...plain,
  name: 'acceptInvitation',
  group,
  summary: 'Accept an invitation and set a password',
  method: 'POST',
  path: '/invitation-acceptances',
  body: z.strictObject({ token: z.string().min(20).max(200), password: newPasswordSchema }),
  answer: z.object({ done: z.literal(true) }),
  status: 200,
  problems: ['bad-input', 'link-not-valid', 'too-many', 'forged-request'],
});

export const changePassword = operation({
  ...plain,
  name: 'changePassword',
  group,
  summary: 'Change my password',
  method: 'PUT',
  path: '/my-password',
  body: z.strictObject({ current: typedPasswordSchema, next: newPasswordSchema }),
  answer: z.object({ done: z.literal(true) }),
  status: 200,
  problems: ['bad-input', 'not-signed-in', 'wrong-password', 'too-many', 'forged-request'],
});

export const mySessionSchema = z.object({
  id: idSchema,
  startedAt: instantSchema,
  seenAt: instantSchema,
  device: z.string(),
  isThis: z.boolean(),
});

export const listMySessions = operation({
  ...plain,
  name: 'listMySessions',
  group,
  summary: 'Where I am signed in',
  method: 'GET',
  path: '/my-sessions',
  body: noneSchema,
  answer: z.object({ sessions: z.array(mySessionSchema) }),
  status: 200,
  problems: ['not-signed-in'],
});

export const endMySession = operation({
  ...plain,
  name: 'endMySession',
  group,
  summary: 'End one of my sessions',
  method: 'DELETE',
  path: '/my-sessions/:sessionId',
  params: z.strictObject({ sessionId: idSchema }),
  body: noneSchema,
  answer: z.object({ done: z.literal(true) }),
  status: 200,
  problems: ['not-signed-in', 'not-found', 'forged-request'],
});

export const mailSchema = z.object({
  id: idSchema,
  at: instantSchema,
  to: z.string(),
  subject: z.string(),
  text: z.string(),
});

export const readLocalInbox = operation({
  ...plain,
  name: 'readLocalInbox',
  group,
  summary: 'Mail kept on this machine instead of being sent (demo only)',
  method: 'GET',
  path: '/local-inbox',
  body: noneSchema,
  answer: z.object({ mails: z.array(mailSchema) }),
  status: 200,
  problems: ['not-found'],
});
