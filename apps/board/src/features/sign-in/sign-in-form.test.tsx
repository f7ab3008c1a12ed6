import { screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { signIn } from '@weftway/contract/session';
import { call } from '../../api/api-client.ts';
import { draw } from '../../testing/draw.tsx';
import { fakeServer, problemBody } from '../../testing/fake-server.ts';
import { DemoAccounts } from './demo-accounts.tsx';
import { ForgottenPasswordForm } from './forgotten-password-form.tsx';
import { NewPasswordForm } from './new-password-form.tsx';
import { SignInForm } from './sign-in-form.tsx';

afterEach(() => vi.unstubAllGlobals());

const session = {
  me: null,
  csrfToken: 'fresh',
  today: '2026-12-01',
  team: { name: 'Tern', zone: 'UTC' },
  isDemo: true,
  demoAccounts: [],
  idleSeconds: null,
  endsAt: null,
};

describe('the sign-in form', () => {
  it('sends what was typed and goes on', async () => {
    const server = fakeServer({ 'POST /session': { body: session } });
    const onSignedIn = vi.fn();
    draw(<SignInForm filled={null} onSignedIn={onSignedIn} />);
    await userEvent.type(screen.getByLabelText('E-mail'), 'ines@tern.example');
    await userEvent.type(screen.getByLabelText('Password'), 'a quiet tide{Enter}');
    await vi.waitFor(() => expect(onSignedIn).toHaveBeenCalledOnce());
    expect(server.asked[0]?.body).toEqual({ email: 'ines@tern.example', password: 'a quiet tide' });
  });

  it('says at the field what was left empty, and sends nothing', async () => {
    const server = fakeServer({});
    draw(<SignInForm filled={null} onSignedIn={() => undefined} />);
    await userEvent.click(screen.getByRole('button', { name: 'Sign in' }));
    expect(screen.getByLabelText('E-mail')).toHaveAccessibleDescription('Write your e-mail.');
    expect(screen.getByLabelText('Password')).toHaveAccessibleDescription('Write your password.');
    expect(screen.getByLabelText('E-mail')).toHaveFocus();
    expect(server.asked).toEqual([]);
  });

  it('a refusal stands beside the button and nothing typed is lost', async () => {
    fakeServer({
      'POST /session': { status: 401, body: problemBody('wrong-credentials', 401, { detail: 'Check both.' }) },
    });
    draw(<SignInForm filled={null} onSignedIn={() => undefined} />);
    await userEvent.type(screen.getByLabelText('E-mail'), 'ines@tern.example');
    await userEvent.type(screen.getByLabelText('Password'), 'wrong{Enter}');
    expect(await screen.findByText('Title of wrong-credentials. Check both.')).toBeVisible();
    expect(screen.getByLabelText('E-mail')).toHaveValue('ines@tern.example');
    expect(screen.getByLabelText('Password')).toHaveValue('wrong');
    expect(screen.getByLabelText('Password')).toHaveFocus();
  });

  it('somebody chosen from the demonstration is filled in, and the button waits under the finger', () => {
    draw(
      <SignInForm
        filled={{ name: 'Ines Calder', email: 'ines@tern.example', password: 'a quiet tide' }}
        onSignedIn={() => undefined}
      />,
    );
    expect(screen.getByLabelText('Password')).toHaveValue('a quiet tide');
    expect(screen.getByRole('button', { name: 'Sign in' })).toHaveFocus();
    expect(screen.getByText('Filled in for Ines Calder.')).toBeInTheDocument();
  });
});

it('the list of the demonstration tells who was chosen', async () => {
  const onChoose = vi.fn();
  const account = { name: 'Ines Calder', role: 'Orthodontist', email: 'ines@tern.example', password: 'a quiet tide' };
  draw(<DemoAccounts accounts={[account]} onChoose={onChoose} />);
  await userEvent.click(screen.getByRole('button', { name: /Ines Calder/ }));
  expect(onChoose).toHaveBeenCalledWith(account);
});

describe('asking for a new password', () => {
  it('says the same for every address', async () => {
    fakeServer({ 'POST /password-reset-requests': { status: 202, body: { sent: true } } });
    draw(<ForgottenPasswordForm isDemo />);
    await userEvent.type(screen.getByLabelText('E-mail'), ' nobody@tern.example {Enter}');
    expect(await screen.findByText('Look into your mail')).toBeVisible();
    expect(screen.getByRole('link', { name: 'Local inbox' })).toHaveAttribute('href', '/inbox');
  });

  it('an address that is none is said at the field', async () => {
    fakeServer({
      'POST /password-reset-requests': {
        status: 400,
        body: problemBody('bad-input', 400, {
          errors: [{ pointer: '/email', detail: 'Write a whole e-mail address.' }],
        }),
      },
    });
    draw(<ForgottenPasswordForm isDemo={false} />);
    await userEvent.type(screen.getByLabelText('E-mail'), 'nobody{Enter}');
    await vi.waitFor(() =>
      expect(screen.getByLabelText('E-mail')).toHaveAccessibleDescription('Write a whole e-mail address.'),
    );
  });
});

describe('choosing a password', () => {
  const form = (onSave: (password: string) => Promise<unknown>) =>
    draw(<NewPasswordForm action="Set the password" onSave={onSave} linkGone={<p>The link is gone</p>} />);

  it('counts characters, an emoji being one', async () => {
    form(async () => undefined);
    await userEvent.type(screen.getByLabelText('New password'), 'fox🦊');
    expect(screen.getByText('4 of at least 15')).toBeVisible();
  });

  it('a refusal of the password stands at the field', async () => {
    fakeServer({
      'POST /session': {
        status: 400,
        body: problemBody('bad-input', 400, {
          errors: [{ pointer: '/password', detail: 'This repeats the same few characters.' }],
        }),
      },
    });
    form((password) => call(signIn, { body: { email: 'a@b.example', password } }));
    await userEvent.type(screen.getByLabelText('New password'), 'aaaaaaaaaaaaaaa{Enter}');
    await vi.waitFor(() =>
      expect(screen.getByLabelText('New password')).toHaveAccessibleDescription(/This repeats the same few characters/),
    );
    expect(screen.getByLabelText('New password')).toHaveValue('aaaaaaaaaaaaaaa');
  });
});
