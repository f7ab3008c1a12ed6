import { render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { MemoryRouter } from 'react-router-dom';
import { expect, test, vi } from 'vitest';
import { Cell, ColumnHead, Row, RowLink, Table } from './table.tsx';

function draw(onSort = vi.fn()) {
  render(
    <MemoryRouter>
      <Table label="Children" head={<ColumnHead sort={{ direction: 'ascending', onSort }}>Name</ColumnHead>}>
        {['Tomasz', 'Amara'].map((name) => (
          <Row key={name}>
            <Cell kind="head">
              <RowLink to={`/children/${name}`}>{name}</RowLink>
            </Cell>
          </Row>
        ))}
      </Table>
    </MemoryRouter>,
  );
}

test('the arrow keys go from row to row', async () => {
  draw();
  screen.getByRole('link', { name: 'Tomasz' }).focus();
  await userEvent.keyboard('{ArrowDown}');
  expect(screen.getByRole('link', { name: 'Amara' })).toHaveFocus();
  await userEvent.keyboard('{ArrowDown}{ArrowUp}');
  expect(screen.getByRole('link', { name: 'Tomasz' })).toHaveFocus();
});

test('a sorted column says so and can be sorted again', async () => {
  const onSort = vi.fn();
  draw(onSort);
  expect(screen.getByRole('columnheader', { name: /Name/ })).toHaveAttribute('aria-sort', 'ascending');
  await userEvent.click(screen.getByRole('button', { name: 'Name' }));
  expect(onSort).toHaveBeenCalledOnce();
});
