/** Sends the visitor and counts what its visits cost this process. */
import { fork } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { benchPassword } from './bench-team.ts';
import { cpuOf } from './measure.ts';
import type { Asked, Told } from './visitor.ts';

export interface Visitor {
  readonly ask: (asked: Asked) => Promise<Told>;
  /** CPU milliseconds of the server for each visit. */
  readonly cost: (asked: Asked) => Promise<number>;
  readonly close: () => void;
}

export const openVisitor = (): Visitor => {
  const child = fork(fileURLToPath(new URL('visitor.ts', import.meta.url)), { execArgv: ['--import', 'tsx'] });
  const ask = (asked: Asked): Promise<Told> =>
    new Promise((resolve) => {
      child.once('message', (told) => resolve(told as Told)); // the visitor's own answer
      child.send(asked);
    });
  return { ask, cost: async (asked) => (await cpuOf(() => ask(asked))) / asked.times, close: () => void child.kill() };
};

const cookiesOf = (answer: Response): string =>
  answer.headers
    .getSetCookie()
    .map((cookie) => cookie.split(';')[0])
    .join('; ');

/** The cookie of a signed-in member. */
export const signInAs = async (address: string, discipline: string): Promise<string> => {
  const first = await fetch(`${address}/api/v1/session`);
  const { csrfToken } = (await first.json()) as { csrfToken: string }; // contract of readSession
  const answer = await fetch(`${address}/api/v1/session`, {
    method: 'POST',
    headers: { cookie: cookiesOf(first), 'x-csrf-token': csrfToken, 'content-type': 'application/json' },
    body: JSON.stringify({ email: `${discipline}@tern-estuary.example`, password: benchPassword }),
  });
  if (answer.status !== 200) throw new Error(`Signing in answered ${String(answer.status)}`);
  return cookiesOf(answer) || cookiesOf(first);
};
