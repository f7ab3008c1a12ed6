import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import { cleftPlaces, parseCleftCode, severities } from '@weftway/pathway/cleft-code';
import { CleftEntry } from './cleft-entry.tsx';
import { codeFrom, severitiesIn } from './cleft-signs.ts';

function Entry({ start = '•••••••', isReadOnly = false }: { readonly start?: string; readonly isReadOnly?: boolean }) {
  const [code, setCode] = useState(start);
  return <CleftEntry value={code} onChange={setCode} flags={[]} isReadOnly={isReadOnly} />;
}

const part = (name: string) => screen.getByRole('slider', { name });
const text = () => screen.getByRole('textbox', { name: 'Cleft code (LAHSHAL)' });

describe('the drawing of a cleft', () => {
  it('has seven parts with names and states', () => {
    render(<Entry start="l•••SHA" />);
    expect(screen.getAllByRole('slider').map((one) => one.getAttribute('aria-label'))).toEqual([
      'Right lip',
      'Right gum',
      'Right hard palate',
      'Soft palate',
      'Left hard palate',
      'Left gum',
      'Left lip',
    ]);
  });

  it('goes round whole, minimal, incomplete and complete when pressed, and writes the code', async () => {
    render(<Entry />);
    await userEvent.click(part('Left lip'));
    expect(text()).toHaveValue('••••••*');
    await userEvent.click(part('Left lip'));
    expect(text()).toHaveValue('••••••l');
    await userEvent.click(part('Left lip'));
    expect(text()).toHaveValue('••••••L');
    expect(part('Left lip')).toHaveAttribute('aria-valuetext', 'complete');
    await userEvent.click(part('Left lip'));
    expect(text()).toHaveValue('•••••••');
  });

  it('is worked with the keyboard alone', async () => {
    render(<Entry />);
    await userEvent.tab();
    expect(part('Right lip')).toHaveFocus();
    await userEvent.keyboard('{End}');
    await userEvent.tab();
    await userEvent.keyboard('{ArrowUp}{ArrowUp}');
    await userEvent.tab();
    await userEvent.keyboard('{Enter}{ }');
    expect(text()).toHaveValue('Lah••••');
    await userEvent.keyboard('{ArrowDown}');
    expect(text()).toHaveValue('La*••••');
    await userEvent.keyboard('{Home}');
    expect(text()).toHaveValue('La•••••');
  });

  it('follows what is typed, in every accepted form', async () => {
    render(<Entry />);
    await userEvent.clear(text());
    await userEvent.type(text(), '[[...SHaL]');
    expect(part('Soft palate')).toHaveAttribute('aria-valuetext', 'complete');
    expect(part('Left gum')).toHaveAttribute('aria-valuetext', 'incomplete');
    expect(part('Right lip')).toHaveAttribute('aria-valuetext', 'whole');
    expect(screen.getByText(/Left cleft of lip, gum and palate/)).toBeInTheDocument();
    expect(screen.getByText(/Q37\.5/)).toBeInTheDocument();
  });

  it('names the place that cannot be read', async () => {
    render(<Entry />);
    await userEvent.clear(text());
    await userEvent.type(text(), 'LXHS...');
    expect(screen.getByText('Place 2 is the right gum: A, a, * or •, not X.')).toBeInTheDocument();
  });

  it('warns of a rare pattern and lets it stand', async () => {
    render(<Entry />);
    await userEvent.click(part('Right gum'));
    expect(screen.getByText(/The right gum is cleft and the right lip whole/)).toBeInTheDocument();
  });

  it('can be looked at without being changed', () => {
    render(<Entry start="LAHSHAL" isReadOnly />);
    expect(screen.queryByRole('slider')).toBeNull();
    expect(screen.getByRole('group', { name: 'Drawing of lip, gum and palate' })).toBeInTheDocument();
  });

  it('reads back whatever it writes', () => {
    fc.assert(
      fc.property(fc.tuple(...cleftPlaces.map(() => fc.constantFrom(...severities))), (shown) => {
        const code = codeFrom(shown);
        expect(parseCleftCode(code)).toEqual({ ok: true, code });
        expect(severitiesIn(code)).toEqual(shown);
      }),
    );
  });
});
