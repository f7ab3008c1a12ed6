import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { expect, test, vi } from 'vitest';
import { ApiProblem } from '../../../api/api-client.ts';
import { SignDialog } from './sign-dialog.tsx';
import type { SigningSheet } from './signing-sheet.ts';

const sheet = (over: Partial<SigningSheet> = {}): SigningSheet => ({
  sentence: 'I did “Lip repair” for Amara Okoye on 12 May 2026.',
  meaning: 'performed',
  signAs: 'Obed Nkansah, Cleft surgeon',
  digest: 'abc',
  evidence: [{ name: 'technique', label: 'Technique', text: 'Rotation and advancement' }],
  refusals: [],
  overridable: [],
  ...over,
});

const titles: Readonly<Record<string, string>> = { 'CARE-04:SURG-01': 'Fitness check', 'MOLD-06': 'Molding complete' };

const show = (of: { readonly sheet?: SigningSheet; readonly error?: unknown; readonly isChanged?: boolean } = {}) => {
  const onSign = vi.fn();
  const onClose = vi.fn();
  render(
    <SignDialog
      sheet={of.sheet ?? sheet()}
      signer="Obed Nkansah"
      colleagues={[{ value: 'Wen Zhao', label: 'Wen Zhao', detail: 'Paediatrician' }]}
      titleOf={(key) => titles[key] ?? key}
      isBusy={false}
      error={of.error ?? null}
      isChanged={of.isChanged ?? false}
      onClose={onClose}
      onSign={onSign}
    />,
  );
  return { onSign, onClose };
};

const signButton = () => screen.getByRole('button', { name: 'Sign as Obed Nkansah' });

test('repeats what is signed, its evidence and its meaning, and signs with the password', async () => {
  const { onSign } = show();
  expect(screen.getByRole('dialog', { name: 'Sign off' })).toHaveTextContent(
    'I did “Lip repair” for Amara Okoye on 12 May 2026.',
  );
  expect(screen.getByText('Rotation and advancement')).toBeInTheDocument();
  expect(screen.getByText(/I performed this, or was responsible for it. A signature is final/)).toBeInTheDocument();
  await userEvent.type(screen.getByLabelText('Your password'), 'a quiet tide');
  await userEvent.click(signButton());
  expect(onSign).toHaveBeenCalledWith({ password: 'a quiet tide', overrides: [] });
});

test('without a password nothing is signed, and the field says so', async () => {
  const { onSign } = show();
  await userEvent.click(signButton());
  expect(screen.getByText('Write your password.')).toBeInTheDocument();
  expect(onSign).not.toHaveBeenCalled();
});

test('a check that was not met takes a reason and, where the protocol asks, a second name', async () => {
  const { onSign } = show({
    sheet: sheet({
      overridable: [{ check: 'CARE-04:SURG-01', text: 'CARE-04:SURG-01: not signed', needsSecondName: true }],
    }),
  });
  expect(screen.getByText('Fitness check: not signed')).toBeInTheDocument();
  await userEvent.type(screen.getByLabelText('Your password'), 'a quiet tide');
  await userEvent.click(signButton());
  expect(onSign).not.toHaveBeenCalled();
  await userEvent.type(screen.getByLabelText('Why it was done without it'), 'Emergency');
  await userEvent.type(screen.getByRole('combobox', { name: /Second clinician/ }), 'Wen');
  await userEvent.click(screen.getByRole('option', { name: /Wen Zhao/ }));
  await userEvent.click(signButton());
  expect(onSign).toHaveBeenCalledWith({
    password: 'a quiet tide',
    overrides: [{ check: 'CARE-04:SURG-01', reason: 'Emergency', secondName: 'Wen Zhao' }],
  });
});

test('a value that needs a second clinician asks for the name', () => {
  show({
    sheet: sheet({
      refusals: [
        {
          code: 'second-name-needed',
          field: 'position_needed',
          text: 'Position: prone. A second clinician must stand by this.',
        },
      ],
    }),
  });
  expect(screen.getByRole('combobox', { name: /Second clinician/ })).toBeInTheDocument();
  expect(screen.queryByText('It cannot be signed yet')).toBeNull();
});

test('what stands in the way is said by title, and nothing is sent', async () => {
  const { onSign } = show({
    sheet: sheet({ refusals: [{ code: 'gate-unmet', field: null, text: 'MOLD-06 must come first (not signed).' }] }),
  });
  expect(screen.getByText('Molding complete must come first (not signed).')).toBeInTheDocument();
  await userEvent.type(screen.getByLabelText('Your password'), 'a quiet tide');
  await userEvent.click(signButton());
  expect(onSign).not.toHaveBeenCalled();
});

test('a wrong password is said at its field', () => {
  show({
    error: new ApiProblem({ type: '/problems/wrong-password', title: 'That is not your password', status: 403 }),
  });
  expect(screen.getByLabelText('Your password')).toHaveAccessibleDescription(/That is not your password/);
});

test('a record that changed meanwhile is to be read again', () => {
  show({ isChanged: true });
  expect(screen.getByRole('alert')).toHaveTextContent('has changed meanwhile. Read it again before you sign.');
});
