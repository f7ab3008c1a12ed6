/** Exactly what would be signed, as the server says it. */
import type { z } from 'zod';
import type { signingSheetSchema } from '@weftway/contract/pathway';

export type SigningSheet = z.infer<typeof signingSheetSchema>;
