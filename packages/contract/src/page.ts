/** Pages of a long list: `cursor` is opaque, `next` is null on the last page. */
import { z } from 'zod';

export const pageQuery = {
  cursor: z.string().max(200).optional(),
  limit: z.coerce.number().int().min(1).max(200).default(50),
};

export const pageOf = <T extends z.ZodType>(item: T) => z.object({ items: z.array(item), next: z.string().nullable() });
