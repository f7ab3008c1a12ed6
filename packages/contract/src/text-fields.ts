/** Text as people type it: length-limited, Unicode NFC, no control characters except line feeds where lines are meant. */
import { z } from 'zod';
import type { PlainDate } from '@weftway/calendar/plain-date';

// eslint-disable-next-line no-control-regex -- refusing control characters is the purpose
const controlCharacter = /[\u0000-\u0008\u000b-\u001f\u007f\u2028\u2029]/;
// eslint-disable-next-line no-control-regex -- refusing control characters is the purpose
const controlOrLine = /[\u0000-\u001f\u007f\u2028\u2029]/;

/** One line of text, `most` characters at most, at least one that is not blank. */
export const lineSchema = (most: number, whatIsMissing = 'This cannot be left empty.') =>
  z
    .string()
    .max(most, `Use at most ${most} characters.`)
    .refine((text) => !controlOrLine.test(text), 'Remove the hidden control characters.')
    .transform((text) => text.normalize('NFC').trim())
    .refine((text) => text.length > 0, whatIsMissing);

/** One line that may be empty. */
export const optionalLineSchema = (most: number) =>
  z
    .string()
    .max(most, `Use at most ${most} characters.`)
    .refine((text) => !controlOrLine.test(text), 'Remove the hidden control characters.')
    .transform((text) => text.normalize('NFC').trim());

/** Several lines that may be empty. */
export const paragraphSchema = (most: number) =>
  z
    .string()
    .max(most, `Use at most ${most} characters.`)
    .refine((text) => !controlCharacter.test(text), 'Remove the hidden control characters.')
    .transform((text) => text.normalize('NFC').trim());

/** A reason that must be given. */
export const reasonSchema = paragraphSchema(1000).refine((text) => text.length >= 3, 'Say why, in a few words.');

export const plainDateSchema = z.iso
  .date('Write a date that exists, such as 2026-10-06.')
  .transform((text) => text as PlainDate); // the calendar date was just checked

export const instantSchema = z.iso.datetime();

export const emailSchema = z
  .email('Write a whole e-mail address, such as name@example.org.')
  .max(254, 'Use at most 254 characters.')
  .transform((text) => text.normalize('NFC').toLowerCase());

export const idSchema = z.string().regex(/^[A-Za-z0-9-]{1,64}$/, 'This is not an id.');

export const noneSchema = z.strictObject({});
