/** The registry: children and expected children, their cleft, contacts and alerts. */
import { z } from 'zod';
import { operation } from './operation.ts';
import { pageOf, pageQuery } from './page.ts';
import {
  emailSchema,
  idSchema,
  instantSchema,
  lineSchema,
  noneSchema,
  optionalLineSchema,
  plainDateSchema,
  paragraphSchema,
  reasonSchema,
} from './text-fields.ts';

export const sexes = ['female', 'male', 'unknown'] as const;
export const alertKinds = ['allergy', 'latex', 'airway', 'interpreter', 'other'] as const;
export const contactRelations = ['mother', 'father', 'parent', 'foster-carer', 'guardian', 'other'] as const;

/** Facts without a date of their own that the protocol asks for. */
export const childFlags = [
  'robin',
  'airway',
  'smcp',
  'syndrome',
  'stickler_risk',
  'uvula_only',
  'midline_lip',
  'early_incisor_track',
  'jaw_surgery_planned',
] as const;
export type ChildFlag = (typeof childFlags)[number];

/** An address or nothing; one message for both, which a union could not give. */
const optionalEmailSchema = z
  .string()
  .max(254, 'Use at most 254 characters.')
  .transform((text) => text.normalize('NFC').trim().toLowerCase())
  .refine(
    (text) => text === '' || emailSchema.safeParse(text).success,
    'Write a whole e-mail address, such as name@example.org.',
  );

export const contactSchema = z.strictObject({
  name: lineSchema(100, 'Write a name.'),
  relation: z.enum(contactRelations),
  phone: optionalLineSchema(40),
  email: optionalEmailSchema,
  language: optionalLineSchema(40),
  needsInterpreter: z.boolean(),
  mayConsent: z.boolean(),
});
export type Contact = z.infer<typeof contactSchema>;

export const alertSchema = z.strictObject({
  kind: z.enum(alertKinds),
  text: lineSchema(200, 'Say what the alert is.'),
});

/** What a person types about a child. Dates that cannot be are refused where today is known (the API). */
export const childFieldsSchema = z
  .strictObject({
    firstName: lineSchema(80, 'Write a first name.'),
    familyName: lineSchema(80, 'Write a family name.'),
    recordNumber: z
      .string()
      .regex(/^[A-Za-z0-9][A-Za-z0-9/-]{2,19}$/, 'Use 3 to 20 letters, digits, dashes or slashes.'),
    /** Null for an expected child. */
    bornOn: plainDateSchema.nullable(),
    dueOn: plainDateSchema.nullable(),
    isBirthEstimated: z.boolean(),
    gestation: z
      .strictObject({
        weeks: z.int().min(20, 'Weeks run from 20 to 45.').max(45, 'Weeks run from 20 to 45.'),
        days: z.int().min(0).max(6),
      })
      .nullable(),
    sex: z.enum(sexes),
    /** LAHSHAL text; stored in its normal form. */
    cleft: z.string().max(30),
    isCleftProvisional: z.boolean(),
    flags: z.array(z.enum(childFlags)).max(childFlags.length),
    syndromes: z.array(lineSchema(80)).max(10),
    referredOn: plainDateSchema.nullable(),
    prenatalReferralOn: plainDateSchema.nullable(),
    teamStartOn: plainDateSchema.nullable(),
    site: lineSchema(60, 'Choose a site.'),
    leadClinicianId: idSchema.nullable(),
    contacts: z.array(contactSchema).max(8),
    alerts: z.array(alertSchema).max(12),
    notes: paragraphSchema(2000),
  })
  .refine((child) => child.bornOn !== null || child.dueOn !== null, {
    path: ['bornOn'],
    message: 'Write the birth date, or the expected date for a child not yet born.',
  });
export type ChildFields = z.infer<typeof childFieldsSchema>;

export const childSchema = z.object({
  id: idSchema,
  version: z.int(),
  fields: z.custom<ChildFields>((value) => typeof value === 'object' && value !== null),
  icd10: z.object({ code: z.string(), title: z.string() }).nullable(),
  protocolVersion: z.int(),
  transferredOn: plainDateSchema.nullable(),
  transferredTo: z.string(),
  /** Members in training who work with this child. */
  traineeIds: z.array(idSchema),
  careEnded: z.object({ on: plainDateSchema, reason: z.string() }).nullable(),
  registeredAt: instantSchema,
});
export type Child = z.infer<typeof childSchema>;

