import { describe, expect, it } from 'vitest';
import { createTestApp } from '../testing/test-app.ts';
import { oneLine, plainAddress } from './mail-address.ts';
import { queueMail } from './outbox-store.ts';

const attacks = ['A\r\nBcc: x@example.org', 'A\nBcc: x@example.org', 'A\u0000', 'A\u2028Bcc: x@example.org'];

describe('X10 a line break in the head of a letter', () => {
  it.each(attacks)('is refused in a subject: %j', (text) => {
    expect(() => oneLine(text)).toThrow('line break');
  });

  it.each([
    ...attacks,
    'a@b.example\r\nBcc: x@example.org',
    'a@b.example, c@d.example',
    'Ann <a@b.example>',
    '"a"@b.example',
  ])('is refused in an address: %j', (text) => {
    expect(() => plainAddress(text)).toThrow();
  });

  it('a plain address passes', () => {
    expect(plainAddress('ines.calder+clinic@tern-estuary.example')).toBe('ines.calder+clinic@tern-estuary.example');
  });

  it('is refused before anything is written', async () => {
    const test = await createTestApp();
    await expect(
      queueMail(test.db, {
        id: 'one',
        to: 'a@b.example\r\nBcc: c@d.example',
        subject: 'Hello',
        text: '',
        at: '2026-12-01T09:00:00.000Z',
      }),
    ).rejects.toThrow();
    expect(await test.db('outbox').select('id')).toEqual([]);
    await test.close();
  });

  it.each(['name', 'email'])('is refused as the %s of an invitation, at the field', async (field) => {
    const test = await createTestApp();
    const browser = await test.as('administrator');
    const body = {
      name: 'Ann Pell',
      email: 'ann.pell@tern-estuary.example',
      standing: 'auditor',
      disciplines: [],
      supervisorId: null,
      [field]: 'A\r\nBcc: x@example.org',
    };
    const answer = await browser.post('/members', body);
    expect(answer.body.errors[0].pointer).toBe(`/${field}`);
    await test.close();
  });
});
