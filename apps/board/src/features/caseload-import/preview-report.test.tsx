import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import type { ImportPreview } from '@weftway/contract/caseload-import';
import { PreviewReport } from './preview-report.tsx';
import { readTextBytes } from './read-text-file.ts';

const clean: ImportPreview = {
  id: 'i1',
  fileName: 'a.csv',
  rows: 2,
  added: 1,
  updated: 1,
  unchanged: 0,
  faultCount: 0,
  warningCount: 0,
  faults: [],
  sample: [
    { row: 2, name: 'Amara Okonjo', recordNumber: 'TE-1', bornOn: '2024-03-18', cleft: '•••SHAL', action: 'add' },
  ],
  status: 'previewed',
};
const faulty: ImportPreview = {
  ...clean,
  faultCount: 1,
  warningCount: 1,
  faults: [
    { row: 3, column: 'cleft', value: 'LXHS...', message: 'Place 2 is the right gum.', severity: 'fault' },
    { row: 2, column: 'first_name', value: '=1+1', message: 'This looks like a formula.', severity: 'warning' },
  ],
};

const show = (preview: ImportPreview, isStale = false) => {
  const onAccept = vi.fn();
  render(<PreviewReport preview={preview} isStale={isStale} isBusy={false} onAccept={onAccept} />);
  return onAccept;
};

describe('the report of a file', () => {
  it('offers to take a good file in', async () => {
    const onAccept = show(clean);
    await userEvent.click(screen.getByRole('button', { name: 'Take in 2 children' }));
    expect(onAccept).toHaveBeenCalled();
    expect(screen.getByText('18 Mar 2024')).toBeInTheDocument();
  });

  it('lists each problem and does not take a file with faults', async () => {
    const onAccept = show(faulty);
    const button = screen.getByRole('button', { name: 'Take in 2 children' });
    expect(button).toHaveAccessibleDescription('The file still has faults.');
    await userEvent.click(button);
    expect(onAccept).not.toHaveBeenCalled();
    await userEvent.click(screen.getByRole('radio', { name: /Faults/ }));
    expect(screen.getByText('LXHS...')).toBeInTheDocument();
    expect(screen.queryByText('=1+1')).toBeNull();
  });

  it('asks for a new check when another file was chosen', () => {
    show(clean, true);
    expect(screen.getByRole('button', { name: 'Take in 2 children' })).toHaveAccessibleDescription(/Check it first/);
  });

  it('says when there is nothing to do', () => {
    show({ ...clean, added: 0, updated: 0, unchanged: 2 });
    expect(screen.queryByRole('button', { name: /Take in/ })).toBeNull();
    expect(screen.getByText(/There is nothing to take in/)).toBeInTheDocument();
  });
});

describe('bytes of a file', () => {
  const read = (...bytes: number[]) => readTextBytes(new Uint8Array(bytes));

  it('are read as UTF-8, by their mark, or as a Windows code page that is named', () => {
    expect(read(0xc5, 0x81)).toEqual({ text: 'Ł', otherEncoding: null });
    expect(read(0xef, 0xbb, 0xbf, 0x61)).toEqual({ text: 'a', otherEncoding: null });
    expect(read(0xff, 0xfe, 0x41, 0x01)).toEqual({ text: 'Ł', otherEncoding: 'UTF-16LE' });
    expect(read(0x4a, 0x6f, 0x73, 0xe9)).toEqual({ text: 'José', otherEncoding: 'Windows-1252' });
  });
});
