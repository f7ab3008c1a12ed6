import { useEffect, useState, type ReactNode } from 'react';
import { Link, NavLink, useLocation } from 'react-router-dom';
import { Logo } from '../../marks/logo.tsx';
import { kitWords } from '../../words/kit.ts';
import { CloseIcon, MenuIcon } from '../icons.tsx';
import { Selvedge } from './selvedge.tsx';

export interface Place {
  readonly to: string;
  readonly label: string;
  /** Only a count that asks for something. */
  readonly count?: number | undefined;
}

interface TopBarProps {
  readonly places: readonly Place[];
  /** Where the mark leads. */
  readonly home?: string;
  /** The field that goes to a child; drawn in the bar and, on a phone, in the menu. */
  readonly goTo?: ReactNode;
  /** Who you are: name, discipline, and the menu behind it. */
  readonly who?: ReactNode;
}

/** The frame's bar: mark, places, go to a child, who you are; under 1180 px the places fold into a menu. */
export function TopBar({ places, home = '/', goTo, who }: TopBarProps) {
  const { pathname } = useLocation();
  const [openAt, setOpenAt] = useState<string | null>(null);
  const isOpen = openAt === pathname;
  useEffect(() => {
    if (!isOpen) return;
    const onKeyDown = (event: KeyboardEvent) => {
      if (event.key === 'Escape') setOpenAt(null);
    };
    document.addEventListener('keydown', onKeyDown);
    return () => document.removeEventListener('keydown', onKeyDown);
  }, [isOpen]);
  const here = places.find((place) => pathname === place.to || pathname.startsWith(`${place.to}/`));
  return (
    <header className="no-print bg-paper sticky top-0 z-20">
      <div className="flex h-13.5 items-stretch gap-4 px-6 max-sm:px-4">
        <Link to={home} className="flex shrink-0 items-center gap-2 rounded pr-4 max-sm:pr-0">
          <Logo size={26} />
          <span className="text-head max-[480px]:sr-only">{kitWords.productName}</span>
        </Link>
        <PlaceLinks places={places} />
        <span className="text-body text-ink flex min-w-0 grow items-center truncate font-semibold min-[1180px]:hidden">
          {here?.label}
        </span>
        <div className="ml-auto flex shrink-0 items-center gap-4 max-sm:hidden">
          {goTo ? <div className="w-58">{goTo}</div> : null}
          {who}
        </div>
        <button
          type="button"
          aria-expanded={isOpen}
          onClick={() => setOpenAt(isOpen ? null : pathname)}
          className="text-body flex min-w-11 shrink-0 items-center justify-center gap-2 rounded font-semibold min-[1180px]:hidden"
        >
          {isOpen ? <CloseIcon /> : <MenuIcon />}
          {kitWords.places}
        </button>
      </div>
      <Selvedge />
      {isOpen ? (
        <div className="bg-paper border-hair shadow-lift absolute inset-x-0 flex max-h-[80vh] flex-col gap-3 overflow-y-auto border-b px-6 py-4 min-[1180px]:hidden max-sm:px-4">
          <div className="flex flex-col gap-3 sm:hidden">
            {goTo}
            {who}
          </div>
          <FoldedPlaces places={places} />
        </div>
      ) : null}
    </header>
  );
}

/** The bar of the current place sits in the selvedge: 5 px, indigo. */
function PlaceLinks({ places }: { readonly places: readonly Place[] }) {
  return (
    <nav aria-label={kitWords.places} className="hidden min-[1180px]:block">
      <ul className="m-0 flex h-full list-none items-stretch gap-1 p-0">
        {places.map((place) => (
          <li key={place.to} className="flex">
            <NavLink
              to={place.to}
              className="text-body text-ink-2 aria-[current=page]:text-ink hover:text-ink aria-[current=page]:before:bg-indigo relative flex items-center gap-1.5 rounded px-2.5 forced-color-adjust-none whitespace-nowrap focus-visible:-outline-offset-3 aria-[current=page]:font-semibold aria-[current=page]:before:absolute aria-[current=page]:before:inset-x-2 aria-[current=page]:before:-bottom-[5px] aria-[current=page]:before:z-10 aria-[current=page]:before:h-[5px] aria-[current=page]:before:rounded-tag"
            >
              {place.label} <PlaceCount count={place.count} />
            </NavLink>
          </li>
        ))}
      </ul>
    </nav>
  );
}

function FoldedPlaces({ places }: { readonly places: readonly Place[] }) {
  return (
    <nav aria-label={kitWords.places}>
      <ul className="m-0 grid list-none grid-cols-2 gap-x-4 p-0 min-[700px]:grid-cols-4">
        {places.map((place) => (
          <li key={place.to}>
            <NavLink
              to={place.to}
              className="text-body text-ink aria-[current=page]:border-indigo flex min-h-11 items-center gap-1.5 border-l-5 border-transparent pl-2.5 aria-[current=page]:font-semibold"
            >
              {place.label} <PlaceCount count={place.count} />
            </NavLink>
          </li>
        ))}
      </ul>
    </nav>
  );
}

function PlaceCount({ count }: { readonly count: number | undefined }) {
  if (count === undefined || count === 0) return null;
  return <span className="text-fine text-ink-3 figures font-normal">{count}</span>;
}
