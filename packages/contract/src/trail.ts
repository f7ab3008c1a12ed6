/** The audit trail: who changed what and when, and who looked. */
import { z } from 'zod';
import { operation } from './operation.ts';
import { pageOf, pageQuery } from './page.ts';
import { idSchema, instantSchema, noneSchema, plainDateSchema } from './text-fields.ts';

/** Every kind of change, as written in the trail. */
export const eventKinds = [
  'team-founded',
  'team-settings-changed',
  'member-invited',
  'member-invited-again',
  'member-joined',
  'member-edited',
  'member-left',
  'cover-set',
  'password-set',
  'password-changed',
  'signed-in',
  'sign-in-refused',
  'signed-out',
  'protocol-added',
  'protocol-activated',
  'child-moved-to-protocol',
  'child-registered',
  'child-edited',
  'child-transferred',
  'child-returned',
  'care-ended',
  'lead-handed-on',
  'trainees-assigned',
  'import-accepted',
  'milestone-claimed',
  'milestone-released',
  'milestone-handed-over',
  'draft-saved',
  'milestone-signed',
  'signature-amended',
  'import-confirmed',
  'milestone-held',
  'hold-lifted',
  'milestone-waived',
  'booking-set',
  'booking-removed',
  'finding-recorded',
  'finding-withdrawn',
  'own-milestone-added',
  'history-imported',
] as const;
export type EventKind = (typeof eventKinds)[number];

/** Each kind in a few words, as a line of the trail and as a filter. */
export const eventKindNames: Readonly<Record<EventKind, string>> = {
  'team-founded': 'Team founded',
  'team-settings-changed': 'Team settings changed',
  'member-invited': 'Member invited',
  'member-invited-again': 'Invitation sent again',
  'member-joined': 'Member joined',
  'member-edited': 'Member changed',
  'member-left': 'Member left',
  'cover-set': 'Cover set',
  'password-set': 'Password set',
  'password-changed': 'Password changed',
  'signed-in': 'Signed in',
  'sign-in-refused': 'Sign-in refused',
  'signed-out': 'Signed out',
  'protocol-added': 'Protocol version kept as a draft',
  'protocol-activated': 'Protocol version made active',
  'child-moved-to-protocol': 'Child moved to another protocol version',
  'child-registered': 'Child registered',
  'child-edited': 'Record of a child changed',
  'child-transferred': 'Care moved to another team',
  'child-returned': 'Care came back',
  'care-ended': 'Care ended',
  'lead-handed-on': 'Lead clinician handed on',
  'trainees-assigned': 'Trainees assigned',
  'import-accepted': 'Import accepted',
  'milestone-claimed': 'Milestone claimed',
  'milestone-released': 'Milestone let go',
  'milestone-handed-over': 'Milestone handed over',
  'draft-saved': 'Draft kept',
  'milestone-signed': 'Milestone signed',
  'signature-amended': 'Signature amended',
  'import-confirmed': 'Imported operation confirmed',
  'milestone-held': 'Milestone held',
  'hold-lifted': 'Hold lifted',
  'milestone-waived': 'Milestone waived',
  'booking-set': 'Date booked',
  'booking-removed': 'Booking taken back',
  'finding-recorded': 'Finding recorded',
  'finding-withdrawn': 'Finding withdrawn',
  'own-milestone-added': 'Milestone added for one child',
  'history-imported': 'Past treatment imported',
};

export const trailLineSchema = z.object({
  seq: z.int(),
  at: instantSchema,
  kind: z.string(),
  actorId: z.string().nullable(),
  actorName: z.string(),
  actorRole: z.string(),
  childId: z.string().nullable(),
  childName: z.string().nullable(),
  memberId: z.string().nullable(),
  milestone: z.string().nullable(),
  requestId: z.string(),
  summary: z.string(),
  before: z.unknown(),
  after: z.unknown(),
  hash: z.string(),
  log: z.enum(['changes', 'reads']),
});
export type TrailLine = z.infer<typeof trailLineSchema>;

const plain = { params: noneSchema, query: noneSchema, ifMatch: 'none', isRepeatable: false } as const;

export const readTrail = operation({
  ...plain,
  name: 'readTrail',
  group: 'Audit trail',
  summary: 'Changes or reads, newest first',
  method: 'GET',
  path: '/trail',
  query: z.strictObject({
    ...pageQuery,
    log: z.enum(['changes', 'reads']).default('changes'),
    child: idSchema.optional(),
    member: idSchema.optional(),
    kind: z.string().max(40).optional(),
    from: plainDateSchema.optional(),
    to: plainDateSchema.optional(),
  }),
  body: noneSchema,
  answer: pageOf(trailLineSchema),
  status: 200,
  problems: ['bad-input', 'not-signed-in', 'not-allowed'],
});

/** How many lines were proved; the first that does not fit, of which kind, and what about it does not fit. */
export const chainProofSchema = z.object({
  lines: z.int(),
  brokenAt: z.int().nullable(),
  brokenKind: z.string().nullable(),
  why: z.string().nullable(),
});
export type ChainProof = z.infer<typeof chainProofSchema>;

export const verifyTrail = operation({
  ...plain,
  name: 'verifyTrail',
  group: 'Audit trail',
  summary: 'Prove the chains of changes and of reads',
  method: 'POST',
  path: '/trail-checks',
  body: noneSchema,
  answer: chainProofSchema.extend({ reads: chainProofSchema }),
  status: 200,
  problems: ['not-signed-in', 'not-allowed', 'forged-request'],
});
