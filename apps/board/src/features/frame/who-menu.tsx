import { useState, type ComponentProps, type ComponentType } from 'react';
import type { WhoMenuList } from './who-menu-list.tsx';
import { roleLine } from './role-line.ts';

type List = ComponentType<ComponentProps<typeof WhoMenuList>>;
type WhoMenuProps = Omit<ComponentProps<typeof WhoMenuList>, 'children'>;

const fetchList = () => import('./who-menu-list.tsx');
/** Not reached: the press asks again. */
const fetchAhead = () => void fetchList().catch(() => undefined);

/** Who is signed in, and the menu of what belongs to them, which is fetched when somebody comes near. */
export function WhoMenu(props: WhoMenuProps) {
  const [late, setLate] = useState<{ readonly List: List } | null>(null);
  const open = () => {
    fetchList().then(
      ({ WhoMenuList: List }) => setLate({ List }),
      () => undefined,
    );
  };
  const face = (
    <span className="flex max-w-64 min-w-0 flex-col text-right max-sm:min-h-11 max-sm:justify-center max-sm:text-left">
      <span className="text-small text-ink truncate font-semibold">{props.me.name}</span>
      <span className="text-fine text-ink-2 truncate">{roleLine(props.me)}</span>
    </span>
  );
  if (late !== null) return <late.List {...props}>{face}</late.List>;
  return (
    <button
      type="button"
      aria-haspopup="menu"
      aria-expanded={false}
      className="rounded text-left"
      onPointerEnter={fetchAhead}
      onFocus={fetchAhead}
      onClick={open}
      onKeyDown={(event) => {
        if (event.key === 'ArrowDown') open();
      }}
    >
      {face}
    </button>
  );
}
