import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router-dom';
import { describe, expect, it, vi } from 'vitest';
import { plainDate } from '@weftway/calendar/plain-date';
import type { ChildRow } from '@weftway/contract/child';
import { RegistryTable } from './registry-table.tsx';

const row: ChildRow = {
  id: 'c1',
  firstName: 'Łucja',
  familyName: '<img src=x onerror=alert(1)>',
  recordNumber: 'TE-1',
  bornOn: plainDate('2018-08-01'),
  dueOn: null,
  cleft: '•••SHAL',
  site: 'Tern Quay',
  leadClinicianId: 's1',
  alerts: ['Latex'],
  late: 2,
  closing: 0,
  unowned: 1,
  transferredOn: null,
  careEndedOn: null,
};

const show = (rows: readonly ChildRow[]) => {
  const onOrder = vi.fn();
  render(
    <MemoryRouter>
      <RegistryTable
        rows={rows}
        today={plainDate('2026-12-01')}
        names={new Map([['s1', 'Obed Nkansah']])}
        order="name"
        onOrder={onOrder}
      />
    </MemoryRouter>,
  );
  return onOrder;
};

describe('the registry', () => {
  it('says of each child who, how old, what is late and whose', () => {
    show([row]);
    const line = screen.getAllByRole('row')[1] ?? document.body;
    expect(within(line).getByRole('link', { name: '<img src=x onerror=alert(1)>, Łucja' })).toHaveAttribute(
      'href',
      '/children/c1',
    );
    expect(within(line).getByText('8 years 4 months')).toBeInTheDocument();
    expect(within(line).getByText('UCLP left, complete')).toBeInTheDocument();
    expect(within(line).getByText('Obed Nkansah')).toBeInTheDocument();
    expect(within(line).getByRole('img', { name: /late/i })).toBeInTheDocument();
    expect(within(line).getByText('Latex')).toBeInTheDocument();
  });

  it('says expected, moved and ended in words', () => {
    show([
      { ...row, id: 'c2', bornOn: null, dueOn: plainDate('2027-02-01') },
      { ...row, id: 'c3', transferredOn: plainDate('2026-09-02') },
      { ...row, id: 'c4', careEndedOn: plainDate('2026-11-03') },
    ]);
    expect(screen.getByText('expected 1 Feb 2027')).toBeInTheDocument();
    expect(screen.getByText(/moved to another team 2 Sep 2026/)).toBeInTheDocument();
    expect(screen.getByText(/care ended 3 Nov 2026/)).toBeInTheDocument();
    expect(screen.getAllByRole('link')[2]).toHaveAttribute('href', '/children/c4/record');
  });

  it('is put in order from its heads', async () => {
    const onOrder = show([row]);
    await userEvent.click(screen.getByRole('button', { name: /Late/ }));
    expect(onOrder).toHaveBeenCalledWith('late');
    expect(screen.getByRole('columnheader', { name: /Child/ })).toHaveAttribute('aria-sort', 'ascending');
  });
});
