import { NavLink } from 'react-router-dom';

interface TabLinksProps {
  readonly label: string;
  readonly tabs: readonly {
    readonly to: string;
    readonly label: string;
    readonly count?: number | undefined;
    readonly end?: boolean;
  }[];
}

/** Tabs of a page that each have their own address. */
export function TabLinks({ label, tabs }: TabLinksProps) {
  return (
    <nav aria-label={label} className="-mx-2 overflow-x-auto">
      <ul className="m-0 flex list-none gap-1 p-0">
        {tabs.map((tab) => (
          <li key={tab.to}>
            <NavLink
              to={tab.to}
              end={tab.end ?? false}
              className="text-body text-ink-2 aria-[current=page]:text-ink hover:text-ink aria-[current=page]:before:bg-indigo relative flex min-h-10 forced-color-adjust-none items-center gap-1.5 px-2 whitespace-nowrap before:absolute before:inset-x-2 before:bottom-0 before:h-1 focus-visible:-outline-offset-3 aria-[current=page]:font-semibold"
            >
              {tab.label}{' '}
              {tab.count === undefined ? null : <span className="text-fine text-ink-3 figures">{tab.count}</span>}
            </NavLink>
          </li>
        ))}
      </ul>
    </nav>
  );
}
