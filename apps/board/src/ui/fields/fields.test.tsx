import { plainDate } from '@weftway/calendar/plain-date';
import { render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { useState } from 'react';
import { expect, test, vi } from 'vitest';
import { ComboboxField } from './combobox-field.tsx';
import { DateField } from './date-field.tsx';
import { ErrorSummary } from './error-summary.tsx';
import { NumberField } from './number-field.tsx';
import { PasswordField } from './password-field.tsx';
import { TextField } from './text-field.tsx';

function DateForm({ onDate, start = '' }: { readonly onDate: (date: string) => void; readonly start?: string }) {
  const [date, setDate] = useState(start);
  const take = (next: string) => {
    setDate(next);
    onDate(next);
  };
  return <DateField label="Done on" value={date} onChange={take} birth={plainDate('2018-06-03')} />;
}

test('a typed date comes out as ISO text and shows the age on that day', async () => {
  const onDate = vi.fn();
  render(<DateForm onDate={onDate} />);
  await userEvent.type(screen.getByLabelText('Done on'), '6/10/2026');
  expect(onDate).toHaveBeenLastCalledWith('2026-10-06');
  expect(screen.getByLabelText('Done on')).toHaveAccessibleDescription('Tue 6 Oct 2026, 8 years 4 months');
  await userEvent.tab();
  expect(screen.getByLabelText('Done on')).toHaveValue('6 Oct 2026');
});

test('text that is no date is named on leaving the field', async () => {
  render(<DateForm onDate={vi.fn()} />);
  await userEvent.type(screen.getByLabelText('Done on'), '31/2/2026');
  expect(screen.queryByText(/not a date/)).not.toBeInTheDocument();
  await userEvent.tab();
  expect(screen.getByLabelText('Done on')).toBeInvalid();
  expect(screen.getByText('“31/2/2026” is not a date we can read. Write it like 6 Oct 2026.')).toBeVisible();
});

test('the arrow keys move a date by a day', async () => {
  const onDate = vi.fn();
  render(<DateForm onDate={onDate} start="2026-10-31" />);
  await userEvent.type(screen.getByLabelText('Done on'), '{ArrowUp}');
  expect(onDate).toHaveBeenLastCalledWith('2026-11-01');
});

test('what was typed as a number is never rounded or rewritten', async () => {
  function NumberForm() {
    const [gap, setGap] = useState<number | null>(null);
    return <NumberField label="Gap" unit="mm" step={0.1} value={gap} onChange={setGap} />;
  }
  render(<NumberForm />);
  const field = screen.getByLabelText('Gap');
  await userEvent.type(field, '6.20');
  expect(field).toHaveValue('6.20');
  expect(field).toHaveAccessibleDescription('mm');
  await userEvent.clear(field);
  await userEvent.type(field, '6.2.1');
  await userEvent.tab();
  expect(screen.getByText('“6.2.1” is not a number. Write it like 6.2.')).toBeVisible();
});

test('a password can be shown and hidden', async () => {
  render(<PasswordField label="Password" value="tern" onChange={vi.fn()} />);
  await userEvent.click(screen.getByRole('button', { name: 'Show the password' }));
  expect(screen.getByLabelText('Password')).toHaveAttribute('type', 'text');
  await userEvent.click(screen.getByRole('button', { name: 'Hide the password' }));
  expect(screen.getByLabelText('Password')).toHaveAttribute('type', 'password');
});

test('the summary takes the focus, counts, and leads to the field', async () => {
  render(
    <>
      <ErrorSummary errors={[{ name: 'email', message: 'Write an address.' }]} />
      <TextField label="Email" name="email" value="" onChange={vi.fn()} error="Write an address." />
    </>,
  );
  expect(screen.getByRole('alert')).toHaveFocus();
  expect(screen.getByText('One field needs another look')).toBeVisible();
  await userEvent.click(screen.getByRole('link', { name: 'Write an address.' }));
  expect(screen.getByLabelText('Email')).toHaveFocus();
  expect(screen.getByLabelText('Email')).toHaveAccessibleDescription('Write an address.');
});

test('a combobox filters while typing and chooses with Enter', async () => {
  const onChange = vi.fn();
  const options = [
    { value: '1', label: 'Ines Calder' },
    { value: '2', label: 'Obed Nkansah' },
  ];
  render(<ComboboxField label="Owner" value={null} onChange={onChange} options={options} />);
  await userEvent.type(screen.getByRole('combobox', { name: 'Owner' }), 'obe');
  expect(await screen.findAllByRole('option')).toHaveLength(1);
  await userEvent.keyboard('{ArrowDown}{Enter}');
  expect(onChange).toHaveBeenCalledWith('2');
});
