import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import { plainDate } from '@weftway/calendar/plain-date';
import type { ChildFields } from '@weftway/contract/child';
import { ConflictView } from './conflict-view.tsx';
import { differencesBetween, mergedFields } from './merge-versions.ts';

const was: ChildFields = {
  firstName: 'Amara',
  familyName: 'Okonjo',
  recordNumber: 'TE-0001',
  bornOn: plainDate('2026-10-06'),
  dueOn: null,
  isBirthEstimated: false,
  gestation: null,
  sex: 'female',
  cleft: '•••SHAL',
  isCleftProvisional: true,
  flags: [],
  syndromes: [],
  referredOn: null,
  prenatalReferralOn: null,
  teamStartOn: null,
  site: 'Tern Quay',
  leadClinicianId: null,
  contacts: [],
  alerts: [],
  notes: '',
};
const mine: ChildFields = { ...was, familyName: 'Okonjo-Bell', notes: 'By ferry' };
const theirs: ChildFields = { ...was, familyName: 'Bell', site: 'Saltmarsh' };

const show = () => {
  const onSave = vi.fn();
  const onBack = vi.fn();
  render(
    <ConflictView
      was={was}
      mine={mine}
      theirs={theirs}
      names={new Map()}
      isBusy={false}
      onSave={onSave}
      onBack={onBack}
      onLeave={() => undefined}
    />,
  );
  return { onSave, onBack };
};

describe('two versions of one record', () => {
  it('stand side by side with what was there, and only what differs', () => {
    show();
    const rows = screen.getAllByRole('row').slice(1);
    expect(rows.map((row) => within(row).getByRole('rowheader').textContent?.slice(0, 11))).toEqual([
      'Family name',
      'Siteonly th',
      'Notesonly y',
    ]);
    expect(
      within(rows[0] ?? document.body)
        .getAllByRole('cell')
        .map((cell) => cell.textContent),
    ).toEqual(['Okonjo-Bell', 'Bell', 'Okonjo']);
  });

  it('keep what only one of the two changed and ask where both did', async () => {
    const { onSave } = show();
    await userEvent.click(screen.getByRole('radio', { name: 'Theirs' }));
    await userEvent.click(screen.getByRole('button', { name: 'Save with these choices' }));
    expect(onSave).toHaveBeenCalledWith({ ...was, familyName: 'Bell', site: 'Saltmarsh', notes: 'By ferry' });
  });

  it('keep mine where both changed until something else is chosen', async () => {
    const { onBack } = show();
    await userEvent.click(screen.getByRole('button', { name: 'Go on editing with these choices' }));
    expect(onBack).toHaveBeenCalledWith({ ...was, familyName: 'Okonjo-Bell', site: 'Saltmarsh', notes: 'By ferry' });
  });

  it('lose nothing that only one side changed', () => {
    const texts = fc.record({
      firstName: fc.constantFrom('Amara', 'A', 'B'),
      notes: fc.constantFrom('', 'x', 'y'),
      site: fc.constantFrom('Tern Quay', 'S'),
    });
    fc.assert(
      fc.property(texts, texts, (a, b) => {
        const left = { ...was, ...a };
        const right = { ...was, ...b };
        const differences = differencesBetween(was, left, right);
        const merged = mergedFields({ mine: left, theirs: right }, differences, new Map());
        for (const name of ['firstName', 'notes', 'site'] as const)
          expect(merged[name]).toBe(left[name] === was[name] ? right[name] : left[name]);
      }),
    );
  });
});
