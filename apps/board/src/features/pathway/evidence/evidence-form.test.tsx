import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { expect, test, vi } from 'vitest';
import type { Evidence } from '@weftway/contract/pathway';
import type { EvidenceField } from '@weftway/pathway/protocol';
import { builtToday, day } from '../../../testing/pathway-builders.ts';
import { fromDay } from '../model/evidence.ts';
import { DraftStatus, EvidenceForm } from './evidence-form.tsx';
import { EvidenceList } from './evidence-list.tsx';
import type { EvidenceDraft } from './use-evidence-draft.ts';

const asked: readonly EvidenceField[] = [
  { name: 'operation_date', label: 'Date of the operation', kind: 'date' },
  { name: 'technique', label: 'Technique', kind: 'text' },
  { name: 'gap_mm', label: 'Gap at the gum', kind: 'number', unit: 'mm', min: 0, max: 80, likely: [0, 20] },
  { name: 'nose_done', label: 'Nose corrected', kind: 'yes-no' },
  { name: 'hygiene', label: 'Plaque', kind: 'grade', min: 0, max: 3 },
  { name: 'root', label: 'Root of the canine', kind: 'root-stage' },
  { name: 'mood_notes', label: 'What the parents said', kind: 'long-text', isPrivate: true },
];

const birth = day('2026-01-15');

interface HeldProps {
  readonly start?: Evidence;
  readonly isAskedFor?: boolean;
  readonly over?: Partial<EvidenceDraft>;
  readonly seen?: (values: Evidence) => void;
}

function Held({ start = {}, isAskedFor = false, over = {}, seen }: HeldProps) {
  const [values, setValues] = useState(start);
  const [performedOn, setPerformedOn] = useState('');
  const take = (next: Evidence) => {
    setValues(next);
    seen?.(next);
  };
  const draft = {
    values,
    performedOn,
    day: null,
    change: (name: string, value: Evidence[string]) => take({ ...values, [name]: value }),
    changeDay: (next: string) => {
      setPerformedOn(next);
      take(fromDay(asked, values, next, performedOn, birth));
    },
    both: [],
    choose: vi.fn(),
    isMerged: false,
    ...over,
  };
  return <EvidenceForm fields={asked} draft={draft} birth={birth} today={builtToday} isAskedFor={isAskedFor} />;
}

test('every kind of field takes its value', async () => {
  const seen = vi.fn();
  render(<Held seen={seen} />);
  await userEvent.type(screen.getByLabelText('Technique'), 'Millard');
  await userEvent.type(screen.getByLabelText('Gap at the gum'), '6.2');
  await userEvent.click(
    within(screen.getByRole('group', { name: 'Nose corrected' })).getByRole('radio', { name: 'Yes' }),
  );
  await userEvent.click(screen.getByRole('radio', { name: '2 moderate' }));
  await userEvent.selectOptions(screen.getByLabelText('Root of the canine'), '1/2');
  expect(seen).toHaveBeenLastCalledWith({
    technique: { value: 'Millard' },
    gap_mm: { value: '6.2' },
    nose_done: { value: 'yes' },
    hygiene: { value: '2' },
    root: { value: '1/2' },
  });
});

test('the day on which it was done fills in the date of the operation', async () => {
  const seen = vi.fn();
  render(<Held seen={seen} />);
  await userEvent.type(screen.getByLabelText('Done on'), '2026-04-12');
  expect(seen).toHaveBeenLastCalledWith({ operation_date: { value: '2026-04-12' } });
});

test('an unlikely value asks to be confirmed, an impossible one is refused', async () => {
  const seen = vi.fn();
  render(<Held seen={seen} />);
  const gap = screen.getByLabelText('Gap at the gum');
  await userEvent.type(gap, '62');
  expect(screen.getByText(/Gap at the gum of 62 mm is unusual/)).toBeInTheDocument();
  await userEvent.click(screen.getByRole('checkbox', { name: 'Yes, it is right' }));
  expect(seen).toHaveBeenLastCalledWith({ gap_mm: { value: '62', isConfirmed: true } });
  expect(screen.queryByText(/is unusual/)).toBeNull();
  await userEvent.clear(gap);
  await userEvent.type(gap, '620');
  expect(gap).toHaveAccessibleDescription(/Gap at the gum cannot be 620 mm/);
});

test('a field is left empty with a reason', async () => {
  const seen = vi.fn();
  render(<Held seen={seen} />);
  const [leave] = screen
    .getAllByRole('button', { name: 'leave empty' })
    .filter((button) => button.getAttribute('aria-describedby') !== null)
    .slice(1);
  if (leave === undefined) throw new Error('no way to leave a field empty');
  await userEvent.click(leave);
  await userEvent.type(screen.getByLabelText(/Technique: leave empty, because/), 'not recorded');
  expect(seen).toHaveBeenLastCalledWith({ technique: { value: null, emptyBecause: 'not recorded' } });
});

test('once it is to be signed, every empty field says so', () => {
  render(<Held isAskedFor start={{ technique: { value: 'Millard' } }} />);
  expect(screen.getByText('Gap at the gum is empty. Fill it in, or say why it is empty.')).toBeInTheDocument();
  expect(screen.queryByText(/Technique is empty/)).toBeNull();
  expect(screen.getByText('Write the day on which it was done.')).toBeInTheDocument();
});

test('a field that both changed is asked about, and only that', async () => {
  const choose = vi.fn();
  render(
    <Held over={{ both: [{ name: 'technique', mine: { value: 'Millard' }, theirs: { value: 'Fisher' } }], choose }} />,
  );
  await userEvent.click(screen.getByRole('button', { name: 'Theirs: Fisher' }));
  expect(choose).toHaveBeenCalledWith('technique', { value: 'Fisher' });
});

test('says when the draft was kept', () => {
  render(<DraftStatus status="kept" keptAt="2026-04-20T11:04:00Z" />);
  expect(screen.getByRole('status')).toHaveTextContent(/Draft kept \d\d:04/);
});

test('private fields stay with those who sign', () => {
  render(<Held />);
  expect(screen.getByLabelText('What the parents said')).toHaveAccessibleDescription(
    'Kept for the people who sign this part.',
  );
});

test('the list says what is here and what is missing, and leads to the form', async () => {
  const onRecord = vi.fn();
  render(
    <EvidenceList
      fields={asked}
      values={{ technique: { value: 'Millard' }, root: { value: null, emptyBecause: 'no film' } }}
      onRecord={onRecord}
    />,
  );
  expect(screen.getByText('Technique').closest('li')).toHaveTextContent('here: Millard');
  expect(screen.getByText('Root of the canine').closest('li')).toHaveTextContent('Left empty: no film');
  await userEvent.click(screen.getByRole('button', { name: 'Record: gap at the gum' }));
  expect(onRecord).toHaveBeenCalledWith('gap_mm');
});
