import { dictionary } from '@zxcvbn-ts/language-common';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { predictablePassword } from './predictable-password.ts';

const context = [
  'Tern Estuary Cleft Team',
  'Tern Quay',
  'Saltmarsh',
  'Ines Calder',
  'ines.calder@tern-estuary.example',
];
const isRefused = (password: string): boolean => predictablePassword(password, context) !== null;

const stems = dictionary.passwords.filter((word) => /^[a-z]{5,}$/.test(word)).slice(0, 30);
const upper = (word: string): string => word.charAt(0).toUpperCase() + word.slice(1);
const patterns: readonly ((stem: string) => string)[] = [
  (stem) => stem + stem,
  (stem) => `${upper(stem)} summer 2026`,
  (stem) => `${upper(stem)}123456789!!`,
  (stem) => `${stem} ${upper(stems[0] ?? '')} 1987`,
  (stem) => [...(stem + stem)].reverse().join(''),
  (stem) => `${stem.replaceAll('o', '0').replaceAll('e', '3').replaceAll('a', '@')}2024!!!!`,
  (stem) => `tern estuary ${stem}`,
  (stem) => `${stem}qwertyuiop`,
  (stem) => `Ines Calder ${stem}`,
  (stem) => `${stem} december 1999`,
];
const refused = stems.flatMap((stem) => patterns.map((pattern) => pattern(stem)));

const words = dictionary.diceware.filter((word) => /^[a-z]{5,}$/.test(word));
const accepted = Array.from({ length: 300 }, (_, index) =>
  [1, 2, 3, 4].map((step) => words[(index * 17 + step * 1013) % words.length]).join(' '),
);

describe('a predictable password', () => {
  it('300 built from common words, years, runs and known names are refused', () => {
    expect(refused).toHaveLength(300);
    expect(refused.filter((password) => !isRefused(password))).toEqual([]);
  });

  it('300 of four unrelated words are accepted', () => {
    expect(accepted.filter(isRefused)).toEqual([]);
  });

  it.each([
    ['Summer2026!!', 'summer and a year'],
    ['cleftteam december 2026', 'the team and the month'],
    ['aaaaaaaaaaaaaaa', 'one character'],
    ['123456789012345', 'counting'],
    ['zyxwvutsrqponml', 'counting down'],
    ['1q2w3e4r5t6y7u8i', 'a walk over the keys'],
    ['InesCalderInesCalder', 'the own name twice'],
    ['ines.calder@tern-estuary.example', 'the own address'],
    ['               ', 'nothing but blanks'],
    ['correct horse battery staple', 'an example that everybody knows'],
    ['Crème Crème Crème', 'a word three times'],
  ])('%s is refused: %s', (password) => {
    expect(predictablePassword(password, context)).toMatch(/^This (is|repeats) .+\.$/);
  });

  it.each([
    'a tide of small boats',
    'seven herons wait by the lock',
    'Łódka płynie powoli w dół',
    '🦊🦊🐢 over the hill at dawn',
    '8301947562038471',
  ])('%s is accepted', (password) => {
    expect(predictablePassword(password, context)).toBeNull();
  });

  it('fifteen characters of chance are accepted', () => {
    const letters = 'abcdefghijklmnopqrstuvwxyzABCDEFGHIJKLMNOPQRSTUVWXYZ0123456789'.split('');
    fc.assert(
      fc.property(fc.uniqueArray(fc.constantFrom(...letters), { minLength: 18, maxLength: 30 }), (characters) => {
        const text = characters.join('');
        // A run of keys or a word can come about by chance; what is left over must still carry it.
        expect(isRefused(text) && text.length >= 24).toBe(false);
      }),
      { numRuns: 300 },
    );
  });
});
