import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { expect, test, vi } from 'vitest';
import { builtChild, day } from '../../../testing/pathway-builders.ts';
import { viewNamed } from '../model/milestone-view.ts';
import { WaitsFor, WillMove } from './waits-for.tsx';

const molding = {
  findings: [
    { name: 'plate_chosen', on: day('2026-01-27') },
    { name: 'molding_started', on: day('2026-02-09') },
  ],
};

test('each wait says whether it is met, why not, whose it is, and opens', async () => {
  const { of, views, view } = builtChild({ facts: molding });
  const onOpen = vi.fn();
  const lines = view('SURG-01').planned.waitsFor.map((wait) => ({
    wait,
    title: of.titleOf(wait.milestone),
    view: viewNamed(views, wait.milestone),
  }));
  render(<WaitsFor lines={lines} onOpen={onOpen} />);
  const gate = screen.getByText('Molding complete, lip repair can follow').closest('li');
  expect(gate).toHaveTextContent('not signed yet');
  expect(gate).toHaveTextContent('must be done first, no one');
  await userEvent.click(screen.getByRole('button', { name: 'Open: Molding complete, lip repair can follow' }));
  expect(onOpen).toHaveBeenCalledWith('MOLD-06');
});

test('what may be claimed can be claimed from here', async () => {
  const { of, views, view } = builtChild({ facts: molding });
  const onClaim = vi.fn();
  const [wait] = view('SURG-01').planned.waitsFor;
  if (wait === undefined) throw new Error('lip repair waits for nothing');
  render(
    <WaitsFor
      lines={[{ wait, title: of.titleOf(wait.milestone), view: viewNamed(views, wait.milestone), onClaim }]}
      onOpen={vi.fn()}
    />,
  );
  await userEvent.click(screen.getByRole('button', { name: /^Claim:/ }));
  expect(onClaim).toHaveBeenCalledOnce();
});

test('a milestone that waits for nothing says so', () => {
  render(<WaitsFor lines={[]} onOpen={vi.fn()} />);
  expect(screen.getByText(/Nothing. It can be done/)).toBeInTheDocument();
});

test('what will move can be opened', async () => {
  const { view } = builtChild();
  const onOpen = vi.fn();
  render(<WillMove views={[view('SURG-03')]} onOpen={onOpen} />);
  await userEvent.click(screen.getByRole('button', { name: 'Open: Palate repair' }));
  expect(onOpen).toHaveBeenCalledWith('SURG-03');
});
