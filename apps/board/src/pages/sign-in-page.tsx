import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Navigate, useNavigate, useSearchParams } from 'react-router-dom';
import { DemoAccounts } from '../features/sign-in/demo-accounts.tsx';
import { OutsideFrame } from '../features/sign-in/outside-frame.tsx';
import { safeNext } from '../features/sign-in/safe-next.ts';
import { SignInForm, type Filled } from '../features/sign-in/sign-in-form.tsx';
import { WovenBand } from '../features/sign-in/woven-band.tsx';
import { sessionQueries } from '../queries/session-queries.ts';
import { signInWords } from '../words/sign-in.ts';

/** Form on the left; on the right, who to be in the demonstration, or how to join. */
export function Component() {
  const session = useQuery(sessionQueries.current()).data;
  const [filled, setFilled] = useState<Filled | null>(null);
  const [query] = useSearchParams();
  const navigate = useNavigate();
  const next = safeNext(query.get('next')) ?? '/';
  const accounts = session?.demoAccounts ?? [];
  if ((session?.me ?? null) !== null) return <Navigate to={next} replace />;
  return (
    <OutsideFrame team={session?.team.name} band={<WovenBand />}>
      <title>{signInWords.title}</title>
      <div className="grid grid-cols-1 gap-x-12 gap-y-10 min-[880px]:grid-cols-[minmax(0,5fr)_minmax(0,6fr)]">
        <div className="flex flex-col gap-5">
          <h1 className="text-title m-0">{signInWords.title}</h1>
          <SignInForm
            key={filled?.email ?? ''}
            filled={filled}
            onSignedIn={() => void navigate(next, { replace: true })}
          />
        </div>
        <div className="border-hair min-[880px]:border-l min-[880px]:pl-11">
          {accounts.length > 0 ? (
            <DemoAccounts accounts={accounts} onChoose={setFilled} />
          ) : session === undefined || session.isDemo ? null : (
            <section className="flex flex-col gap-3">
              <h2 className="text-head m-0">{signInWords.newHere}</h2>
              <p className="text-sentence m-0 max-w-[44ch]">{signInWords.newHereText}</p>
            </section>
          )}
        </div>
      </div>
    </OutsideFrame>
  );
}
