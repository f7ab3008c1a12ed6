import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { plainDate } from '@weftway/calendar/plain-date';
import type { ChildFields } from '@weftway/contract/child';
import { ChildForm, type FormReach } from './child-form.tsx';
import { blankChildForm, formOf, readChildForm, type ChildFormValues, type ChildKind } from './child-form-values.ts';

const today = plainDate('2026-12-01');
const everything: FormReach = { mayIdentity: true, mayCleft: true, mayConfirm: true };

const amara: ChildFields = {
  firstName: 'Amara',
  familyName: 'Okonjo',
  recordNumber: 'TE-0001',
  bornOn: plainDate('2026-10-06'),
  dueOn: null,
  isBirthEstimated: false,
  gestation: { weeks: 39, days: 2 },
  sex: 'female',
  cleft: '•••SHAL',
  isCleftProvisional: true,
  flags: ['robin'],
  syndromes: ['Stickler', '22q11'],
  referredOn: plainDate('2026-10-07'),
  prenatalReferralOn: null,
  teamStartOn: null,
  site: 'Tern Quay',
  leadClinicianId: 's1',
  contacts: [
    {
      name: 'Ada',
      relation: 'mother',
      phone: '01632 960417',
      email: '',
      language: 'Igbo',
      needsInterpreter: true,
      mayConsent: true,
    },
  ],
  alerts: [{ kind: 'latex', text: 'Latex' }],
  notes: 'By ferry\nin winter',
};

const show = (
  more: {
    readonly start?: ChildFormValues;
    readonly reach?: FormReach;
    readonly kind?: ChildKind;
    readonly refusals?: readonly { name: string; message: string }[];
  } = {},
) => {
  const onSend = vi.fn();
  render(
    <ChildForm
      start={more.start ?? blankChildForm('Tern Quay')}
      reach={more.reach ?? everything}
      choices={{ sites: ['Tern Quay'], leads: [{ id: 's1', name: 'Obed Nkansah' }] }}
      today={today}
      kind={more.kind ?? 'born'}
      sendLabel="Add to the list"
      isBusy={false}
      refusals={more.refusals ?? []}
      renderCleft={({ value, onChange }) => (
        <input aria-label="code" value={value} onChange={(event) => onChange(event.target.value)} />
      )}
      onSend={onSend}
      leave={null}
    />,
  );
  return onSend;
};
const send = () => userEvent.click(screen.getByRole('button', { name: 'Add to the list' }));
/** Pasted at the end in one go: letter by letter is slow with so many fields. */
const fill = async (label: RegExp | string, text: string) => {
  await userEvent.click(screen.getByRole('textbox', { name: label }));
  await userEvent.paste(text);
};

describe('the form and the record', () => {
  it('give each other back', () => {
    expect(readChildForm(formOf(amara), today, 'any')).toEqual({ kind: 'fields', fields: amara });
  });
});

describe('the form of a child', () => {
  it('sends what was typed as the record', async () => {
    const onSend = show();
    await fill('First name', 'Tomasz');
    await fill('Family name', 'Bielak');
    await fill('Record number', 'TE');
    await fill('Birth date', '6/10/2026');
    await send();
    expect(await screen.findByRole('alert')).toHaveTextContent('One field needs another look');
    await fill('Record number', '-900');
    await send();
    expect(onSend).toHaveBeenCalledWith(
      expect.objectContaining({
        firstName: 'Tomasz',
        recordNumber: 'TE-900',
        bornOn: '2026-10-06',
        dueOn: null,
        gestation: null,
        site: 'Tern Quay',
      }),
    );
  });

  it('counts the mistakes above and leads to each', async () => {
    const onSend = show();
    await send();
    const summary = await screen.findByRole('alert');
    expect(within(summary).getAllByRole('link').length).toBeGreaterThan(3);
    await userEvent.click(within(summary).getByRole('link', { name: 'Write a first name.' }));
    expect(screen.getByRole('textbox', { name: 'First name' })).toHaveFocus();
    expect(onSend).not.toHaveBeenCalled();
  });

  it('asks for the expected date alone when the child is not born', async () => {
    const onSend = show({ kind: 'expected' });
    expect(screen.queryByRole('textbox', { name: /Birth date/ })).toBeNull();
    await fill('First name', 'Baby');
    await fill('Family name', 'Bielak');
    await fill('Record number', 'TE-901');
    await send();
    expect(await screen.findByRole('link', { name: 'Write the expected date.' })).toBeInTheDocument();
    await fill('Expected date', '1 Feb 2027');
    await send();
    expect(onSend).toHaveBeenCalledWith(expect.objectContaining({ bornOn: null, dueOn: '2027-02-01' }));
  });

  it('asks again before it sends an unlikely gestation, and then lets it through', async () => {
    const onSend = show({ start: formOf({ ...amara, gestation: { weeks: 21, days: 0 } }) });
    await send();
    expect(await screen.findByText(/Born at 21 weeks is very unusual/)).toBeInTheDocument();
    expect(onSend).not.toHaveBeenCalled();
    await userEvent.click(screen.getByRole('checkbox', { name: 'This is right' }));
    await send();
    expect(onSend).toHaveBeenCalled();
  });

  it('adds contacts and points at a wrong e-mail', async () => {
    show({ start: formOf({ ...amara, contacts: [] }) });
    await userEvent.click(screen.getByRole('button', { name: 'Add a contact' }));
    const contact = screen.getByRole('group', { name: 'Contact 1' });
    await userEvent.type(within(contact).getByRole('textbox', { name: 'Name' }), 'Ada');
    await userEvent.type(within(contact).getByRole('textbox', { name: /E-mail/ }), 'ada@');
    await userEvent.tab();
    expect(await within(contact).findByText(/Write a whole e-mail address/)).toBeInTheDocument();
  });

  it('shows what the server refused at its field', async () => {
    show({
      start: formOf(amara),
      refusals: [{ name: 'recordNumber', message: 'Another child has this record number.' }],
    });
    expect(screen.getByRole('textbox', { name: 'Record number' })).toHaveAccessibleDescription(
      /Another child has this record number/,
    );
  });

  it('keeps identity closed to those who edit the cleft only', () => {
    show({ start: formOf(amara), reach: { mayIdentity: false, mayCleft: true, mayConfirm: true }, kind: 'any' });
    expect(screen.getByRole('textbox', { name: 'First name' })).toHaveAttribute('readonly');
    expect(screen.queryByRole('button', { name: 'Add a contact' })).toBeNull();
  });
});
