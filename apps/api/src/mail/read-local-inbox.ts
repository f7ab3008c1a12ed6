import { readLocalInbox } from '@weftway/contract/session';
import { endpoint } from '../http/endpoint.ts';
import { answered, refused } from '../http/outcome.ts';
import { keptMails } from './local-inbox-store.ts';
import { sendDueMail } from './send-due-mail.ts';

/** Whatever was written just now is delivered first, so that a reader never looks too early. */
export const readLocalInboxEndpoint = endpoint<typeof readLocalInbox>({
  operation: readLocalInbox,
  can: 'anyone',
  handle: async ({ trx, services }) => {
    if (!services.env.isDemo) return refused('not-found');
    await sendDueMail(services);
    const mails = await keptMails(trx);
    return answered({
      mails: mails.map(({ id, at, recipient, subject, body }) => ({ id, at, to: recipient, subject, text: body })),
    });
  },
});
