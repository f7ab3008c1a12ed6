/** Hands one letter to the mail server, or to the local inbox where none is set. */
import { createTransport } from 'nodemailer';
import type { Services } from '../http/services.ts';
import { keepMail } from './local-inbox-store.ts';
import { oneLine, plainAddress } from './mail-address.ts';
import type { OutboxRow } from './outbox-store.ts';

export type Deliver = (row: OutboxRow) => Promise<void>;

const timeoutMs = 20_000;

const bySmtp = (address: string, from: string): Deliver => {
  const transport = createTransport({
    url: address,
    connectionTimeout: timeoutMs,
    greetingTimeout: timeoutMs,
    socketTimeout: timeoutMs,
  });
  return async (row) => {
    await transport.sendMail({
      from: oneLine(from),
      to: { name: '', address: plainAddress(row.recipient) },
      subject: oneLine(row.subject),
      text: row.body,
      // The same on every try, so that a reader's mail program shows a repeated letter once.
      messageId: `<${row.id}@weftway>`,
      disableFileAccess: true,
      disableUrlAccess: true,
    });
  };
};

export const delivererOf = ({ db, env, now }: Services): Deliver =>
  env.smtp === null
    ? ({ id, recipient, subject, body }) => keepMail(db, { id, at: now().toISOString(), recipient, subject, body })
    : bySmtp(env.smtp, env.mailFrom);
