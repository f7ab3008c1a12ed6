import { milestoneStateNames, milestoneStates } from '@weftway/pathway/milestone-state';
import { render, screen } from '@testing-library/react';
import { expect, test } from 'vitest';
import { Mark } from './mark.tsx';

test.each(milestoneStates)('the mark of %s is called by the state', (state) => {
  render(<Mark state={state} />);
  expect(screen.getByRole('img', { name: milestoneStateNames[state] })).toBeInTheDocument();
});

test('a loose end is said after the state and makes the drawing taller', () => {
  render(<Mark state="late" unowned size={16} />);
  expect(screen.getByRole('img', { name: 'Late, unowned' })).toHaveAttribute('height', '25');
});

test('a mark beside its own word is silent', () => {
  render(<Mark state="open" title={null} />);
  expect(screen.queryByRole('img')).not.toBeInTheDocument();
});
