import { render, screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { MemoryRouter } from 'react-router-dom';
import { expect, test } from 'vitest';
import { PageFrame } from './page-frame.tsx';
import { TopBar } from './top-bar.tsx';

const places = [
  { to: '/my-work', label: 'My work', count: 9 },
  { to: '/board', label: 'Board' },
];

test('the current place is marked and counts stand with their place', () => {
  render(
    <MemoryRouter initialEntries={['/my-work']}>
      <TopBar places={places} />
    </MemoryRouter>,
  );
  expect(screen.getByRole('link', { name: 'My work 9', current: 'page' })).toBeInTheDocument();
  expect(screen.getByRole('link', { name: 'Board' })).not.toHaveAttribute('aria-current');
});

test('the folded menu opens, holds every place, and closes when one is gone to', async () => {
  render(
    <MemoryRouter initialEntries={['/my-work']}>
      <TopBar places={places} />
    </MemoryRouter>,
  );
  const fold = screen.getByRole('button', { name: 'Places' });
  await userEvent.click(fold);
  expect(fold).toHaveAttribute('aria-expanded', 'true');
  const [, folded] = screen.getAllByRole('navigation', { name: 'Places' });
  if (folded === undefined) throw new Error('The folded places are missing.');
  await userEvent.click(within(folded).getByRole('link', { name: 'Board' }));
  expect(fold).toHaveAttribute('aria-expanded', 'false');
});

test('the first stop of a page leads to its content', async () => {
  render(<PageFrame topBar={<a href="/other">other</a>}>text</PageFrame>);
  await userEvent.tab();
  expect(screen.getByRole('link', { name: 'Go to the content' })).toHaveFocus();
  expect(screen.getByRole('main')).toHaveAttribute('id', 'content');
});
