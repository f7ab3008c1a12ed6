/** A child's pathway: the facts the planner reads, and who holds, drafted and signed what. The reader plans it live. */
import { z } from 'zod';
import type { MilestoneRule } from '@weftway/pathway/protocol';
import type { PathwayFacts } from '@weftway/pathway/pathway-facts';
import { childParams, childSchema } from './child.ts';
import { operation } from './operation.ts';
import {
  idSchema,
  instantSchema,
  noneSchema,
  optionalLineSchema,
  paragraphSchema,
  plainDateSchema,
  reasonSchema,
} from './text-fields.ts';

/** A value as typed, or left empty for a stated reason. */
export const evidenceValueSchema = z.strictObject({
  value: paragraphSchema(4000).nullable(),
  /** Why it is empty. */
  emptyBecause: optionalLineSchema(300).optional(),
  /** An unlikely value that the person confirmed. */
  isConfirmed: z.boolean().optional(),
});
export type EvidenceValue = z.infer<typeof evidenceValueSchema>;
export const evidenceSchema = z.record(z.string().regex(/^[a-z][a-z0-9_]{0,60}$/), evidenceValueSchema);
export type Evidence = z.infer<typeof evidenceSchema>;

export const claimSchema = z.object({
  milestone: z.string(),
  part: z.string(),
  memberId: idSchema,
  since: instantSchema,
});
export type Claim = z.infer<typeof claimSchema>;

export const draftSchema = z.object({
  milestone: z.string(),
  part: z.string(),
  occurrence: z.int(),
  version: z.int(),
  values: evidenceSchema,
  performedOn: plainDateSchema.nullable(),
  byId: idSchema,
  at: instantSchema,
  /** A trainee has finished and asks for a signature. */
  isReady: z.boolean(),
});
export type Draft = z.infer<typeof draftSchema>;

export const signatureSchema = z.object({
  id: idSchema,
  milestone: z.string(),
  part: z.string(),
  occurrence: z.int(),
  performedOn: plainDateSchema,
  signedAt: instantSchema,
  signerId: idSchema,
  signerName: z.string(),
  signerRole: z.string(),
  meaning: z.string(),
  values: evidenceSchema,
  draftedByName: z.string().nullable(),
  overrides: z.array(z.object({ check: z.string(), reason: z.string(), secondName: z.string().nullable() })),
  protocolVersion: z.int(),
  digest: z.string(),
  /** The entry that this one amends. */
  amends: idSchema.nullable(),
  amendReason: z.string().nullable(),
});
export type Signature = z.infer<typeof signatureSchema>;

export const historyEntrySchema = z.object({
  seq: z.int(),
  at: instantSchema,
  kind: z.string(),
  byName: z.string(),
  milestone: z.string().nullable(),
  detail: z.string(),
});

export const pathwaySchema = z.object({
  child: childSchema,
  /** Changes with every event of this child. */
  version: z.int(),
  facts: z.custom<PathwayFacts>((value) => typeof value === 'object' && value !== null),
  protocolVersion: z.int(),
  /** Milestones outside the protocol, added for this child alone. */
  ownMilestones: z.array(z.custom<MilestoneRule>((value) => typeof value === 'object' && value !== null)),
  claims: z.array(claimSchema),
  drafts: z.array(draftSchema),
  signatures: z.array(signatureSchema),
  trainees: z.array(idSchema),
  history: z.array(historyEntrySchema),
});
export type Pathway = z.infer<typeof pathwaySchema>;

const group = 'Pathway';
const plain = { params: noneSchema, query: noneSchema, ifMatch: 'none', isRepeatable: false } as const;
export const milestoneParams = z.strictObject({
  childId: idSchema,
  milestone: z.string().regex(/^[A-Z]{3,5}-\d{2,3}(:[A-Z0-9:-]{1,20})?$/, 'This is not a milestone.'),
});
const common = ['bad-input', 'not-signed-in', 'not-allowed', 'not-found', 'forged-request'] as const;
const partSchema = z.string().regex(/^[a-z][a-z-]{0,39}$/);
const act = { ...plain, group, params: milestoneParams, answer: pathwaySchema, status: 200 } as const;

export const readPathway = operation({
  ...plain,
  name: 'readPathway',
  group,
  summary: "A child's pathway with everything it is reckoned from",
  method: 'GET',
  path: '/children/:childId/pathway',
  params: childParams,
  body: noneSchema,
  answer: pathwaySchema,
  status: 200,
  problems: ['not-signed-in', 'not-allowed', 'not-found'],
});

