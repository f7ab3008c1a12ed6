import { render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { expect, test, vi } from 'vitest';
import { Menu } from './menu.tsx';
import { Segment } from './segment.tsx';

test('a segment is one choice of a named group, moved with the arrow keys', async () => {
  const onChange = vi.fn();
  const options = [
    { value: 'everyone', label: 'Everyone’s' },
    { value: 'mine', label: 'Mine', count: 14 },
  ] as const;
  render(<Segment label="Whose" options={options} value="everyone" onChange={onChange} />);
  expect(screen.getByRole('group', { name: 'Whose' })).toBeInTheDocument();
  await userEvent.tab();
  await userEvent.keyboard('{ArrowRight}');
  expect(onChange).toHaveBeenCalledWith('mine');
  expect(screen.getByRole('radio', { name: 'Mine 14' })).toBeInTheDocument();
});

test('a menu opens by key and does what was chosen', async () => {
  const handOver = vi.fn();
  render(<Menu label="More" entries={[{ key: 'over', label: 'Hand over', detail: 'H', onAction: handOver }]} />);
  await userEvent.tab();
  await userEvent.keyboard('{Enter}');
  await userEvent.click(await screen.findByRole('menuitem', { name: /Hand over/ }));
  expect(handOver).toHaveBeenCalledOnce();
  expect(screen.queryByRole('menu')).not.toBeInTheDocument();
});
