/** Passwords as they are typed and as they are chosen. */
import { z } from 'zod';

/** Counted by code point, so that an emoji is one character. */
const charactersOf = (text: string): number => [...text].length;
const passwordMost = 128;

/** A password as typed to sign in: never trimmed, never cut. */
export const typedPasswordSchema = z
  .string()
  .min(1, 'Write your password.')
  .max(passwordMost * 4)
  .refine((text) => charactersOf(text) <= passwordMost, `A password has at most ${passwordMost} characters.`);

export const newPasswordSchema = z
  .string()
  .max(passwordMost * 4, `Use at most ${passwordMost} characters.`)
  .refine((text) => charactersOf(text) <= passwordMost, `Use at most ${passwordMost} characters.`)
  .refine((text) => charactersOf(text) >= 15, 'Use at least 15 characters; a short sentence is easy to keep.');
