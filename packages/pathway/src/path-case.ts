/**
 * One case of the `path` command: a child written down in one line of JSON, as in the published test vectors.
 * This file reads the line and turns it into the planner's facts; entries dated after `as_of` have not happened yet.
 */
import { z } from 'zod';
import { readPlainDate, type PlainDate } from '@weftway/calendar/plain-date';

const dateSchema = z.string().transform((text, context): PlainDate => {
  const reading = readPlainDate(text);
  if (reading.kind === 'date') return reading.date;
  context.addIssue(
    reading.fault === 'not-iso' ? 'Write a date as 2026-10-06.' : `${text} is not a day of the calendar.`,
  );
  return z.NEVER;
});

/** `ORTH-05`, of one side `ORTH-05:R`, for one operation `CARE-04:SURG-01`. */
const keySchema = z
  .string()
  .regex(/^[A-Z]{3,5}-\d{2,3}(:[A-Za-z0-9:-]+)?$/, 'Write a milestone id such as SURG-03 or ORTH-05:R.');
const readingSchema = z.tuple([dateSchema, z.string().regex(/^\d+(\/[1-9]\d*)?$/, 'Write a root stage such as 1/2.')]);
/** An imported date may be known to the month (then its 15th) or to the year (then 1 July). */
const doneSchema = z
  .string()
  .transform((text) => (/^\d{4}$/.test(text) ? `${text}-07-01` : /^\d{4}-\d{2}$/.test(text) ? `${text}-15` : text))
  .pipe(dateSchema);
const datesSchema = z.union([doneSchema.transform((date) => [date]), z.array(doneSchema)]);
const resultSchema = z.union([z.string(), z.array(z.string()), z.record(z.string(), z.string())]);
const waiverSchema = z.union([
  z.string().transform((reason) => ({ reason, on: undefined })),
  z.object({ reason: z.string().default(''), on: dateSchema.optional() }),
]);
const holdSchema = z.union([
  dateSchema.transform((review) => ({ review, on: undefined })),
  z.object({ review: dateSchema, on: dateSchema.optional() }),
]);
const sexSchema = z
  .string()
  .nullish()
  .transform((text) => (text === 'F' ? 'female' : text === 'M' ? 'male' : 'unknown'));
const codeSchema = z.string().refine((code) => {
  const bare = code.replace(/[[\]]/g, '');
  const places = bare.length === 7 ? bare : bare.replace(/\s/g, '');
  return /^[Ll*•.\-_· ][Aa*•.\-_· ][Hh*•.\-_· ][Ss*•.\-_· ][Hh*•.\-_· ][Aa*•.\-_· ][Ll*•.\-_· ]$/u.test(places);
}, 'Write seven LAHSHAL places such as LAHS•••.');

const childSchema = z
  .object({
    dob: dateSchema.nullish(),
    due: dateSchema.nullish(),
    dob_estimated: z.union([z.boolean(), z.enum(['yes', 'no'])]).default(false),
    ga: z.tuple([z.int().min(20).max(45), z.int().min(0).max(6)]).nullish(),
    sex: sexSchema,
    code: codeSchema,
    flags: z.array(z.string()).default([]),
    trig: z.record(z.string(), dateSchema).default({}),
    found: z.record(z.string(), dateSchema).default({}),
    done: z.record(keySchema, datesSchema).default({}),
    result: z.record(z.string(), resultSchema).default({}),
    partial: z.record(keySchema, z.string()).default({}),
    held: z.record(keySchema, holdSchema).default({}),
    waived: z.record(keySchema, waiverSchema).default({}),
    unverified: z.array(keySchema).default([]),
    plan: z.record(z.string(), dateSchema).default({}),
    roots: z
      .union([z.array(readingSchema), z.record(z.enum(['R', 'L']), z.array(readingSchema).optional())])
      .default([]),
    team_start: dateSchema.nullish(),
    transferred: dateSchema.nullish(),
    ask: z.array(keySchema).optional(),
  })
  .refine((child) => Boolean(child.dob ?? child.due), 'Give the date of birth (dob) or the expected date (due).');

export const pathCaseSchema = z.object({
  example: z.union([z.number(), z.string()]).optional(),
  as_of: dateSchema,
  child: childSchema,
  ask: z.array(keySchema).optional(),
  expect: z.record(keySchema, z.unknown()).optional(),
  /** Settings of the team where they differ from the default protocol. */
  settings: z
    .object({
      offersMolding: z.boolean(),
      moldingClock: z.enum(['birth', 'corrected']),
      graftRootLower: z.string(),
      graftRootUpper: z.string(),
    })
    .partial()
    .optional(),
});
export type PathCase = z.infer<typeof pathCaseSchema>;
export type PathChild = PathCase['child'];

export type CaseReading =
  { readonly kind: 'case'; readonly case: PathCase } | { readonly kind: 'fault'; readonly message: string };

/** Reads one line; a fault says what is wrong and where, all of it. */
export function readPathCase(line: string): CaseReading {
  let json: unknown;
  try {
    // What is written as null has not been stated.
    json = JSON.parse(line, (_key, value: unknown) => (value === null ? undefined : value));
  } catch (error) {
    return { kind: 'fault', message: `not JSON: ${error instanceof Error ? error.message : String(error)}` };
  }
  const parsed = pathCaseSchema.safeParse(json);
  if (parsed.success) return { kind: 'case', case: parsed.data };
  const faults = parsed.error.issues.map((issue) => {
    const place = issue.path.map(String).join('.');
    return place === '' ? issue.message : `${place}: ${issue.message}`;
  });
  return { kind: 'fault', message: faults.join('; ') };
}
