/** Bringing a caseload in from CSV: preview every problem, then accept all or nothing. */
import { z } from 'zod';
import { operation } from './operation.ts';
import { idSchema, noneSchema } from './text-fields.ts';

export const importColumns = [
  'record_number',
  'first_name',
  'family_name',
  'birth_date',
  'due_date',
  'sex',
  'gestation',
  'cleft',
  'flags',
  'syndromes',
  'site',
  'referral_date',
  'team_start',
  'contact_name',
  'contact_relation',
  'contact_phone',
  'contact_email',
  'language',
  'interpreter',
  'alerts',
  'lip_repair',
  'palate_repair',
  'bone_graft',
  'last_team_review',
  'last_hearing_test',
  'last_dental_visit',
  'notes',
] as const;
export type ImportColumn = (typeof importColumns)[number];

/** Other spellings of a column's name that are understood; case, blanks, dashes and underscores never matter. */
export const importAliases = {
  record_number: ['record no', 'record', 'number', 'hospital number', 'mrn'],
  first_name: ['given name', 'forename'],
  family_name: ['surname', 'last name'],
  birth_date: ['date of birth', 'dob', 'born', 'born on'],
  due_date: ['expected date', 'edd', 'due'],
  sex: ['gender'],
  gestation: ['gestational age', 'weeks'],
  cleft: ['cleft code', 'lahshal'],
  flags: ['diagnosis flags'],
  syndromes: ['syndrome', 'diagnoses'],
  site: ['hospital', 'clinic'],
  referral_date: ['referred', 'referred on', 'date of referral'],
  team_start: ['first contact', 'start', 'first seen'],
  contact_name: ['contact', 'parent', 'guardian'],
  contact_relation: ['relation', 'relationship'],
  contact_phone: ['phone', 'telephone', 'mobile'],
  contact_email: ['email', 'e-mail'],
  language: ['spoken language'],
  interpreter: ['needs interpreter', 'interpreter needed'],
  alerts: ['alert', 'allergies'],
  lip_repair: ['date of lip repair'],
  palate_repair: ['date of palate repair'],
  bone_graft: ['graft', 'alveolar bone graft', 'abg'],
  last_team_review: ['last review'],
  last_hearing_test: ['last hearing', 'last audiology'],
  last_dental_visit: ['last dental'],
  notes: ['note', 'comments', 'remarks'],
} as const satisfies Readonly<Record<ImportColumn, readonly string[]>>;

export const dateOrders = ['day-first', 'month-first'] as const;
/** Rows that one file may hold. */
export const mostImportRows = 20_000;

export const importFaultSchema = z.object({
  row: z.int(),
  column: z.string(),
  value: z.string(),
  message: z.string(),
  severity: z.enum(['fault', 'warning']),
});
export type ImportFault = z.infer<typeof importFaultSchema>;
export const importPreviewSchema = z.object({
  id: idSchema,
  fileName: z.string(),
  rows: z.int(),
  added: z.int(),
  updated: z.int(),
  unchanged: z.int(),
  faultCount: z.int(),
  warningCount: z.int(),
  /** The first 500. */
  faults: z.array(importFaultSchema),
  sample: z.array(
    z.object({
      row: z.int(),
      name: z.string(),
      recordNumber: z.string(),
      bornOn: z.string().nullable(),
      cleft: z.string(),
      action: z.enum(['add', 'update', 'unchanged', 'refused']),
    }),
  ),
  status: z.enum(['previewed', 'accepted']),
});
export type ImportPreview = z.infer<typeof importPreviewSchema>;

const group = 'Caseload import';
const plain = { params: noneSchema, query: noneSchema, ifMatch: 'none', isRepeatable: false } as const;

export const previewImport = operation({
  ...plain,
  name: 'previewImport',
  group,
  summary: 'Read a caseload file and list every problem; nothing is written to the caseload',
  method: 'POST',
  path: '/imports',
  isRepeatable: true,
  body: z.strictObject({
    fileName: z.string().max(200),
    text: z.string().max(12_000_000),
    dateOrder: z.enum(dateOrders).default('day-first'),
  }),
  answer: importPreviewSchema,
  status: 201,
  problems: ['bad-input', 'not-signed-in', 'not-allowed', 'too-large', 'forged-request'],
});
export const acceptImport = operation({
  ...plain,
  name: 'acceptImport',
  group,
  summary: 'Write a previewed import, all or nothing',
  method: 'POST',
  path: '/imports/:importId/acceptance',
  params: z.strictObject({ importId: idSchema }),
  body: noneSchema,
  answer: importPreviewSchema,
  status: 200,
  problems: [
    'not-signed-in',
    'not-allowed',
    'not-found',
    'import-has-faults',
    'already-done',
    'changed-meanwhile',
    'forged-request',
  ],
});
