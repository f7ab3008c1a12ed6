/** What operations may reach besides the open transaction: mail, the live view, hashing, the log. */
import type { Knex } from 'knex';
import type { Logger } from 'pino';
import type { AccessLog } from '../trail/access-log.ts';
import type { LiveView } from '../board/live-view.ts';
import type { Env } from '../env.ts';

export interface Services {
  /** The connection outside transactions; never touch it inside one. */
  readonly db: Knex;
  readonly env: Env;
  readonly log: Logger;
  readonly accessLog: AccessLog;
  readonly liveView: LiveView;
  /** UTC instant. */
  readonly now: () => Date;
  /** The team's local date. */
  readonly today: () => string;
  /** From now on the team's date is that of another zone; left out where the date does not follow a zone. */
  readonly useZone?: (zone: string) => void;
  readonly newId: () => string;
}
