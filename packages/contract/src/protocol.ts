/** The team's protocol: versions, faults, activation. */
import { z } from 'zod';
import type { Protocol } from '@weftway/pathway/protocol';
import { operation } from './operation.ts';
import { instantSchema, lineSchema, noneSchema, reasonSchema } from './text-fields.ts';

export const protocolStatuses = ['draft', 'active', 'retired'] as const;
export const protocolHeadSchema = z.object({
  version: z.int(),
  name: z.string(),
  status: z.enum(protocolStatuses),
  changes: z.string(),
  createdAt: instantSchema,
  createdBy: z.string(),
  activatedAt: instantSchema.nullable(),
  activatedBy: z.string().nullable(),
  agreedBy: z.string().nullable(),
  children: z.int(),
});
export const protocolFaultSchema = z.object({
  pointer: z.string(),
  milestone: z.string().optional(),
  message: z.string(),
});

const group = 'Protocol';
const plain = { params: noneSchema, query: noneSchema, ifMatch: 'none', isRepeatable: false } as const;
const versionParams = z.strictObject({ version: z.coerce.number().int().min(1) });
const document = z.custom<Protocol>((value) => typeof value === 'object' && value !== null);

export const listProtocols = operation({
  ...plain,
  name: 'listProtocols',
  group,
  summary: 'Every version of the protocol',
  method: 'GET',
  path: '/protocols',
  body: noneSchema,
  answer: z.object({ protocols: z.array(protocolHeadSchema) }),
  status: 200,
  problems: ['not-signed-in', 'not-allowed'],
});
export const readProtocolVersion = operation({
  ...plain,
  name: 'readProtocolVersion',
  group,
  summary: 'One version of the protocol, whole',
  method: 'GET',
  path: '/protocols/:version',
  params: versionParams,
  body: noneSchema,
  answer: z.object({ head: protocolHeadSchema, protocol: document }),
  status: 200,
  problems: ['not-signed-in', 'not-allowed', 'not-found'],
});
export const checkProtocol = operation({
  ...plain,
  name: 'checkProtocol',
  group,
  summary: 'Find the faults of a protocol; nothing is written',
  method: 'POST',
  path: '/protocol-checks',
  body: z.strictObject({ protocol: z.unknown() }),
  answer: z.object({ faults: z.array(protocolFaultSchema) }),
  status: 200,
  problems: ['bad-input', 'not-signed-in', 'not-allowed', 'forged-request', 'too-large'],
});
export const addProtocol = operation({
  ...plain,
  name: 'addProtocol',
  group,
  summary: 'Keep a new version as a draft',
  method: 'POST',
  path: '/protocols',
  isRepeatable: true,
  body: z.strictObject({ protocol: z.unknown(), changes: lineSchema(500, 'Say what changed.') }),
  answer: protocolHeadSchema,
  status: 201,
  problems: ['bad-input', 'not-signed-in', 'not-allowed', 'protocol-has-faults', 'forged-request', 'too-large'],
});
export const activateProtocol = operation({
  ...plain,
  name: 'activateProtocol',
  group,
  summary: 'Make a version the one that new children follow',
  method: 'POST',
  path: '/protocols/:version/activation',
  params: versionParams,
  body: z.strictObject({
    password: z.string().min(1, 'Write your password.').max(128),
    agreedBy: lineSchema(100, 'Name the clinical lead who agreed.'),
    reason: reasonSchema,
    moveOpenChildren: z.boolean(),
  }),
  answer: protocolHeadSchema,
  status: 200,
  problems: [
    'bad-input',
    'not-signed-in',
    'not-allowed',
    'not-found',
    'wrong-password',
    'too-many',
    'already-done',
    'forged-request',
  ],
});
