import { askPasswordReset } from '@weftway/contract/session';
import { endpoint } from '../http/endpoint.ts';
import { done } from '../http/outcome.ts';
import { queueResetRequest } from '../mail/outbox-store.ts';
import { originOf } from '../mail/origin.ts';

/**
 * One line is written whatever was typed; whether an account stands behind it is looked up later, by the sender of
 * mail. So neither the answer nor the time it takes tells who is on the team.
 */
export const askPasswordResetEndpoint = endpoint<typeof askPasswordReset>({
  operation: askPasswordReset,
  can: 'anyone',
  handle: async ({ services, body, request, now }) => ({
    ...done([], async () => ({ sent: true as const })),
    secrets: async (trx) => {
      await queueResetRequest(trx, {
        id: services.newId(),
        email: body.email,
        origin: originOf(services.env, request),
        at: now,
      });
      return null;
    },
  }),
});
