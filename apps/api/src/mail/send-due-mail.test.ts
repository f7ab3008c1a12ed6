import { simpleParser } from 'mailparser';
import type { ParsedMail } from 'mailparser';
import { SMTPServer } from 'smtp-server';
import type { AddressInfo } from 'node:net';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { Services } from '../http/services.ts';
import { createTestApp } from '../testing/test-app.ts';
import type { TestApp } from '../testing/test-app.ts';
import { queueMail } from './outbox-store.ts';
import { sendDueMail, startMailSender, waitBeforeTry } from './send-due-mail.ts';

let test: TestApp;
let server: SMTPServer | null = null;
const received: ParsedMail[] = [];

beforeEach(async () => {
  test = await createTestApp();
  received.length = 0;
});
afterEach(async () => {
  await new Promise<void>((resolve) => (server === null ? resolve() : server.close(() => resolve())));
  server = null;
  await test.close();
});

/** A mail server that takes or refuses; answers services that send to it. */
const withServer = async (answer: (to: string) => Error | null): Promise<Services> => {
  const running = new SMTPServer({
    disabledCommands: ['AUTH', 'STARTTLS'],
    onRcptTo: (address, _session, callback) => callback(answer(address.address)),
    onData: (stream, _session, callback) => {
      simpleParser(stream).then(
        (mail) => {
          received.push(mail);
          callback();
        },
        (error: unknown) => callback(error as Error), // the parser rejects with an Error
      );
    },
  });
  server = running;
  await new Promise<void>((resolve) => running.listen(0, '127.0.0.1', () => resolve()));
  const { port } = running.server.address() as AddressInfo; // listens on a port, not a pipe
  return { ...test.services, env: { ...test.services.env, smtp: `smtp://127.0.0.1:${port}?ignoreTLS=true` } };
};

const queue = (id: string, to: string) =>
  queueMail(test.db, {
    id,
    to,
    subject: 'You are invited to Weftway',
    text: 'Open this:\nhttp://127.0.0.1/invitation#abc',
    at: '2026-12-01T09:00:00.000Z',
  });
const rows = () =>
  test.db('outbox').orderBy('id').select('id', 'tries', 'sent_at', 'next_try_at', 'body', 'last_error');
const greylisted = (): Error => Object.assign(new Error('Try later'), { responseCode: 451 });

describe('a letter to the mail server', () => {
  it('arrives once, whole, with a Message-ID of its own row', async () => {
    const services = await withServer(() => null);
    await queue('letter-1', 'ann@tern-estuary.example');
    await sendDueMail(services);
    await sendDueMail(services);
    expect(received).toHaveLength(1);
    expect(received[0]).toMatchObject({ messageId: '<letter-1@weftway>', subject: 'You are invited to Weftway' });
    expect(received[0]?.text).toContain('/invitation#abc');
    expect(await rows()).toMatchObject([{ sent_at: '2026-12-01T09:00:00.000Z', body: '' }]);
  });

  it('F12 waits and is tried again when the server says later, keeping its Message-ID', async () => {
    let isReady = false;
    const services = await withServer(() => (isReady ? null : greylisted()));
    await queue('letter-1', 'ann@tern-estuary.example');
    await sendDueMail(services);
    const [row] = await rows();
    expect(row).toMatchObject({ tries: 1, sent_at: null, last_error: expect.stringContaining('451') });
    expect(Date.parse(row.next_try_at) - Date.parse('2026-12-01T09:00:00.000Z')).toBeGreaterThanOrEqual(48_000);
    isReady = true;
    await sendDueMail(services);
    expect(received).toHaveLength(0);
    test.setNow('2026-12-01T09:01:20.000Z');
    await sendDueMail(services);
    expect(received.map(({ messageId }) => messageId)).toEqual(['<letter-1@weftway>']);
  });

  it('one that is always refused holds up no other, and is given up after three days', async () => {
    const services = await withServer((to) => (to.startsWith('poison') ? greylisted() : null));
    await queue('letter-1', 'poison@tern-estuary.example');
    await queue('letter-2', 'ann@tern-estuary.example');
    await sendDueMail(services);
    expect(received).toHaveLength(1);
    test.setNow('2026-12-04T10:00:00.000Z');
    await sendDueMail(services);
    expect((await rows())[0]).toMatchObject({ sent_at: null, next_try_at: '9999-12-31T00:00:00.000Z' });
  });

  it('a server that is not there is no reason to lose it', async () => {
    const services = { ...test.services, env: { ...test.services.env, smtp: 'smtp://127.0.0.1:1' } };
    await queue('letter-1', 'ann@tern-estuary.example');
    await sendDueMail(services);
    expect(await rows()).toMatchObject([{ sent_at: null, last_error: 'ESOCKET' }]);
  });

  it('two senders at once send it once', async () => {
    const services = await withServer(() => null);
    await queue('letter-1', 'ann@tern-estuary.example');
    await Promise.all([sendDueMail(services), sendDueMail(services)]);
    expect(received).toHaveLength(1);
  });

  it('is found by the sender that runs beside the server', async () => {
    const services = await withServer(() => null);
    const sender = startMailSender(services, 10);
    await queue('letter-1', 'ann@tern-estuary.example');
    await expect.poll(() => received.length).toBe(1);
    await sender.stop();
  });
});

describe('waiting between tries', () => {
  it.each([
    [1, 1],
    [2, 2],
    [4, 8],
    [7, 60],
    [40, 60],
  ])('after try %i about %i minutes, a fifth more or less', (tries, minutes) => {
    expect(waitBeforeTry(tries, 0)).toBeCloseTo(minutes * 48_000, 3);
    expect(waitBeforeTry(tries, 1)).toBeCloseTo(minutes * 72_000, 3);
  });
});
