import { act, render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { useState } from 'react';
import { expect, test, vi } from 'vitest';
import { Dialog } from './dialog.tsx';
import { SideSheet } from './side-sheet.tsx';
import { ToastRegion } from './toast-region.tsx';
import { dismissToast, currentToast, showToast } from './toasts.ts';

function WithSheet() {
  const [isOpen, setOpen] = useState(false);
  return (
    <>
      <button type="button" onClick={() => setOpen(true)}>
        Bone graft
      </button>
      {isOpen ? (
        <SideSheet title="Alveolar bone graft" onClose={() => setOpen(false)}>
          <input aria-label="Note" />
        </SideSheet>
      ) : null}
    </>
  );
}

test('a sheet takes the focus, F6 changes sides, Escape closes and gives the focus back', async () => {
  render(<WithSheet />);
  const opener = screen.getByRole('button', { name: 'Bone graft' });
  await userEvent.click(opener);
  expect(screen.getByRole('region', { name: 'Alveolar bone graft' })).toBeInTheDocument();
  expect(screen.getByRole('heading', { name: 'Alveolar bone graft' })).toHaveFocus();
  await userEvent.keyboard('{F6}');
  expect(opener).toHaveFocus();
  await userEvent.keyboard('{F6}');
  expect(screen.getByRole('heading', { name: 'Alveolar bone graft' })).toHaveFocus();
  await userEvent.keyboard('{Escape}');
  expect(screen.queryByRole('region', { name: 'Alveolar bone graft' })).not.toBeInTheDocument();
  expect(opener).toHaveFocus();
});

test('Escape cancels a dialog and the focus goes back', async () => {
  function WithDialog() {
    const [isOpen, setOpen] = useState(false);
    return (
      <>
        <button type="button" onClick={() => setOpen(true)}>
          Hold
        </button>
        <Dialog isOpen={isOpen} onClose={() => setOpen(false)} title="Hold the bone graft">
          <input aria-label="Reason" />
        </Dialog>
      </>
    );
  }
  render(<WithDialog />);
  await userEvent.click(screen.getByRole('button', { name: 'Hold' }));
  expect(screen.getByRole('dialog', { name: 'Hold the bone graft' })).toBeInTheDocument();
  await userEvent.keyboard('{Escape}');
  expect(screen.queryByRole('dialog')).not.toBeInTheDocument();
  await vi.waitFor(() => expect(screen.getByRole('button', { name: 'Hold' })).toHaveFocus());
});

test('a message is announced, F8 reaches its undo, and undoing takes it away', async () => {
  const undo = vi.fn();
  render(<ToastRegion />);
  act(() => showToast({ text: 'Claimed: speech at 5', onUndo: undo }));
  expect(screen.getByRole('status')).toHaveTextContent('Claimed: speech at 5');
  await userEvent.keyboard('{F8}');
  expect(screen.getByRole('button', { name: 'Undo' })).toHaveFocus();
  await userEvent.keyboard('{Enter}');
  expect(undo).toHaveBeenCalledOnce();
  expect(screen.getByRole('status')).toBeEmptyDOMElement();
});

test('a message leaves after six seconds, but not while it is hovered', async () => {
  vi.useFakeTimers({ shouldAdvanceTime: true });
  const user = userEvent.setup({ advanceTimers: vi.advanceTimersByTime });
  render(<ToastRegion />);
  act(() => showToast({ text: 'Kept' }));
  await user.hover(screen.getByText('Kept'));
  act(() => void vi.advanceTimersByTime(10_000));
  expect(screen.getByText('Kept')).toBeInTheDocument();
  await user.unhover(screen.getByText('Kept'));
  act(() => void vi.advanceTimersByTime(6_000));
  expect(screen.queryByText('Kept')).not.toBeInTheDocument();
  vi.useRealTimers();
  dismissToast(currentToast()?.id ?? 0);
});
