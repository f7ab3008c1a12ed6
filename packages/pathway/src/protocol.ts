/**
 * The shape of a team's protocol: every rule of the pathway as data.
 *
 * Spans are written as in the trade: `10w`, `3m`, `2y6m`, `-30d`; years and months are calendar months, weeks are
 * seven days; years and months are added first, then weeks and days.
 */
import { z } from 'zod';
import { disciplines } from '@weftway/team/disciplines';
import { lanes } from '@weftway/team/lanes';
import { conditionSchema } from './condition.ts';

export const spanSchema = z
  .string()
  .regex(/^-?(?=\d)(\d+y)?(\d+m)?(\d+w)?(\d+d)?$/, 'Write a span such as 10w, 3m, 2y6m or -30d.');

/** A milestone of the protocol, `SURG-03`. */
export const milestoneIdSchema = z.string().regex(/^[A-Z]{3,5}-\d{2,3}$/, 'Write a milestone id such as SURG-03.');

export const windowRuleSchema = z.strictObject({ earliest: spanSchema, target: spanSchema, latest: spanSchema });

/**
 * From which day a window is counted.
 * `birth` and `corrected` (for prematurity); the day a referral came (`referral`, before birth `prenatal-referral`);
 * the completion of another milestone (`event`); a booked date of another milestone (`booking`); the day a finding was
 * recorded (`finding`); every booked or performed operation (`operation-booked`, `operation-done`).
 */
export const clockSchema = z.discriminatedUnion('from', [
  z.strictObject({ from: z.literal('birth') }),
  z.strictObject({ from: z.literal('corrected') }),
  z.strictObject({ from: z.literal('referral') }),
  z.strictObject({ from: z.literal('prenatal-referral') }),
  z.strictObject({ from: z.literal('event'), milestone: milestoneIdSchema }),
  z.strictObject({ from: z.literal('booking'), milestone: milestoneIdSchema }),
  z.strictObject({ from: z.literal('finding'), finding: z.string().min(1) }),
  z.strictObject({ from: z.literal('operation-booked') }),
  z.strictObject({ from: z.literal('operation-done') }),
]);

/** What a gate or check asks of the result that was signed: a named evidence field must hold one of these values. */
export const resultDemandSchema = z.strictObject({ field: z.string().min(1), oneOf: z.array(z.string()).min(1) });

export const prerequisiteSchema = z.strictObject({
  milestone: milestoneIdSchema,
  type: z.enum(['gate', 'check', 'soft']),
  gap: spanSchema.optional(),
  freshFor: spanSchema.optional(),
  result: resultDemandSchema.optional(),
  when: conditionSchema.optional(),
  /** Checks that a second clinician must name themselves for when they are overridden. */
  secondName: z.boolean().optional(),
  note: z.string().optional(),
});

export const repeatSchema = z.strictObject({
  /** Spans from the last signed occurrence, or ages when `byAge` is set. */
  window: windowRuleSchema,
  byAge: z.boolean().optional(),
  when: conditionSchema.optional(),
  /** Age of the child at the last signed occurrence, half-open: from <= age < to. */
  ageFrom: spanSchema.optional(),
  ageTo: spanSchema.optional(),
  until: z.array(z.string()).optional(),
  /** Counted from this clock instead of from the last signed occurrence. */
  clock: clockSchema.optional(),
});

export const evidenceKinds = [
  'text',
  'long-text',
  'number',
  'yes-no',
  'choice',
  'date',
  'grade',
  'root-stage',
] as const;

export const evidenceFieldSchema = z.strictObject({
  /** Stable name, snake_case; with `_right` or `_left` where one value per side is kept. */
  name: z.string().regex(/^[a-z][a-z0-9_]*$/),
  label: z.string().min(1),
  kind: z.enum(evidenceKinds),
  unit: z.string().optional(),
  /** Impossible outside `min`..`max`; unlikely (asks to be confirmed) outside `likely`. */
  min: z.number().optional(),
  max: z.number().optional(),
  likely: z.tuple([z.number(), z.number()]).optional(),
  choices: z.array(z.string()).optional(),
  hint: z.string().optional(),
  /** Part of a two-signature milestone that answers for this field; absent: the first part. */
  part: z.string().optional(),
  /** Values with which a second clinician must name themselves beside the signer. */
  secondNameFor: z.array(z.string()).optional(),
  /** Visible to the signing disciplines only. */
  isPrivate: z.boolean().optional(),
});
export type EvidenceField = z.infer<typeof evidenceFieldSchema>;

