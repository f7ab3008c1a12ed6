/** Asks the planner in the form of the published test vectors, so that tests stay as short as the rules they check. */
import { defaultProtocol } from '../default-protocol.ts';
import { answerPathCase, type Answer } from '../path-answer.ts';
import { readPathCase } from '../path-case.ts';
import type { Protocol } from '../protocol.ts';

export interface Asked {
  readonly asOf: string;
  readonly child: Readonly<Record<string, unknown>>;
  readonly ask?: readonly string[];
  readonly settings?: Readonly<Record<string, unknown>>;
  readonly protocol?: Protocol;
}

/** A child with both sides cleft through lip, gum and palate, born on 2020-03-10 at term. */
export const bothSidesChild = { dob: '2020-03-10', ga: [39, 0], sex: 'F', code: 'LAHSHAL' } as const;

/** Every answer of a case. Throws when the case cannot be read. */
export function askPath({
  asOf,
  child,
  ask,
  settings,
  protocol = defaultProtocol,
}: Asked): Readonly<Record<string, Answer>> {
  const reading = readPathCase(JSON.stringify({ as_of: asOf, child, ask: ask ?? [], settings }));
  if (reading.kind === 'fault') throw new Error(reading.message);
  return answerPathCase(protocol, reading.case).got;
}

/** The answer for one milestone, whose unstated conditions count as given. */
export function askOne(
  id: string,
  asOf: string,
  child: Asked['child'],
  settings?: Asked['settings'],
): Answer | undefined {
  return askPath({ asOf, child, ask: [id], ...(settings ? { settings } : {}) })[id];
}
