/** Side by side, in turns, by CPU time: medians of product and reference, and the ratio between them. */
export type Work = () => Promise<number> | number;

export const median = (values: readonly number[]): number => {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = Math.floor(sorted.length / 2);
  const upper = sorted[middle] ?? Number.NaN;
  return sorted.length % 2 === 1 ? upper : (upper + (sorted[middle - 1] ?? Number.NaN)) / 2;
};

/** CPU milliseconds of this process that the work took. */
export const cpuOf = async (work: () => Promise<unknown> | unknown): Promise<number> => {
  const start = process.cpuUsage();
  await work();
  const { user, system } = process.cpuUsage(start);
  return (user + system) / 1000;
};

/** Runs every work once a round, in turns; answers the median of what each answered. */
export const inTurns = async <Name extends string>(
  rounds: number,
  works: Readonly<Record<Name, Work>>,
): Promise<Record<Name, number>> => {
  const names = Object.keys(works) as Name[]; // keys of the record
  const measured = new Map<Name, number[]>(names.map((name) => [name, []]));
  for (const name of names) await works[name](); // warm
  for (let round = 0; round < rounds; round += 1) {
    for (const name of round % 2 === 0 ? names : [...names].reverse()) measured.get(name)?.push(await works[name]());
  }
  return Object.fromEntries(names.map((name) => [name, median(measured.get(name) ?? [])])) as Record<Name, number>; // one entry for each name
};

export const say = (text: string): void => void process.stdout.write(`${text}\n`);

export const head = (text: string): void => say(`\n${text}`);

/** One line: what, how much, against what, and the aim. */
export const line = (what: string, value: string, aim: string, isReached: boolean | null): void => {
  const mark = isReached === null ? ' ' : isReached ? '✓' : '·';
  say(`  ${mark} ${what.padEnd(58)} ${value.padStart(26)}   ${aim}`);
};

/** A ratio with its aim beside it. */
/** `aim` null: measured for the reader, nothing is promised. */
export const ratioLine = (what: string, product: number, reference: number, aim: number | null, unit: string): void => {
  const ratio = product / reference;
  const digits = ratio < 0.1 ? 4 : 2;
  line(
    what,
    `${ratio.toFixed(digits)} × (${product.toFixed(2)} ${unit})`,
    aim === null ? '' : `aim ≤ ${String(aim)} ×`,
    aim === null ? null : ratio <= aim,
  );
};
