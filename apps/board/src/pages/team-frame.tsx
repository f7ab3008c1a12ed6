import { useQueryClient, useQuery, useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import { Navigate, Outlet, useLocation, useNavigate } from 'react-router-dom';
import type { Me, Session } from '@weftway/contract/session';
import { GoToChild } from '../features/frame/go-to-child.tsx';
import { NotYours } from '../features/frame/not-yours.tsx';
import { closedPlace, homeFor, mayGoToChild, placesFor } from '../features/frame/places.ts';
import { SessionEndsSoon, SessionIsOver, useSessionEndAtHand } from '../features/frame/session-end.tsx';
import { useSessionClock } from '../features/frame/use-session-clock.ts';
import { WhoMenu } from '../features/frame/who-menu.tsx';
import { sessionMutations, sessionQueries } from '../queries/session-queries.ts';
import { PageFrame } from '../ui/page/page-frame.tsx';
import { TopBar } from '../ui/page/top-bar.tsx';
import { showToast } from '../ui/overlays/toasts.ts';
import { ToastRegion } from '../ui/overlays/toast-region.tsx';
import { frameWords } from '../words/frame.ts';

/** Who is signed in is loaded before this is drawn. */
export function Component() {
  const { pathname, search } = useLocation();
  const { data: session, dataUpdatedAt } = useQuery(sessionQueries.current());
  if (session === undefined) return null;
  if (session.me === null) return <Navigate to={`/sign-in?next=${encodeURIComponent(pathname + search)}`} replace />;
  return <Frame session={session} me={session.me} askedAt={dataUpdatedAt} />;
}

interface FrameProps {
  readonly session: Session;
  readonly me: Me;
  /** When the session was read, by this machine's clock. */
  readonly askedAt: number;
}

/** Bar, screen and foot; over them the warning before a session ends, and the lock after it. */
function Frame({ session, me, askedAt }: FrameProps) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const closed = closedPlace(me, useLocation().pathname);
  const clock = useSessionClock(session, askedAt);
  useSessionEndAtHand();
  const [isLeaving, setLeaving] = useState(false);
  const signOut = useMutation(sessionMutations.signOut(client));
  const isLocked = clock.phase.kind === 'over' && !isLeaving;

  const leave = async () => {
    setLeaving(true);
    try {
      await signOut.mutateAsync();
      showToast({ text: frameWords.signedOut });
      await navigate('/sign-in', { replace: true });
    } catch {
      // The cookie may still be good: the way out is to lock, which asks for the password again.
      setLeaving(false);
      clock.lock();
    }
  };

  return (
    <>
      <div className={isLocked ? 'invisible' : undefined} inert={isLocked}>
        <PageFrame
          topBar={
            <TopBar
              places={placesFor(me)}
              home={homeFor(me)}
              goTo={mayGoToChild(me) ? <GoToChild /> : undefined}
              who={<WhoMenu me={me} session={session} onSignOut={() => void leave()} />}
            />
          }
        >
          <div className="flex grow flex-col">{closed === null ? <Outlet /> : <NotYours place={closed} />}</div>
          <p className="no-print border-hair text-fine text-ink-3 m-0 border-t px-6 py-3 max-sm:px-5">
            {frameWords.safety}
          </p>
        </PageFrame>
        <ToastRegion />
      </div>
      {clock.phase.kind === 'warning' && !isLeaving ? (
        <SessionEndsSoon
          because={clock.phase.because}
          secondsLeft={clock.phase.secondsLeft}
          onStay={clock.stay}
          onSignInAgain={clock.lock}
          onSignOut={() => void leave()}
        />
      ) : null}
      {isLocked ? <SessionIsOver me={me} onUnlocked={clock.restart} onSomebodyElse={() => void leave()} /> : null}
    </>
  );
}
