/** What stands beside a child's record: its own history, and what it may name. */
import { z } from 'zod';
import { childParams } from './child.ts';
import { operation } from './operation.ts';
import { pageOf, pageQuery } from './page.ts';
import { idSchema, instantSchema, noneSchema } from './text-fields.ts';

const group = 'Children';
const plain = { params: noneSchema, query: noneSchema, ifMatch: 'none', isRepeatable: false } as const;

/** One entry of the record's own history: who changed what, before and after, field by field. */
export const childChangeSchema = z.object({
  seq: z.int(),
  at: instantSchema,
  kind: z.string(),
  actorName: z.string(),
  actorRole: z.string(),
  reason: z.string(),
  changes: z.array(z.object({ field: z.string(), before: z.unknown(), after: z.unknown() })),
});
export type ChildChange = z.infer<typeof childChangeSchema>;

export const listChildChanges = operation({
  ...plain,
  name: 'listChildChanges',
  group,
  summary: "What was changed in a child's record, newest first",
  method: 'GET',
  path: '/children/:childId/changes',
  params: childParams,
  query: z.strictObject(pageQuery),
  body: noneSchema,
  answer: pageOf(childChangeSchema),
  status: 200,
  problems: ['bad-input', 'not-signed-in', 'not-allowed', 'not-found'],
});

/** What a record may name: the team's sites, clinicians who may lead, trainees. */
export const readRecordChoices = operation({
  ...plain,
  name: 'readRecordChoices',
  group,
  summary: 'Sites, lead clinicians and trainees that a record may name',
  method: 'GET',
  path: '/record-choices',
  body: noneSchema,
  answer: z.object({
    sites: z.array(z.string()),
    leads: z.array(z.object({ id: idSchema, name: z.string() })),
    trainees: z.array(z.object({ id: idSchema, name: z.string() })),
  }),
  status: 200,
  problems: ['not-signed-in', 'not-allowed'],
});
