import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router-dom';
import { expect, test } from 'vitest';
import { builtChild, builtToday, day, signature } from '../../../testing/pathway-builders.ts';
import { PathwayList } from './pathway-list.tsx';

const child = () =>
  builtChild({
    facts: { completions: [{ milestone: 'TEAM-03', on: day('2026-01-16') }] },
    claims: [{ milestone: 'EAR-02', part: 'milestone', memberId: 'm-1', since: '2026-02-01T09:00:00Z' }],
    signatures: [signature({ milestone: 'TEAM-03', performedOn: day('2026-01-16') })],
  });

const shown = ['TEAM-03', 'EAR-02', 'CARE-01', 'PSY-01', 'SURG-03'];

const show = () => {
  const { of, views } = child();
  const few = views.all.filter((view) => shown.includes(view.key));
  render(
    <MemoryRouter>
      <PathwayList
        views={few}
        today={builtToday}
        selectedKey={null}
        titleOf={of.titleOf}
        hrefOf={(key) => `?m=${key}`}
      />
    </MemoryRouter>,
  );
};

const table = (name: RegExp) => screen.getByRole('table', { name });
const titles = (name: RegExp) =>
  within(table(name))
    .getAllByRole('rowheader')
    .map((cell) => within(cell).getByRole('link').textContent);

test('what is late comes first, with its state as a word, its dates and its owner', () => {
  show();
  const [, first] = within(table(/^Now/)).getAllByRole('row');
  expect(first).toHaveTextContent('Late');
  const hearing = screen.getByRole('row', { name: /Diagnostic hearing test/ });
  expect(hearing).toHaveTextContent('5 days late');
  expect(hearing).toHaveTextContent('12 Feb 2026');
  expect(hearing).toHaveTextContent('15 Apr 2026');
  expect(hearing).toHaveTextContent('Obed Nkansah');
});

test('what nobody holds says so, what is done says who signed', () => {
  show();
  expect(screen.getByRole('row', { name: /Feeding assessment/ })).toHaveTextContent('no one');
  const coded = within(table(/^Done/)).getByRole('row', { name: /Cleft examined/ });
  expect(coded).toHaveTextContent('Signed');
  expect(coded).toHaveTextContent('done 16 Jan 2026');
  expect(coded).toHaveTextContent('Obed Nkansah');
});

test('a column sorts up, down and back to urgency', async () => {
  show();
  const before = titles(/^Now/);
  const button = within(table(/^Now/)).getByRole('button', { name: /Milestone/ });
  await userEvent.click(button);
  expect(titles(/^Now/)).toEqual(before.toSorted((a, b) => (a ?? '').localeCompare(b ?? '')));
  expect(within(table(/^Now/)).getByRole('columnheader', { name: /Milestone/ })).toHaveAttribute(
    'aria-sort',
    'ascending',
  );
  await userEvent.click(button);
  await userEvent.click(button);
  expect(titles(/^Now/)).toEqual(before);
});

test('a row opens its milestone by its address', () => {
  show();
  expect(screen.getByRole('link', { name: 'Palate repair' })).toHaveAttribute('href', '/?m=SURG-03');
});
