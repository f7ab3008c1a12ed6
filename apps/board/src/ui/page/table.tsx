import type { KeyboardEvent, ReactNode } from 'react';
import { Link } from 'react-router-dom';

interface TableProps {
  /** Said as the table's name; drawn nowhere. */
  readonly label: string;
  readonly head: ReactNode;
  readonly children: ReactNode;
}

/** A table that scrolls sideways in its own region; the arrow keys move from row link to row link. */
export function Table({ label, head, children }: TableProps) {
  const move = (event: KeyboardEvent<HTMLTableElement>) => {
    if (event.key !== 'ArrowDown' && event.key !== 'ArrowUp') return;
    const links = [...event.currentTarget.querySelectorAll<HTMLElement>('[data-row-link]')];
    const at = links.findIndex((link) => link === document.activeElement);
    if (at < 0) return;
    event.preventDefault();
    links[at + (event.key === 'ArrowDown' ? 1 : -1)]?.focus();
  };
  return (
    // The region can be scrolled with the keyboard only if it can be focused.
    // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex
    <div role="region" aria-label={label} tabIndex={0} className="overflow-x-auto">
      {/* eslint-disable-next-line jsx-a11y/no-noninteractive-element-interactions */}
      <table aria-label={label} onKeyDown={move} className="text-body w-full border-collapse text-left">
        <thead>
          <tr>{head}</tr>
        </thead>
        <tbody>{children}</tbody>
      </table>
    </div>
  );
}

interface ColumnHeadProps {
  readonly children: ReactNode;
  readonly kind?: 'text' | 'number';
  /** Present when the table can be sorted by this column. */
  readonly sort?: { readonly direction: 'ascending' | 'descending' | 'none'; readonly onSort: () => void } | undefined;
}

const arrows = { ascending: ' ▴', descending: ' ▾', none: '' } as const;

export function ColumnHead({ children, kind = 'text', sort }: ColumnHeadProps) {
  const align = kind === 'number' ? 'text-right' : 'text-left';
  const isSorted = sort !== undefined && sort.direction !== 'none';
  return (
    <th
      scope="col"
      aria-sort={sort?.direction}
      className={`text-fine text-ink-2 bg-paper sticky top-0 px-2 py-1.5 align-bottom first:pl-0 last:pr-0 ${align} ${isSorted ? 'font-semibold' : 'font-normal'}`}
    >
      {sort === undefined ? (
        <span className="inline-flex min-h-6 items-center">{children}</span>
      ) : (
        <button
          type="button"
          onClick={sort.onSort}
          className="inline-flex min-h-6 items-center rounded text-inherit hover:underline"
        >
          {children}
          <span aria-hidden="true">{arrows[sort.direction]}</span>
        </button>
      )}
    </th>
  );
}

export function Row({ children, isChosen = false }: { readonly children: ReactNode; readonly isChosen?: boolean }) {
  return <tr className={`border-hair border-t ${isChosen ? 'bg-indigo-wash' : 'hover:bg-linen'}`}>{children}</tr>;
}

interface CellProps {
  readonly children?: ReactNode;
  readonly kind?: 'text' | 'number' | 'head';
}

export function Cell({ children, kind = 'text' }: CellProps) {
  const look = `h-10.5 px-2 py-1 first:pl-0 last:pr-0 ${kind === 'number' ? 'figures text-right' : 'text-left'}`;
  if (kind !== 'head') return <td className={look}>{children}</td>;
  return (
    <th scope="row" className={`${look} font-normal`}>
      {children}
    </th>
  );
}

/** The link that opens what a row is about; the arrow keys reach it. */
export function RowLink({ to, children }: { readonly to: string; readonly children: ReactNode }) {
  return (
    <Link to={to} data-row-link="" className="text-ink rounded font-semibold hover:underline">
      {children}
    </Link>
  );
}
