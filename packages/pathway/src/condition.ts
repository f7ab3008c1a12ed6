/**
 * Conditions on which a rule of the protocol depends, as data: a name of a fact, or a combination of conditions.
 * A name that nobody has recorded counts as false.
 */
import { z } from 'zod';

export type Condition =
  | string
  | { readonly all: readonly Condition[] }
  | { readonly any: readonly Condition[] }
  | { readonly not: Condition };

export const conditionSchema: z.ZodType<Condition> = z.lazy(() =>
  z.union([
    z.string().min(1).max(60),
    z.strictObject({ all: z.array(conditionSchema).min(1) }),
    z.strictObject({ any: z.array(conditionSchema).min(1) }),
    z.strictObject({ not: conditionSchema }),
  ]),
);