export const childRowSchema = z.object({
  id: idSchema,
  firstName: z.string(),
  familyName: z.string(),
  recordNumber: z.string(),
  bornOn: plainDateSchema.nullable(),
  dueOn: plainDateSchema.nullable(),
  cleft: z.string(),
  site: z.string(),
  leadClinicianId: idSchema.nullable(),
  alerts: z.array(z.string()),
  late: z.int(),
  closing: z.int(),
  unowned: z.int(),
  transferredOn: plainDateSchema.nullable(),
  careEndedOn: plainDateSchema.nullable(),
});
export type ChildRow = z.infer<typeof childRowSchema>;

const group = 'Children';
const plain = { params: noneSchema, query: noneSchema, ifMatch: 'none', isRepeatable: false } as const;
export const childParams = z.strictObject({ childId: idSchema });
const readProblems = ['not-signed-in', 'not-allowed', 'not-found'] as const;

export const listChildren = operation({
  ...plain,
  name: 'listChildren',
  group,
  summary: 'Search the registry by name, record number or birth date',
  method: 'GET',
  path: '/children',
  query: z.strictObject({
    ...pageQuery,
    q: z.string().max(100).optional(),
    order: z.enum(['name', 'birth', 'late']).default('name'),
  }),
  body: noneSchema,
  answer: pageOf(childRowSchema).extend({ total: z.int() }),
  status: 200,
  problems: ['bad-input', 'not-signed-in', 'not-allowed'],
});

export const findDuplicates = operation({
  ...plain,
  name: 'findDuplicates',
  group,
  summary: 'Children that may be the same as one about to be added',
  method: 'POST',
  path: '/duplicate-checks',
  body: z.strictObject({
    firstName: z.string().max(80),
    familyName: z.string().max(80),
    recordNumber: z.string().max(20),
    bornOn: plainDateSchema.nullable(),
    exceptId: idSchema.nullable(),
  }),
  answer: z.object({
    candidates: z.array(
      z.object({
        id: idSchema,
        name: z.string(),
        recordNumber: z.string(),
        bornOn: plainDateSchema.nullable(),
        why: z.array(z.enum(['record-number', 'name-and-birth', 'name', 'birth'])),
      }),
    ),
  }),
  status: 200,
  problems: ['bad-input', 'not-signed-in', 'not-allowed', 'forged-request'],
});

export const registerChild = operation({
  ...plain,
  name: 'registerChild',
  group,
  summary: 'Add a child or an expected child',
  method: 'POST',
  path: '/children',
  isRepeatable: true,
  body: z.strictObject({ fields: childFieldsSchema, isDistinct: z.boolean() }),
  answer: childSchema,
  status: 201,
  problems: ['bad-input', 'not-signed-in', 'not-allowed', 'duplicate-record', 'forged-request'],
});

export const readChild = operation({
  ...plain,
  name: 'readChild',
  group,
  summary: "A child's record",
  method: 'GET',
  path: '/children/:childId',
  params: childParams,
  body: noneSchema,
  answer: childSchema,
  status: 200,
  problems: readProblems,
});

export const editChild = operation({
  ...plain,
  name: 'editChild',
  group,
  summary: "Change a child's record",
  method: 'PATCH',
  path: '/children/:childId',
  params: childParams,
  ifMatch: 'required',
  body: childFieldsSchema,
  answer: childSchema,
  status: 200,
  problems: ['bad-input', ...readProblems, 'changed-meanwhile', 'version-needed', 'duplicate-record', 'forged-request'],
});

export const transferChild = operation({
  ...plain,
  name: 'transferChild',
  group,
  summary: 'Care moves to another team, or comes back',
  method: 'PUT',
  path: '/children/:childId/transfer',
  params: childParams,
  body: z.strictObject({ on: plainDateSchema.nullable(), to: optionalLineSchema(120), reason: reasonSchema }),
  answer: childSchema,
  status: 200,
  problems: ['bad-input', ...readProblems, 'forged-request'],
});

export const endCare = operation({
  ...plain,
  name: 'endCare',
  group,
  summary: 'Stop every reminder, letter and list entry at once',
  method: 'PUT',
  path: '/children/:childId/care-end',
  params: childParams,
  body: z.strictObject({ on: plainDateSchema, reason: reasonSchema }),
  answer: childSchema,
  status: 200,
  problems: ['bad-input', ...readProblems, 'already-done', 'forged-request'],
});

export const assignTrainees = operation({
  ...plain,
  name: 'assignTrainees',
  group,
  summary: 'Which trainees work with this child',
  method: 'PUT',
  path: '/children/:childId/trainees',
  params: childParams,
  body: z.strictObject({ memberIds: z.array(idSchema).max(20) }),
  answer: z.object({ memberIds: z.array(idSchema) }),
  status: 200,
  problems: ['bad-input', ...readProblems, 'forged-request'],
});
