/** Chance that is the same on every machine: a small generator started from a text. */

/** Numbers in [0, 1), always the same from the same start. Mulberry32, public domain. */
export const chanceFrom = (start: number): (() => number) => {
  let state = start;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
};

/** Numbers that belong to a text. */
const chanceOf = (text: string): (() => number) => {
  let start = 2166136261;
  for (const character of text) start = Math.imul(start ^ (character.codePointAt(0) ?? 0), 16777619);
  return chanceFrom(start);
};

/** One number in [0, 1) that belongs to this text alone. */
export const chance = (text: string): number => {
  const next = chanceOf(text);
  next();
  return next();
};

/** One of the list; the list must not be empty. */
export const oneOf = <T>(list: readonly T[], text: string): T => {
  const found = list[Math.floor(chance(text) * list.length)];
  if (found === undefined) throw new RangeError('Nothing to choose from');
  return found;
};
