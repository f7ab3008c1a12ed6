/** Opens what the service stands on: database, log of reads, clock. */
import type { Knex } from 'knex';
import { v7 as newId } from 'uuid';
import { createLiveView } from './board/live-view.ts';
import type { Env } from './env.ts';
import { createLog } from './http/request-log.ts';
import type { Services } from './http/services.ts';
import { localDate } from './team/team-date.ts';
import { AccessLog } from './trail/access-log.ts';

/** `zone` is the team's; a fixed day in the environment wins over the clock. */
export const startServices = (db: Knex, env: Env, zone: string): Services => {
  const now = (): Date => new Date();
  let teamZone = zone;
  return {
    db,
    env,
    log: createLog(env.logLevel),
    accessLog: new AccessLog(env.accessFile),
    liveView: createLiveView(),
    now,
    today: () => env.today ?? localDate(now(), teamZone),
    useZone: (next) => {
      teamZone = next;
    },
    newId: () => newId(),
  };
};
