/** What is done to a child's pathway as a whole: findings, milestones of its own, questions, another protocol. */
import { z } from 'zod';
import { childParams } from './child.ts';
import { operation } from './operation.ts';
import { pathwaySchema } from './pathway.ts';
import { lineSchema, noneSchema, optionalLineSchema, plainDateSchema, reasonSchema } from './text-fields.ts';

const group = 'Pathway';
const plain = { params: noneSchema, query: noneSchema, ifMatch: 'none', isRepeatable: false } as const;
const common = ['bad-input', 'not-signed-in', 'not-allowed', 'not-found', 'forged-request'] as const;

export const recordFinding = operation({
  ...plain,
  name: 'recordFinding',
  group,
  summary: 'Record a finding that starts or ends a milestone',
  method: 'POST',
  path: '/children/:childId/findings',
  params: childParams,
  isRepeatable: true,
  body: z.strictObject({
    name: z.string().regex(/^[a-z][a-z0-9_]{1,40}$/),
    on: plainDateSchema,
    isPresent: z.boolean(),
    note: optionalLineSchema(300),
  }),
  answer: pathwaySchema,
  status: 200,
  problems: common,
});
export const addOwnMilestone = operation({
  ...plain,
  name: 'addOwnMilestone',
  group,
  summary: 'Add a milestone from outside the protocol',
  method: 'POST',
  path: '/children/:childId/own-milestones',
  params: childParams,
  isRepeatable: true,
  body: z.strictObject({
    catalogueId: z.string().max(40),
    title: lineSchema(80),
    earliest: plainDateSchema,
    target: plainDateSchema,
    latest: plainDateSchema,
    reason: reasonSchema,
  }),
  answer: pathwaySchema,
  status: 201,
  problems: common,
});
export const askWhatIf = operation({
  ...plain,
  name: 'askWhatIf',
  group,
  summary: 'What would move if this slipped or were waived; nothing is written',
  method: 'POST',
  path: '/children/:childId/what-if',
  params: childParams,
  body: z.strictObject({
    milestone: z.string().max(40),
    change: z.discriminatedUnion('kind', [
      z.strictObject({ kind: z.literal('slip'), weeks: z.int().min(1).max(104) }),
      z.strictObject({ kind: z.literal('waive') }),
      z.strictObject({ kind: z.literal('book'), on: plainDateSchema }),
    ]),
  }),
  answer: z.object({
    moved: z.array(
      z.object({
        milestone: z.string(),
        title: z.string(),
        before: z.object({
          state: z.string(),
          earliest: plainDateSchema.nullable(),
          target: plainDateSchema.nullable(),
          latest: plainDateSchema.nullable(),
        }),
        after: z.object({
          state: z.string(),
          earliest: plainDateSchema.nullable(),
          target: plainDateSchema.nullable(),
          latest: plainDateSchema.nullable(),
        }),
        days: z.int(),
      }),
    ),
  }),
  status: 200,
  problems: common,
});
export const moveToProtocol = operation({
  ...plain,
  name: 'moveToProtocol',
  group,
  summary: 'Move a child to another version of the protocol',
  method: 'PUT',
  path: '/children/:childId/protocol-version',
  params: childParams,
  body: z.strictObject({ version: z.int().min(1), reason: reasonSchema }),
  answer: pathwaySchema,
  status: 200,
  problems: common,
});
