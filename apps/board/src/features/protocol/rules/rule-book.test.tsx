import { render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { MemoryRouter } from 'react-router-dom';
import { expect, test } from 'vitest';
import { defaultProtocol } from '@weftway/pathway/default-protocol';
import { RuleBook } from './rule-book.tsx';

const show = (address: string) =>
  render(
    <MemoryRouter initialEntries={[address]}>
      <RuleBook protocol={defaultProtocol} />
    </MemoryRouter>,
  );

test('the address of a rule opens it and focuses it', () => {
  HTMLElement.prototype.scrollIntoView = () => undefined;
  show('/protocol/1#SURG-03');
  const button = screen.getByRole('button', { name: /^Palate repair/ });
  expect(button).toHaveAttribute('aria-expanded', 'true');
  expect(button).toHaveFocus();
  expect(screen.getByText(/Aim 42 days after joining the team/)).toBeVisible();
});

test('the search reads everything that a rule says', async () => {
  show('/protocol/1');
  expect(screen.getByText('66 milestones')).toBeVisible();
  await userEvent.type(screen.getByRole('searchbox', { name: 'Search the rules' }), 'pittsburgh');
  const found = screen.queryAllByRole('button', { expanded: false });
  expect(found.length).toBeLessThan(6);
  await userEvent.clear(screen.getByRole('searchbox', { name: 'Search the rules' }));
  await userEvent.type(screen.getByRole('searchbox', { name: 'Search the rules' }), 'zanzibar qqq');
  expect(screen.getByText('No rule holds these words.')).toBeVisible();
});
