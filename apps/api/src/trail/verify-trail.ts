import { verifyTrail } from '@weftway/contract/trail';
import { endpoint } from '../http/endpoint.ts';
import { answered } from '../http/outcome.ts';
import { askOf } from './verify-ask.ts';
import { proveChanges, proveReads } from './verify-chains.ts';
import type { Proof } from './verify-chains.ts';

const answerOf = ({ lines, broken }: Proof) => ({
  lines,
  brokenAt: broken?.seq ?? null,
  brokenKind: broken?.kind ?? null,
  why: broken?.why ?? null,
});

export const verifyTrailEndpoint = endpoint<typeof verifyTrail>({
  operation: verifyTrail,
  can: { action: 'verify', subject: 'Trail' },
  // It only reads, and may take seconds: nobody waits for it.
  inTransaction: false,
  handle: async ({ services }) => {
    const anchors = { file: services.env.anchorFile };
    const changes = await proveChanges(askOf(services.db), anchors);
    const reads = await proveReads(
      { after: (seq, limit) => services.accessLog.after(seq, limit), hashOf: (seq) => services.accessLog.hashOf(seq) },
      anchors,
    );
    return answered({ ...answerOf(changes), reads: answerOf(reads) });
  },
});
