import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router-dom';
import { expect, test } from 'vitest';
import { builtChild, day, type BuiltChild } from '../../../testing/pathway-builders.ts';
import { namingOf } from '../model/child-plan.ts';
import { Reckoning } from './reckoning.tsx';

const show = ({ of, view }: BuiltChild, key: string) =>
  render(
    <MemoryRouter>
      <Reckoning
        planned={view(key).planned}
        naming={namingOf(of)}
        protocolVersion={1}
        sources={['A published source']}
      />
    </MemoryRouter>,
  );

test('a lip repair that slipped moves the opening of the palate repair, and the reckoning says by what and how far', () => {
  show(
    builtChild({ facts: { completions: [{ milestone: 'SURG-01', on: day('2026-08-20') }] } }, day('2026-09-01')),
    'SURG-03',
  );
  const rows = screen.getAllByRole('row').map((row) => row.textContent);
  expect(rows[0]).toContain('Counted from birth');
  expect(rows[0]).toContain('15 Jan 2026');
  expect(rows[1]).toContain('opens 9 months after');
  expect(rows[1]).toContain('+ 9 months');
  expect(rows[2]).toContain('Lip repair on 20 Aug 2026, then 12 weeks');
  expect(rows[2]).toContain('28 days later');
  expect(rows[3]).toBe('Opens12 Nov 2026');
});

test('the latest date never moves because something else was late', async () => {
  show(
    builtChild({ facts: { completions: [{ milestone: 'SURG-01', on: day('2026-08-20') }] } }, day('2026-09-01')),
    'SURG-03',
  );
  await userEvent.click(screen.getByRole('radio', { name: 'Latest' }));
  expect(screen.getByRole('row', { name: /Latest/ })).toHaveTextContent('15 Feb 2027');
  expect(screen.queryByText(/Lip repair on/)).toBeNull();
});

test('every reason names its rule, with the way to it, and the sources are spelled out', () => {
  show(builtChild(), 'SURG-01');
  const links = within(screen.getByRole('table')).getAllByRole('link');
  expect(links.length).toBeGreaterThanOrEqual(2);
  for (const link of links) expect(link).toHaveAttribute('href', '/protocol/1#SURG-01');
  expect(screen.getByText('A published source')).toBeInTheDocument();
  expect(screen.getByText('A calculation, not advice.')).toBeInTheDocument();
});

test('a child born early is counted from the expected date', () => {
  show(builtChild({ facts: { gestation: { weeks: 32, days: 0 } } }), 'SURG-01');
  expect(screen.getByRole('row', { name: /Born early/ })).toHaveTextContent('12 Mar 2026');
});

test('without a window there is nothing to reckon', () => {
  show(builtChild(), 'SURG-02');
  expect(screen.getByText('No dates yet, so there is nothing to reckon.')).toBeInTheDocument();
});
