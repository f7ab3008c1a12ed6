import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { expect, test } from 'vitest';
import { builtChild, day } from '../../../testing/pathway-builders.ts';
import { WhatIf } from './what-if.tsx';

const booked = builtChild({ facts: { bookings: [{ milestone: 'SURG-01', on: day('2026-05-12') }] } });

test('asks in the browser what a delay would move, and says that nothing is written', async () => {
  render(<WhatIf of={booked.of} milestone="SURG-01" />);
  await userEvent.clear(screen.getByLabelText('Weeks of delay'));
  await userEvent.type(screen.getByLabelText('Weeks of delay'), '24');
  await userEvent.click(screen.getByRole('button', { name: 'Show what would move' }));
  const palate = screen.getByText('Palate repair').closest('li');
  expect(palate).toHaveTextContent('opens 3 months later');
  expect(screen.getByText(/Nothing is written. A calculation, not advice./)).toBeInTheDocument();
});

test('a number of weeks that cannot be is refused at the field', async () => {
  render(<WhatIf of={booked.of} milestone="SURG-01" />);
  await userEvent.clear(screen.getByLabelText('Weeks of delay'));
  await userEvent.type(screen.getByLabelText('Weeks of delay'), '300');
  expect(screen.getByText('Write a number of weeks from 1 to 104.')).toBeInTheDocument();
  await userEvent.click(screen.getByRole('button', { name: 'Show what would move' }));
  expect(screen.queryByText(/would move$/, { selector: 'p' })).toBeNull();
});

test('a waiver shows what leaves the path', async () => {
  render(<WhatIf of={booked.of} milestone="SURG-03" />);
  await userEvent.click(screen.getByRole('radio', { name: 'it is waived' }));
  await userEvent.click(screen.getByRole('button', { name: 'Show what would move' }));
  expect(screen.getByText('Check for a hole and for movement of the palate').closest('li')).toHaveTextContent(
    'is no longer on the path',
  );
});
