import { render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { MemoryRouter } from 'react-router-dom';
import { expect, test, vi } from 'vitest';
import type { TrailLine } from '@weftway/contract/trail';
import { ProofNotice } from './proof-notice.tsx';
import { TrailTable } from './trail-table.tsx';

const line: TrailLine = {
  seq: 41,
  at: '2026-12-01T09:05:00.000Z',
  kind: 'child-edited',
  actorId: 'm-ruth',
  actorName: 'Ruth Alder',
  actorRole: 'Team coordinator',
  childId: 'c-1',
  childName: 'Mara Lind',
  memberId: null,
  milestone: null,
  requestId: 'r-1',
  summary: 'Record of a child changed',
  before: { fields: { site: 'Tern Quay' } },
  after: { fields: { site: 'Saltmarsh' } },
  hash: 'ab'.repeat(32),
  log: 'changes',
};

const show = (shown: TrailLine, seesContent = true, onlyChild = vi.fn()) =>
  render(
    <MemoryRouter>
      <TrailTable
        lines={[shown]}
        zone="Europe/London"
        nameOf={() => undefined}
        seesContent={seesContent}
        onlyChild={onlyChild}
      />
    </MemoryRouter>,
  );

test('a line opens to what stood before and after', async () => {
  show(line);
  expect(screen.getByText('1 Dec 2026, 09:05:00')).toBeVisible();
  await userEvent.click(screen.getByRole('button', { name: 'Show line 41: Record of a child changed' }));
  expect(screen.getByText('Tern Quay')).toBeVisible();
  expect(screen.getByText(/Saltmarsh/)).toBeVisible();
});

test('without leave to see contents there is no name and no difference', async () => {
  const onlyChild = vi.fn();
  show({ ...line, childName: null, before: null, after: null }, false, onlyChild);
  await userEvent.click(screen.getByRole('button', { name: /Show line 41/ }));
  expect(screen.getByText('The contents are for the coordinator and for those who did it.')).toBeVisible();
  await userEvent.click(screen.getByRole('button', { name: /A child/ }));
  expect(onlyChild).toHaveBeenCalledWith('c-1');
});

test('a proof says how many lines hold, or names the one that does not', () => {
  const holds = { lines: 13_227, brokenAt: null, brokenKind: null, why: null };
  const { rerender } = render(<ProofNotice proof={{ ...holds, reads: { ...holds, lines: 1 } }} />);
  expect(screen.getByRole('status')).toHaveTextContent('13,227 lines of changes and 1 line of reads were proved');
  rerender(<ProofNotice proof={{ ...holds, brokenAt: 5, why: 'Line 5 itself was altered.', reads: holds }} />);
  expect(screen.getByRole('alert')).toHaveTextContent('In the log of changes, at line 5: Line 5 itself was altered.');
});
