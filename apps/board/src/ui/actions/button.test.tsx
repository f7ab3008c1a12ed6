import { render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { expect, test, vi } from 'vitest';
import { Button } from './button.tsx';

test('a button that cannot be pressed yet keeps the focus and says why', async () => {
  const press = vi.fn();
  render(
    <Button onClick={press} notYet="Waits for 3 things.">
      Sign off
    </Button>,
  );
  await userEvent.tab();
  const button = screen.getByRole('button', { name: 'Sign off' });
  expect(button).toHaveFocus();
  expect(button).toHaveAccessibleDescription('Waits for 3 things.');
  await userEvent.keyboard('{Enter}');
  expect(press).not.toHaveBeenCalled();
});

test('a busy button keeps its name and does not act twice', async () => {
  const press = vi.fn();
  render(
    <Button isBusy onClick={press}>
      Save
    </Button>,
  );
  await userEvent.click(screen.getByRole('button', { name: 'Save' }));
  expect(press).not.toHaveBeenCalled();
});

test('a busy button does not send its form again', async () => {
  const send = vi.fn();
  render(
    <form onSubmit={send}>
      <Button type="submit" isBusy>
        Send
      </Button>
    </form>,
  );
  await userEvent.click(screen.getByRole('button', { name: 'Send' }));
  expect(send).not.toHaveBeenCalled();
});