export const signerSchema = z.enum([...disciplines, 'lead-clinician']);
export type Signer = z.infer<typeof signerSchema>;

/** One signature that a milestone needs: a named part, what signing it means, and who may give it. */
export const signaturePartSchema = z.strictObject({
  part: z.string().regex(/^[a-z][a-z-]*$/),
  label: z.string().min(1),
  meaning: z.string().min(1),
  disciplines: z.array(signerSchema).min(1),
});

/** A finding that a signed evidence value raises (`vpi_suspected` = yes starts a clock). */
export const raisesSchema = z.strictObject({
  field: z.string(),
  oneOf: z.array(z.string()).min(1),
  finding: z.string().min(1),
});

export const milestoneRuleSchema = z.strictObject({
  id: milestoneIdSchema,
  title: z.string().min(1),
  /** At most 24 characters, for the ruler and the board. */
  shortTitle: z.string().min(1).max(28),
  /** One sentence in plain words. */
  plain: z.string().min(1),
  lane: z.enum(lanes),
  kind: z.enum(['core', 'conditional', 'elective']),
  clock: clockSchema,
  window: windowRuleSchema,
  closingDays: z.int().min(0),
  /** Absent: for every child. */
  applies: conditionSchema.optional(),
  appliesText: z.string().min(1),
  variants: z
    .array(z.strictObject({ when: conditionSchema, window: windowRuleSchema, note: z.string().min(1) }))
    .default([]),
  prerequisites: z.array(prerequisiteSchema).default([]),
  repeats: z.array(repeatSchema).default([]),
  /** Days after team start to target and to latest for a late arrival; absent: cannot be made up. */
  catchUp: z.tuple([z.int(), z.int()]).optional(),
  lapse: z.strictObject({ after: z.union([spanSchema, z.literal('birth')]) }).optional(),
  /** One entry for each cleft side (grafts). */
  perSide: z.boolean().default(false),
  isOperation: z.boolean().default(false),
  /** Window follows the canine root (rule C2.14). */
  followsRoot: z.enum(['tracking', 'readiness', 'graft']).optional(),
  mayClaim: z.array(signerSchema).min(1),
  signatures: z.array(signaturePartSchema).min(1).max(2),
  evidence: z.array(evidenceFieldSchema).default([]),
  raises: z.array(raisesSchema).default([]),
  waivedWhen: z.array(z.string()).default([]),
  /** Disciplines of whom one each must decide a waiver, where the protocol asks for more than the signer. */
  waiverNeeds: z.array(z.array(signerSchema).min(1)).optional(),
  lateMeans: z.string(),
  moves: z.array(milestoneIdSchema).default([]),
  sources: z.array(z.string()).default([]),
});
export type MilestoneRule = z.infer<typeof milestoneRuleSchema>;
export type MilestoneRuleInput = z.input<typeof milestoneRuleSchema>;

export const rootStages = ['0', '1/4', '1/3', '1/2', '2/3', '3/4', '1'] as const;

export const protocolSettingsSchema = z.strictObject({
  offersMolding: z.boolean(),
  moldingClock: z.enum(['birth', 'corrected']).default('birth'),
  graftRootLower: z.string().regex(/^\d+(\/\d+)?$/),
  graftRootUpper: z.string().regex(/^\d+(\/\d+)?$/),
});

export const protocolSchema = z.strictObject({
  name: z.string().min(1).max(120),
  version: z.int().min(1),
  changes: z.string().max(2000),
  settings: protocolSettingsSchema,
  milestones: z.array(milestoneRuleSchema).min(1),
  sources: z.record(z.string(), z.string()),
});
export type Protocol = z.infer<typeof protocolSchema>;
export type ProtocolInput = z.input<typeof protocolSchema>;
