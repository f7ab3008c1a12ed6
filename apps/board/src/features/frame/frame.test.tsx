import { screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { Me } from '@weftway/contract/session';
import { problemNames } from '@weftway/contract/problems';
import { problemWords } from '../../words/problems.ts';
import { draw } from '../../testing/draw.tsx';
import { fakeServer, problemBody } from '../../testing/fake-server.ts';
import { LockedScreen } from './locked-screen.tsx';
import { homeFor, placesFor } from './places.ts';
import { SessionWarning } from './session-warning.tsx';

afterEach(() => vi.unstubAllGlobals());

const me = (standing: Me['standing'], disciplines: Me['disciplines'] = []): Me => ({
  id: 'ines',
  name: 'Ines Calder',
  email: 'ines@tern.example',
  standing,
  disciplines,
  supervisorId: null,
});
const labels = (who: Me): string[] => placesFor(who).map(({ label }) => label);

describe('places', () => {
  it('a clinician and the coordinator open all six', () => {
    const all = ['My work', 'Board', 'Children', 'Protocol', 'Team', 'Audit trail'];
    expect(labels(me('member', ['orthodontist']))).toEqual(all);
    expect(labels(me('member', ['coordinator']))).toEqual(all);
  });

  it('a trainee has no audit trail; administrator and auditor open no child', () => {
    expect(labels(me('trainee', ['surgeon']))).toEqual(['My work', 'Board', 'Children', 'Protocol', 'Team']);
    expect(labels(me('administrator'))).toEqual(['Protocol', 'Team', 'Audit trail']);
    expect(labels(me('auditor'))).toEqual(['Protocol', 'Team', 'Audit trail']);
  });

  it('everybody starts where their work is', () => {
    expect([
      homeFor(me('member', ['nurse'])),
      homeFor(me('administrator')),
      homeFor(me('auditor')),
      homeFor(me('guardian')),
    ]).toEqual(['/my-work', '/team', '/trail', '/account']);
  });
});

describe('before the session ends', () => {
  it('quiet minutes: staying is one press, and closing the question is a sign of life too', async () => {
    const onStay = vi.fn();
    draw(
      <SessionWarning
        because="quiet"
        secondsLeft={118}
        onStay={onStay}
        onSignInAgain={() => undefined}
        onSignOut={() => undefined}
      />,
    );
    expect(screen.getByRole('alertdialog', { name: 'Are you still there?' })).toHaveTextContent('in 2 minutes');
    await userEvent.click(screen.getByRole('button', { name: 'Stay signed in' }));
    await userEvent.keyboard('{Escape}');
    expect(onStay).toHaveBeenCalledTimes(2);
  });

  it('the end of the day: signing in again is offered in time', () => {
    draw(
      <SessionWarning
        because="day"
        secondsLeft={30}
        onStay={() => undefined}
        onSignInAgain={() => undefined}
        onSignOut={() => undefined}
      />,
    );
    expect(screen.getByRole('alertdialog')).toHaveTextContent('in 30 seconds');
    expect(screen.getByRole('button', { name: 'Sign in again' })).toBeVisible();
  });
});

describe('the locked screen', () => {
  it('asks the same person for their password and goes on', async () => {
    const server = fakeServer({ 'POST /session': { body: { me: me('member'), csrfToken: 'fresh' } } });
    const onUnlocked = vi.fn();
    draw(<LockedScreen me={me('member')} onUnlocked={onUnlocked} onSomebodyElse={() => undefined} />);
    await userEvent.type(screen.getByLabelText('Password'), 'a quiet tide{Enter}');
    await vi.waitFor(() => expect(onUnlocked).toHaveBeenCalledOnce());
    expect(server.asked[0]?.body).toEqual({ email: 'ines@tern.example', password: 'a quiet tide' });
  });

  it('a wrong password keeps it locked and says so', async () => {
    fakeServer({
      'POST /session': { status: 401, body: problemBody('wrong-credentials', 401, { detail: 'Check both.' }) },
    });
    const onUnlocked = vi.fn();
    draw(<LockedScreen me={me('member')} onUnlocked={onUnlocked} onSomebodyElse={() => undefined} />);
    await userEvent.type(screen.getByLabelText('Password'), 'wrong{Enter}');
    expect(await screen.findByText(/Check both/)).toBeVisible();
    await userEvent.keyboard('{Escape}');
    expect(screen.getByText('The screen is locked')).toBeVisible();
    expect(onUnlocked).not.toHaveBeenCalled();
  });
});

it('every problem of the API is explained in sentences', () => {
  for (const name of problemNames)
    expect(`${problemWords[name].happened} ${problemWords[name].helps}`, name).toMatch(/^[A-Z].+\. .+\.$/);
});
