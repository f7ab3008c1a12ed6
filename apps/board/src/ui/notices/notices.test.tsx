import { act, render, screen } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { Loading } from './loading.tsx';
import { ProblemNotice } from './problem-notice.tsx';

describe('a problem', () => {
  test('that the rules foresee is told with its title, detail and reference', () => {
    render(
      <ProblemNotice
        problem={{ title: 'Already claimed', status: 409, detail: 'A surgeon holds it.', instance: '/requests/7F2K' }}
      />,
    );
    expect(screen.getByRole('alert')).toHaveTextContent('Already claimedA surgeon holds it.Reference 7F2K.');
  });

  test('that is a surprise never shows what the server wrote', () => {
    render(<ProblemNotice problem={{ title: 'Internal Server Error', status: 500, detail: 'SQLITE_BUSY' }} />);
    expect(screen.getByRole('alert')).not.toHaveTextContent(/SQLITE|Internal/);
  });
});

describe('loading', () => {
  beforeEach(() => void vi.useFakeTimers());
  afterEach(() => void vi.useRealTimers());

  test('shows nothing at first, then a status, then a sentence', () => {
    render(<Loading label="Loading the pathway" rows={['Surgery']} />);
    expect(screen.queryByRole('status')).not.toBeInTheDocument();
    act(() => void vi.advanceTimersByTime(300));
    expect(screen.getByRole('status')).toHaveTextContent('Loading the pathway');
    act(() => void vi.advanceTimersByTime(3_700));
    expect(screen.getByText(/Still fetching/)).toBeVisible();
  });
});
