/** Sessions, their two clocks, and who is asking: worked out afresh from the database on every request. */
import type { Express, RequestHandler } from 'express';
import session from 'express-session';
import type passportModule from 'passport';
import type { Discipline } from '@weftway/team/disciplines';
import type { Standing } from '@weftway/team/standings';
import type { Actor } from '../http/endpoint.ts';
import type { Services } from '../http/services.ts';
import { limits } from '../limits.ts';
import { SessionStore } from './session-store.ts';

export type Passport = InstanceType<typeof passportModule.Passport>;

declare module 'express-session' {
  interface SessionData {
    /** UTC ISO instants. */
    startedAt: string;
    activeAt: string;
    device: string;
  }
}

interface MemberRow {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly standing: Standing;
  readonly disciplines: string;
  readonly supervisor_id: string | null;
  readonly status: string;
}

export const findActor = async ({ db }: Services, memberId: string): Promise<Actor | null> => {
  const row: MemberRow | undefined = await db('members')
    .where({ id: memberId })
    .first('id', 'name', 'email', 'standing', 'disciplines', 'supervisor_id', 'status');
  if (row === undefined || row.status !== 'active') return null;
  return {
    id: row.id,
    name: row.name,
    email: row.email,
    standing: row.standing,
    disciplines: JSON.parse(row.disciplines) as Discipline[], // written from the closed list
    supervisorId: row.supervisor_id,
  };
};

export const timeoutsOf = (actor: Actor): { readonly idle: number; readonly absolute: number } =>
  actor.standing === 'administrator'
    ? { idle: limits.idle.administrator, absolute: limits.absolute.administrator }
    : { idle: limits.idle.member, absolute: limits.absolute.member };

/** Polls and streams say so and are not activity. */
const isBackground = (headers: Record<string, unknown>): boolean =>
  headers['x-background'] === '1' || headers['accept'] === 'text/event-stream';

const hasRunOut = (data: { startedAt?: string; activeAt?: string }, actor: Actor, nowMs: number): boolean => {
  const { idle, absolute } = timeoutsOf(actor);
  const startedMs = Date.parse(data.startedAt ?? '');
  const activeMs = Date.parse(data.activeAt ?? '');
  return !(nowMs - startedMs < absolute * 1000 && nowMs - activeMs < idle * 1000);
};

const activityEveryMs = 30_000;

const actorMiddleware =
  (services: Services): RequestHandler =>
  async (request, response, next) => {
    const actor = (request.user ?? null) as Actor | null; // set by passport from findActor
    if (actor === null) return next();
    const nowMs = services.now().getTime();
    if (hasRunOut(request.session, actor, nowMs)) {
      await new Promise<void>((resolve) => request.session.regenerate(() => resolve()));
      response.locals['hasRunOut'] = true;
      return next();
    }
    const activeMs = Date.parse(request.session.activeAt ?? '');
    if (!isBackground(request.headers) && nowMs - activeMs >= activityEveryMs)
      request.session.activeAt = services.now().toISOString();
    response.locals['actor'] = actor;
    next();
  };

export interface SessionOptions {
  readonly secret: string;
  readonly isSecure: boolean;
  readonly cleanupInterval: number;
}

export const useSessions = (app: Express, passport: Passport, services: Services, options: SessionOptions): void => {
  app.use(
    session({
      store: new SessionStore(services.db, options.cleanupInterval),
      secret: options.secret,
      name: options.isSecure ? '__Host-wid' : 'wid',
      resave: false,
      saveUninitialized: false,
      cookie: {
        httpOnly: true,
        sameSite: 'lax',
        secure: options.isSecure,
        path: '/',
        maxAge: limits.absolute.member * 1000,
      },
    }),
  );
  passport.serializeUser((user, callback) => callback(null, (user as Actor).id)); // passport holds what findActor gave
  passport.deserializeUser((id: string, callback) => {
    findActor(services, id).then(
      (actor) => callback(null, actor ?? false),
      (error: unknown) => callback(error),
    );
  });
  app.use(passport.initialize());
  app.use(passport.session());
  app.use(actorMiddleware(services));
};
