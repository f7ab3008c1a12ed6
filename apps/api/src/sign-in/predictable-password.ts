/**
 * Refuses passwords that a guesser tries early, without a network. A password is refused when it can be put together
 * from few well-known pieces: common passwords as stems, words that anybody knows of the team, years, seasons, runs of
 * keys, repeats. Each piece has a price; long passwords of unrelated words or of chance are always dear enough.
 */
import { adjacencyGraphs, dictionary } from '@zxcvbn-ts/language-common';

/** Prices of pieces: a password whose cheapest reading costs no more than `refusedUpTo` is refused. */
const price = { topStem: 10, stem: 15, known: 3, run: 3, digits: 7, letter: 10 } as const;
const refusedUpTo = 27;
const topStems = 500;
const longestWord = 64;

const everybodysWords = [
  'weftway',
  'cleft',
  'palate',
  'lip',
  'team',
  'clinic',
  'hospital',
  'molding',
  'surgery',
  'surgeon',
  'speech',
  'password',
  'passwort',
  'welcome',
  'letmein',
  'admin',
  'administrator',
  'correcthorsebatterystaple',
];
const calendarWords = [
  'january',
  'february',
  'march',
  'april',
  'may',
  'june',
  'july',
  'august',
  'september',
  'october',
  'november',
  'december',
  'spring',
  'summer',
  'autumn',
  'winter',
  'monday',
  'tuesday',
  'wednesday',
  'thursday',
  'friday',
  'saturday',
  'sunday',
];

let ranks: ReadonlyMap<string, number> | null = null;

/** Common passwords of three characters and more, with their place in the list. */
const stems = (): ReadonlyMap<string, number> => {
  ranks ??= new Map(dictionary.passwords.filter((word) => word.length >= 3).map((word, index) => [word, index]));
  return ranks;
};

const swaps: Readonly<Record<string, string>> = {
  '0': 'o',
  '1': 'l',
  '3': 'e',
  '4': 'a',
  '5': 's',
  '7': 't',
  '8': 'b',
  '@': 'a',
  $: 's',
  '!': 'i',
  '€': 'e',
};
const withoutSwaps = (text: string): string => [...text].map((character) => swaps[character] ?? character).join('');

const plain = (text: string): string => text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase();

/** Words that anybody knows: of the team, the clinic, the person. */
const knownWords = (context: readonly string[]): ReadonlySet<string> => {
  const own = context.flatMap((text) => plain(text).split(/[^\p{L}\p{N}]+/u)).filter((word) => word.length >= 3);
  const whole = context.map((text) => plain(text).replace(/\s+/gu, ''));
  return new Set([...own, ...whole, ...everybodysWords, ...calendarWords]);
};

const qwerty: Readonly<Record<string, readonly (string | null)[]>> = adjacencyGraphs.qwerty;
const isBesideOnKeyboard = (a: string, b: string): boolean =>
  (qwerty[a] ?? []).some((keys) => keys?.includes(b) === true);

/** Length of the run that starts here: the same character, counting up or down, or neighbours on the keyboard. */
const runLength = (text: string, start: number): number => {
  const follows: readonly ((a: string, b: string) => boolean)[] = [
    (a, b) => a === b,
    (a, b) => b.charCodeAt(0) - a.charCodeAt(0) === 1,
    (a, b) => b.charCodeAt(0) - a.charCodeAt(0) === -1,
    isBesideOnKeyboard,
  ];
  const lengthBy = (isNext: (a: string, b: string) => boolean): number => {
    let end = start + 1;
    while (end < text.length && isNext(text.charAt(end - 1), text.charAt(end))) end += 1;
    return end - start;
  };
  return Math.max(...follows.map(lengthBy));
};

/** The shortest unit of which the text is a whole number of copies. */
const unitOf = (text: string): string => {
  const at = (text + text).indexOf(text, 1);
  return text.slice(0, at);
};

const wordPrice = (word: string, known: ReadonlySet<string>): number | null => {
  if (known.has(word)) return price.known;
  const rank = stems().get(word);
  if (rank === undefined) return null;
  return rank < topStems ? price.topStem : price.stem;
};

const isLetterOrDigit = (character: string): boolean => /[\p{L}\p{N}]/u.test(character);

interface Piece {
  readonly length: number;
  readonly price: number;
}

/** Everything that could be read at this place. */
const piecesAt = (text: string, swapped: string, start: number, known: ReadonlySet<string>): Piece[] => {
  const pieces: Piece[] = [{ length: 1, price: isLetterOrDigit(text.charAt(start)) ? price.letter : price.known }];
  const digits = /^\d{1,4}/.exec(text.slice(start, start + 4))?.[0] ?? '';
  if (digits !== '')
    pieces.push({ length: digits.length, price: /^(19|20)\d\d$/.test(digits) ? price.known : price.digits });
  const run = runLength(text, start);
  const shortestRun = isLetterOrDigit(text.charAt(start)) ? 3 : 2;
  for (let length = shortestRun; length <= run; length += 1) pieces.push({ length, price: price.run });
  for (let length = 3; length <= Math.min(longestWord, text.length - start); length += 1) {
    const end = start + length;
    const found = [wordPrice(text.slice(start, end), known), wordPrice(swapped.slice(start, end), known)].filter(
      (one) => one !== null,
    );
    if (found.length > 0) pieces.push({ length, price: Math.min(...found) });
  }
  return pieces;
};

/** The cheapest way to put the text together. */
const cheapest = (text: string, known: ReadonlySet<string>): number => {
  const swapped = withoutSwaps(text);
  const best: number[] = [0, ...Array.from({ length: text.length }, () => Number.POSITIVE_INFINITY)];
  for (let start = 0; start < text.length; start += 1) {
    const before = best[start] ?? Number.POSITIVE_INFINITY;
    for (const piece of piecesAt(text, swapped, start, known)) {
      const end = start + piece.length;
      best[end] = Math.min(best[end] ?? Number.POSITIVE_INFINITY, before + piece.price);
    }
  }
  return best[text.length] ?? 0;
};

/** Why this password is easily guessed, in plain words; null when it is not. `context`: names and addresses around it. */
export const predictablePassword = (password: string, context: readonly string[]): string | null => {
  const text = plain(password).replace(/\s+/gu, '');
  const unit = unitOf(text);
  if (unit.length < 6) return 'This repeats the same few characters. Use a short sentence of your own instead.';
  if (stems().has(text) || stems().has(withoutSwaps(text)))
    return 'This is on the list of passwords that are tried first. Use a short sentence of your own instead.';
  const known = knownWords(context);
  const reversed = [...unit].reverse().join('');
  if (Math.min(cheapest(unit, known), cheapest(reversed, known)) > refusedUpTo) return null;
  return 'This is built from common words, runs of keys, years, or names that anybody on the team knows. Add unrelated words.';
};
