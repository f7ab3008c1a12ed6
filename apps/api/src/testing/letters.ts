/** Letters as their reader would find them: everything due is sent, then the newest to an address is opened. */
import { sendDueMail } from '../mail/send-due-mail.ts';
import { keptMails } from '../mail/local-inbox-store.ts';
import type { TestApp } from './test-app.ts';

export const lettersTo = async (
  { db, services }: TestApp,
  email: string,
): Promise<{ subject: string; body: string }[]> => {
  await sendDueMail(services);
  return (await keptMails(db)).filter(({ recipient }) => recipient === email);
};

/** The token behind `#` in the newest letter to this address. */
export const tokenTo = async (test: TestApp, email: string): Promise<string> => {
  const token = /#([\w-]+)/.exec((await lettersTo(test, email))[0]?.body ?? '')?.[1];
  if (token === undefined) throw new Error(`No letter with a link to ${email}`);
  return token;
};
