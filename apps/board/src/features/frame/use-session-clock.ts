import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useEffect, useEffectEvent, useRef, useState } from 'react';
import type { Session } from '@weftway/contract/session';
import { isProblem } from '../../api/api-client.ts';
import { askSession, sessionMutations, sessionQueries } from '../../queries/session-queries.ts';
import { phaseAt, type Clock, type Phase } from './session-clock.ts';

const tellEvery = 60_000;
const askEvery = 5_000;
const channelName = 'weftway-activity';
const acts = ['pointerdown', 'keydown', 'wheel', 'touchstart'] as const;

export interface SessionClock {
  readonly phase: Phase;
  /** The person says that they are there. */
  readonly stay: () => void;
  /** After signing in again. */
  readonly restart: () => void;
  readonly lock: () => void;
}

/** As the server counted when it was asked, at `askedAt` of this machine's clock. */
const clockOf = (session: Session, askedAt: number): Clock => {
  const idleSeconds = session.idleSeconds ?? 900;
  return {
    activeAt: askedAt - (idleSeconds - (session.idleSecondsLeft ?? idleSeconds)) * 1000,
    idleSeconds,
    endsAt: session.endsAt === null ? null : Date.parse(session.endsAt),
  };
};

/** Calls back when any query or change is answered with "not signed in". */
function useNotSignedIn(onEnded: () => void): void {
  const client = useQueryClient();
  const ended = useEffectEvent(onEnded);
  useEffect(() => {
    const look = (error: unknown) => {
      if (isProblem(error, 'not-signed-in')) ended();
    };
    const leaveQueries = client.getQueryCache().subscribe((event) => {
      if (event.type === 'updated' && event.action.type === 'error') look(event.action.error);
    });
    const leaveChanges = client.getMutationCache().subscribe((event) => {
      if (event.type === 'updated' && event.action.type === 'error') look(event.action.error);
    });
    return () => {
      leaveQueries();
      leaveChanges();
    };
  }, [client]);
}

/**
 * Tells the server once a minute that somebody is there, and counts down when nobody is. Windows of one browser tell
 * each other, since they share the session. Whether it is really over is asked, not assumed.
 */
export function useSessionClock(session: Session, askedAt: number): SessionClock {
  const client = useQueryClient();
  const clock = useRef<Clock | null>(null);
  const channel = useRef<BroadcastChannel | null>(null);
  const askAgainAt = useRef(0);
  const [phase, setPhase] = useState<Phase>({ kind: 'in' });
  const tell = useMutation(sessionMutations.stayedActive(client));

  const begin = useEffectEvent(() => {
    clock.current = clockOf(session, askedAt);
  });
  const wasActive = useEffectEvent(() => {
    clock.current = { ...(clock.current ?? clockOf(session, askedAt)), activeAt: Date.now() };
    setPhase({ kind: 'in' });
  });
  const stay = () => {
    tell.mutate(undefined, {
      onSuccess: (fresh) => {
        clock.current = clockOf(fresh, Date.now());
        setPhase({ kind: 'in' });
        channel.current?.postMessage('active');
      },
    });
  };
  const act = useEffectEvent(() => {
    const { activeAt } = clock.current ?? { activeAt: 0 };
    if (phase.kind === 'in' && Date.now() - activeAt >= tellEvery && !tell.isPending) stay();
  });
  const tick = useEffectEvent(async () => {
    if (phase.kind === 'over' || clock.current === null) return;
    const next = phaseAt(Date.now(), clock.current);
    if (next.kind !== 'over') {
      if (next.kind !== 'in' || phase.kind !== 'in') setPhase(next);
      return;
    }
    if (Date.now() < askAgainAt.current) return;
    askAgainAt.current = Date.now() + askEvery;
    // Not reached: asked again in a while, with the warning left standing.
    const known = await askSession().catch(() => null);
    if (known === null) return;
    if (known.me === null) setPhase({ kind: 'over' });
    else clock.current = clockOf(known, Date.now());
  });

  useEffect(() => {
    begin();
    const timer = setInterval(() => void tick(), 1000);
    const told = typeof BroadcastChannel === 'undefined' ? null : new BroadcastChannel(channelName);
    channel.current = told;
    if (told !== null) told.onmessage = () => wasActive();
    for (const kind of acts) document.addEventListener(kind, act, { passive: true });
    return () => {
      clearInterval(timer);
      told?.close();
      for (const kind of acts) document.removeEventListener(kind, act);
    };
  }, []);

  const lock = () => setPhase({ kind: 'over' });
  useNotSignedIn(lock);
  return {
    phase,
    stay,
    lock,
    restart: () => wasActiveNow(clock, client.getQueryData(sessionQueries.current().queryKey) ?? session, setPhase),
  };
}

const wasActiveNow = (clock: { current: Clock | null }, session: Session, setPhase: (phase: Phase) => void): void => {
  clock.current = clockOf(session, Date.now());
  setPhase({ kind: 'in' });
};
