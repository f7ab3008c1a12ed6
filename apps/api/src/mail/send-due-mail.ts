/** The sender of letters: claims a row, tries it, and waits longer after each miss. One bad letter holds up no other. */
import type { Services } from '../http/services.ts';
import { limits } from '../limits.ts';
import { countOpenLinks, makeLink } from '../sign-in/mailed-link-store.ts';
import { findMemberByEmail, teamName } from '../team/member-view.ts';
import { delivererOf } from './deliver-mail.ts';
import type { Deliver } from './deliver-mail.ts';
import { resetLetter } from './mail-texts.ts';
import { answerResetRequest, claimMail, dueMail, mailWaits, mailWasSent } from './outbox-store.ts';
import type { OutboxRow } from './outbox-store.ts';

const minute = 60_000;
const never = '9999-12-31T00:00:00.000Z';

/** 1, 2, 4 ... 60 minutes, a fifth more or less so that many letters do not all come back at once. */
export const waitBeforeTry = (tries: number, chance: number): number =>
  Math.min(60, 2 ** Math.min(10, tries - 1)) * minute * (0.8 + 0.4 * chance);

const later = (now: Date, ms: number): string => new Date(now.getTime() + ms).toISOString();

/** Looks up who asked. Too many open letters to one person are not added to. */
const answerRequest = ({ db, now }: Services, row: OutboxRow): Promise<void> =>
  db.transaction(async (trx) => {
    const at = now();
    const member = await findMemberByEmail(trx, row.recipient);
    const isAnswered =
      member !== null &&
      member.status === 'active' &&
      (await countOpenLinks(trx, member.id, 'reset', at.toISOString())) < limits.openResetsPerMember;
    if (!isAnswered) return answerResetRequest(trx, row.id, null, at.toISOString());
    const token = await makeLink(trx, {
      purpose: 'reset',
      memberId: member.id,
      madeById: null,
      now: at,
      validSeconds: limits.resetValid,
    });
    return answerResetRequest(trx, row.id, resetLetter(row.body, token, await teamName(trx)), at.toISOString());
  });

const codeOf = (error: unknown): string => {
  const { code, responseCode } = (typeof error === 'object' && error !== null ? error : {}) as {
    code?: unknown;
    responseCode?: unknown;
  }; // nodemailer's errors carry both
  return (
    [code, responseCode].filter((part) => typeof part === 'string' || typeof part === 'number').join(' ') || 'unknown'
  );
};

const tryOne = async (services: Services, row: OutboxRow, deliver: Deliver): Promise<void> => {
  const { db, now, log } = services;
  try {
    await deliver(row);
    await mailWasSent(db, row.id, now().toISOString());
  } catch (error) {
    const givesUp = now().getTime() - Date.parse(row.at) > limits.mailTriedFor * 1000;
    const next = givesUp ? never : later(now(), waitBeforeTry(row.tries + 1, Math.random()));
    await mailWaits(db, row.id, next, codeOf(error));
    if (givesUp) log.error({ mailId: row.id, code: codeOf(error) }, 'a letter could not be sent');
    else log.warn({ mailId: row.id, code: codeOf(error), tries: row.tries + 1 }, 'a letter waits for another try');
  }
};

/** Answers how many rows were taken up. */
export const sendDueMail = async (services: Services, deliver: Deliver = delivererOf(services)): Promise<number> => {
  const { db, now } = services;
  let taken = 0;
  for (let round = 0; round < 2; round += 1) {
    for (const row of await dueMail(db, now().toISOString())) {
      if (!(await claimMail(db, row, later(now(), limits.mailLease * 1000)))) continue;
      taken += 1;
      await (row.kind === 'reset-request' ? answerRequest(services, row) : tryOne(services, row, deliver));
    }
  }
  return taken;
};

export interface MailSender {
  readonly stop: () => Promise<void>;
}

/** Looks for letters every few seconds until it is stopped; a round that is under way is waited for. */
export const startMailSender = (services: Services, everyMs = 2000): MailSender => {
  const deliver = delivererOf(services);
  let running: Promise<unknown> = Promise.resolve();
  let isBusy = false;
  const timer = setInterval(() => {
    if (isBusy) return;
    isBusy = true;
    running = sendDueMail(services, deliver)
      .catch((error: unknown) => services.log.error({ err: error }, 'the outbox could not be read'))
      .finally(() => {
        isBusy = false;
      });
  }, everyMs);
  return {
    stop: async () => {
      clearInterval(timer);
      await running;
    },
  };
};
