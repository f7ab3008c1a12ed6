import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { beforeAll, describe, expect, test, vi } from 'vitest';
import { headsOf, stripsOf } from '../board-strips.ts';
import { aBoard, aRow, palateRepair, testDay } from '../testing-board.ts';
import { BoardGrid } from './board-grid.tsx';

// The test browser has no layout, so nothing can be scrolled.
beforeAll(() => {
  Element.prototype.scrollIntoView = () => undefined;
  window.scrollTo = () => undefined;
});

const rows = [
  aRow({ childId: 'a', firstName: 'Hamza', familyName: 'Siddiqui', state: 'late', closesIn: -12, holders: [null] }),
  aRow({ childId: 'b', firstName: 'Ela', familyName: 'Wrońska', closesIn: 30, holders: ['m-hana'] }),
  aRow({
    childId: 'c',
    firstName: 'Mateo',
    familyName: 'Huamán',
    milestone: palateRepair,
    state: 'waiting',
    closesIn: 60,
    holders: ['m-obed'],
  }),
];

const show = (unrolled: readonly string[]) => {
  const model = aBoard(rows);
  const strips = stripsOf({
    rows: model.rows,
    heads: headsOf(model),
    day: testDay,
    own: ['speech-therapist'],
    discipline: null,
  });
  const acts = { onUnroll: vi.fn(), onOpen: vi.fn(), onClaim: vi.fn(), onActions: vi.fn() };
  render(<BoardGrid model={model} strips={strips} unrolled={new Set(unrolled)} {...acts} />);
  return acts;
};

describe('the grid of the board', () => {
  test('an unrolled lane names child, milestone, state, time and owner of each row', () => {
    show(['speech']);
    expect(
      screen.getByRole('gridcell', { name: 'Hamza Siddiqui, Speech at 18 months, late, 12 days late, no one' }),
    ).toBeInTheDocument();
    expect(
      screen.getByRole('gridcell', { name: 'Ela Wrońska, Speech at 18 months, open, 4 weeks left, Hana Dvořák' }),
    ).toBeInTheDocument();
  });

  test('a rolled lane says how many of each state stand in a bin', () => {
    show([]);
    expect(screen.getByRole('gridcell', { name: 'under 4 weeks late: 1 late' })).toBeInTheDocument();
    expect(screen.getByRole('rowheader', { name: 'Speech review, 2 milestones, 1 unowned' })).toHaveAttribute(
      'aria-expanded',
      'false',
    );
  });

  test('a press on a rolled bin unrolls its lane; a press on a name offers what can be done', async () => {
    const rolled = show([]);
    await userEvent.click(screen.getByRole('gridcell', { name: 'under 4 weeks late: 1 late' }));
    expect(rolled.onUnroll).toHaveBeenCalledWith('speech');
  });

  test('C claims, H hands over, Enter opens the row with the focus', async () => {
    const acts = show(['speech']);
    const cell = screen.getByRole('gridcell', { name: /^Hamza/ });
    cell.focus();
    await userEvent.keyboard('c');
    await userEvent.keyboard('h');
    await userEvent.keyboard('{Enter}');
    expect(acts.onClaim).toHaveBeenCalledWith(rows[0]);
    expect(acts.onActions).toHaveBeenCalledWith(rows[0], cell, 'hand-to');
    expect(acts.onOpen).toHaveBeenCalledWith(rows[0]);
  });

  test('Space rolls the lane of the focused row up', async () => {
    const acts = show(['speech']);
    screen.getByRole('gridcell', { name: /^Ela/ }).focus();
    await userEvent.keyboard(' ');
    expect(acts.onUnroll).toHaveBeenCalledWith('speech');
  });
});
