import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router-dom';
import { describe, expect, test, vi } from 'vitest';
import type { MyWork, WorkItem } from '@weftway/contract/board';
import { WorkList } from './work-list.tsx';
import { sumOf, timeLeft } from './work-rows.ts';

const item = (change: Partial<WorkItem>): WorkItem => ({
  childId: 'c-1',
  childName: 'Jonas Ekdal',
  bornOn: '2018-05-01',
  milestone: 'ORTH-03',
  title: 'Arch widening',
  part: 'milestone',
  lane: 'orthodontics-and-graft',
  state: 'late',
  isDue: false,
  isUnowned: false,
  ownerName: 'Ines Calder',
  window: { earliest: '2026-05-01', target: '2026-08-01', latest: '2026-11-19', closing: '2026-10-20' },
  daysLeft: -12,
  standsInTheWay: 'Turn count to enter',
  note: '',
  ...change,
});

const nothing: MyWork = {
  today: '2026-12-01',
  cameBack: [],
  doNow: [],
  toSign: [],
  drafted: [],
  waiting: [],
  covers: [],
  late: [],
  looseEnds: [],
  totals: { cameBack: 0, doNow: 0, toSign: 0, drafted: 0, waiting: 0, covers: 0, late: 0, looseEnds: 0 },
};
const show = (work: Partial<MyWork>, onClaim = vi.fn()) => {
  render(
    <MemoryRouter>
      <WorkList work={{ ...nothing, ...work }} onClaim={onClaim} />
    </MemoryRouter>,
  );
  return onClaim;
};

describe('my work', () => {
  test('a row tells time left, child and age, state, and what stands in the way', () => {
    show({ doNow: [item({})] });
    const row = within(screen.getByRole('region', { name: 'Do now' })).getByRole('listitem');
    expect(row).toHaveTextContent('12 days late');
    expect(row).toHaveTextContent('Jonas Ekdal 8 y');
    expect(within(row).getByRole('img', { name: 'Late' })).toBeInTheDocument();
    expect(row).toHaveTextContent('Turn count to enter');
  });

  test('empty groups that matter say so in one sentence, others are left out', () => {
    show({});
    expect(screen.getByText('Every milestone in your lanes has an owner.')).toBeInTheDocument();
    expect(screen.queryByRole('region', { name: 'Work you cover' })).toBeNull();
  });

  test('work that I cover is labelled with whose it is', () => {
    show({ covers: [item({ note: 'Ines Calder’s work, which you cover until 4 Dec 2026' })] });
    expect(screen.getByRole('region', { name: 'Work you cover' })).toHaveTextContent(
      'Ines Calder’s work, which you cover until 4 Dec 2026',
    );
  });

  test('a loose end can be claimed on the spot', async () => {
    const loose = item({ isUnowned: true, ownerName: null, daysLeft: 21, state: 'closing' });
    const onClaim = show({ looseEnds: [loose] });
    await userEvent.click(screen.getByRole('button', { name: 'Claim: Arch widening, Jonas Ekdal' }));
    expect(onClaim).toHaveBeenCalledWith(loose);
  });

  test('a long group shows its first rows and all of them when asked', async () => {
    const many = Array.from({ length: 15 }, (_unused, at) => item({ childId: `c-${String(at)}` }));
    show({ waiting: many });
    const group = screen.getByRole('region', { name: 'Waiting for others' });
    expect(within(group).getAllByRole('listitem')).toHaveLength(8);
    await userEvent.click(within(group).getByRole('button', { name: 'Show all 15' }));
    expect(within(group).getAllByRole('listitem')).toHaveLength(15);
  });

  test.each([
    [-12, '12', 'days late'],
    [9, '9', 'days'],
    [63, '9', 'weeks'],
    [548, '18', 'months'],
    [0, '', 'today'],
  ])('%i days read as %s %s', (daysLeft, number, unit) => {
    expect(timeLeft(item({ daysLeft }))).toMatchObject({ number, unit });
  });

  test('the head sums up what is late, closing and to be signed', () => {
    expect(sumOf(nothing)).toBe('Nothing of yours is late or closing.');
    expect(sumOf({ ...nothing, doNow: [item({}), item({ state: 'closing' })] })).toBe(
      'Of your milestones 1 is late and 1 is closing.',
    );
  });
});
