import { render, screen } from '@testing-library/react';
import { MemoryRouter } from 'react-router-dom';
import { expect, test } from 'vitest';
import type { ChildFields } from '@weftway/contract/child';
import { builtToday, day, pathway } from '../../../testing/pathway-builders.ts';
import { ChildHead } from './child-head.tsx';

const show = (
  fields: Partial<ChildFields> = {},
  over: { readonly transferredOn?: string; readonly leadName?: string | null } = {},
) => {
  const { child } = pathway({ fields });
  render(
    <MemoryRouter initialEntries={['/children/c-1']}>
      <ChildHead
        child={{ ...child, transferredOn: over.transferredOn === undefined ? null : day(over.transferredOn) }}
        today={builtToday}
        leadName={over.leadName === undefined ? 'Obed Nkansah' : over.leadName}
      />
    </MemoryRouter>,
  );
};

test('the head is a sentence: alerts first, cleft in words with its code, who comes, who leads', () => {
  show();
  expect(screen.getByRole('heading', { level: 1, name: 'Amara Okoye' })).toBeInTheDocument();
  expect(screen.getByText('13 weeks')).toBeInTheDocument();
  const head = screen.getByRole('banner').textContent ?? '';
  expect(head.indexOf('Latex allergy')).toBeLessThan(head.indexOf('Left cleft of lip, gum and palate, complete'));
  expect(head).toContain('(LAHSHAL •••SHAL)');
  expect(head).toContain('Igbo at home. Comes with Chidi Okoye (father), who needs an interpreter.');
  expect(head).toContain('Lead clinician Obed Nkansah, site Tern Quay.');
  expect(screen.getByRole('link', { name: 'Pathway' })).toHaveAttribute('aria-current', 'page');
});

test('an expected child and a child without a lead say so', () => {
  show({ bornOn: null, dueOn: day('2026-06-01'), cleft: '' }, { leadName: null });
  expect(screen.getByText('not born yet, expected 1 Jun 2026')).toBeInTheDocument();
  expect(screen.getByText('Cleft not coded yet')).toBeInTheDocument();
  expect(screen.getByRole('banner')).toHaveTextContent('No lead clinician yet');
});

test('a child whose care has moved says that the path is frozen', () => {
  show({}, { transferredOn: '2026-03-01' });
  expect(screen.getByRole('status')).toHaveTextContent('Care moved to another team on 1 Mar 2026');
});
