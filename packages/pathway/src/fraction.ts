/** Root lengths as exact fractions of the final length: 1/3 is never rounded, so a bound is met or it is not. */
export interface Fraction {
  readonly over: number;
  readonly under: number;
}

/** Reads `1/2`, `0` or `1`. Throws a RangeError that quotes the text when it is not a fraction. */
export function fraction(text: string): Fraction {
  const match = /^(\d+)(?:\/([1-9]\d*))?$/.exec(text);
  if (!match) throw new RangeError(`"${text}" is not a fraction such as 1/2.`);
  return { over: Number(match[1]), under: Number(match[2] ?? 1) };
}

/** Whether `left` is at or above `right`, compared without rounding. */
export function isAtLeast(left: Fraction, right: Fraction): boolean {
  return left.over * right.under >= right.over * left.under;
}
