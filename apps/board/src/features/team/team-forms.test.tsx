import { screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { Member } from '@weftway/contract/member';
import { draw } from '../../testing/draw.tsx';
import { fakeServer, problemBody } from '../../testing/fake-server.ts';
import type { OpenClaim, OpenWorkOf } from './hand-over-choices.ts';
import { EditMemberForm } from './edit-member-form.tsx';
import { InviteDialog } from './invite-dialog.tsx';
import { LeaveDialog } from './leave-dialog.tsx';

afterEach(() => vi.unstubAllGlobals());

const member = (id: string, name: string, more: Partial<Member> = {}): Member => ({
  id,
  name,
  email: `${id}@tern.example`,
  standing: 'member',
  disciplines: ['surgeon'],
  supervisorId: null,
  status: 'active',
  version: 3,
  invitedAt: null,
  leftOn: null,
  cover: null,
  openClaims: 0,
  ...more,
});
const obed = member('obed', 'Obed Nkansah');
const mireille = member('mireille', 'Mireille Aubert');
const fergus = member('fergus', 'Fergus Boyle', { disciplines: ['nurse'] });
const everyone = [obed, mireille, fergus];
const claim = (childName: string, title: string): OpenClaim => ({
  childId: childName,
  childName,
  milestone: 'SURG-01',
  part: 'milestone',
  title,
  state: 'open',
  latest: null,
  mayHold: ['obed'],
  mayHoldAsLead: [],
});

const workOf = (claims: readonly OpenClaim[], leads = 0): OpenWorkOf => ({
  claims: [...claims],
  leads,
  mayLead: ['obed'],
});

describe('inviting', () => {
  it('a trainee is asked for a supervisor of the same discipline, and nobody else is offered', async () => {
    draw(<InviteDialog everyone={everyone} onClose={() => undefined} />);
    expect(screen.queryByLabelText('Supervisor')).toBeNull();
    await userEvent.click(screen.getByRole('radio', { name: /Trainee/ }));
    await userEvent.click(screen.getByRole('checkbox', { name: 'Cleft nurse' }));
    expect(
      within(screen.getByLabelText('Supervisor'))
        .getAllByRole('option')
        .map(({ textContent }) => textContent),
    ).toEqual(['Choose one', 'Fergus Boyle']);
  });

  it('sends once with a key; a taken address is said at the field and the dialog stays', async () => {
    const server = fakeServer({
      'POST /members': {
        status: 409,
        body: problemBody('duplicate-record', 409, {
          errors: [{ pointer: '/email', detail: 'This is the address of Obed Nkansah.' }],
        }),
      },
    });
    const onClose = vi.fn();
    draw(<InviteDialog everyone={everyone} onClose={onClose} />);
    await userEvent.type(screen.getByLabelText('Name'), 'Ann Pell');
    await userEvent.type(screen.getByLabelText('E-mail'), 'obed@tern.example');
    await userEvent.click(screen.getByRole('checkbox', { name: 'Cleft nurse' }));
    await userEvent.click(screen.getByRole('button', { name: 'Send the invitation' }));
    await vi.waitFor(() =>
      expect(screen.getByLabelText('E-mail')).toHaveAccessibleDescription('This is the address of Obed Nkansah.'),
    );
    expect(screen.getByLabelText('Name')).toHaveValue('Ann Pell');
    expect(onClose).not.toHaveBeenCalled();
    expect(server.asked[0]?.headers.get('idempotency-key')).toMatch(/^[\w-]{36}$/);
    expect(server.asked[0]?.body).toEqual({
      name: 'Ann Pell',
      email: 'obed@tern.example',
      standing: 'member',
      disciplines: ['nurse'],
      supervisorId: null,
    });
  });

  it('an empty form is refused at its fields without asking the server', async () => {
    const server = fakeServer({});
    draw(<InviteDialog everyone={everyone} onClose={() => undefined} />);
    await userEvent.click(screen.getByRole('button', { name: 'Send the invitation' }));
    expect(await screen.findByText('Write a name.')).toBeVisible();
    expect(server.asked).toEqual([]);
  });
});

describe('changing', () => {
  it('when somebody was faster, both stand side by side and mine can be saved over it', async () => {
    const theirs = { ...obed, name: 'Obed K. Nkansah', version: 4 };
    let tries = 0;
    const server = fakeServer({
      'PATCH /members/obed': () => {
        tries += 1;
        return tries === 1
          ? { status: 412, body: problemBody('changed-meanwhile', 412, { current: theirs }) }
          : { body: theirs };
      },
    });
    const onClose = vi.fn();
    draw(<EditMemberForm member={obed} everyone={everyone} onClose={onClose} />);
    await userEvent.clear(screen.getByLabelText('Name'));
    await userEvent.type(screen.getByLabelText('Name'), 'O. Nkansah');
    await userEvent.click(screen.getByRole('button', { name: 'Save the changes' }));
    expect(await screen.findByText('Obed K. Nkansah')).toBeVisible();
    expect(screen.getByText('O. Nkansah')).toBeVisible();
    await userEvent.click(screen.getByRole('button', { name: 'Save mine over it' }));
    await vi.waitFor(() => expect(onClose).toHaveBeenCalledOnce());
    expect(server.asked.map(({ headers }) => headers.get('if-match'))).toEqual(['"3"', '"4"']);
  });
});

describe('leaving', () => {
  const claims = [claim('Amara Okoye', 'Lip repair'), claim('Tomasz Bielak', 'Palate repair')];

  it('waits until every milestone has a colleague or is let go, then is one act', async () => {
    const server = fakeServer({ 'POST /members/mireille/leaving': { body: { ...mireille, status: 'left' } } });
    const onClose = vi.fn();
    draw(<LeaveDialog member={mireille} work={workOf(claims)} everyone={everyone} onClose={onClose} />);
    const close = screen.getByRole('button', { name: 'Close the account' });
    expect(close).toHaveAccessibleDescription('2 milestones still need a colleague, or to be let go.');
    await userEvent.selectOptions(screen.getByLabelText('To'), 'Obed Nkansah');
    await userEvent.click(screen.getByRole('button', { name: 'Give' }));
    expect(screen.getByText('2 now go to Obed Nkansah.')).toBeVisible();
    await userEvent.selectOptions(screen.getByLabelText('Goes to: Palate repair, Tomasz Bielak'), 'Nobody: let it go');
    await userEvent.type(screen.getByLabelText('Reason'), 'Moves away');
    await userEvent.click(close);
    await vi.waitFor(() => expect(onClose).toHaveBeenCalledOnce());
    expect(server.asked[0]?.body).toMatchObject({ reason: 'Moves away', items: [{ to: 'obed' }, { to: null }] });
  });

  it('of a lead clinician asks who leads from now on, and lets the new lead hold what only a lead may', async () => {
    const server = fakeServer({ 'POST /members/mireille/leaving': { body: { ...mireille, status: 'left' } } });
    const agreed = { ...claim('Amara Okoye', 'Content agreed'), mayHold: [], mayHoldAsLead: ['obed'] };
    const onClose = vi.fn();
    draw(<LeaveDialog member={mireille} work={workOf([agreed], 4)} everyone={everyone} onClose={onClose} />);
    const close = screen.getByRole('button', { name: 'Close the account' });
    expect(close).toHaveAccessibleDescription('Choose who leads these children from now on.');
    await userEvent.selectOptions(screen.getByLabelText('Lead clinician of 4 children from now on'), 'Obed Nkansah');
    await userEvent.selectOptions(screen.getByLabelText('Goes to: Content agreed, Amara Okoye'), 'Obed Nkansah');
    await userEvent.type(screen.getByLabelText('Reason'), 'Moves away');
    await userEvent.click(close);
    await vi.waitFor(() => expect(onClose).toHaveBeenCalledOnce());
    expect(server.asked[0]?.body).toMatchObject({ leadTo: 'obed', items: [{ to: 'obed' }] });
  });

  it('of a supervisor says whose trainees come first', () => {
    const trainee = member('pavel', 'Pavel Novák', { standing: 'trainee', supervisorId: 'mireille' });
    draw(
      <LeaveDialog member={mireille} work={workOf([])} everyone={[...everyone, trainee]} onClose={() => undefined} />,
    );
    expect(screen.getByRole('link', { name: 'Pavel Novák' })).toHaveAttribute('href', '/team/pavel');
    expect(screen.queryByRole('button', { name: 'Close the account' })).toBeNull();
  });

  it('a fault of one row stands at that row and no choice is lost', async () => {
    fakeServer({
      'POST /members/mireille/leaving': {
        status: 400,
        body: problemBody('bad-input', 400, {
          errors: [
            { pointer: '/items/1/to', detail: 'Obed Nkansah may not hold this.' },
            { pointer: '/reason', detail: 'Say why.' },
          ],
        }),
      },
    });
    draw(<LeaveDialog member={mireille} work={workOf(claims)} everyone={everyone} onClose={() => undefined} />);
    await userEvent.selectOptions(screen.getByLabelText('To'), 'Obed Nkansah');
    await userEvent.click(screen.getByRole('button', { name: 'Give' }));
    await userEvent.click(screen.getByRole('button', { name: 'Close the account' }));
    await vi.waitFor(() =>
      expect(screen.getByLabelText('Goes to: Palate repair, Tomasz Bielak')).toHaveAccessibleDescription(
        'Obed Nkansah may not hold this.',
      ),
    );
    expect(screen.getByLabelText('Reason')).toHaveAccessibleDescription(/Say why\./);
    expect(screen.getByLabelText('Goes to: Lip repair, Amara Okoye')).toHaveValue('obed');
  });
});