export const claimMilestone = operation({
  ...act,
  name: 'claimMilestone',
  summary: 'Take a milestone on',
  method: 'POST',
  path: '/children/:childId/milestones/:milestone/claim',
  body: z.strictObject({ part: partSchema }),
  problems: [...common, 'milestone-already-claimed', 'milestone-state-refuses'],
});
export const releaseMilestone = operation({
  ...act,
  name: 'releaseMilestone',
  summary: 'Let a milestone go',
  method: 'POST',
  path: '/children/:childId/milestones/:milestone/release',
  body: z.strictObject({ part: partSchema, reason: optionalLineSchema(300) }),
  problems: [...common, 'milestone-not-yours'],
});
export const handOverMilestone = operation({
  ...act,
  name: 'handOverMilestone',
  summary: 'Give a milestone to a colleague who may hold it',
  method: 'POST',
  path: '/children/:childId/milestones/:milestone/hand-over',
  body: z.strictObject({ part: partSchema, to: idSchema, from: idSchema.nullable() }),
  problems: [...common, 'milestone-already-claimed', 'milestone-not-yours', 'milestone-state-refuses'],
});
export const saveDraft = operation({
  ...act,
  name: 'saveDraft',
  summary: 'Keep evidence as a draft',
  method: 'PUT',
  path: '/children/:childId/milestones/:milestone/draft',
  ifMatch: 'required',
  body: z.strictObject({
    part: partSchema,
    values: evidenceSchema,
    performedOn: plainDateSchema.nullable(),
    isReady: z.boolean(),
  }),
  problems: [...common, 'changed-meanwhile', 'version-needed', 'milestone-state-refuses'],
});
export const signingSheetSchema = z.object({
  sentence: z.string(),
  meaning: z.string(),
  signAs: z.string(),
  digest: z.string(),
  evidence: z.array(z.object({ name: z.string(), label: z.string(), text: z.string() })),
  /** Why it cannot be signed yet, in the reader's words; empty when it can. */
  refusals: z.array(z.object({ code: z.string(), text: z.string(), field: z.string().nullable() })),
  /** Checks that may be overridden with a reason. */
  overridable: z.array(z.object({ check: z.string(), text: z.string(), needsSecondName: z.boolean() })),
});
export const readSigningSheet = operation({
  ...plain,
  name: 'readSigningSheet',
  group,
  summary: 'Exactly what would be signed',
  method: 'POST',
  path: '/children/:childId/milestones/:milestone/signing-sheet',
  params: milestoneParams,
  body: z.strictObject({ part: partSchema, performedOn: plainDateSchema, values: evidenceSchema }),
  answer: signingSheetSchema,
  status: 200,
  problems: common,
});
export const signMilestone = operation({
  ...act,
  name: 'signMilestone',
  summary: 'Sign a milestone off',
  method: 'POST',
  path: '/children/:childId/milestones/:milestone/sign-off',
  isRepeatable: true,
  body: z.strictObject({
    part: partSchema,
    performedOn: plainDateSchema,
    values: evidenceSchema,
    digest: z.string().max(100),
    password: z.string().min(1, 'Write your password.').max(128),
    overrides: z
      .array(
        z.strictObject({
          check: z.string().max(40),
          reason: reasonSchema,
          secondName: optionalLineSchema(100).nullable(),
        }),
      )
      .max(10),
  }),
  problems: [
    ...common,
    'wrong-password',
    'too-many',
    'milestone-already-signed',
    'milestone-not-ready',
    'signed-content-changed',
    'milestone-state-refuses',
  ],
});
export const amendSignature = operation({
  ...act,
  name: 'amendSignature',
  summary: 'Put a signed entry right by a further signed entry',
  method: 'POST',
  path: '/children/:childId/milestones/:milestone/amendments',
  isRepeatable: true,
  body: z.strictObject({
    signatureId: idSchema,
    performedOn: plainDateSchema,
    values: evidenceSchema,
    reason: reasonSchema,
    password: z.string().min(1, 'Write your password.').max(128),
  }),
  problems: [...common, 'wrong-password', 'too-many', 'milestone-not-ready', 'milestone-state-refuses'],
});
export const holdMilestone = operation({
  ...act,
  name: 'holdMilestone',
  summary: 'Pause with a reason and a review date',
  method: 'PUT',
  path: '/children/:childId/milestones/:milestone/hold',
  body: z.strictObject({ hold: z.strictObject({ reason: reasonSchema, reviewOn: plainDateSchema }).nullable() }),
  problems: [...common, 'milestone-state-refuses'],
});
export const waiveMilestone = operation({
  ...act,
  name: 'waiveMilestone',
  summary: 'Record that it will not be done, why and who decided',
  method: 'POST',
  path: '/children/:childId/milestones/:milestone/waiver',
  body: z.strictObject({
    kind: z.enum(['waived', 'not-recoverable']),
    reason: reasonSchema,
    note: paragraphSchema(1000),
    secondName: optionalLineSchema(100).nullable(),
    offerAgainOn: plainDateSchema.nullable(),
    password: z.string().min(1, 'Write your password.').max(128),
  }),
  problems: [...common, 'wrong-password', 'too-many', 'milestone-state-refuses'],
});
export const bookMilestone = operation({
  ...act,
  name: 'bookMilestone',
  summary: 'Book a date, move it or take it back',
  method: 'PUT',
  path: '/children/:childId/milestones/:milestone/booking',
  body: z.strictObject({ on: plainDateSchema.nullable(), reason: optionalLineSchema(300) }),
  problems: [...common, 'milestone-state-refuses'],
});
export const confirmImported = operation({
  ...act,
  name: 'confirmImported',
  summary: 'A surgeon confirms an operation done elsewhere',
  method: 'POST',
  path: '/children/:childId/milestones/:milestone/confirmation',
  body: z.strictObject({ password: z.string().min(1, 'Write your password.').max(128) }),
  problems: [...common, 'wrong-password', 'too-many', 'milestone-state-refuses'],
});
