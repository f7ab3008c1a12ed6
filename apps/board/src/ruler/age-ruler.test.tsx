import { render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { expect, test, vi } from 'vitest';
import { rulerBirth, rulerItem, rulerLanes, rulerToday, rulerWindow } from '../testing/ruler-builders.ts';
import { AgeRuler, type AgeRulerProps } from './age-ruler.tsx';

const items = [
  rulerItem({
    key: 'lip',
    label: 'Lip repair',
    state: 'signed',
    window: rulerWindow(3, 6),
    knotOn: rulerWindow(4, 4).earliest,
  }),
  rulerItem({ key: 'graft', label: 'Alveolar bone graft', state: 'waiting', window: rulerWindow(99, 117) }),
  rulerItem({ key: 'speech', label: 'Speech at 10', lane: 'speech', window: rulerWindow(117, 126) }),
  rulerItem({
    key: 'teeth',
    label: 'Teeth clear',
    lane: 'teeth',
    state: 'late',
    unowned: true,
    window: rulerWindow(92, 98),
  }),
];

function draw(given: Partial<AgeRulerProps> = {}) {
  const onSelect = vi.fn();
  const onPeriodChange = vi.fn();
  render(
    <AgeRuler
      lanes={rulerLanes}
      items={items}
      birth={rulerBirth}
      today={rulerToday}
      period="all"
      selectedKey={null}
      dependencies={[]}
      onSelect={onSelect}
      onPeriodChange={onPeriodChange}
      {...given}
    />,
  );
  return { onSelect, onPeriodChange };
}

const cell = (name: RegExp) => screen.getByRole('gridcell', { name });

test('a milestone says its name, state, window and owner in that order', () => {
  draw();
  expect(cell(/bone graft/)).toHaveAccessibleName(
    'Alveolar bone graft, waiting, 3 Sep 2026 to 3 Mar 2028, Obed Nkansah',
  );
});

test('a signed one says the day it was signed for, an unowned one that no one holds it', () => {
  draw();
  expect(cell(/Lip repair/)).toHaveAccessibleName('Lip repair, signed, on 3 Oct 2018, Obed Nkansah');
  expect(cell(/Teeth clear/)).toHaveAccessibleName('Teeth clear, late, 3 Feb 2026 to 3 Aug 2026, no one');
});

test('each lane is a row with its name and its owner', () => {
  draw();
  expect(screen.getAllByRole('row')).toHaveLength(3);
  expect(screen.getByRole('rowheader', { name: 'Teeth, no one' })).toBeInTheDocument();
});

test('one tab stop, at the milestone nearest to today, from which the arrows move', async () => {
  draw();
  await userEvent.tab();
  expect(cell(/bone graft/)).toHaveFocus();
  await userEvent.keyboard('{ArrowLeft}');
  expect(cell(/Lip repair/)).toHaveFocus();
  await userEvent.keyboard('{End}{ArrowDown}');
  expect(cell(/Speech at 10/)).toHaveFocus();
  await userEvent.tab();
  expect(document.body).toHaveFocus();
});

test('Enter and a press both choose', async () => {
  const { onSelect } = draw();
  await userEvent.tab();
  await userEvent.keyboard('{Enter}');
  await userEvent.click(cell(/Speech at 10/));
  expect(onSelect.mock.calls).toEqual([['graft'], ['speech']]);
});

test('D goes to what the chosen one waits for', async () => {
  draw({ selectedKey: 'graft', dependencies: [{ key: 'teeth', isMet: false }] });
  await userEvent.tab();
  await userEvent.keyboard('d');
  expect(cell(/Teeth clear/)).toHaveFocus();
});

test('plus looks closer at the period of the focused one, minus at the whole life', async () => {
  const { onPeriodChange } = draw();
  await userEvent.tab();
  await userEvent.keyboard('+-');
  expect(onPeriodChange.mock.calls).toEqual([['school'], ['all']]);
});

test('the chosen one is marked as such', () => {
  draw({ selectedKey: 'graft' });
  expect(cell(/bone graft/)).toHaveAttribute('aria-selected', 'true');
  expect(cell(/Speech/)).toHaveAttribute('aria-selected', 'false');
});

test('a child without milestones still has threads and their names', () => {
  draw({ items: [] });
  expect(screen.getByRole('rowheader', { name: 'Surgery, Obed Nkansah' })).toBeInTheDocument();
  expect(screen.queryByRole('gridcell')).not.toBeInTheDocument();
});
