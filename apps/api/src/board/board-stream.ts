/** The live view as server-sent events: one line with the new version whenever the board changed. */
import type { Express, Response } from 'express';
import { abilityFor, canSome } from '@weftway/abilities/ability-for';
import { apiPrefix } from '@weftway/contract/operation';
import type { Actor } from '../http/endpoint.ts';
import { refused } from '../http/outcome.ts';
import { sendProblem } from '../http/problem-answer.ts';
import type { Services } from '../http/services.ts';
import { limits } from '../limits.ts';

const heartbeatMs = 20_000;

/** How many streams each person has open. */
const openStreams = new Map<string, number>();

const follow = (response: Response, services: Services, actorId: string): void => {
  response.writeHead(200, {
    'Content-Type': 'text/event-stream',
    'Cache-Control': 'no-store',
    'X-Accel-Buffering': 'no',
  });
  response.write('retry: 2000\n: open\n\n');
  const stopListening = services.liveView.listen((version) => response.write(`event: board\ndata: ${version}\n\n`));
  const heartbeat = setInterval(() => response.write(': still here\n\n'), heartbeatMs);
  // The browser comes back by itself; then session and permission are looked at afresh.
  const end = setTimeout(() => response.end(), limits.streamSeconds * 1000);
  openStreams.set(actorId, (openStreams.get(actorId) ?? 0) + 1);
  response.on('close', () => {
    clearInterval(heartbeat);
    clearTimeout(end);
    stopListening();
    const left = (openStreams.get(actorId) ?? 1) - 1;
    if (left > 0) openStreams.set(actorId, left);
    else openStreams.delete(actorId);
  });
};

export const serveBoardStream = (app: Express, services: Services): void => {
  app.get(`${apiPrefix}/board/stream`, (_request, response) => {
    response.locals['operation'] = 'streamBoard';
    const actor = (response.locals['actor'] ?? null) as Actor | null; // set by the session middleware
    if (actor === null) return sendProblem(response, refused('not-signed-in'));
    if (!canSome(abilityFor(actor), 'read', 'Board')) return sendProblem(response, refused('not-allowed'));
    if ((openStreams.get(actor.id) ?? 0) >= limits.streamsPerMember) return sendProblem(response, refused('too-many'));
    follow(response, services, actor.id);
  });
};
