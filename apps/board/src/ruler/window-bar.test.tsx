import { addDays } from '@weftway/calendar/plain-date';
import { render, screen } from '@testing-library/react';
import { expect, test } from 'vitest';
import { rulerToday, rulerWindow } from '../testing/ruler-builders.ts';
import { barPositions } from './layout/bar-positions.ts';
import { WindowBar } from './window-bar.tsx';
import { WeeksAxis } from './weeks-axis.tsx';

test('a bar says its state and its dates', () => {
  render(<WindowBar state="waiting" window={rulerWindow(99, 117)} today={rulerToday} />);
  expect(screen.getByRole('img', { name: 'Waiting, 3 Sep 2026 to 3 Mar 2028' })).toBeInTheDocument();
});

test('on the scale of weeks a bar is cut where the axis ends', () => {
  const window = {
    earliest: addDays(rulerToday, -80),
    target: rulerToday,
    latest: addDays(rulerToday, 21),
    closing: addDays(rulerToday, 7),
  };
  const at = barPositions({ window, today: rulerToday, scale: 'weeks', width: 400 });
  expect(at).toMatchObject({ left: 0, today: 100, isCutLeft: true, isCutRight: false });
  expect(at.right).toBeCloseTo(180);
});

test('on its own scale today and both dates are inside', () => {
  const window = rulerWindow(190, 228);
  const at = barPositions({ window, today: rulerToday, scale: 'own', width: 400 });
  expect(at.today).toBeCloseTo(48);
  expect(at.right).toBeCloseTo(352);
  expect(at.left).toBeGreaterThan(at.today);
});

test('the head of the weeks is decoration', () => {
  render(<WeeksAxis />);
  expect(screen.queryByRole('img')).not.toBeInTheDocument();
  expect(screen.getByText('6 months')).toBeInTheDocument();
});
