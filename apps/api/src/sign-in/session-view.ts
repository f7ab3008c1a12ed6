/** What the screens know of the session, and where a member is signed in. */
import type { Request } from 'express';
import type { Knex } from 'knex';
import type { Me, Session } from '@weftway/contract/session';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { Discipline } from '@weftway/team/disciplines';
import type { Standing } from '@weftway/team/standings';
import { csrfTokenOf } from '../http/csrf.ts';
import type { Actor } from '../http/endpoint.ts';
import { roleTextOf } from '../http/role-text.ts';
import type { Services } from '../http/services.ts';
import { limits } from '../limits.ts';
import { demoPassword } from './demo-accounts.ts';
import { timeoutsOf } from './session-middleware.ts';
import { storedIdOf } from './session-store.ts';

type Accounts = Session['demoAccounts'];

interface AccountRow {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly standing: Standing;
  readonly disciplines: string;
}

/** Active members who still have the passphrase that the demo gave them. */
const demoAccountsOf = async (db: Knex): Promise<Accounts> => {
  const rows: AccountRow[] = await db('members')
    .join('credentials', 'credentials.member_id', 'members.id')
    .where({ status: 'active' })
    .where('credentials.changed_at', db('credentials').min('changed_at'))
    .orderBy('members.name')
    .select('members.id', 'members.name', 'members.email', 'members.standing', 'members.disciplines');
  return rows.map((row) => {
    const disciplines = JSON.parse(row.disciplines) as Discipline[]; // written from the closed list
    const role = roleTextOf({ standing: row.standing, disciplines });
    return { email: row.email, name: row.name, role, password: demoPassword };
  });
};

const meOf = ({ id, name, email, standing, disciplines, supervisorId }: Actor): Me => ({
  id,
  name,
  email,
  standing,
  disciplines: [...disciplines],
  supervisorId,
});

type Clocks = Pick<Session, 'idleSeconds' | 'idleSecondsLeft' | 'endsAt'>;

const noClocks: Clocks = { idleSeconds: null, idleSecondsLeft: null, endsAt: null };

/** When the session ends, as the server itself will count. */
const clocksOf = (services: Services, request: Request, actor: Actor): Clocks => {
  const { idle, absolute } = timeoutsOf(actor);
  const { activeAt = '', startedAt = '' } = request.session;
  const quietSeconds = (services.now().getTime() - Date.parse(activeAt)) / 1000;
  return {
    idleSeconds: idle,
    idleSecondsLeft: Math.max(0, Math.floor(idle - quietSeconds)),
    endsAt: new Date(Date.parse(startedAt) + absolute * 1000).toISOString(),
  };
};

export interface SessionOf {
  readonly services: Services;
  readonly request: Request;
  readonly actor: Actor | null;
  readonly today: PlainDate;
  /** Makes a new token also where the session has one. */
  readonly renewsToken?: boolean;
}

export const sessionOf = async ({
  services,
  request,
  actor,
  today,
  renewsToken = false,
}: SessionOf): Promise<Session> => {
  const { db, env } = services;
  const team: { name: string; zone: string } | undefined = await db('team').first('name', 'zone');
  const csrfToken = csrfTokenOf(request, renewsToken);
  if (actor === null) request.session.cookie.maxAge = limits.anonymousSession * 1000;
  return {
    me: actor === null ? null : meOf(actor),
    csrfToken,
    today,
    team: { name: team?.name ?? '', zone: team?.zone ?? 'UTC' },
    isDemo: env.isDemo,
    demoAccounts: env.isDemo && actor === null ? await demoAccountsOf(db) : [],
    ...(actor === null ? noClocks : clocksOf(services, request, actor)),
  };
};

export interface StoredSession {
  readonly id: string;
  readonly startedAt: string;
  readonly activeAt: string;
  readonly device: string;
}

/** Sessions of a member, newest first. `id` is the stored digest, which is no use as a cookie. */
export const sessionsOfMember = async (db: Knex, memberId: string): Promise<StoredSession[]> => {
  const rows: { sid: string; sess: string }[] = await db('sessions')
    .whereRaw("json_extract(sess, '$.passport.user') = ?", [memberId])
    .select('sid', 'sess');
  return rows
    .map((row) => {
      const data = JSON.parse(row.sess) as Partial<StoredSession>; // written by the session middleware
      return { id: row.sid, startedAt: data.startedAt ?? '', activeAt: data.activeAt ?? '', device: data.device ?? '' };
    })
    .sort((a, b) => b.startedAt.localeCompare(a.startedAt));
};

export const isThisSession = (stored: StoredSession, request: Request): boolean =>
  stored.id === storedIdOf(request.sessionID);
